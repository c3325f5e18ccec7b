package bedmark.screen.pad;

/** Why the pad refused a key; the words come from outside by the code. */
public enum PadNote {
    /** The number has its decimal sign already; a second one is never reinterpreted. */
    SECOND_DECIMAL_SIGN("second-decimal-sign"),
    /** The sign is not the decimal sign here, and might stand for thousands. */
    OTHER_DECIMAL_SIGN("other-decimal-sign"),
    /** A number with a fraction takes no decimal sign. */
    DECIMAL_AFTER_FRACTION("decimal-after-fraction"),
    /** A number with a fraction takes no more digits. */
    DIGIT_AFTER_FRACTION("digit-after-fraction"),
    /** A number with a decimal sign takes no fraction. */
    FRACTION_AFTER_DECIMAL("fraction-after-decimal"),
    /** The number is as long as a number gets. */
    TOO_LONG("too-long");

    private final String code;

    PadNote(String code) {
        this.code = code;
    }

    public String code() {
        return code;
    }
}
