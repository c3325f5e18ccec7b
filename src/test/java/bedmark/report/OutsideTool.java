package bedmark.report;

import java.io.File;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Map;
import org.junit.jupiter.api.Assumptions;

/** A program that is not ours; a test that needs one that is absent is skipped by its name. */
final class OutsideTool {
    private OutsideTool() {
    }

    record Result(int code, String output) {
    }

    static Result of(String... command) throws IOException, InterruptedException {
        return in(Map.of(), command);
    }

    static Result in(Map<String, String> surroundings, String... command) throws IOException, InterruptedException {
        boolean there = Arrays.stream(System.getenv("PATH").split(File.pathSeparator))
                .anyMatch(path -> Files.isExecutable(Path.of(path, command[0])));
        Assumptions.assumeTrue(there, command[0] + " is not installed");
        ProcessBuilder builder = new ProcessBuilder(command).redirectErrorStream(true);
        builder.environment().putAll(surroundings);
        Process process = builder.start();
        process.getOutputStream().close();
        String output = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        return new Result(process.waitFor(), output);
    }
}
