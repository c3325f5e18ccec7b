package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.words.Words;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.ResourceBundle;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** Every reason that this package gives has its sentence in both languages, and no sentence is left over. */
class PackWordsTest {
    private static final Pattern CODE = Pattern.compile("\"((pack|zip|bag|name|device-key|receipt)-[a-z0-9]+(-[a-z0-9]+)*)\"");

    private static Set<String> codes() throws IOException {
        Set<String> codes = new TreeSet<>();
        try (Stream<Path> sources = Files.list(Path.of("src/main/java/bedmark/pack"))) {
            for (Path source : sources.toList()) {
                Matcher code = CODE.matcher(Files.readString(source));
                while (code.find()) {
                    codes.add(code.group(1));
                }
            }
        }
        return codes;
    }

    @Test
    void everyReasonHasItsSentenceInEveryLanguage() throws IOException {
        for (Locale language : Words.LANGUAGES) {
            Words words = new Words(language);
            for (String code : codes()) {
                assertTrue(words.has("defect." + code), language + " lacks " + code);
                String sentence = words.text("defect." + code, "HERE", "ONE", "TWO");
                assertFalse(sentence.contains("{"), sentence);
                assertTrue(sentence.endsWith("."), sentence);
            }
        }
    }

    @Test
    void noSentenceIsLeftOver() throws IOException {
        Set<String> written = ResourceBundle.getBundle("bedmark.words.defect", Locale.ROOT).keySet().stream()
                .filter(code -> CODE.matcher("\"" + code + "\"").matches())
                .collect(Collectors.toCollection(TreeSet::new));
        assertEquals(codes(), written);
    }
}
