package bedmark.words;

import static org.junit.jupiter.api.Assertions.assertDoesNotThrow;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.quantity.TypedNumber;
import bedmark.quantity.Unit;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.Reader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Properties;
import java.util.Set;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class BundlesTest {
    private static final Pattern PLACEHOLDER = Pattern.compile("\\{\\d");

    private static Properties load(String name) throws IOException {
        Properties properties = new Properties();
        try (Reader text = new InputStreamReader(
                BundlesTest.class.getResourceAsStream("/bedmark/words/" + name + ".properties"),
                StandardCharsets.UTF_8)) {
            properties.load(text);
        }
        return properties;
    }

    static Stream<String> bundles() {
        String[] files = Path.of("src/main/resources/bedmark/words").toFile().list();
        return Stream.of(files).filter(name -> !name.contains("_"))
                .map(name -> name.substring(0, name.indexOf('.'))).sorted();
    }

    @ParameterizedTest
    @MethodSource("bundles")
    void bothLanguagesHaveTheSameKeysAndPlaceholders(String bundle) throws IOException {
        Properties english = load(bundle);
        Properties spanish = load(bundle + "_es");
        assertEquals(english.stringPropertyNames(), spanish.stringPropertyNames());
        for (String key : english.stringPropertyNames()) {
            assertEquals(placeholders(english.getProperty(key)), placeholders(spanish.getProperty(key)), key);
            assertFalse(english.getProperty(key).replace("''", "").contains("'"), key);
            assertFalse(spanish.getProperty(key).replace("''", "").contains("'"), key);
        }
    }

    /** Defects, judgements and assumptions carry their details as texts; a choice format would fail on those. */
    @ParameterizedTest
    @ValueSource(strings = {"defect", "judgement", "assumption"})
    void whatIsToldOfDetailsTakesThemAsTexts(String bundle) throws IOException {
        Object[] details = {"TP-01", "one", "two", "three", "four", "five", "six"};
        for (Locale language : Words.LANGUAGES) {
            Words words = new Words(language);
            for (String key : load(bundle).stringPropertyNames()) {
                assertDoesNotThrow(() -> words.text(bundle + "." + key, details), bundle + "." + key);
            }
        }
    }

    private static Set<String> placeholders(String text) {
        return PLACEHOLDER.matcher(text).results().map(match -> match.group())
                .collect(Collectors.toSet());
    }

    @Test
    void everyUnitAndEveryReasonHasItsWords() {
        for (Locale language : Words.LANGUAGES) {
            Words words = new Words(language);
            for (Unit unit : Unit.values()) {
                assertTrue(words.has("unit." + unit.key()), unit.code());
            }
            for (TypedNumber.Reason reason : TypedNumber.Reason.values()) {
                assertTrue(words.has("entry." + reason.code()), reason.code());
            }
        }
        assertEquals("pulg", new Words(Locale.forLanguageTag("es")).text("unit." + Unit.INCH.key()));
    }
}
