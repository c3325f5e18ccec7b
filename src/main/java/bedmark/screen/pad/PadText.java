package bedmark.screen.pad;

import java.util.List;

/** The text of a number under the keys of the pad: what each key makes of it, or why it is refused. */
public final class PadText {
    /** Signs that a number on the pad can have; no reading needs more. */
    static final int LONGEST = 12;

    private static final List<String> QUARTERS = List.of("1/4", "1/2", "3/4");

    private PadText() {
    }

    /** What a key made of the text. */
    sealed interface Outcome {
        record Changed(String text) implements Outcome {
        }

        record Refused(PadNote note) implements Outcome {
        }
    }

    static Outcome digit(String text, int digit) {
        String body = body(text);
        if (hasFraction(text)) {
            return new Outcome.Refused(PadNote.DIGIT_AFTER_FRACTION);
        }
        return body.equals("0") ? changed(sign(text) + digit) : changed(text + digit);
    }

    static Outcome decimal(String text, char decimalSign) {
        if (hasFraction(text)) {
            return new Outcome.Refused(PadNote.DECIMAL_AFTER_FRACTION);
        }
        if (hasDecimal(text)) {
            return new Outcome.Refused(PadNote.SECOND_DECIMAL_SIGN);
        }
        return changed(text + (body(text).isEmpty() ? "0" : "") + decimalSign);
    }

    /** The next quarter; after the last one none. */
    static Outcome fraction(String text) {
        if (hasDecimal(text)) {
            return new Outcome.Refused(PadNote.FRACTION_AFTER_DECIMAL);
        }
        String whole = whole(text);
        int next = QUARTERS.indexOf(text.substring(whole.length()).strip()) + 1;
        if (next == QUARTERS.size()) {
            return changed(whole);
        }
        return changed(whole + (body(whole).isEmpty() ? "" : " ") + QUARTERS.get(next));
    }

    static Outcome turned(String text) {
        return changed(text.startsWith("-") ? text.substring(1) : "-" + text);
    }

    /** Without its last sign; a fraction goes as one. */
    static Outcome backspace(String text) {
        if (hasFraction(text)) {
            return changed(whole(text));
        }
        return changed(text.isEmpty() ? text : text.substring(0, text.length() - 1));
    }

    /** The text as it is shown: fractions as one sign, a real minus. */
    public static String shown(String text) {
        String shown = text.replace("-", "\u2212");
        for (int i = 0; i < QUARTERS.size(); i++) {
            String sign = String.valueOf("¼½¾".charAt(i));
            shown = shown.replace(" " + QUARTERS.get(i), "\u00A0" + sign).replace(QUARTERS.get(i), sign);
        }
        return shown;
    }

    private static Outcome changed(String text) {
        return text.length() > LONGEST ? new Outcome.Refused(PadNote.TOO_LONG) : new Outcome.Changed(text);
    }

    private static boolean hasFraction(String text) {
        return text.indexOf('/') >= 0;
    }

    private static boolean hasDecimal(String text) {
        return text.indexOf('.') >= 0 || text.indexOf(',') >= 0;
    }

    private static String sign(String text) {
        return text.startsWith("-") ? "-" : "";
    }

    private static String body(String text) {
        return text.substring(sign(text).length());
    }

    /** The part before the fraction. */
    private static String whole(String text) {
        if (!hasFraction(text)) {
            return text;
        }
        int space = text.indexOf(' ');
        return space < 0 ? sign(text) : text.substring(0, space);
    }
}
