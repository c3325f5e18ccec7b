package bedmark.screen.theme;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.net.URL;
import java.nio.charset.StandardCharsets;
import java.util.Base64;
import java.util.List;
import java.util.Objects;
import javafx.css.PseudoClass;
import javafx.scene.Scene;

/** Dresses a scene: typeface, colours of the light, sizes of the density. */
public final class Theme {
    private static final PseudoClass NIGHT = PseudoClass.getPseudoClass("night");
    private static final PseudoClass GLOVED = PseudoClass.getPseudoClass("gloved");
    private static final String STYLE_CLASS = "bedmark";

    private Theme() {
    }

    /**
     * Dresses a scene, or dresses it anew. Its style sheets are replaced.
     */
    public static void apply(Scene scene, Light light, Density density) {
        Typeface.load();
        if (!scene.getRoot().getStyleClass().contains(STYLE_CLASS)) {
            scene.getRoot().getStyleClass().add(STYLE_CLASS);
        }
        scene.getRoot().pseudoClassStateChanged(NIGHT, light == Light.NIGHT);
        scene.getRoot().pseudoClassStateChanged(GLOVED, density.hand() == Hand.GLOVED);
        List<String> sheets = List.of(resource("tokens.css").toExternalForm(), sheet("theme.css", density),
                sheet("screens.css", density));
        if (!scene.getStylesheets().equals(sheets)) {
            scene.getStylesheets().setAll(sheets);
        }
    }

    private static String sheet(String name, Density density) {
        try (InputStream in = resource(name).openStream()) {
            String text = density.transcribe(new String(in.readAllBytes(), StandardCharsets.UTF_8));
            return "data:text/css;charset=UTF-8;base64,"
                    + Base64.getEncoder().encodeToString(text.getBytes(StandardCharsets.UTF_8));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static URL resource(String name) {
        return Objects.requireNonNull(Theme.class.getResource(name));
    }
}
