package bedmark.form;

import java.util.Optional;
import java.util.stream.Stream;

/** Which safety caution stands beside a field: a running belt kills. */
public enum Caution {
    /** A depth is taken on an isolated belt, or sighted from outside the guards and marked as estimated. */
    DEPTH("depth"),
    /** Seals are touched only with the belt isolated. */
    SEAL("seal"),
    /** The speed is read on a running belt, from outside the guards. */
    SPEED("speed");

    private final String code;

    Caution(String code) {
        this.code = code;
    }

    /** The word used in form files. */
    public String code() {
        return code;
    }

    public static Optional<Caution> ofCode(String code) {
        return Stream.of(values()).filter(caution -> caution.code.equals(code)).findFirst();
    }
}
