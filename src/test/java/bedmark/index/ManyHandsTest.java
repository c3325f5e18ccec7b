package bedmark.index;

import static bedmark.index.StoreScript.PERSON;
import static bedmark.index.StoreScript.answer;
import static bedmark.index.StoreScript.id;
import static bedmark.index.StoreScript.opened;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Node;
import bedmark.journal.Progress;
import bedmark.survey.Entry;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicReference;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Several threads save at once, are interrupted all the time, and others ask and prove meanwhile. */
class ManyHandsTest {
    private static final int HANDS = 4;
    private static final int ANSWERS = 60;

    @TempDir
    Path folder;

    private final List<Entry> saved = Collections.synchronizedList(new ArrayList<>());
    private final AtomicReference<Optional<Throwable>> failed = new AtomicReference<>(Optional.empty());

    private void type(Store store, int hand) {
        try {
            saved.add(store.append(PERSON, opened(id(hand), "T" + hand)));
            for (int i = 0; i < ANSWERS; i++) {
                if (i % 3 == 0) {
                    Thread.currentThread().interrupt();
                }
                saved.add(store.append(PERSON, answer(id(hand), "/notes", Node.text(hand + "-" + i))));
            }
        } catch (RuntimeException | Error e) {
            failed.set(Optional.of(e));
        }
    }

    @Test
    void nothingIsLostOrDoubledAndNoInterruptClosesAnything() throws InterruptedException {
        StoreOptions options = StoreScript.options().withSegmentBytes(4096);
        try (Store store = Store.open(folder, options)) {
            List<Thread> hands = new ArrayList<>();
            for (int hand = 1; hand <= HANDS; hand++) {
                int number = hand;
                hands.add(new Thread(() -> type(store, number)));
            }
            AtomicBoolean over = new AtomicBoolean();
            Thread nuisance = new Thread(() -> {
                Random random = new Random(3);
                while (!over.get()) {
                    hands.get(random.nextInt(HANDS)).interrupt();
                    Thread.onSpinWait();
                    Thread.yield();
                }
            });
            hands.forEach(Thread::start);
            nuisance.start();
            while (hands.stream().anyMatch(Thread::isAlive)) {
                store.surveys(SurveyQuery.ALL).forEach(line ->
                        assertTrue(store.history(line.id()).orElseThrow().changes().size() <= ANSWERS));
                StoreCheck check = store.check(Progress.NONE);
                assertTrue(check.sound(), () -> check.defects().toString());
            }
            over.set(true);
            nuisance.join();
            assertEquals(Optional.empty(), failed.get());
            assertEquals(LongStream.rangeClosed(1, HANDS * (ANSWERS + 1)).boxed().toList(),
                    saved.stream().map(Entry::sequence).sorted().toList());
            assertAllThere(store);
        }
        try (Store store = Store.open(folder, options)) {
            assertEquals(0, store.opening().replayed());
            assertAllThere(store);
            StoreCheck check = store.check(Progress.NONE);
            assertTrue(check.sound() && check.segments() > 3, check::toString);
        }
    }

    private static void assertAllThere(Store store) {
        for (int hand = 1; hand <= HANDS; hand++) {
            int number = hand;
            assertEquals(LongStream.range(0, ANSWERS).mapToObj(i -> number + "-" + i).toList(),
                    store.history(id(hand)).orElseThrow().changes().stream()
                            .map(change -> ((Node.Text) change.after().orElseThrow()).value()).toList());
        }
    }
}
