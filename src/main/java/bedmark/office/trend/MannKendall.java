package bedmark.office.trend;

import java.util.List;

/**
 * The Mann–Kendall test: whether later values tend to lie higher, or lower, than earlier ones.
 *
 * <pre>
 * S      = Σ sgn(yj − yi) over all pairs i &lt; j with ti &lt; tj
 * Var S  = [n(n − 1)(2n + 5) − Σ g(g − 1)(2g + 5)]/18, over groups of g equal values
 * z      = (S − sgn S)/√Var S
 * </pre>
 *
 * <p>Up to {@value #EXACT} values of which no two are equal the probability is exact, else normal.
 *
 * <p>Source: H. B. Mann, Econometrica 13 (1945) 245–259; M. G. Kendall, <i>Rank Correlation Methods</i>; R. O. Gilbert,
 * <i>Statistical Methods for Environmental Pollution Monitoring</i> (1987), chapter 16 (recalled, not re-read).
 *
 * @param s           Kendall's S
 * @param probability that S is at least that far from 0 by chance, two-sided
 * @param exact       whether that is exact rather than normal
 */
public record MannKendall(long s, double probability, boolean exact) {
    static final int EXACT = 40;

    /**
     * Tests a series.
     *
     * @param series at least two points
     */
    static MannKendall of(List<TimedValue> series) {
        long s = 0;
        boolean ties = false;
        int n = series.size();
        for (int i = 0; i < n; i++) {
            for (int j = i + 1; j < n; j++) {
                double rise = Math.signum(series.get(j).value() - series.get(i).value())
                        * Math.signum(series.get(j).time() - series.get(i).time());
                s += (long) rise;
                ties |= rise == 0;
            }
        }
        if (!ties && n <= EXACT) {
            double tail = new KendallDistribution(n).atLeast(Math.abs(s));
            return new MannKendall(s, Math.min(1, 2 * tail), true);
        }
        double z = Math.abs(z(s, variance(series)));
        return new MannKendall(s, Math.min(1, 2 * Normal.above(z)), false);
    }

    /** S in its standard deviations, corrected for continuity. */
    static double z(long s, double variance) {
        return (s - Math.signum(s)) / Math.sqrt(variance);
    }

    /** The variance of S where there is no trend. */
    static double variance(List<TimedValue> series) {
        double n = series.size();
        double sum = n * (n - 1) * (2 * n + 5);
        for (double value : series.stream().mapToDouble(TimedValue::value).distinct().toArray()) {
            double g = series.stream().filter(point -> point.value() == value).count();
            sum -= g * (g - 1) * (2 * g + 5);
        }
        return Math.max(1, sum / 18);
    }
}
