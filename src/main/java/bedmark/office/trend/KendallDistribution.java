package bedmark.office.trend;

/**
 * The exact distribution of Kendall's S where there is no trend and no two values are equal.
 *
 * <p>The number of orders of n values with k inversions is the coefficient of q^k in the product over j = 1…n of
 * (1 + q + … + q^(j−1)) (the Mahonian numbers), and S = n(n − 1)/2 − 2k.
 *
 * <p>Source: M. G. Kendall, <i>Rank Correlation Methods</i>, the table of the probability function of S; the same
 * tail probabilities stand in M. Hollander and D. A. Wolfe, <i>Nonparametric Statistical Methods</i>, table A.30
 * (recalled, not re-read).
 */
final class KendallDistribution {
    private final int n;
    private final double[] shares;

    /** @param n how many values, at least 1 */
    KendallDistribution(int n) {
        this.n = n;
        double[] now = {1};
        for (int j = 2; j <= n; j++) {
            double[] next = new double[now.length + j - 1];
            for (int k = 0; k < next.length; k++) {
                for (int step = 0; step < j; step++) {
                    if (k - step >= 0 && k - step < now.length) {
                        next[k] += now[k - step] / j;
                    }
                }
            }
            now = next;
        }
        this.shares = now;
    }

    /** The probability that S is at least {@code s}. */
    double atLeast(long s) {
        double sum = 0;
        for (int k = 0; k < shares.length && pairs() - 2L * k >= s; k++) {
            sum += shares[k];
        }
        return Math.min(1, sum);
    }

    private long pairs() {
        return n * (n - 1L) / 2;
    }

    /**
     * The smallest S that is exceeded by chance, on one side, with no more than {@code alpha}.
     *
     * @return more than the greatest S where no S is as unlikely as that
     */
    long critical(double alpha) {
        long s = pairs();
        if (atLeast(s) > alpha) {
            return s + 2;
        }
        while (atLeast(s - 2) <= alpha) {
            s -= 2;
        }
        return s;
    }
}
