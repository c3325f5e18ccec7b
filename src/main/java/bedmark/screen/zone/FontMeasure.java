package bedmark.screen.zone;

import bedmark.picture.Face;
import bedmark.picture.TextMeasure;
import bedmark.screen.theme.Typeface;
import java.util.HashMap;
import java.util.Map;
import javafx.scene.text.Font;
import javafx.scene.text.FontPosture;
import javafx.scene.text.FontWeight;
import javafx.scene.text.Text;

/** Measures text in the typeface of the app; a picture asks for the same few words again and again. */
final class FontMeasure implements TextMeasure {
    private static final int MOST = 400;

    private final Map<Key, Font> fonts = new HashMap<>();
    private final Map<Written, Extent> measured = new HashMap<>();
    private final Text probe = new Text();

    private record Key(Face face, double size) {
    }

    private record Written(String text, Face face, double size) {
    }

    FontMeasure() {
        Typeface.load();
    }

    Font font(Face face, double size) {
        return fonts.computeIfAbsent(new Key(face, size), key -> Font.font(Typeface.FAMILY,
                face == Face.BOLD ? FontWeight.BOLD : FontWeight.NORMAL,
                face == Face.ITALIC ? FontPosture.ITALIC : FontPosture.REGULAR, size));
    }

    /** Cap height and figures of the typeface rise 0.76 of its size; what hangs below the line takes 0.2. */
    @Override
    public Extent of(String text, Face face, double size) {
        if (measured.size() > MOST) {
            measured.clear();
        }
        return measured.computeIfAbsent(new Written(text, face, size), this::measure);
    }

    private Extent measure(Written written) {
        probe.setFont(font(written.face(), written.size()));
        probe.setText(written.text());
        return new Extent(probe.getLayoutBounds().getWidth(), 0.76 * written.size(), 0.2 * written.size());
    }
}
