package bedmark.index;

import static bedmark.index.StoreScript.PERSON;
import static bedmark.index.StoreScript.id;
import static bedmark.index.StoreScript.options;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Refused;
import bedmark.journal.Progress;
import bedmark.journal.QuickLayer;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class StoreRebuildTest {
    @TempDir
    Path folder;

    private static StoreOptions quick() {
        return options().withFiles(new QuickLayer());
    }

    private Path database() {
        return folder.resolve("index").resolve("bedmark.mv.db");
    }

    private Asked walked() {
        try (Store store = Store.open(folder, quick())) {
            StoreScript.walk(store);
            return Asked.of(store);
        }
    }

    /** A change of the database by its own means, as damage would do it. */
    private void alter(String sql) {
        try (Database database = Database.open(folder.resolve("index"))) {
            database.run(sql);
            database.commit();
        }
    }

    private Opening assertAnswersAre(Asked expected) {
        try (Store store = Store.open(folder, quick())) {
            assertEquals(expected, Asked.of(store));
            assertTrue(store.check(Progress.NONE).sound());
            return store.opening();
        }
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5})
    void aRebuiltIndexEqualsTheOriginalRowForRow(long seed) {
        Asked asked;
        try (Store store = Store.open(folder, quick())) {
            new RandomRounds(seed, store).append(400);
            asked = Asked.of(store);
        }
        List<String> rows = Asked.tables(folder);
        List<Long> progress = new ArrayList<>();
        long entries = Store.rebuild(folder, quick().withProgress((done, total) -> progress.add(done * 100 / total)));
        assertEquals(rows, Asked.tables(folder));
        assertTrue(entries > 100);
        assertEquals(100, progress.get(progress.size() - 1));
        Opening opening = assertAnswersAre(asked);
        assertEquals(0, opening.replayed(), "what is indexed is not read again");
    }

    @Test
    void aMissingDatabaseIsMadeAnew() throws IOException {
        Asked asked = walked();
        Files.delete(database());
        assertTrue(assertAnswersAre(asked).rebuilt());
    }

    @Test
    void anEmptyFileIsMadeAnew() throws IOException {
        Asked asked = walked();
        Files.write(database(), new byte[0]);
        assertTrue(assertAnswersAre(asked).rebuilt());
    }

    @Test
    void garbageIsMadeAnew() throws IOException {
        Asked asked = walked();
        byte[] garbage = new byte[20_000];
        new Random(7).nextBytes(garbage);
        Files.write(database(), garbage);
        assertTrue(assertAnswersAre(asked).rebuilt());
    }

    @Test
    void aTruncatedFileNeverAnswersWrongly() throws IOException {
        Asked asked = walked();
        byte[] whole = Files.readAllBytes(database());
        for (int part = 1; part < 12; part++) {
            Files.write(database(), Arrays.copyOf(whole, whole.length * part / 12));
            assertAnswersAre(asked);
        }
    }

    @Test
    void anOlderFormatIsMadeAnew() {
        Asked asked = walked();
        alter("update settings set content = '0' where name = 'format'");
        assertTrue(assertAnswersAre(asked).rebuilt());
    }

    @Test
    void theIndexOfAnotherStoreIsMadeAnew() throws IOException {
        Asked asked = walked();
        Path other = folder.resolve("other");
        try (Store store = Store.open(other, quick())) {
            store.append(PERSON, StoreScript.opened(id(1), "elsewhere"));
        }
        Files.copy(other.resolve("index").resolve("bedmark.mv.db"), database(),
                StandardCopyOption.REPLACE_EXISTING);
        assertTrue(assertAnswersAre(asked).rebuilt());
    }

    @Test
    void anIndexThatFellBehindCatchesUp() throws IOException {
        try (Store store = Store.open(folder, quick())) {
            store.append(PERSON, StoreScript.opened(id(50), "T9"));
        }
        byte[] early = Files.readAllBytes(database());
        Asked asked = walked();
        Files.write(database(), early);
        Opening opening = assertAnswersAre(asked);
        assertFalse(opening.rebuilt());
        assertEquals(18, opening.replayed());
    }

    @ParameterizedTest
    @ValueSource(strings = {
        "delete from entry where sequence_no = 5",
        "update entry set start_at = start_at + 1 where sequence_no = 5",
        "update mark set sequence_no = sequence_no - 1",
        "update survey set state = 'RECEIVED' where first_no = 4",
        "update survey set verdict = 'within' where first_no = 4",
        "update survey set last_no = 4 where first_no = 4",
        "update survey set state = 'NONE' where first_no = 4",
        "update walk set started = 4",
        "drop table landmark"
    })
    void aRowThatIsNotAsItWasWrittenIsNoticed(String damage) {
        Asked asked = walked();
        alter(damage);
        StoreCheck check = Store.check(folder, new QuickLayer(), Progress.NONE);
        assertFalse(check.indexEqual());
        assertTrue(check.chainIntact());
        assertTrue(assertAnswersAre(asked).rebuilt());
    }

    @ParameterizedTest
    @ValueSource(strings = {
        "delete from survey where first_no = 4",
        "update entry set person = 'nobody' where sequence_no = 5",
        "delete from touch",
        "delete from landmark where act = 'pack-exported'",
        "delete from walk"
    })
    void aRowThatNobodyAskedForIsNoticedByTheProof(String damage) {
        Asked asked = walked();
        alter(damage);
        assertFalse(Store.check(folder, new QuickLayer(), Progress.NONE).indexEqual());
        assertEquals(18, Store.rebuild(folder, quick()));
        assertTrue(Store.check(folder, new QuickLayer(), Progress.NONE).sound());
        assertAnswersAre(asked);
    }

    @Test
    void whatIsNoStoreIsNotTakenForOne() {
        assertEquals("store-missing", assertThrows(Refused.class, () ->
                Store.check(folder, new QuickLayer(), Progress.NONE)).defect().code());
        assertEquals("store-missing", assertThrows(Refused.class, () ->
                Store.rebuild(folder, quick())).defect().code());
    }
}
