package bedmark.index;

import static bedmark.index.StoreScript.PERSON;
import static bedmark.index.StoreScript.id;
import static bedmark.index.StoreScript.options;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Digest;
import bedmark.journal.Progress;
import bedmark.journal.QuickLayer;
import bedmark.survey.Act;
import bedmark.survey.SurveyHistory;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class StoreCheckTest {
    @TempDir
    Path folder;

    private Path segment() {
        return folder.resolve("journal").resolve("00000001.journal");
    }

    private void walked() {
        try (Store store = Store.open(folder, options().withFiles(new QuickLayer()))) {
            StoreScript.walk(store);
        }
    }

    private StoreCheck check() {
        return Store.check(folder, new QuickLayer(), Progress.NONE);
    }

    private static List<String> codes(List<Defect> defects) {
        return defects.stream().map(Defect::code).toList();
    }

    private Map<String, String> everyFile() throws IOException {
        Map<String, String> files = new TreeMap<>();
        try (Stream<Path> all = Files.walk(folder)) {
            for (Path file : all.filter(Files::isRegularFile).toList()) {
                files.put(file.toString(), Digest.of(Files.readAllBytes(file)).hex());
            }
        }
        return files;
    }

    @Test
    void aSoundStoreIsSaidToBeSoundAndNotAByteIsChanged() throws IOException {
        walked();
        Map<String, String> before = everyFile();
        List<Long> progress = new ArrayList<>();
        StoreCheck check = Store.check(folder, new QuickLayer(), (done, total) -> progress.add(done * 100 / total));
        assertTrue(check.sound(), () -> check.defects().toString());
        assertEquals(new StoreCheck(1, 18, 18, true, List.of(), 1, true, List.of(), check.facts()),
                check);
        assertEquals(100, progress.get(progress.size() - 1));
        assertEquals(before, everyFile());
    }

    @Test
    void aProofStopsWhereThePersonStopsIt() throws IOException {
        walked();
        Map<String, String> before = everyFile();
        Progress impatient = new Progress() {
            @Override
            public void at(long done, long total) {
                assertTrue(done <= total);
            }

            @Override
            public boolean cancelled() {
                return true;
            }
        };
        assertEquals("work-cancelled", assertThrows(Refused.class, () ->
                Store.check(folder, new QuickLayer(), impatient)).defect().code());
        assertEquals(before, everyFile());
    }

    @Test
    void aCheckTellsWhenSomethingWasSavedAndBackedUpLast() throws IOException {
        walked();
        Path stick = Files.createDirectory(folder.resolve("stick"));
        try (Store store = Store.open(folder, options().withFiles(new QuickLayer()))) {
            store.backup(stick, PERSON, Progress.NONE);
            assertEquals(0, store.facts().notBackedUp());
            store.append(PERSON, new Act.WalkStarted("round-2"));
            assertEquals(1, store.facts().notBackedUp());
        }
        StoreFacts facts = check().facts();
        assertEquals(20, facts.last());
        assertEquals(18, facts.backup().orElseThrow().upTo());
        assertEquals(1, facts.notBackedUp());
        assertTrue(facts.savedAt().isPresent());
        assertTrue(facts.freeBytes() > 0);
    }

    @Test
    void aStoreIsProvedWhileItIsOpen() {
        try (Store store = Store.open(folder, options().withFiles(new QuickLayer()))) {
            StoreScript.walk(store);
            StoreCheck check = store.check((done, total) ->
                    store.append(PERSON, new Act.WalkStarted("round-" + done)));
            assertTrue(check.sound(), () -> check.defects().toString());
            assertEquals(18, check.entries());
            assertTrue(store.check(Progress.NONE).entries() > 18);
        }
    }

    @Test
    void aStoreThatIsOpenElsewhereIsProvedWithoutItsIndex() {
        try (Store store = Store.open(folder, options().withFiles(new QuickLayer()))) {
            StoreScript.walk(store);
            StoreCheck check = check();
            assertTrue(check.chainIntact());
            assertEquals(18, check.entries());
            assertTrue(check.sound() || codes(check.defects()).equals(List.of("index-in-use")),
                    () -> check.defects().toString());
        }
    }

    @Test
    void aDamagedEntryIsNamedAndEverythingAroundItIsStillRead() throws IOException {
        walked();
        byte[] bytes = Files.readAllBytes(segment());
        int at = new String(bytes, StandardCharsets.ISO_8859_1).indexOf("2.50");
        bytes[at] = '3';
        Files.write(segment(), bytes);
        StoreCheck check = check();
        assertFalse(check.chainIntact());
        assertEquals(17, check.entries());
        assertEquals("journal-entry-damaged", check.defects().get(0).code());
        assertEquals("5", check.defects().get(0).details().get(1));
        try (Store store = Store.open(folder, options().withFiles(new QuickLayer()))) {
            SurveyHistory history = store.history(id(1)).orElseThrow();
            assertEquals(List.of(6L), history.changes().stream().map(SurveyHistory.Change::sequence).toList());
            assertEquals(1, history.survey().photos().size());
            assertTrue(store.survey(id(3)).isPresent());
            assertTrue(codes(store.opening().found()).contains("journal-entry-damaged"));
            store.append(PERSON, StoreScript.speed(id(3), "2.6"));
            assertEquals(19, store.survey(id(3)).orElseThrow().last());
        }
    }

    @Test
    void aLostOpeningLeavesTheOtherSurveysAlone() throws IOException {
        walked();
        byte[] bytes = Files.readAllBytes(segment());
        int at = new String(bytes, StandardCharsets.ISO_8859_1).indexOf("survey-opened");
        bytes[at] = 'S';
        Files.write(segment(), bytes);
        Store.rebuild(folder, options().withFiles(new QuickLayer()));
        StoreCheck check = check();
        assertEquals(List.of("journal-entry-damaged", "entry-unfit"),
                codes(check.defects()).stream().distinct().toList());
        assertTrue(check.indexEqual());
        try (Store store = Store.open(folder, options().withFiles(new QuickLayer()))) {
            assertTrue(store.history(id(1)).isEmpty());
            assertEquals(List.of(id(90), id(2), id(3)),
                    store.surveys(SurveyQuery.ALL).stream().map(SurveyLine::id).toList());
        }
    }

    @Test
    void photosThatAreGoneOrDifferAreNamed() throws IOException {
        walked();
        Branch photo;
        Path file;
        try (Store store = Store.open(folder, options().withFiles(new QuickLayer()))) {
            photo = store.history(id(1)).orElseThrow().survey().photos().get(0);
            file = store.photoFile(photo);
        }
        byte[] content = Files.readAllBytes(file);
        content[5] ^= 1;
        Files.write(file, content);
        assertEquals(List.of("photo-differs"), codes(check().defects()));
        Files.delete(file);
        assertEquals(List.of("photo-missing"), codes(check().defects()));
        assertFalse(check().sound());
    }

    @Test
    void aTornTailIsNamedBeforeAndKeptAfterOpening() throws IOException {
        walked();
        Files.write(segment(), new byte[] {1, 2, 3}, StandardOpenOption.APPEND);
        assertEquals(List.of("journal-tail-unread"), codes(check().defects()));
        try (Store store = Store.open(folder, options().withFiles(new QuickLayer()))) {
            assertEquals(List.of("journal-tail-torn"), codes(store.opening().found()));
        }
        StoreCheck check = check();
        assertTrue(check.sound(), () -> check.defects().toString());
        assertEquals(1, check.torn().size());
    }

    @Test
    void entriesThatVanishedAfterTheyWereSavedAreNamed() throws IOException {
        walked();
        byte[] bytes = Files.readAllBytes(segment());
        int at = new String(bytes, StandardCharsets.ISO_8859_1).lastIndexOf("\"sequence\":17") - 57;
        Files.write(segment(), Arrays.copyOf(bytes, at));
        assertFalse(check().sound());
        try (Store store = Store.open(folder, options().withFiles(new QuickLayer()))) {
            assertEquals("17-18", store.opening().found().get(0).details().get(1));
            assertEquals(19, store.append(PERSON, StoreScript.speed(id(3), "2.6")).sequence());
        }
        assertFalse(check().chainIntact());
    }

    @Test
    void aJournalThatIsGoneAltogetherIsNamed() throws IOException {
        walked();
        Files.delete(segment());
        try (Store store = Store.open(folder, options().withFiles(new QuickLayer()))) {
            assertEquals(List.of("journal-missing"), codes(store.opening().found()));
            assertEquals(List.of(), store.surveys(SurveyQuery.ALL));
        }
    }
}
