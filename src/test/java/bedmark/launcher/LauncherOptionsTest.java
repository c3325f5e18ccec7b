package bedmark.launcher;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

/** The launcher, the image and the benchmarks start the same virtual machine. */
class LauncherOptionsTest {

    private static Set<String> options(Path file, String before) throws IOException {
        return Pattern.compile(before + "(-XX:[^\\s\"<]+)").matcher(Files.readString(file)).results()
                .map(found -> found.group(1)).filter(option -> !option.contains("SharedArchiveFile"))
                .collect(Collectors.toCollection(TreeSet::new));
    }

    @Test
    void theImageAndTheBenchmarksHaveTheOptionsOfTheLauncher() throws IOException {
        Set<String> launcher = options(Path.of("src/main/launcher/bin/bedmark"), "\\s");
        assertFalse(launcher.isEmpty());
        assertEquals(launcher, options(Path.of("pom.xml"), "--java-options "));
        assertEquals(launcher, options(Path.of("pom.xml"), "<argument>"));
    }
}
