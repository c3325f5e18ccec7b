package bedmark.engine.uncertainty;

/**
 * The normal distribution of a result about its estimate, with its standard uncertainty as standard deviation.
 *
 * <p>The distribution function is the series {@code Φ(z) = ½ + φ(z) (z + z³/3 + z⁵/(3·5) + z⁷/(3·5·7) + …)},
 * which converges for every z and is good to about 1e-15 absolutely (Marsaglia, Evaluating the Normal Distribution,
 * Journal of Statistical Software 11(4), 2004) [R].
 */
public final class NormalDistribution {
    /** Beyond this many standard deviations a double holds only 0 or 1. */
    private static final double CERTAIN = 8.3;
    private static final double DENSITY_AT_ZERO = 1 / Math.sqrt(2 * Math.PI);

    private NormalDistribution() {
    }

    /**
     * The probability that the true value lies over a limit. Without uncertainty it is 1 or 0, and a value on the limit
     * is not over it.
     */
    public static double over(double limit, Estimate estimate) {
        return beyond(estimate.value() - limit, estimate.standardUncertainty());
    }

    /** The probability that the true value lies under a limit; a certain value on the limit is not under it. */
    public static double under(double limit, Estimate estimate) {
        return beyond(limit - estimate.value(), estimate.standardUncertainty());
    }

    /**
     * How many standard deviations from the middle a probability lies.
     *
     * @param probability of lying under it; from 0.5 up, and 1 gives what a double can no longer tell from certainty
     */
    public static double quantile(double probability) {
        double low = 0;
        double high = CERTAIN;
        while (high - low > 1e-12) {
            double middle = (low + high) / 2;
            if (beyond(middle, 1) < probability) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return high;
    }

    /**
     * The middles of equally likely strata, in standard deviations and ascending: of the n-th part of the probability
     * each lies in the middle.
     *
     * @param number of strata, at least one
     */
    public static double[] strata(int number) {
        double[] scores = new double[number];
        double score = 0;
        for (int i = number / 2; i < number; i++) {
            score = quantileNear((i + 0.5) / number, score);
            scores[i] = score;
            scores[number - 1 - i] = -score;
        }
        return scores;
    }

    /**
     * The score under which that probability lies, by Newton's method from a lesser score that is not negative: there
     * the distribution function is concave, so that it comes nearer from below with every step.
     */
    private static double quantileNear(double probability, double start) {
        double score = start;
        for (double step = 1; step > 1e-9;) {
            step = (probability - beyond(score, 1)) / (DENSITY_AT_ZERO * Math.exp(-0.5 * score * score));
            score += step;
        }
        return score;
    }

    /** @throws IllegalArgumentException where one of them is no number, over which no probability can be told */
    private static double beyond(double excess, double uncertainty) {
        if (Double.isNaN(excess) || Double.isNaN(uncertainty)) {
            throw new IllegalArgumentException("no number");
        }
        double z = excess / uncertainty;
        if (uncertainty == 0 || !(Math.abs(z) <= CERTAIN)) {
            return excess > 0 ? 1 : 0;
        }
        return Math.min(1, Math.max(0, 0.5 + DENSITY_AT_ZERO * Math.exp(-0.5 * z * z) * series(z)));
    }

    private static double series(double z) {
        double term = z;
        double sum = z;
        double before = 0;
        for (int odd = 3; sum != before; odd += 2) {
            before = sum;
            term *= z * z / odd;
            sum += term;
        }
        return sum;
    }
}
