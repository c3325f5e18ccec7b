package bedmark.screen.pad;

import java.util.List;

/** The keys of the pad. */
public enum PadKey {
    DIGIT_0, DIGIT_1, DIGIT_2, DIGIT_3, DIGIT_4, DIGIT_5, DIGIT_6, DIGIT_7, DIGIT_8, DIGIT_9,
    /** The decimal sign of the locale. */
    DECIMAL,
    /** Goes on to the next quarter: none, ¼, ½, ¾. */
    FRACTION,
    /** Turns the sign round. */
    SIGN,
    STEP_DOWN,
    STEP_UP,
    UNIT,
    BACKSPACE,
    /** What happened to the field so far. */
    HISTORY,
    UNDO,
    BACK,
    NEXT;

    private static final List<PadKey> DIGITS = List.of(DIGIT_0, DIGIT_1, DIGIT_2, DIGIT_3, DIGIT_4, DIGIT_5, DIGIT_6,
            DIGIT_7, DIGIT_8, DIGIT_9);

    /** The key of a digit from 0 to 9. */
    public static PadKey digit(int digit) {
        return DIGITS.get(digit);
    }

    /** The digit of a digit key, −1 for any other. */
    int digit() {
        return DIGITS.indexOf(this);
    }
}
