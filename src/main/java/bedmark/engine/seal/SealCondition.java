package bedmark.engine.seal;

import java.util.Optional;
import java.util.stream.Stream;

/** What an inspector finds of a seal. */
public enum SealCondition {
    SOUND("sound"),
    WORN("worn"),
    HARDENED("hardened"),
    TORN("torn"),
    OVER_TIGHTENED("over-tightened"),
    MISSING("missing");

    private final String code;

    SealCondition(String code) {
        this.code = code;
    }

    /** The condition of that code. */
    public static Optional<SealCondition> ofCode(String code) {
        return Stream.of(values()).filter(condition -> condition.code.equals(code)).findFirst();
    }

    public String code() {
        return code;
    }

    /** Whether the seal needs a person: anything but sound. */
    public boolean isDefect() {
        return this != SOUND;
    }
}
