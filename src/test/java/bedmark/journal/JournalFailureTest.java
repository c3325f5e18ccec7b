package bedmark.journal;

import static bedmark.journal.JournalScript.append;
import static bedmark.journal.JournalScript.open;
import static bedmark.journal.JournalScript.prove;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.journal.JournalScript.Read;
import bedmark.survey.Entry;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Every single operation is made to fail, once and for good, over a script with rotation, a torn tail and copying. */
class JournalFailureTest {
    @TempDir
    Path folder;

    /** What a run of the script was told. */
    private static final class Told {
        final Map<Long, Entry> saved = new TreeMap<>();
        final List<String> notSaved = new ArrayList<>();
        boolean notOpened;
        Optional<Mark> known = Optional.empty();
    }

    private static Told script(Path home, FileLayer files) throws IOException {
        Told told = new Told();
        session(home, files, told, 1, 9);
        List<SegmentFile> segments = Files.exists(home) ? SegmentFile.list(FileLayer.disk(), home) : List.of();
        if (!segments.isEmpty()) {
            Path last = segments.get(segments.size() - 1).path();
            Files.write(last, new byte[] {(byte) 0xFE, 'B', 'E', 0, 1}, StandardOpenOption.APPEND);
        }
        session(home, files, told, 10, 18);
        return told;
    }

    private static void session(Path home, FileLayer files, Told told, int from, int to) {
        try (Journal journal = open(home, files, told.known, new Read())) {
            for (int i = from; i <= to; i++) {
                try {
                    Journal.Saved saved = append(journal, i);
                    told.saved.put(saved.entry().sequence(), saved.entry());
                    if (i % 9 < 7) {
                        told.known = Optional.of(new Mark(journal.identity(), saved.entry().sequence(),
                                saved.place()));
                    }
                } catch (NotSaved e) {
                    told.notSaved.add(e.defect().code());
                }
            }
        } catch (IOException e) {
            told.notOpened = true;
        }
    }

    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void whatWasReportedSavedIsThereWhicheverOperationFails(boolean forGood) throws IOException {
        FailingLayer sound = new FailingLayer(0, false, "");
        assertEquals(18, script(folder.resolve("sound"), sound).saved.size());
        for (long n = 1; n <= sound.operations(); n++) {
            Path home = folder.resolve((forGood ? "good" : "once") + n);
            Told told = script(home, new FailingLayer(n, forGood, "Input/output error"));
            String where = "operation " + n;
            if (!forGood && !told.notOpened) {
                assertEquals(18, told.saved.size(), where + ": one failure is mended by writing again");
            }
            assertTrue(Stream.of("not-saved-failed", "not-saved-force-failed").collect(Collectors.toSet())
                    .containsAll(told.notSaved), where + told.notSaved);
            assertEverySavedEntryIsThere(home, told, where);
        }
    }

    private static void assertEverySavedEntryIsThere(Path home, Told told, String where) throws IOException {
        try (Journal journal = open(home, new QuickLayer(), told.known, new Read())) {
            Journal.Saved more = append(journal, 99);
            told.saved.put(more.entry().sequence(), more.entry());
        }
        Read read = new Read();
        JournalProof proof = prove(home, read);
        Map<Long, Entry> there = new TreeMap<>();
        read.entries.forEach(entry -> there.put(entry.sequence(), entry));
        told.saved.forEach((sequence, entry) -> assertEquals(entry, there.get(sequence), where));
        assertEquals(List.of(), read.flaws, where);
        assertTrue(proof.intact(), where);
        assertEquals(Optional.empty(), proof.tail(), where);
    }

    @ParameterizedTest
    @ValueSource(strings = {"No space left on device", "Read-only file system"})
    void theReasonIsTold(String message) throws IOException {
        Path home = folder.resolve("reason");
        open(home, new Read()).close();
        FailingLayer counted = new FailingLayer(0, false, "");
        open(home, counted, Optional.empty(), new Read()).close();
        FailingLayer failing = new FailingLayer(counted.operations() + 1, true, message);
        try (Journal journal = open(home, failing, Optional.empty(), new Read())) {
            try {
                append(journal, 1);
                throw new AssertionError("saved on a disk that takes nothing");
            } catch (NotSaved e) {
                assertEquals(message.startsWith("No") ? "not-saved-disk-full" : "not-saved-read-only",
                        e.defect().code());
                assertEquals(0, e.safe());
            }
        }
    }
}
