package bedmark.site;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** Every link of the pages leads somewhere: to a file of this tree and, where it names one, to a heading in it. */
class LinksTest {
    private static final Pattern LINK = Pattern.compile("\\]\\(([^)\\s]+)\\)");
    private static final Pattern HEADING = Pattern.compile("(?m)^#+ (.+)$");

    static List<Path> pages() throws IOException {
        try (Stream<Path> below = Files.walk(Path.of("src/site"))) {
            return Stream.concat(Stream.of(Path.of("README.md"), Path.of("DEVELOPERS.md")),
                    below.filter(file -> file.toString().endsWith(".md"))).sorted().toList();
        }
    }

    @Test
    void everyLinkLeadsSomewhere() throws IOException {
        List<String> broken = new ArrayList<>();
        int followed = 0;
        for (Path page : pages()) {
            Matcher link = LINK.matcher(Files.readString(page));
            while (link.find()) {
                followed++;
                if (!leadsSomewhere(page, link.group(1))) {
                    broken.add(page + ": " + link.group(1));
                }
            }
        }
        assertEquals(List.of(), broken);
        assertTrue(followed > 0, "the pages hold links");
    }

    private static boolean leadsSomewhere(Path page, String link) throws IOException {
        if (link.matches("[a-z]+:.*")) {
            return false;
        }
        String[] parts = link.split("#", 2);
        Path target = parts[0].isEmpty() ? page
                : Path.of("").resolve(page).toAbsolutePath().resolveSibling(parts[0]).normalize();
        return Files.exists(target)
                && (parts.length == 1 || headings(Files.readString(target)).contains(parts[1]));
    }

    private static Set<String> headings(String text) {
        Set<String> anchors = new HashSet<>();
        Matcher heading = HEADING.matcher(text);
        while (heading.find()) {
            anchors.add(heading.group(1).toLowerCase(Locale.ROOT).replaceAll("[^\\p{L}\\p{N} _-]", "")
                    .replace(' ', '-'));
        }
        return anchors;
    }
}
