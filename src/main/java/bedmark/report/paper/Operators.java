package bedmark.report.paper;

import java.nio.charset.StandardCharsets;

/** The operators of one page's content, in their order. */
final class Operators {
    private static final long THOUSAND = 1000;
    /** No page is larger (pt). */
    private static final double MOST = 1e9;

    private final StringBuilder text = new StringBuilder(1 << 13);

    /** An operator with its numbers before it. */
    Operators add(String operator, double... operands) {
        for (double operand : operands) {
            text.append(number(operand)).append(' ');
        }
        text.append(operator).append('\n');
        return this;
    }

    /** An operator whose operands are no numbers. */
    Operators add(String operands, String operator) {
        text.append(operands).append(' ').append(operator).append('\n');
        return this;
    }

    byte[] bytes() {
        return text.toString().getBytes(StandardCharsets.US_ASCII);
    }

    /** A number as PDF writes it: a decimal point and no exponent, whatever the locale. */
    static String number(double value) {
        if (!(Math.abs(value) < MOST)) {
            throw new IllegalArgumentException("no place on paper: " + value);
        }
        long thousandths = Math.round(value * THOUSAND);
        if (thousandths % THOUSAND == 0) {
            return Long.toString(thousandths / THOUSAND);
        }
        String rest = Long.toString(THOUSAND + Math.abs(thousandths % THOUSAND)).substring(1);
        int end = rest.length();
        while (rest.charAt(end - 1) == '0') {
            end--;
        }
        return (thousandths < 0 ? "-" : "") + Math.abs(thousandths / THOUSAND) + "." + rest.substring(0, end);
    }
}
