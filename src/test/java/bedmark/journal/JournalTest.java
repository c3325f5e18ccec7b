package bedmark.journal;

import static bedmark.journal.JournalScript.append;
import static bedmark.journal.JournalScript.open;
import static bedmark.journal.JournalScript.prove;
import static bedmark.journal.JournalScript.read;
import static bedmark.journal.JournalScript.write;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.JournalScript.Read;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.LongStream;
import java.util.zip.CRC32C;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class JournalTest {
    private static final int FLIP_EVERY = Integer.getInteger("bedmark.journal.flip.every", 3);

    @TempDir
    Path folder;

    private static List<Long> upTo(long last) {
        return LongStream.rangeClosed(1, last).boxed().toList();
    }

    @Test
    void entriesComeBackInOrderOverManySegments() throws IOException {
        List<Entry> written = write(folder, 40).stream().map(Journal.Saved::entry).toList();
        Read read = new Read();
        JournalProof proof = prove(folder, read);
        assertEquals(written, read.entries);
        assertEquals(List.of(), read.flaws);
        assertTrue(proof.intact());
        assertTrue(proof.segments() > 3, "segments are small here: " + proof.segments());
        assertEquals(40, proof.last());
        assertEquals(Optional.empty(), proof.tail());
        Read replayed = new Read();
        open(folder, replayed).close();
        assertEquals(written, replayed.entries);
    }

    /** Who was trusted, who inspected: that is nobody's business on a machine that others use too. */
    @Test
    void onlyTheOwnerMayReadTheJournal() throws IOException {
        Assumptions.assumeTrue(folder.getFileSystem().supportedFileAttributeViews().contains("posix"),
                "no POSIX rights here");
        write(folder, 40);
        for (SegmentFile segment : SegmentFile.list(FileLayer.disk(), folder)) {
            assertEquals("rw-------", PosixFilePermissions.toString(Files.getPosixFilePermissions(segment.path())));
        }
    }

    @Test
    void numberingGoesOnAfterOpeningAgain() throws IOException {
        write(folder, 3);
        Optional<Mark> last = Optional.of(read(folder).marks.get(2));
        try (Journal journal = open(folder, FileLayer.disk(), last, new Read())) {
            assertEquals(4, append(journal, 4).entry().sequence());
        }
        assertEquals(upTo(4), read(folder).sequences());
        assertEquals(1, prove(folder, new Read()).segments(), "a sound segment is written on");
    }

    @Test
    void onlyWhatFollowsTheMarkIsReplayed() throws IOException {
        write(folder, 40);
        Read all = read(folder);
        for (int known = 40; known > 0; known--) {
            Read rest = new Read();
            try (Journal journal = open(folder, FileLayer.disk(), Optional.of(all.marks.get(known - 1)), rest)) {
                assertEquals(40, journal.last());
                assertTrue(rest.resumed);
            }
            assertEquals(upTo(40).subList(known, 40), rest.sequences());
            assertTrue(prove(folder, new Read()).intact());
            all = known == 40 ? all : read(folder);
        }
    }

    @Test
    void aMarkOfAnotherJournalIsNotFollowed() throws IOException {
        write(folder.resolve("one"), 5);
        write(folder.resolve("other"), 9);
        Optional<Mark> foreign = Optional.of(read(folder.resolve("other")).marks.get(8));
        Read read = new Read();
        try (Journal journal = open(folder.resolve("one"), FileLayer.disk(), foreign, read)) {
            assertEquals(6, append(journal, 6).entry().sequence());
        }
        assertFalse(read.resumed);
        assertEquals(upTo(5), read.sequences());
    }

    @Test
    void anEntryNotKnownToBeSafeIsCopiedBeforeAnythingFollowsIt() throws IOException {
        write(folder, 3);
        Mark second = read(folder).marks.get(1);
        Read rest = new Read();
        try (Journal journal = open(folder, FileLayer.disk(), Optional.of(second), rest)) {
            append(journal, 4);
        }
        assertEquals(List.of(3L), rest.sequences());
        assertEquals(2, rest.marks.get(0).place().segment());
        Read all = new Read();
        assertTrue(prove(folder, all).intact());
        assertEquals(upTo(4), all.sequences());
        assertEquals(List.of(), all.flaws);
    }

    @Test
    void aTornLastEntryIsCutOffAndKeptWhereverItTore() throws IOException {
        List<Journal.Saved> saved = write(folder.resolve("whole"), 3);
        Path segment = SegmentFile.path(folder.resolve("whole"), 1);
        byte[] whole = Files.readAllBytes(segment);
        int start = (int) saved.get(2).place().offset();
        for (int length = start; length < whole.length; length++) {
            Path torn = Files.createDirectories(folder.resolve("torn" + length));
            Files.write(SegmentFile.path(torn, 1), Arrays.copyOf(whole, length));
            try (Journal journal = open(torn, new QuickLayer(), Optional.empty(), new Read())) {
                assertEquals(2, journal.last());
                assertEquals(length > start ? List.of("journal-tail-torn") : List.of(),
                        journal.found().stream().map(flaw -> flaw.code()).toList());
                append(journal, 30);
            }
            Read read = new Read();
            JournalProof proof = prove(torn, read);
            assertEquals(List.of("note 1 ß", "note 2 ß ß", "note 30 ß ß"), notes(read));
            assertTrue(proof.intact() && read.flaws.isEmpty());
            if (length > start) {
                byte[] kept = Files.readAllBytes(torn.resolve(proof.torn().get(0)));
                assertArrayEquals(Arrays.copyOfRange(whole, start, length), kept);
            }
        }
    }

    private static List<String> notes(Read read) {
        return read.entries.stream().map(entry -> ((Act.AnswerSet) entry.act()).answer().orElseThrow())
                .map(node -> ((Node.Text) node).value()).toList();
    }

    @Test
    void aFlippedBitInAMiddleEntryIsNamedAndSurvived() throws IOException {
        List<Journal.Saved> saved = write(folder, 5);
        Place third = saved.get(2).place();
        Path segment = SegmentFile.path(folder, 1);
        byte[] whole = Files.readAllBytes(segment);
        for (int at = (int) third.offset(); at < third.end(); at++) {
            byte[] flipped = whole.clone();
            flipped[at] ^= (byte) (1 << at % 8);
            Files.write(segment, flipped);
            Read read = new Read();
            JournalProof proof = prove(folder, read);
            assertEquals(List.of(1L, 2L, 4L, 5L), read.sequences());
            assertFalse(proof.intact());
            assertEquals(1, read.flaws.size(), () -> read.flaws.toString());
            assertEquals("journal-entry-damaged", read.flaws.get(0).code());
            assertEquals("00000001.journal", read.flaws.get(0).where());
            assertEquals(List.of(Long.toString(third.offset()), "3"), read.flaws.get(0).details());
            Read opened = new Read();
            try (Journal journal = open(folder, opened)) {
                assertEquals(5, journal.last());
                assertEquals(read.flaws, journal.found());
            }
            assertEquals(read.sequences(), opened.sequences());
        }
    }

    @Test
    void damageInHeaderAndSealIsNamedAndNothingIsLost() throws IOException {
        write(folder, 40);
        Set<String> codes = new TreeSet<>();
        Path segment = SegmentFile.path(folder, 2);
        byte[] whole = Files.readAllBytes(segment);
        for (int back = 1; back <= Frame.HEAD; back++) {
            codes.addAll(codesAfterFlip(segment, whole, whole.length - back));
        }
        assertEquals(Set.of("journal-seal-damaged"), codes);
        codes.clear();
        for (int at = 0; at < SegmentHeader.LENGTH; at++) {
            codes.addAll(codesAfterFlip(segment, whole, at));
        }
        assertEquals(Set.of("journal-header-damaged"), codes);
    }

    @Test
    void noFlippedBitAnywhereIsSilent() throws IOException {
        write(folder, 20);
        for (SegmentFile segment : SegmentFile.list(FileLayer.disk(), folder)) {
            byte[] whole = Files.readAllBytes(segment.path());
            for (int at = 0; at < whole.length; at += FLIP_EVERY) {
                byte[] flipped = whole.clone();
                flipped[at] ^= (byte) (1 << at % 8);
                Files.write(segment.path(), flipped);
                Read read = new Read();
                JournalProof proof = prove(folder, read);
                int place = at;
                assertTrue(!read.flaws.isEmpty() || proof.tail().isPresent(), () -> segment.name() + " byte " + place);
                assertTrue(read.entries.size() >= 19, () -> segment.name() + " byte " + place);
            }
            Files.write(segment.path(), whole);
        }
    }

    private List<String> codesAfterFlip(Path segment, byte[] whole, int at) throws IOException {
        byte[] flipped = whole.clone();
        flipped[at] ^= 4;
        Files.write(segment, flipped);
        Read read = new Read();
        prove(folder, read);
        assertEquals(upTo(40), read.sequences());
        assertEquals(1, read.flaws.size(), () -> read.flaws.toString());
        return read.codes();
    }

    @Test
    void anExchangedEntryBreaksTheChain() throws IOException {
        List<Journal.Saved> saved = write(folder, 5);
        Place third = saved.get(2).place();
        Path segment = SegmentFile.path(folder, 1);
        byte[] whole = Files.readAllBytes(segment);
        ByteBuffer old = ByteBuffer.wrap(whole, (int) third.offset(), third.length()).slice();
        Frame frame = Frame.decode(old).orElseThrow();
        byte[] payload = frame.payload().clone();
        payload[new String(payload, StandardCharsets.ISO_8859_1).indexOf("note 3")] = 'x';
        Frame forged = new Frame(Frame.Kind.ENTRY, Frame.Form.PLAIN, 3, frame.previous(), payload);
        forged.encode().get(whole, (int) third.offset(), third.length());
        Files.write(segment, whole);
        Read read = new Read();
        assertFalse(prove(folder, read).intact());
        assertEquals(List.of("journal-chain-broken"), read.codes());
        assertEquals("4", read.flaws.get(0).details().get(1));
    }

    @Test
    void aMissingSegmentIsNamed() throws IOException {
        write(folder, 40);
        Read all = read(folder);
        long before = all.marks.stream().filter(mark -> mark.place().segment() < 2).count();
        long through = all.marks.stream().filter(mark -> mark.place().segment() < 3).count();
        Files.delete(SegmentFile.path(folder, 2));
        Read read = new Read();
        assertFalse(prove(folder, read).intact());
        assertEquals(List.of("journal-entries-missing"), read.codes());
        assertEquals((before + 1) + "-" + through, read.flaws.get(0).details().get(1));
    }

    @Test
    void segmentsOfAnotherJournalAreLeftOutAndNamed() throws IOException {
        write(folder.resolve("one"), 3);
        write(folder.resolve("other"), 40);
        Files.copy(SegmentFile.path(folder.resolve("other"), 2), SegmentFile.path(folder.resolve("one"), 2));
        Files.copy(SegmentFile.path(folder.resolve("one"), 1), SegmentFile.path(folder.resolve("one"), 3));
        Read read = new Read();
        assertTrue(prove(folder.resolve("one"), read).intact());
        assertEquals(List.of("journal-segment-foreign", "journal-segment-foreign"), read.codes());
        try (Journal journal = open(folder.resolve("one"), new Read())) {
            append(journal, 4);
        }
        assertEquals(upTo(4), read(folder.resolve("one")).sequences());
    }

    @Test
    void savedEntriesThatAreGoneAreNamedAndTheirNumbersStayTaken() throws IOException {
        List<Journal.Saved> saved = write(folder, 5);
        Mark last = read(folder).marks.get(4);
        Path segment = SegmentFile.path(folder, 1);
        byte[] whole = Files.readAllBytes(segment);
        for (long cut : List.of(saved.get(3).place().offset(), saved.get(4).place().offset() - 1)) {
            Path copy = Files.createDirectories(folder.resolve("cut" + cut));
            Files.write(SegmentFile.path(copy, 1), Arrays.copyOf(whole, (int) cut));
            Read read = new Read();
            try (Journal journal = open(copy, FileLayer.disk(), Optional.of(last), read)) {
                assertFalse(read.resumed);
                assertEquals(upTo(3), read.sequences());
                assertEquals("4-5", journal.found().get(0).details().get(1));
                assertEquals(6, append(journal, 6).entry().sequence());
            }
            Read again = new Read();
            assertFalse(prove(copy, again).intact());
            assertEquals(List.of(1L, 2L, 3L, 6L), again.sequences());
            assertEquals("4-5", again.flaws.get(0).details().get(1));
        }
    }

    @Test
    void aLaterVersionIsRefusedAndNotTakenForDamage() throws IOException {
        write(folder, 1);
        Path segment = SegmentFile.path(folder, 1);
        byte[] bytes = Files.readAllBytes(segment);
        bytes[11] = 3;
        CRC32C crc = new CRC32C();
        crc.update(bytes, 0, 76);
        ByteBuffer.wrap(bytes).putInt(76, (int) crc.getValue());
        Files.write(segment, bytes);
        Refused refused = assertThrows(Refused.class, () -> open(folder, new Read()));
        assertEquals("journal-version-unknown", refused.defect().code());
        assertArrayEquals(bytes, Files.readAllBytes(segment));
    }

    @Test
    void aVanishedFileIsNotSaved() throws IOException {
        Path home = folder.resolve("stick");
        try (Journal journal = open(home, new Read())) {
            append(journal, 1);
            Files.delete(SegmentFile.path(home, 1));
            Files.delete(home);
            NotSaved notSaved = assertThrows(NotSaved.class, () -> append(journal, 2));
            assertEquals("not-saved-vanished", notSaved.defect().code());
            assertEquals(1, notSaved.safe());
        }
    }
}
