package bedmark.screen.theme;

import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;

/** How large type is set; targets stay as they are. */
public enum TextSize {
    STANDARD(1),
    LARGE(1.12);

    private final double scale;

    TextSize(double scale) {
        this.scale = scale;
    }

    /** To the sizes of the style sheets. */
    public double scale() {
        return scale;
    }

    /** The word used in settings. */
    public String code() {
        return name().toLowerCase(Locale.ROOT);
    }

    public static Optional<TextSize> ofCode(String code) {
        return Stream.of(values()).filter(size -> size.code().equals(code)).findFirst();
    }
}
