package bedmark.screen.theme;

import java.net.URL;
import java.util.List;
import java.util.Objects;
import java.util.stream.Stream;
import javafx.scene.text.Font;

/**
 * The typeface that ships with the app, B612 (SIL Open Font License 1.1), so that pictures are the same on every
 * machine. Its figures all have one width. Loaded even where the machine has fonts of that name: there the family may
 * hold others, and a wrong face would be picked.
 */
public final class Typeface {
    /** Family name. */
    public static final String FAMILY = "B612";

    private static final List<Font> FACES =
            Stream.of("Regular", "Bold", "Italic", "BoldItalic").map(Typeface::face).toList();

    private Typeface() {
    }

    /**
     * Makes the faces known to the toolkit.
     *
     * @return the faces, plain one first
     */
    public static List<Font> load() {
        return FACES;
    }

    private static Font face(String name) {
        URL file = Objects.requireNonNull(Typeface.class.getResource("/bedmark/screen/font/B612-" + name + ".otf"));
        return Objects.requireNonNull(Font.loadFont(file.toExternalForm(), -1), "the typeface cannot be read");
    }
}
