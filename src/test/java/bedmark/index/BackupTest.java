package bedmark.index;

import static bedmark.index.StoreScript.FEW;
import static bedmark.index.StoreScript.NOON;
import static bedmark.index.StoreScript.PERSON;
import static bedmark.index.StoreScript.SECRET;
import static bedmark.index.StoreScript.id;
import static bedmark.index.StoreScript.options;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.journal.FailingLayer;
import bedmark.journal.FileLayer;
import bedmark.journal.ForwardingLayer;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import bedmark.journal.QuickLayer;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import bedmark.survey.Act;
import bedmark.survey.QueueState;
import bedmark.survey.SurveyHistory;
import bedmark.vault.Passphrase;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A backup is whole or it is not there, and what it brings to another tablet is there once. */
class BackupTest {
    private static final Optional<Passphrase> NONE = Optional.empty();

    @TempDir
    Path folder;
    private Path home;
    private Path stick;

    @BeforeEach
    void prepare() throws IOException {
        home = folder.resolve("tablet");
        stick = Files.createDirectory(folder.resolve("stick"));
    }

    private static StoreOptions quick(boolean sealed) {
        return options(sealed).withFiles(new QuickLayer()).withSegmentBytes(2048);
    }

    private Asked walked(boolean sealed) {
        try (Store store = Store.open(StoreScript.home(home, sealed), quick(sealed))) {
            StoreScript.walk(store);
            store.backup(stick, PERSON, Progress.NONE);
            return Asked.of(store);
        }
    }

    private static Restored restore(Path from, Path to, boolean sealed) {
        return new StoreFolder(to, quick(sealed), FEW).restore(from, sealed ? Optional.of(SECRET) : NONE, PERSON);
    }

    private static Map<String, Long> files(Path root) throws IOException {
        Map<String, Long> files = new TreeMap<>();
        try (Stream<Path> all = Files.walk(root)) {
            for (Path file : all.filter(Files::isRegularFile).toList()) {
                byte[] bytes = Files.readAllBytes(file);
                files.put(root.relativize(file).toString(), Arrays.hashCode(bytes) * 1_000_003L
                        + bytes.length);
            }
        }
        return files;
    }

    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void anotherDeviceGetsTheWholeHistoryAndStaysItself(boolean sealed) throws IOException {
        Asked asked = walked(sealed);
        Path other = folder.resolve("other");
        Restored restored = restore(stick, other, sealed);
        assertTrue(restored.fresh());
        assertEquals(4, restored.taken().size());
        try (Store store = Store.open(home, quick(sealed)); Store copy = Store.open(other, quick(sealed))) {
            assertNotEquals(store.device().id(), copy.device().id());
            assertTrue(store.facts().backup().isPresent());
        }
        try (Store copy = Store.open(other, quick(sealed))) {
            assertEquals(asked, Asked.of(copy));
            assertTrue(copy.check(Progress.NONE).sound(), () -> copy.check(Progress.NONE).defects().toString());
            copy.append(PERSON, StoreScript.speed(id(3), "2.60"));
            copy.append(PERSON, new Act.AnswerUndone(id(3), 17));
            assertEquals(2, copy.history(id(3)).orElseThrow().changes().size());
        }
    }

    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void restoringTwiceChangesNothing(boolean sealed) throws IOException {
        walked(sealed);
        Path other = folder.resolve("other");
        restore(stick, other, sealed);
        Store.open(other, quick(sealed)).close();
        Map<String, Long> journal = files(other.resolve("journal"));
        Restored again = restore(stick, other, sealed);
        assertEquals(List.of(), again.taken());
        assertEquals(List.of(), again.differing());
        assertEquals(4, again.known().size());
        assertEquals(journal, files(other.resolve("journal")));
    }

