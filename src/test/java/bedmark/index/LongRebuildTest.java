package bedmark.index;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * A store of many years is rebuilt by a program with little memory, and answers every question as before. The number
 * of entries is set with {@code -Dbedmark.rebuild.entries=500000}.
 */
class LongRebuildTest {
    private static final long ENTRIES = Long.getLong("bedmark.rebuild.entries", 3_000);
    private static final String HEAP = "-Xmx256m";

    @TempDir
    Path folder;

    private List<String> run(String what, Path store) throws IOException, InterruptedException {
        Path said = folder.resolve(what + ".txt");
        Process child = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(), HEAP,
                "-XX:+UseSerialGC", "-cp", System.getProperty("java.class.path"), LongStore.class.getName(), what,
                store.toString(), Long.toString(ENTRIES)).redirectErrorStream(true).redirectOutput(said.toFile())
                .start();
        int code = child.waitFor();
        List<String> lines = Files.readAllLines(said);
        assertEquals(0, code, () -> String.join("\n", lines.subList(Math.max(0, lines.size() - 30), lines.size())));
        return lines;
    }

    private static List<String> answers(List<String> lines) {
        return lines.stream().filter(line -> !line.startsWith("took ")).toList();
    }

    @Test
    void aRebuiltIndexAnswersEveryQuestionAsTheOriginalDid() throws IOException, InterruptedException {
        Path store = folder.resolve("store");
        run("append", store);
        List<String> before = answers(run("ask", store));
        assertTrue(before.size() > Math.min(ENTRIES, 50_000) / 20, "surveys were asked for one by one");
        List<String> rebuilt = run("rebuild", store);
        assertTrue(rebuilt.contains("rebuilt " + ENTRIES), rebuilt::toString);
        String everyPercent = LongStream.rangeClosed(0, 100).boxed().toList().toString();
        String progress = rebuilt.stream().filter(line -> line.startsWith("progress ")).findFirst().orElseThrow();
        assertTrue(progress.endsWith(everyPercent.substring(everyPercent.length() - 40)), progress);
        List<String> after = answers(run("ask", store));
        assertEquals(before, after);
        assertFalse(before.stream().anyMatch(line -> line.contains("rebuilt=true")), "the original is asked, not a new one");
    }
}
