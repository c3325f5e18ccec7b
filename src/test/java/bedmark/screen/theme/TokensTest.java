package bedmark.screen.theme;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.picture.Ink;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Holds the contrasts of WCAG 2.2 between the colours that meet on the screen. */
class TokensTest {
    private static final Pattern BLOCK = Pattern.compile("\\.(day|night) \\{([^}]*)}");
    private static final Pattern TOKEN = Pattern.compile("-bm-([a-z-]+): #([0-9A-F]{6});");

    private static String look() {
        return String.join("", Theme.SHEETS.stream().map(Theme::read).toList());
    }

    private static Map<Light, Map<String, Integer>> tokens() {
        Map<Light, Map<String, Integer>> tokens = new HashMap<>();
        Matcher block = BLOCK.matcher(Theme.read("tokens.css"));
        while (block.find()) {
            Map<String, Integer> colours = new HashMap<>();
            Matcher token = TOKEN.matcher(block.group(2));
            while (token.find()) {
                colours.put(token.group(1), Integer.parseInt(token.group(2), 16));
            }
            tokens.put(Light.valueOf(block.group(1).toUpperCase(Locale.ROOT)), colours);
        }
        return tokens;
    }

    private static double luminance(int colour) {
        double[] weights = {0.2126, 0.7152, 0.0722};
        double sum = 0;
        for (int i = 0; i < 3; i++) {
            double part = (colour >> 8 * (2 - i) & 0xFF) / 255.0;
            sum += weights[i] * (part <= 0.04045 ? part / 12.92 : Math.pow((part + 0.055) / 1.055, 2.4));
        }
        return sum;
    }

    static double contrast(int one, int other) {
        double a = luminance(one);
        double b = luminance(other);
        return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
    }

    @Test
    void contrastIsMeasuredAsPublished() {
        assertEquals(21, contrast(0x000000, 0xFFFFFF), 1e-9);
        assertEquals(4.54, contrast(0x767676, 0xFFFFFF), 0.005);
    }

    @ParameterizedTest
    @CsvSource({"ink,ground", "ink,paper", "ink,board", "ink,held", "soft,ground", "soft,paper", "soft,board",
        "soft,held", "over,ground", "over,paper", "on-accent,accent", "on-accent,accent-held", "on-over,over",
        "ground,ink"})
    void textStandsOutSevenToOne(String text, String under) {
        for (Light light : Light.values()) {
            Map<String, Integer> colours = tokens().get(light);
            double contrast = contrast(colours.get(text), colours.get(under));
            assertTrue(contrast >= 7, () -> light + ": " + text + " on " + under + " " + contrast);
        }
    }

    @ParameterizedTest
    @CsvSource({"soft,ground", "accent,ground", "accent,paper", "ink,bed", "over,ground"})
    void linesStandOutThreeToOne(String line, String under) {
        for (Light light : Light.values()) {
            Map<String, Integer> colours = tokens().get(light);
            double contrast = contrast(colours.get(line), colours.get(under));
            assertTrue(contrast >= 3, () -> light + ": " + line + " on " + under + " " + contrast);
        }
    }

    @Test
    void bothLightsHaveTheSameTokens() {
        assertEquals(tokens().get(Light.DAY).keySet(), tokens().get(Light.NIGHT).keySet());
    }

    @Test
    void everyInkHasItsToken() {
        for (Ink ink : Ink.values()) {
            String name = ink.name().toLowerCase(Locale.ROOT);
            assertTrue(tokens().get(Light.DAY).containsKey(name), name);
            assertTrue(look().contains("-bm-ink-" + name + ": -bm-" + name + ";"), name);
        }
    }

    @Test
    void onlyTheTokenFileHoldsColours() {
        // The one value that has the name of a colour and is none: how the edges of type are smoothed.
        String theme = look().replace("-fx-font-smoothing-type: gray;", "");
        assertFalse(Pattern.compile("#[0-9A-Fa-f]{3,8}\\b|rgba?\\(|hsba?\\(").matcher(theme).find());
        for (String word : List.of("white", "black", "gray", "grey", "red", "blue")) {
            assertFalse(Pattern.compile(": [^;]*\\b" + word + "\\b").matcher(theme).find(), word);
        }
    }
}
