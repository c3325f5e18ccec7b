package bedmark.report.paper;

import bedmark.picture.Ink;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.EnumMap;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The colours of the inks by daylight: those of the app, from the one file that holds any. */
final class Hues {
    private static final String FILE = "/bedmark/screen/theme/tokens.css";
    private static final Pattern DAY = Pattern.compile("\\.day\\s*\\{([^}]*)\\}");
    private static final Pattern TOKEN = Pattern.compile("-bm-([a-z-]+):\\s*#([0-9A-Fa-f]{6})");
    private static final int BYTE = 255;

    private final Map<Ink, double[]> hues = new EnumMap<>(Ink.class);

    Hues() {
        Matcher day = DAY.matcher(text());
        if (!day.find()) {
            throw new IllegalStateException("no daylight in " + FILE);
        }
        for (Ink ink : Ink.values()) {
            Matcher token = TOKEN.matcher(day.group(1));
            String name = ink.name().toLowerCase(Locale.ROOT);
            String hex = token.results().filter(found -> found.group(1).equals(name)).map(found -> found.group(2))
                    .findFirst().orElseThrow(() -> new IllegalStateException("no colour for " + name));
            int rgb = Integer.parseInt(hex, 16);
            hues.put(ink, new double[] {share(rgb >> 16), share(rgb >> 8), share(rgb)});
        }
    }

    private static double share(int number) {
        return (number & BYTE) / (double) BYTE;
    }

    private static String text() {
        try (InputStream file = Objects.requireNonNull(Hues.class.getResourceAsStream(FILE))) {
            return new String(file.readAllBytes(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new IllegalStateException("cannot be read: " + FILE, e);
        }
    }

    /** Red, green and blue, each 0 to 1. */
    double[] of(Ink ink) {
        return hues.get(ink).clone();
    }
}
