package bedmark.index;

import static bedmark.index.StoreScript.FEW;
import static bedmark.index.StoreScript.PERSON;
import static bedmark.index.StoreScript.SECRET;
import static bedmark.index.StoreScript.id;
import static bedmark.index.StoreScript.options;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.FailingLayer;
import bedmark.journal.FileLayer;
import bedmark.journal.PowerCutDisk;
import bedmark.journal.Progress;
import bedmark.journal.QuickLayer;
import bedmark.vault.Passphrase;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * A sealed store answers like any other, and tells nothing to whoever finds the tablet. Sealing is cut short at every
 * step with {@code -Dbedmark.sealing.every=1}.
 */
class SealedStoreTest {
    private static final List<String> SECRETS = List.of("2.50", "2.55", "left skirt", "Northern plant", "coal",
            "wrong belt", PERSON, "loading-zone", "not-accessible", "answer-set", "QUEUED");

    private static final int EVERY = Integer.getInteger("bedmark.sealing.every", 7);

    @TempDir
    Path folder;

    private static StoreOptions quick(boolean sealed) {
        return options(sealed).withFiles(new QuickLayer()).withSegmentBytes(2048);
    }

    private Asked walked(Path home, boolean sealed) {
        try (Store store = Store.open(StoreScript.home(home, sealed), quick(sealed))) {
            StoreScript.walk(store);
            return Asked.of(store);
        }
    }

