package bedmark.engine.drag;

import java.util.Optional;
import java.util.stream.Stream;

/** The methods for the drag of the material on the skirtboards, each a class of this package. */
public enum DragMethod {
    /** Tabulated factor. */
    TABULATED("tabulated"),
    /** Rankine wall pressure. */
    RANKINE("rankine"),
    /** Special resistance of ISO 5048 and DIN 22101. */
    ISO_5048("iso-5048"),
    /** The site's own factor, fitted from readings of its drives. */
    SITE("site");

    private final String code;

    DragMethod(String code) {
        this.code = code;
    }

    /** The method of that code. */
    public static Optional<DragMethod> ofCode(String code) {
        return Stream.of(values()).filter(method -> method.code.equals(code)).findFirst();
    }

    public String code() {
        return code;
    }
}
