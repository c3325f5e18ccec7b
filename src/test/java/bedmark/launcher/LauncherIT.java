package bedmark.launcher;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The packaged program, run as its users run it: another process, from any folder, without a display. */
class LauncherIT {
    private static final Path LAUNCHER = Path.of(System.getProperty("bedmark.launcher"));

    @TempDir
    private Path elsewhere;

    private record Ran(int code, String out, String err) {
    }

    private Ran run(String... command) throws Exception {
        Path out = elsewhere.resolve("out.txt");
        Path err = elsewhere.resolve("err.txt");
        ProcessBuilder builder = new ProcessBuilder(command).directory(elsewhere.toFile())
                .redirectOutput(out.toFile()).redirectError(err.toFile());
        builder.environment().remove("DISPLAY");
        builder.environment().remove("WAYLAND_DISPLAY");
        Process process = builder.start();
        assertTrue(process.waitFor(3, TimeUnit.MINUTES), "the program ends by itself");
        return new Ran(process.exitValue(), Files.readString(out, StandardCharsets.UTF_8),
                Files.readString(err, StandardCharsets.UTF_8));
    }

    @Test
    void withoutADisplayTheSampleRoundIsAssessed() throws Exception {
        Ran ran = run(LAUNCHER.toString());
        assertEquals(0, ran.code(), ran.err());
        assertTrue(ran.out().contains("no display") && ran.out().contains("TP-08"), ran.out());
        assertEquals("", ran.err());
    }

    @Test
    void startScriptDoesTheSame() throws Exception {
        Ran ran = run("sh", LAUNCHER.getParent().resolve("../../../src/bin/start").toString());
        assertEquals(0, ran.code(), ran.err());
        assertTrue(ran.out().contains("no display") && ran.out().contains("TP-08"), ran.out());
    }

    @Test
    void launcherFindsItsHomeThroughALink() throws Exception {
        Path link = Files.createSymbolicLink(elsewhere.resolve("bedmark"), LAUNCHER);
        Ran ran = run(link.toString(), "--version");
        assertEquals(0, ran.code(), ran.err());
        assertTrue(ran.out().matches("(?s)bedmark \\d+\\.\\d+\\.\\d+\\R"), ran.out());
    }

    @Test
    void exitCodesReachTheShell() throws Exception {
        String samples = LAUNCHER.getParent().resolve("../sample-surveys/round-under-way.json").toString();
        assertEquals(1, run(LAUNCHER.toString(), "assess", samples).code());
        assertEquals(2, run(LAUNCHER.toString(), "assess").code());
        Ran missing = run(LAUNCHER.toString(), "assess", "nowhere.json");
        assertEquals(3, missing.code());
        assertEquals(1, missing.err().lines().count(), missing.err());
    }

    @Test
    void everySampleIsAssessedWithoutAWordOnStandardError() throws Exception {
        Ran ran = run(LAUNCHER.toString(), "assess", "--json",
                LAUNCHER.getParent().resolve("../sample-surveys").toString());
        assertEquals("", ran.err());
        assertTrue(ran.out().startsWith("{"), ran.out());
    }
}
