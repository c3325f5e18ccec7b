package bedmark.engine.bed;

import java.util.Optional;
import java.util.stream.Stream;

/** The ways of reading how deep the bed lies against the skirtboard. */
public enum DepthMethod {
    /** The depth itself, up from the belt at the board. */
    AT_BOARD("at-board"),
    /** The freeboard, down from the board's top edge. */
    FROM_BOARD_TOP("from-board-top"),
    /** The depth at the belt's centre. */
    AT_CENTRE("at-centre"),
    /** The wear line on the liner, up from the belt: history rather than today, and always estimated. */
    WEAR_LINE("wear-line");

    private final String code;

    DepthMethod(String code) {
        this.code = code;
    }

    /** The method of that code. */
    public static Optional<DepthMethod> ofCode(String code) {
        return Stream.of(values()).filter(method -> method.code.equals(code)).findFirst();
    }

    public String code() {
        return code;
    }
}
