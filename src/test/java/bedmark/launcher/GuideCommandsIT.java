package bedmark.launcher;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Every command of the pages is run as it stands there, in order, in a folder that looks like this one. A line of a
 * block marked {@code sh} is expected to end with 0, or with what its comment {@code # exit N} says. The two set-up
 * commands are what runs this test.
 */
class GuideCommandsIT {
    private static final Path LAUNCHER = Path.of(System.getProperty("bedmark.launcher")).toAbsolutePath();
    private static final Pattern BLOCK = Pattern.compile("(?ms)^```sh\\n(.*?)^```$");
    private static final Pattern EXIT = Pattern.compile("# exit (\\d)\\b.*$");
    private static final List<String> SET_UP = List.of("mvn ", "sh src/bin/start");

    @TempDir
    private Path folder;

    private record Line(String text, int exit) {
        static Line of(String text) {
            Matcher exit = EXIT.matcher(text);
            return new Line(text, exit.find() ? Integer.parseInt(exit.group(1)) : 0);
        }

        boolean isSetUp() {
            return SET_UP.stream().anyMatch(text::startsWith);
        }
    }

    static Stream<Path> pages() throws IOException {
        List<Path> pages = new ArrayList<>(List.of(Path.of("README.md")));
        try (Stream<Path> below = Files.walk(Path.of("src/site"))) {
            below.filter(file -> file.toString().endsWith(".md")).sorted().forEach(pages::add);
        }
        return pages.stream().filter(page -> lines(page).stream().anyMatch(line -> !line.isSetUp()));
    }

    private static List<Line> lines(Path page) {
        try {
            Matcher block = BLOCK.matcher(Files.readString(page));
            List<Line> lines = new ArrayList<>();
            while (block.find()) {
                block.group(1).lines().filter(text -> !text.isBlank()).map(Line::of).forEach(lines::add);
            }
            return lines;
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
    }

    @Test
    void readmeAndGuidesHoldCommands() throws IOException {
        assertTrue(pages().count() >= 2);
    }

    @ParameterizedTest
    @MethodSource("pages")
    void everyCommandOfThePageDoesWhatItSays(Path page) throws Exception {
        assumeTrue(Files.isExecutable(Path.of("/bin/sh")), "there is no sh on this machine");
        for (String copied : List.of("src/site/forms", "sample-surveys", "field-forms")) {
            copy(Path.of(copied));
        }
        for (Line line : lines(page)) {
            if (!line.isSetUp()) {
                run(line);
            }
        }
    }

    private void copy(Path tree) throws IOException {
        Files.createDirectories(folder.resolve(tree));
        try (Stream<Path> below = Files.walk(tree)) {
            for (Path file : below.filter(Files::isRegularFile).toList()) {
                Files.createDirectories(folder.resolve(file).getParent());
                Files.copy(file, folder.resolve(file));
            }
        }
    }

    private void run(Line line) throws Exception {
        Path said = folder.resolve("said.txt");
        ProcessBuilder builder = new ProcessBuilder("/bin/sh", "-c", line.text()).directory(folder.toFile())
                .redirectErrorStream(true).redirectOutput(said.toFile());
        builder.environment().merge("PATH", LAUNCHER.getParent().toString(), (path, ours) -> ours + ":" + path);
        builder.environment().put("HOME", folder.toString());
        builder.environment().keySet().removeAll(List.of("DISPLAY", "WAYLAND_DISPLAY"));
        Process process = builder.start();
        assertTrue(process.waitFor(3, TimeUnit.MINUTES), line.text() + " ends by itself");
        String output = Files.readString(said, StandardCharsets.UTF_8);
        assertEquals(line.exit(), process.exitValue(), line.text() + "\n" + output);
        assertTrue(!output.contains("\tat "), line.text() + "\n" + output);
    }
}
