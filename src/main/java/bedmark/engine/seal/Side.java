package bedmark.engine.seal;

import java.util.Optional;
import java.util.stream.Stream;

/** A side of the belt, seen along its travel. */
public enum Side {
    LEFT("left"),
    RIGHT("right");

    private final String code;

    Side(String code) {
        this.code = code;
    }

    /** The side of that code. */
    public static Optional<Side> ofCode(String code) {
        return Stream.of(values()).filter(side -> side.code.equals(code)).findFirst();
    }

    public String code() {
        return code;
    }
}
