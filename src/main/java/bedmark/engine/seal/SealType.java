package bedmark.engine.seal;

import java.util.Optional;
import java.util.stream.Stream;

/** Seals told apart by their geometry. */
public enum SealType {
    /** The strip hangs plumb. */
    VERTICAL("vertical", true),
    /** The strip stands square on the wing of the belt. */
    PERPENDICULAR("perpendicular", true),
    /** The strip leans outward across the belt's surface. */
    OBLIQUE("oblique", true),
    /** The lip lies along the belt's surface and floats. */
    PARALLEL("parallel", true),
    /** A gap is kept. */
    CONTACTLESS("contactless", false),
    /** Nothing is there. */
    NONE("none", false);

    private final String code;
    private final boolean touches;

    SealType(String code, boolean touches) {
        this.code = code;
        this.touches = touches;
    }

    /** The type of that code. */
    public static Optional<SealType> ofCode(String code) {
        return Stream.of(values()).filter(type -> type.code.equals(code)).findFirst();
    }

    public String code() {
        return code;
    }

    /** Whether the seal touches the belt; one that touches nothing drags nothing. */
    public boolean touches() {
        return touches;
    }
}
