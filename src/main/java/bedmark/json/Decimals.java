package bedmark.json;

import java.math.BigDecimal;
import java.util.Optional;

/**
 * The numbers that documents may hold: decimals of sensible size. They are written without an exponent, and have to be
 * read again then.
 */
final class Decimals {

    /** Characters of a number, written out. */
    static final int LONGEST = 100;
    private static final int LARGEST_EXPONENT = 100;

    private Decimals() {
    }

    /**
     * Reads a number of JSON.
     *
     * @return nothing where a decimal of sensible size can't hold it
     */
    static Optional<BigDecimal> read(char[] text, int from, int length) {
        try {
            BigDecimal number = new BigDecimal(text, from, length);
            if (isWrittenOut(text, from, length) || Math.abs((long) number.scale()) <= LARGEST_EXPONENT
                    && number.toPlainString().length() <= LONGEST) {
                return Optional.of(number.scale() < 0 ? number.setScale(0) : number);
            }
            return Optional.empty();
        } catch (NumberFormatException e) {
            // Its exponent is beyond every decimal.
            return Optional.empty();
        }
    }

    /** Whether {@link #read} would give a number, told without making one where that can be seen. */
    static boolean holds(char[] text, int from, int length) {
        return isWrittenOut(text, from, length) || read(text, from, length).isPresent();
    }

    private static boolean isWrittenOut(char[] text, int from, int length) {
        for (int i = from; i < from + length; i++) {
            if (text[i] == 'e' || text[i] == 'E') {
                return false;
            }
        }
        return length <= LONGEST;
    }
}
