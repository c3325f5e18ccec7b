package bedmark.screen.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.diary.Diary;
import bedmark.document.Defect;
import bedmark.office.Offices;
import bedmark.office.Received;
import bedmark.office.Refusal;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CopyOnWriteArrayList;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.Executor;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicReference;
import javafx.collections.ListChangeListener;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Work beside the screen: what stops it, and what comes of it when it fails. */
class OfficeDeskTest {
    @TempDir
    Path folder;

    private OfficeDesk desk(Executor screen) {
        return new OfficeDesk(Offices.trusting(folder.resolve("office"), folder.resolve("tablet")), Offices.NOW, screen,
                (title, last) -> Optional.empty());
    }

    private static <T> T come(CompletableFuture<T> answer) throws Exception {
        return answer.get(1, TimeUnit.MINUTES);
    }

    @Test
    void whatIsCancelledStaysCancelledWhateverIsAskedAfterwards() throws Exception {
        try (OfficeDesk desk = desk(Runnable::run)) {
            CountDownLatch begun = new CountDownLatch(1);
            CountDownLatch asked = new CountDownLatch(1);
            CompletableFuture<Boolean> running = new CompletableFuture<>();
            CompletableFuture<Boolean> waiting = new CompletableFuture<>();
            CompletableFuture<Boolean> later = new CompletableFuture<>();
            desk.ask(progress -> {
                begun.countDown();
                return awaited(asked) && progress.cancelled();
            }, running::complete);
            desk.ask(progress -> progress.cancelled(), waiting::complete);
            assertTrue(begun.await(1, TimeUnit.MINUTES));
            desk.cancel();
            desk.ask(progress -> progress.cancelled(), later::complete);
            asked.countDown();
            assertTrue(come(running));
            assertTrue(come(waiting));
            assertFalse(come(later));
        }
    }

    private static boolean awaited(CountDownLatch latch) {
        try {
            return latch.await(1, TimeUnit.MINUTES);
        } catch (InterruptedException e) {
            throw new IllegalStateException(e);
        }
    }

    @Test
    void whatNobodyExpectedToFailIsSaidAndNotedAndTheWorkHasEnded() throws Exception {
        try (OfficeDesk desk = desk(Runnable::run)) {
            CompletableFuture<Defect> told = new CompletableFuture<>();
            desk.troubleProperty().addListener((property, before, now) -> now.ifPresent(told::complete));
            List<Number> shares = new CopyOnWriteArrayList<>();
            desk.progressProperty().addListener((property, before, now) -> shares.add(now));
            desk.ask(progress -> {
                progress.at(1, 2);
                throw new IllegalStateException("what a person wrote");
            }, answer -> { });
            assertEquals("office-work-failed", come(told).code());
            assertEquals(List.of(0.0, 0.5, -1.0), shares);
            List<String> noted = Diary.read(desk.store().folder());
            assertTrue(noted.get(0).endsWith(" failed java.lang.IllegalStateException"), noted::toString);
            assertTrue(noted.stream().noneMatch(line -> line.contains("a person")), noted::toString);
        }
    }

    @Test
    void aWatchEndsWhereNotEveryPackCameInAndGivesThemAllWhenItBeginsAnew() throws Exception {
        Path stick = folder.resolve("stick");
        for (String round : List.of("round-2025-09", "round-2026-03", "round-under-way")) {
            Offices.pack(Offices.sample(round), folder.resolve("tablet"), stick.resolve(round + ".zip"));
        }
        AtomicBoolean stopping = new AtomicBoolean(true);
        AtomicReference<OfficeDesk> at = new AtomicReference<>();
        // Whoever is told how far it is stops it at once.
        try (OfficeDesk desk = desk(told -> {
            told.run();
            if (stopping.get() && at.get() != null) {
                at.get().cancel();
            }
        })) {
            at.set(desk);
            ReceiveModel model = new ReceiveModel(desk);
            CompletableFuture<Optional<Path>> ended = new CompletableFuture<>();
            CompletableFuture<Boolean> all = new CompletableFuture<>();
            model.watch(Optional.of(stick));
            model.watchedProperty().addListener((property, before, now) -> ended.complete(now));
            model.look();
            model.look();
            assertEquals(Optional.empty(), come(ended));
            stopping.set(false);
            model.received().addListener((ListChangeListener<Received>) change -> {
                if (model.received().stream().map(Received::file).distinct().count() == 3) {
                    all.complete(true);
                }
            });
            model.watch(Optional.of(stick));
            model.look();
            model.look();
            assertTrue(come(all));
            model.close();
        }
    }

    @Test
    void whatIsToldOfIsNotListedOnceMoreAsRefusedBefore() throws Exception {
        Path broken = Files.write(folder.resolve("broken.zip"), new byte[] {1, 2, 3});
        Path unread = Path.of("/dev/null");
        try (OfficeDesk desk = desk(Runnable::run)) {
            ReceiveModel model = new ReceiveModel(desk);
            CompletableFuture<List<Refusal>> refused = new CompletableFuture<>();
            model.refusedProperty().addListener((property, before, now) -> refused.complete(now));
            model.receive(List.of(broken, unread));
            assertEquals(2, come(refused).size());
            assertEquals(List.of(), model.refusedBefore());
            model.close();
            ReceiveModel next = new ReceiveModel(desk);
            CompletableFuture<List<Refusal>> held = new CompletableFuture<>();
            next.refusedProperty().addListener((property, before, now) -> held.complete(now));
            next.lookAtRefused();
            assertEquals(come(held), next.refusedBefore());
            next.close();
        }
    }
}
