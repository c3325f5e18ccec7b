package bedmark.quantity;

import java.util.Optional;
import java.util.stream.Stream;

/** What the belt did while a reading was taken. */
public enum BeltState {
    RUNNING_LOADED("running-loaded"),
    RUNNING_EMPTY("running-empty"),
    /** Stopped, isolated, locked and tried under the site's procedure. */
    ISOLATED("isolated");

    private final String code;

    BeltState(String code) {
        this.code = code;
    }

    /** The word used in documents. */
    public String code() {
        return code;
    }

    /** Whether hands may be near the belt: only when it is isolated. */
    public boolean running() {
        return this != ISOLATED;
    }

    public static Optional<BeltState> ofCode(String code) {
        return Stream.of(values()).filter(state -> state.code.equals(code)).findFirst();
    }
}