    private Path otherTablet() {
        Path other = folder.resolve("other");
        try (Store store = Store.open(other, quick(false))) {
            store.append(PERSON, StoreScript.register("Northern plant"));
            store.append(PERSON, StoreScript.opened(id(70), "T7"));
            store.append(PERSON, StoreScript.speed(id(70), "1.0"));
        }
        return other;
    }

    @Test
    void aWalkGoesOnOnAnotherTabletThatHasItsOwn() throws IOException {
        walked(false);
        Path other = otherTablet();
        Restored restored = restore(stick, other, false);
        assertFalse(restored.fresh());
        assertEquals(List.of(id(90), id(1), id(2), id(3)), restored.taken());
        try (Store store = Store.open(other, quick(false))) {
            SurveyHistory open = store.history(id(3)).orElseThrow();
            assertEquals(QueueState.OPEN, open.state());
            assertEquals(id(1), open.survey().supersedes().orElseThrow());
            assertTrue(open.survey().document().at(Pointer.parse("/readings/beltSpeed"))
                    .isPresent(), "answers came along");
            Branch photo = store.history(id(1)).orElseThrow().survey().photos().get(0);
            assertArrayEquals(StoreScript.PHOTO, store.photo(photo).orElseThrow().open().readAllBytes());
            assertEquals(QueueState.COMPLETED, store.survey(id(1)).orElseThrow().state(), "it leaves from here");
            assertEquals(QueueState.RECEIVED, store.survey(id(2)).orElseThrow().state(), "the office has it");
            assertEquals(5, store.surveys(SurveyQuery.ALL).size());
            store.append(PERSON, StoreScript.speed(id(3), "2.60"));
            store.append(PERSON, new Act.SurveyCompleted(id(3), PERSON));
            assertTrue(store.check(Progress.NONE).sound());
        }
        Map<String, Long> journal = files(other.resolve("journal"));
        Restored again = restore(stick, other, false);
        assertEquals(List.of(), again.taken());
        assertEquals(List.of(id(3)), again.differing(), "what went on here is told and left alone");
        assertEquals(journal, files(other.resolve("journal")));
    }

    @Test
    void aTakingOverThatWasCutShortIsEndedByTheNextOne() throws IOException {
        walked(false);
        Path template = otherTablet();
        FailingLayer counted = new FailingLayer(0, false, "");
        takeOver(copy(template, "counted"), counted);
        for (long n = 3; n <= counted.operations(); n += 11) {
            Path other = copy(template, "other" + n);
            takeOver(other, new FailingLayer(n, true, "Input/output error"));
            restore(stick, other, false);
            try (Store store = Store.open(other, quick(false))) {
                assertEquals(5, store.surveys(SurveyQuery.ALL).size(), "operation " + n);
                assertEquals(QueueState.COMPLETED, store.survey(id(1)).orElseThrow().state(), "operation " + n);
                assertTrue(store.check(Progress.NONE).sound(), "operation " + n);
            }
        }
    }

    private void takeOver(Path other, FileLayer files) {
        try {
            new StoreFolder(other, options().withFiles(files), FEW).restore(stick, NONE, PERSON);
        } catch (Refused | NotSaved e) {
            assertTrue(e.getMessage().contains("failed"), e.getMessage());
        }
    }

    private Path copy(Path from, String name) throws IOException {
        Path to = folder.resolve(name);
        try (Stream<Path> all = Files.walk(from)) {
            for (Path file : all.toList()) {
                Files.copy(file, to.resolve(from.relativize(file)));
            }
        }
        return to;
    }

    @Test
    void anotherPlantIsNotMixedIn() {
        walked(false);
        Path other = folder.resolve("other");
        try (Store store = Store.open(other, quick(false))) {
            store.append(PERSON, StoreScript.register("Southern plant"));
        }
        assertEquals("restore-other-plant", assertThrows(Refused.class, () ->
                restore(stick, other, false)).defect().code());
    }

