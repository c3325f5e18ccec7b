package bedmark.office.trend;

/** The standard normal distribution. */
final class Normal {
    private static final int TERMS = 200;

    private Normal() {
    }

    /**
     * The probability of a value above {@code z}, for z at least 0: by the series of Φ below 3, and by Laplace's
     * continued fraction from there (M. Abramowitz and I. A. Stegun, <i>Handbook of Mathematical Functions</i>, 26.2.11
     * and 26.2.14).
     */
    static double above(double z) {
        double density = Math.exp(-z * z / 2) / Math.sqrt(2 * Math.PI);
        if (z < 3) {
            double term = z;
            double sum = z;
            for (int k = 1; k < TERMS; k++) {
                term *= z * z / (2 * k + 1);
                sum += term;
            }
            return 0.5 - density * sum;
        }
        double fraction = z;
        for (int k = TERMS; k >= 1; k--) {
            fraction = z + k / fraction;
        }
        return density / fraction;
    }
}
