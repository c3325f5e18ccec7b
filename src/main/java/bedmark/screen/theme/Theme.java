package bedmark.screen.theme;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Base64;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.Optional;
import java.util.stream.Stream;
import javafx.scene.Scene;

/** Dresses a scene: typeface, colours of the light, sizes of the density. */
public final class Theme {
    /** The sheets that hold the look, in their order; lengths in them are those of the glass. */
    static final List<String> SHEETS = List.of("theme.css", "parts.css", "controls.css", "screens.css", "walk.css",
            "arrival.css", "office.css");
    private static final List<String> OF_TABLET = SHEETS.subList(0, SHEETS.indexOf("arrival.css"));

    /** Written out last: a scene is dressed anew with every screen of another language or size, mostly in the same. */
    private static volatile Optional<Written> last = Optional.empty();

    private Theme() {
    }

    /** Style sheets as their addresses, and what they were written out for. */
    private record Written(List<String> names, Light light, Density density, List<String> sheets) {

        boolean isFor(List<String> others, Light wanted, Density size) {
            return names == others && light == wanted && density.equals(size);
        }
    }

    /** Writes the sheets of a tablet out, so that a scene is dressed quickly; needs no toolkit and no thread of its. */
    public static void writeOut(Light light, Density density) {
        sheets(light, density, OF_TABLET);
    }

    /**
     * Dresses a scene of the tablet, or dresses it anew; its style sheets are replaced. Pop-ups that it opens take them
     * over, so the light and the sizes are written into the sheets and do not hang on the scene's own root.
     */
    public static void apply(Scene scene, Light light, Density density) {
        apply(scene, light, density, OF_TABLET);
    }

    /** The same for a scene of the office, or of what arrives there: it has rooms that no tablet has. */
    public static void applyOffice(Scene scene, Light light, Density density) {
        apply(scene, light, density, SHEETS);
    }

    private static void apply(Scene scene, Light light, Density density, List<String> names) {
        Typeface.load();
        List<String> sheets = sheets(light, density, names);
        if (!scene.getStylesheets().equals(sheets)) {
            scene.getStylesheets().setAll(sheets);
        }
    }

    private static List<String> sheets(Light light, Density density, List<String> names) {
        return last.filter(known -> known.isFor(names, light, density)).map(Written::sheets).orElseGet(() -> {
            List<String> written = Stream.concat(Stream.of(tokens(light)), names.stream()
                    .map(name -> density.transcribe(read(name)))).map(Theme::asAddress).toList();
            last = Optional.of(new Written(names, light, density, written));
            return written;
        });
    }

    /** The tokens of a light, as the style of the root. */
    private static String tokens(Light light) {
        String tokens = read("tokens.css");
        int start = tokens.indexOf("." + light.name().toLowerCase(Locale.ROOT) + " {");
        int open = tokens.indexOf('{', start);
        return ".root " + tokens.substring(open, tokens.indexOf('}', open) + 1);
    }

    private static String asAddress(String sheet) {
        return "data:text/css;charset=UTF-8;base64,"
                + Base64.getEncoder().encodeToString(sheet.getBytes(StandardCharsets.UTF_8));
    }

    static String read(String name) {
        try (InputStream in = Objects.requireNonNull(Theme.class.getResourceAsStream(name))) {
            return new String(in.readAllBytes(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