    @Test
    void aLaterBackupBringsTheEarlierUpToDateAndTwoTabletsShareAStick() throws IOException {
        walked(false);
        Path backup;
        try (Store store = Store.open(home, quick(false))) {
            store.append(PERSON, StoreScript.opened(id(8), "T8"));
            store.attachPhoto(StoreScript.photo("a worn seal"), id(8), PERSON, NOON, "");
            backup = store.backup(stick, PERSON, Progress.NONE);
            assertEquals(List.of(1L), store.surveys(SurveyQuery.ALL.ofTransfer("T8")).stream().map(line -> 1L)
                    .toList());
        }
        BackupList list = BackupList.read(backup, FileLayer.disk()).orElseThrow();
        assertEquals(list.items().size() + 1, files(backup).size(), "nothing lies there that it does not name");
        restore(backup, folder.resolve("third"), false);
        try (Store store = Store.open(folder.resolve("third"), quick(false))) {
            assertEquals(1, store.surveys(SurveyQuery.ALL.ofTransfer("T8")).size());
        }
        try (Store store = Store.open(folder.resolve("third"), quick(false))) {
            store.backup(stick, PERSON, Progress.NONE);
        }
        assertEquals("backup-several", assertThrows(Refused.class, () ->
                restore(stick, folder.resolve("fourth"), false)).defect().code());
    }

    /** Takes the stick away, fills it or locks it while the backup is being written. */
    private static final class Stick extends ForwardingLayer {
        private final Path stick;
        private final String how;

        Stick(Path stick, String how) {
            super(new QuickLayer());
            this.stick = stick;
            this.how = how;
        }

        @Override
        public Output create(Path file) throws IOException {
            if (file.startsWith(stick) && file.toString().contains("journal")) {
                switch (how) {
                    case "vanishes" -> remove(stick);
                    case "fills up" -> throw new IOException("No space left on device");
                    case "is locked" -> throw new IOException("Read-only file system");
                    default -> throw new IOException("Input/output error");
                }
            }
            return super.create(file);
        }

        private static void remove(Path folder) {
            try (Stream<Path> all = Files.walk(folder)) {
                for (Path file : all.sorted(Comparator.reverseOrder()).toList()) {
                    Files.delete(file);
                }
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"vanishes", "fills up", "is locked", "breaks"})
    void aStickThatFailsIsToldAndTheStoreIsAsItWas(String how) throws IOException {
        try (Store store = Store.open(home, options().withFiles(new Stick(stick, how)))) {
            StoreScript.walk(store);
            Map<String, Long> before = files(home.resolve("journal"));
            String code = assertThrows(Refused.class, () ->
                    store.backup(stick, PERSON, Progress.NONE)).defect().code();
            assertEquals(Map.of("vanishes", "backup-vanished", "fills up", "backup-disk-full", "is locked",
                    "backup-read-only", "breaks", "backup-failed").get(how), code);
            assertEquals(before, files(home.resolve("journal")));
            assertTrue(store.facts().backup().isEmpty());
            store.append(PERSON, StoreScript.opened(id(9), "T9"));
        }
    }

    @Test
    void anEarlierBackupIsWholeWhateverStepOfTheNextFails() throws IOException {
        walked(false);
        try (Store store = Store.open(home, quick(false))) {
            store.append(PERSON, StoreScript.opened(id(8), "T8"));
        }
        FailingLayer counted = new FailingLayer(0, false, "");
        long opening;
        try (Store store = Store.open(copy(home, "counted"), options().withFiles(counted))) {
            opening = counted.operations();
            store.backup(copy(stick, "counted-stick"), PERSON, Progress.NONE);
        }
        for (long n = opening + 1; n <= counted.operations(); n += 2) {
            Path here = copy(stick, "stick" + n);
            try (Store store = Store.open(copy(home, "home" + n), options().withFiles(
                    new FailingLayer(n, true, "Input/output error")))) {
                store.backup(here, PERSON, Progress.NONE);
            } catch (Refused | NotSaved e) {
                assertTrue(e.getMessage().contains("failed") || e.getMessage().contains("unreadable"),
                        e.getMessage());
            }
            Path restored = folder.resolve("restored" + n);
            assertTrue(restore(here, restored, false).fresh(), "operation " + n);
            try (Store store = Store.open(restored, quick(false))) {
                assertTrue(store.surveys(SurveyQuery.ALL).size() >= 4, "operation " + n);
            }
        }
    }

