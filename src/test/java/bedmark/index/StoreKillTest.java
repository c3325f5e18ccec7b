package bedmark.index;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.Cover;
import bedmark.journal.FileLayer;
import bedmark.journal.JournalProof;
import bedmark.journal.JournalVisitor;
import bedmark.journal.Place;
import bedmark.journal.Progress;
import bedmark.json.EntryCodec;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.TreeMap;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * A real process types and saves and is killed in the middle, again and again on the same store. The number of kills
 * is set with {@code -Dbedmark.kills=1000}.
 */
class StoreKillTest {
    private static final int KILLS = Integer.getInteger("bedmark.kills", 10);

    @TempDir
    Path folder;

    private final Map<Long, String> acknowledged = new TreeMap<>();

    private Process start(int number, boolean sealed) throws IOException {
        return new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-XX:TieredStopAtLevel=1", "-XX:+UseSerialGC", "-Xmx128m", "-cp", System.getProperty("java.class.path"),
                TypingChild.class.getName(), folder.toString(), "child" + number, Boolean.toString(sealed))
                .redirectError(ProcessBuilder.Redirect.INHERIT).start();
    }

    /** Kills a child after so many lines, and hears what it still said before it died. */
    private void run(int number, int lines, boolean sealed) throws IOException, InterruptedException {
        Process child = start(number, sealed);
        try (BufferedReader output = new BufferedReader(
                new InputStreamReader(child.getInputStream(), StandardCharsets.UTF_8))) {
            int heard = 0;
            for (String line = output.readLine(); line != null; line = output.readLine()) {
                hear(line);
                if (heard == 0 && number == 0) {
                    assertEquals("store-locked", assertThrows(Refused.class, () ->
                            Store.open(folder, options("second", sealed))).defect().code());
                }
                if (heard++ == lines) {
                    // By its handle, since the process itself would close the output that is still to be heard.
                    child.toHandle().destroyForcibly();
                }
            }
        } finally {
            child.destroyForcibly().waitFor();
        }
    }

    private void hear(String line) {
        if (line.startsWith("saved ")) {
            String[] words = line.split(" ", 4);
            String twice = acknowledged.put(Long.parseLong(words[1]), words[2] + " " + words[3]);
            assertEquals(null, twice, () -> "entry " + words[1] + " was acknowledged twice");
        }
    }

    private static StoreOptions options(String device, boolean sealed) {
        return StoreOptions.of(device).withPassphrase(sealed ? Optional.of(StoreScript.SECRET) : Optional.empty());
    }

    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void aKilledProgramLosesNothingThatItReportedSaved(boolean sealed) throws IOException, InterruptedException {
        StoreScript.home(folder, sealed);
        Random random = new Random(1);
        int kills = sealed ? (KILLS + 2) / 3 : KILLS;
        for (int i = 0; i < kills; i++) {
            run(i, random.nextInt(40), sealed);
        }
        assertTrue(acknowledged.size() > kills, () -> "only " + acknowledged.size() + " were saved");
        Store.check(folder, FileLayer.disk(), options("", sealed).passphrase(), Progress.NONE).defects().forEach(
                defect -> assertTrue(defect.code().equals("journal-tail-unread"), defect.toString()));
        Map<Long, String> there = new HashMap<>();
        List<String> notes = new ArrayList<>();
        try (Store store = Store.open(folder, options("tablet", sealed))) {
            StoreCheck check = store.check(Progress.NONE);
            assertTrue(check.sound(), () -> check.defects().toString());
        }
        read(there, notes, sealed);
        acknowledged.forEach((sequence, line) -> assertEquals(line, there.get(sequence), "entry " + sequence));
        assertEquals(notes.stream().distinct().toList(), notes, "nothing is there twice");
    }

    private void read(Map<Long, String> there, List<String> notes, boolean sealed) throws IOException {
        Cover cover = Cover.of(Keys.look(folder, FileLayer.disk(), options("", sealed).passphrase()));
        JournalProof.of(folder.resolve("journal"), FileLayer.disk(), cover, Optional.empty(), new JournalVisitor() {
            @Override
            public void entry(long sequence, Place place, byte[] payload) {
                Entry entry = EntryCodec.read(payload);
                String note = entry.act() instanceof Act.AnswerSet set
                        ? ((Node.Text) set.answer().orElseThrow()).value() : "";
                there.put(sequence, entry.act().code() + " " + note);
                if (!note.isEmpty()) {
                    notes.add(note);
                }
            }

            @Override
            public void flaw(Defect flaw) {
                throw new AssertionError(flaw);
            }

            @Override
            public void walked(long done, long total) {
                assertTrue(done <= total);
            }
        });
    }
}
