package bedmark.form;

import java.math.BigDecimal;
import java.math.MathContext;

/** Tells a slipped decimal sign from a reading that really changed. */
final class Suspicion {
    /** A tenfold slip of a reading that was itself halved or doubled since. */
    private static final BigDecimal SLIP = BigDecimal.valueOf(5);

    private Suspicion() {
    }

    /** Whether a number is about ten times, or a tenth of, the one before; never where either is zero. */
    static boolean tenTimesOff(BigDecimal number, BigDecimal last) {
        if (number.signum() == 0 || last.signum() == 0) {
            return false;
        }
        BigDecimal ratio = number.divide(last, MathContext.DECIMAL64).abs();
        return ratio.compareTo(SLIP) >= 0 || ratio.multiply(SLIP).compareTo(BigDecimal.ONE) <= 0;
    }
}