    @Test
    void aCancelledBackupAndADamagedOneAreToldAndNothingIsMade() throws IOException {
        walked(false);
        Path backup;
        try (Store store = Store.open(home, quick(false))) {
            backup = store.backup(stick, PERSON, Progress.NONE);
            assertEquals("work-cancelled", assertThrows(Refused.class, () ->
                    store.backup(stick, PERSON, new Progress() {
                        @Override
                        public void at(long done, long total) {
                            assertTrue(done <= total);
                        }

                        @Override
                        public boolean cancelled() {
                            return true;
                        }
                    })).defect().code());
        }
        for (BackupList.Item item : BackupList.read(backup, FileLayer.disk()).orElseThrow().items()) {
            Path file = backup.resolve(item.as());
            byte[] whole = Files.readAllBytes(file);
            byte[] flipped = whole.clone();
            flipped[whole.length / 2] ^= 4;
            Files.write(file, flipped);
            Path other = folder.resolve("never");
            assertEquals("backup-file-damaged", assertThrows(Refused.class, () ->
                    restore(stick, other, false)).defect().code());
            assertFalse(Files.exists(other));
            Files.write(file, whole);
        }
        Files.writeString(backup.resolve(BackupList.NAME), "{}");
        assertEquals("backup-list-damaged", assertThrows(Refused.class, () ->
                restore(stick, folder.resolve("never"), false)).defect().code());
        assertEquals("backup-absent", assertThrows(Refused.class, () ->
                restore(folder.resolve("nowhere"), folder.resolve("never"), false)).defect().code());
    }

    @Test
    void aListThatNamesFilesOutsideAStoreIsRefused() throws IOException {
        walked(false);
        Path backup = Backups.find(stick, FileLayer.disk());
        Branch list = JsonReader.read(Files.readAllBytes(backup.resolve(BackupList.NAME))).root();
        for (String name : List.of("../x", "journal/../../x", "/etc/x", "photos/a/b", "device-key.pem", "journal/")) {
            Branch item = list.branches("files").get(0).with("file", name);
            Files.write(backup.resolve(BackupList.NAME), JsonWriter.indented(
                    list.with("files", Node.Series.of(item))));
            assertEquals("backup-list-damaged", assertThrows(Refused.class, () ->
                    restore(stick, folder.resolve("never"), false), name).defect().code());
        }
    }

    @Test
    void aBackupOfASealedStoreTellsNothing() throws IOException {
        walked(true);
        try (Stream<Path> all = Files.walk(stick)) {
            for (Path file : all.filter(Files::isRegularFile).toList()) {
                String text = Files.readString(file, StandardCharsets.ISO_8859_1);
                for (String secret : List.of("left skirt", "Northern plant", "wrong belt", PERSON, "answer-set")) {
                    assertFalse(text.contains(secret), file + " " + secret);
                }
            }
        }
        assertEquals("store-sealed", assertThrows(Refused.class, () -> new StoreFolder(folder.resolve("other"),
                quick(false), FEW).restore(stick, NONE, PERSON)).defect().code());
        assertFalse(Files.exists(folder.resolve("other")));
        Path plain = otherTablet();
        new StoreFolder(plain.resolveSibling("other"), quick(false), FEW).restore(stick, Optional.of(SECRET), PERSON);
        try (Store store = Store.open(plain, quick(false))) {
            assertEquals(5, store.surveys(SurveyQuery.ALL).size());
        }
    }
}