    /** Secrets that stand readable in some file, each with the file. */
    private static List<String> readable(Path home) {
        try (Stream<Path> files = Files.walk(home)) {
            return files.filter(Files::isRegularFile).flatMap(file -> {
                try {
                    String text = new String(Files.readAllBytes(file), StandardCharsets.ISO_8859_1);
                    String wide = text.replace("\0", "");
                    return SECRETS.stream().filter(secret -> text.contains(secret) || wide.contains(secret))
                            .map(secret -> file.getFileName() + ": " + secret);
                } catch (IOException e) {
                    throw new IllegalStateException(e);
                }
            }).toList();
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
    }

    private static String refusal(Path home, StoreOptions options) {
        return assertThrows(Refused.class, () -> Store.open(home, options).close()).defect().code();
    }

    private static Optional<Passphrase> of(String typed) {
        return Optional.of(Passphrase.of(typed));
    }

    @Test
    void answersAreThoseOfAPlainStoreAndNothingIsReadable() throws IOException {
        Path plain = folder.resolve("plain");
        Path sealed = folder.resolve("sealed");
        assertEquals(walked(plain, false).lines().stream().map(SurveyLine::state).toList(),
                walked(sealed, true).lines().stream().map(SurveyLine::state).toList());
        assertFalse(readable(plain).isEmpty(), "the search finds what is readable");
        assertEquals(List.of(), readable(sealed));
        try (Store store = Store.open(sealed, quick(true))) {
            assertFalse(store.opening().rebuilt(), "the index is kept, sealed too");
            Branch photo = store.history(id(1)).orElseThrow().survey().photos().get(0);
            try (InputStream content = store.photo(photo).orElseThrow().open()) {
                assertArrayEquals(StoreScript.PHOTO, content.readAllBytes());
            }
            assertTrue(store.check(Progress.NONE).sound());
            assertTrue(store.sealed());
        }
        assertTrue(Store.check(sealed, new QuickLayer(), Optional.of(SECRET), Progress.NONE).sound());
        assertTrue(Store.rebuild(sealed, quick(true)) > 17);
    }

    @Test
    void onlyTheRightPassphraseOpens() throws IOException {
        walked(folder, true);
        assertEquals("store-sealed", refusal(folder, quick(false)));
        assertEquals("passphrase-wrong", refusal(folder, quick(false).withPassphrase(of("skirt or board"))));
        assertEquals("store-sealed", assertThrows(Refused.class, () ->
                Store.check(folder, new QuickLayer(), Progress.NONE)).defect().code());
        Path plain = folder.resolve("plain");
        walked(plain, false);
        assertEquals("store-not-sealed", refusal(plain, quick(true)));
        assertFalse(new StoreFolder(plain, quick(false)).sealed());
    }

    @Test
    void aStoreIsSealedWithAllThatItHolds() throws IOException {
        Asked asked = walked(folder, false);
        Files.writeString(folder.resolve("journal/00000001-500.torn"), "left skirt");
        new StoreFolder(folder, quick(false), FEW).seal(SECRET);
        assertEquals(List.of(), readable(folder));
        assertFalse(Files.exists(folder.resolve(Sealing.FILE)));
        assertTrue(Files.exists(folder.resolve("journal/00000001-500.torn.sealed")), "kept, but not readable");
        try (Store store = Store.open(folder, quick(true))) {
            assertEquals(asked, Asked.of(store));
            StoreCheck check = store.check(Progress.NONE);
            assertTrue(check.sound(), () -> check.defects().toString());
            assertEquals(18, check.entries());
            store.append(PERSON, StoreScript.opened(id(60), "T9"));
        }
        assertEquals("store-sealed-already", assertThrows(Refused.class, () ->
                new StoreFolder(folder, quick(false), FEW).seal(SECRET)).defect().code());
    }

    @Test
    void damageInTheMiddleIsStillNamedAfterwardsAndItsBytesAreKept() throws IOException {
        walked(folder, false);
        Path segment = folder.resolve("journal/00000002.journal");
        byte[] bytes = Files.readAllBytes(segment);
        bytes[200] ^= 1;
        Files.write(segment, bytes);
        long sound = Store.check(folder, new QuickLayer(), Progress.NONE).entries();
        new StoreFolder(folder, quick(false), FEW).seal(SECRET);
        StoreCheck check = Store.check(folder, new QuickLayer(), Optional.of(SECRET), Progress.NONE);
        assertEquals(sound, check.entries());
        assertFalse(check.chainIntact());
        assertTrue(Files.exists(folder.resolve("journal/00000002.journal.sealed")));
    }

    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void whateverFailsWhileSealingNothingIsLost(boolean forGood) throws IOException {
        Path first = folder.resolve("first");
        walked(first, false);
        FailingLayer sound = new FailingLayer(0, false, "");
        seal(copy(first, "sound"), sound);
        for (long n = 1; n <= sound.operations(); n += EVERY) {
            Path home = copy(first, "failing" + n);
            seal(home, new FailingLayer(n, forGood, "Input/output error"));
            assertWhole(home, "operation " + n);
        }
    }

    private static void seal(Path home, FileLayer files) {
        try {
            new StoreFolder(home, options().withFiles(files).withSegmentBytes(2048), FEW).seal(SECRET);
        } catch (Refused e) {
            assertTrue(e.defect().code().matches("(store|journal)-(failed|force-failed)"), e.defect().toString());
        }
    }

    private Path copy(Path from, String name) throws IOException {
        Path to = folder.resolve(name);
        try (Stream<Path> files = Files.walk(from)) {
            for (Path file : files.toList()) {
                Files.copy(file, to.resolve(from.relativize(file)));
            }
        }
        return to;
    }

    /** Plain or sealed, but all of it, and nothing of the other. */
    private static void assertWhole(Path home, String where) throws IOException {
        boolean sealed = new StoreFolder(home, quick(false)).sealed();
        try (Store store = Store.open(home, quick(sealed))) {
            StoreCheck check = store.check(Progress.NONE);
            assertTrue(check.sound(), () -> where + check.defects());
            assertEquals(18, check.entries(), where);
            assertEquals(1, check.photos(), where);
        }
        assertEquals(sealed, readable(home).isEmpty(), () -> where + readable(home));
    }

    @Test
    void aPowerCutWhileSealingLosesNothing() throws IOException {
        Path home = folder.resolve("live");
        walked(home, false);
        PowerCutDisk disk = new PowerCutDisk(home);
        new StoreFolder(home, options().withFiles(disk).withSegmentBytes(2048), FEW).seal(SECRET);
        Random random = new Random(5);
        for (int cut = 0; cut <= disk.operations(); cut += EVERY) {
            for (PowerCutDisk.Fate fate : PowerCutDisk.Fate.values()) {
                Path image = folder.resolve("image-" + cut + fate);
                disk.layOut(cut, fate, random, image);
                assertWhole(image, "after operation " + cut + ", " + fate);
            }
        }
    }

    @Test
    void theNewPassphraseOpensAndTheOldOneNoLonger() {
        walked(folder, true);
        Passphrase fresh = Passphrase.chosen("board and skirt");
        assertEquals("passphrase-wrong", assertThrows(Refused.class, () ->
                new StoreFolder(folder, quick(false), FEW).changePassphrase(fresh, SECRET)).defect().code());
        new StoreFolder(folder, quick(false), FEW).changePassphrase(SECRET, fresh);
        assertEquals("passphrase-wrong", refusal(folder, quick(true)));
        try (Store store = Store.open(folder, quick(false).withPassphrase(Optional.of(fresh)))) {
            assertTrue(store.check(Progress.NONE).sound());
        }
    }

    @Test
    void aChangeThatIsCutShortLeavesOneOfTheTwo() throws IOException {
        Path home = folder.resolve("live");
        walked(home, true);
        Passphrase fresh = Passphrase.chosen("board and skirt");
        PowerCutDisk disk = new PowerCutDisk(home);
        new StoreFolder(home, options().withFiles(disk), FEW).changePassphrase(SECRET, fresh);
        Random random = new Random(5);
        for (int cut = 0; cut <= disk.operations(); cut++) {
            for (PowerCutDisk.Fate fate : PowerCutDisk.Fate.values()) {
                Path image = folder.resolve("image-" + cut + fate);
                disk.layOut(cut, fate, random, image);
                assertTrue(opens(image, SECRET) || opens(image, fresh), cut + " " + fate);
            }
        }
        assertTrue(opens(home, fresh) && !opens(home, SECRET));
    }

    private static boolean opens(Path home, Passphrase passphrase) {
        try (Store store = Store.open(home, quick(false).withPassphrase(Optional.of(passphrase)))) {
            return store.check(Progress.NONE).entries() == 18;
        } catch (Refused e) {
            assertEquals("passphrase-wrong", e.defect().code());
            return false;
        }
    }

    @Test
    void theWrappedKeyIsMendedFromItsTwin() throws IOException {
        walked(folder, true);
        byte[] whole = Files.readAllBytes(folder.resolve(PassphraseFile.NAME));
        for (String name : List.of(PassphraseFile.NAME, PassphraseFile.TWIN)) {
            Files.write(folder.resolve(name), Arrays.copyOf(whole, 90));
            StoreCheck check = Store.check(folder, new QuickLayer(), Optional.of(SECRET), Progress.NONE);
            assertEquals(List.of(new Defect("passphrase-twin-damaged", name, List.of())), check.defects());
            Store.open(folder, quick(true)).close();
            assertArrayEquals(whole, Files.readAllBytes(folder.resolve(name)));
            Files.delete(folder.resolve(name));
            Store.open(folder, quick(true)).close();
            assertArrayEquals(whole, Files.readAllBytes(folder.resolve(name)));
        }
        Files.write(folder.resolve(PassphraseFile.NAME), Arrays.copyOf(whole, 90));
        Files.write(folder.resolve(PassphraseFile.TWIN), Arrays.copyOf(whole, 90));
        assertEquals("passphrase-file-damaged", refusal(folder, quick(true)));
    }

    @Test
    void aSealedJournalWithoutItsKeyIsNotTakenForDamage() throws IOException {
        walked(folder, true);
        Files.delete(folder.resolve(PassphraseFile.NAME));
        Files.delete(folder.resolve(PassphraseFile.TWIN));
        Path segment = folder.resolve("journal/00000001.journal");
        List<Path> before = Files.list(folder.resolve("journal")).sorted().toList();
        byte[] bytes = Files.readAllBytes(before.get(0));
        assertEquals("journal-sealed", refusal(folder, quick(false)));
        assertEquals(before, Files.list(folder.resolve("journal")).sorted().toList());
        assertArrayEquals(bytes, Files.readAllBytes(before.get(0)), segment.toString());
    }

    @Test
    void entriesFromElsewhereDoNotCount() throws IOException {
        walked(folder, true);
        Path plain = folder.resolve("plain");
        walked(plain, false);
        Path segment;
        try (Stream<Path> files = Files.list(folder.resolve("journal"))) {
            segment = files.sorted().findFirst().orElseThrow();
        }
        Files.copy(plain.resolve("journal/00000001.journal"), segment,
                StandardCopyOption.REPLACE_EXISTING);
        StoreCheck check = Store.check(folder, new QuickLayer(), Optional.of(SECRET), Progress.NONE);
        assertFalse(check.sound());
        assertTrue(check.defects().stream().map(Defect::code).anyMatch(code ->
                code.equals("journal-entry-forged") || code.equals("journal-segment-foreign")),
                () -> check.defects().toString());
    }

    @Test
    void noFlippedBitOfASealedStoreIsSilent() throws IOException {
        walked(folder, true);
        Random random = new Random(3);
        for (String place : List.of("journal", "photos")) {
            List<Path> files;
            try (Stream<Path> all = Files.list(folder.resolve(place))) {
                files = all.sorted().toList();
            }
            for (int i = 0; i < 20; i++) {
                Path file = files.get(random.nextInt(files.size()));
                byte[] whole = Files.readAllBytes(file);
                byte[] flipped = whole.clone();
                int at = random.nextInt(whole.length);
                flipped[at] ^= (byte) (1 << random.nextInt(8));
                Files.write(file, flipped);
                assertFalse(Store.check(folder, new QuickLayer(), Optional.of(SECRET), Progress.NONE).sound(),
                        file + " byte " + at);
                Files.write(file, whole);
            }
        }
        assertTrue(Store.check(folder, new QuickLayer(), Optional.of(SECRET), Progress.NONE).sound());
    }
}
