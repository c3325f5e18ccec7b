package bedmark.index;

import static bedmark.index.StoreScript.NOON;
import static bedmark.index.StoreScript.PERSON;
import static bedmark.index.StoreScript.PHOTO;
import static bedmark.index.StoreScript.ROUND;
import static bedmark.index.StoreScript.id;
import static bedmark.index.StoreScript.options;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.FailingLayer;
import bedmark.journal.FileLayer;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import bedmark.journal.QuickLayer;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.QueueState;
import bedmark.survey.SurveyHistory;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.Consumer;
import java.util.function.Supplier;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Every operation of a small round fails, once and for good; the index stays on a sound disk. */
class StoreFailureTest {
    @TempDir
    Path folder;

    /** What the person was told. */
    private static final class Told {
        final List<Entry> saved = new ArrayList<>();
        final Set<String> codes = new TreeSet<>();

        void attempt(Supplier<Entry> step) {
            try {
                saved.add(step.get());
            } catch (NotSaved e) {
                codes.add(e.defect().code());
            } catch (Refused e) {
                // A step that builds on one that was not saved.
                codes.add(e.defect().code());
            }
        }
    }

    private static Told round(Path home, FileLayer files, boolean sealed) {
        Told told = new Told();
        session(StoreScript.home(home, sealed), files, sealed, told, store -> {
            told.attempt(() -> store.append("", StoreScript.register("Northern plant")));
            told.attempt(() -> store.append(PERSON, new Act.WalkStarted(ROUND)));
            told.attempt(() -> store.append(PERSON, StoreScript.opened(id(1), "T1")));
            told.attempt(() -> store.append(PERSON, StoreScript.speed(id(1), "2.5")));
            told.attempt(() -> store.attachPhoto(PHOTO, id(1), PERSON, NOON, "left"));
            told.attempt(() -> store.append(PERSON, new Act.SurveyCompleted(id(1), PERSON)));
            told.attempt(() -> store.append(PERSON, new Act.SurveysQueued(List.of(id(1)))));
        });
        return told;
    }

    private static void session(Path home, FileLayer files, boolean sealed, Told told, Consumer<Store> work) {
        try (Store store = Store.open(home, options(sealed).withFiles(files).withSegmentBytes(1024))) {
            work.accept(store);
        } catch (Refused e) {
            told.codes.add(e.defect().code());
        }
    }

    @ParameterizedTest
    @CsvSource({"false,false", "true,false", "false,true", "true,true"})
    void noActIsReportedSavedThatIsNotThereAfterwards(boolean forGood, boolean sealed) {
        FailingLayer sound = new FailingLayer(0, false, "");
        assertEquals(7, round(folder.resolve("sound"), sound, sealed).saved.size());
        for (long n = 1; n <= sound.operations(); n += sealed ? 5 : 1) {
            Path home = folder.resolve((forGood ? "good" : "once") + n);
            Told told = round(home, new FailingLayer(n, forGood, "Input/output error"), sealed);
            String where = "operation " + n + " " + told.codes;
            try (Store store = Store.open(home, options(sealed).withFiles(new QuickLayer()))) {
                assertThere(store, told.saved, where);
                StoreCheck check = store.check(Progress.NONE);
                assertTrue(check.sound(), () -> where + check.defects());
                store.append(PERSON, StoreScript.opened(id(9), "T9"));
            }
        }
    }

    /** What was reported saved is there; what was not may be there too, since only its confirmation failed. */
    private static void assertThere(Store store, List<Entry> saved, String where) {
        List<String> acts = saved.stream().map(entry -> entry.act().code()).toList();
        Optional<SurveyHistory> there = store.history(id(1));
        assertTrue(!acts.contains("survey-opened") || there.isPresent(), where);
        assertTrue(!acts.contains("answer-set") || there.orElseThrow().changes().size() == 1, where);
        assertTrue(!acts.contains("photo-attached") || there.orElseThrow().survey().photos().size() == 1, where);
        assertTrue(!acts.contains("survey-completed") || there.orElseThrow().state() != QueueState.OPEN, where);
        assertTrue(!acts.contains("surveys-queued") || store.queue().size() == 1, where);
        assertTrue(!acts.contains("register-taken") || store.register().isPresent(), where);
        assertTrue(!acts.contains("walk-started") || store.walk(ROUND).isPresent(), where);
    }

    @Test
    void aFullDiskIsToldAndTheSurveyStaysReadable() {
        FailingLayer counted = new FailingLayer(0, false, "");
        try (Store store = Store.open(folder.resolve("counted"), options().withFiles(counted))) {
            store.append(PERSON, StoreScript.opened(id(1), "T1"));
        }
        List<NotSaved> heard = new ArrayList<>();
        FailingLayer full = new FailingLayer(counted.operations() + 1, true, "No space left on device");
        try (Store store = Store.open(folder.resolve("full"), options().withFiles(full))) {
            store.observe(new StoreObserver() {
                @Override
                public void saved(Entry entry) {
                    assertEquals(1, entry.sequence());
                }

                @Override
                public void notSaved(NotSaved why) {
                    heard.add(why);
                }
            });
            Told told = new Told();
            told.attempt(() -> store.append(PERSON, StoreScript.opened(id(1), "T1")));
            told.attempt(() -> store.append(PERSON, StoreScript.speed(id(1), "2")));
            told.attempt(() -> store.attachPhoto(PHOTO, id(1), PERSON, NOON, ""));
            assertEquals(Set.of("not-saved-disk-full"), told.codes);
            assertEquals(List.of(1L, 1L), heard.stream().map(NotSaved::safe).toList());
            assertTrue(store.history(id(1)).isPresent());
        }
    }

    @Test
    void anIndexThatTheDiskDoesNotTakeIsKeptInMemory() throws IOException {
        Path home = folder.resolve("blocked");
        try (Store store = Store.open(home, options())) {
            store.append(PERSON, StoreScript.opened(id(1), "T1"));
        }
        Path database = home.resolve("index").resolve("bedmark.mv.db");
        Files.delete(database);
        Files.createDirectories(database);
        try (Store store = Store.open(home, options())) {
            store.append(PERSON, StoreScript.speed(id(1), "2"));
            assertEquals(1, store.history(id(1)).orElseThrow().changes().size());
            assertEquals(List.of("index-in-memory"), store.opening().found().stream().map(Defect::code).toList());
        }
        Files.delete(database);
        try (Store store = Store.open(home, options())) {
            assertEquals(1, store.history(id(1)).orElseThrow().changes().size());
            assertFalse(store.opening().found().stream().anyMatch(defect -> defect.code().startsWith("index")));
        }
    }
}
