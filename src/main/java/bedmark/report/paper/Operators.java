package bedmark.report.paper;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.nio.charset.StandardCharsets;

/** The operators of one page's content, in their order. */
final class Operators {
    private static final int DECIMALS = 3;

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
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException("no place on paper: " + value);
        }
        BigDecimal rounded = BigDecimal.valueOf(value).setScale(DECIMALS, RoundingMode.HALF_EVEN).stripTrailingZeros();
        return rounded.signum() == 0 ? "0" : rounded.toPlainString();
    }
}
