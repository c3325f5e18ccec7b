package bedmark.quantity;

import java.util.Optional;
import java.util.stream.Stream;

/** How far a reading can be trusted: the person's own mark beside it. */
public enum Quality {
    MEASURED("measured"),
    ESTIMATED("estimated"),
    SUSPECT("suspect");

    private final String code;

    Quality(String code) {
        this.code = code;
    }

    /** The word used in documents. */
    public String code() {
        return code;
    }

    public static Optional<Quality> ofCode(String code) {
        return Stream.of(values()).filter(quality -> quality.code.equals(code)).findFirst();
    }
}
