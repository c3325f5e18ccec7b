package bedmark.office.trend;

import java.util.Arrays;
import java.util.List;

/**
 * Theil–Sen's line through a series: the median of the slopes of all pairs, which a third of wild values does not pull
 * away, with a confidence interval that assumes no distribution.
 *
 * <pre>
 * slope      = median of (yj − yi)/(tj − ti) over all pairs with ti ≠ tj
 * interval   = from the M-th smallest to the M-th greatest slope, M = (N − C)/2
 *              with N pairs, and C the critical S of Kendall less 2
 * intercept  = median of y − slope · t
 * </pre>
 *
 * <p>Source: H. Theil, Indagationes Mathematicae 12 (1950) 85–91, 173–177; P. K. Sen, J. Amer. Statist. Assoc. 63 (1968)
 * 1379–1389; M. Hollander and D. A. Wolfe, <i>Nonparametric Statistical Methods</i>, sections 9.2 and 9.3, whose example
 * the tests use (recalled, not re-read).
 *
 * @param slope      per day
 * @param lower      of the interval, per day
 * @param upper      of the interval, per day
 * @param confidence that the interval holds the slope: the least attainable one that is as great as was asked for
 * @param intercept  at day 0
 */
public record TheilSen(double slope, double lower, double upper, double confidence, double intercept) {

    /**
     * Fits a series.
     *
     * @param series     at least two points at different times
     * @param confidence that is asked for, such as 0.95
     * @throws IllegalArgumentException where there are no two times, or the points are too few for that confidence
     */
    static TheilSen of(List<TimedValue> series, double confidence) {
        double[] slopes = slopes(series);
        int n = series.size();
        long critical;
        double attained;
        if (n <= MannKendall.EXACT) {
            KendallDistribution distribution = new KendallDistribution(n);
            critical = distribution.critical((1 - confidence) / 2);
            attained = 1 - 2 * distribution.atLeast(critical);
        } else {
            double z = quantile(confidence);
            critical = (long) Math.ceil(z * Math.sqrt(n * (n - 1.0) * (2.0 * n + 5) / 18)) + 2;
            attained = confidence;
        }
        // S of all pairs; pairs at the same time have no slope and widen the interval.
        int from = (int) Math.floorDiv(slopes.length - (critical - 2), 2L) - 1;
        if (slopes.length == 0 || from < 0) {
            throw new IllegalArgumentException("too few points: " + n);
        }
        double slope = median(slopes);
        return new TheilSen(slope, slopes[from], slopes[slopes.length - 1 - from], attained,
                intercept(series, slope));
    }

    /** The z that a normal value exceeds, on both sides, with what the confidence leaves. */
    private static double quantile(double confidence) {
        double low = 0;
        double high = 8;
        for (int i = 0; i < 60; i++) {
            double middle = (low + high) / 2;
            if (2 * Normal.above(middle) > 1 - confidence) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return high;
    }

    private static double[] slopes(List<TimedValue> series) {
        double[] slopes = new double[series.size() * (series.size() - 1) / 2];
        int count = 0;
        for (int i = 0; i < series.size(); i++) {
            for (int j = i + 1; j < series.size(); j++) {
                double days = series.get(j).time() - series.get(i).time();
                if (days != 0) {
                    slopes[count++] = (series.get(j).value() - series.get(i).value()) / days;
                }
            }
        }
        double[] sorted = Arrays.copyOf(slopes, count);
        Arrays.sort(sorted);
        return sorted;
    }

    private static double median(double[] sorted) {
        int middle = sorted.length / 2;
        return sorted.length % 2 == 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
    }

    /** The intercept of a line of that slope through the middle of the series. */
    static double intercept(List<TimedValue> series, double slope) {
        double[] left = series.stream().mapToDouble(point -> point.value() - slope * point.time()).sorted().toArray();
        return median(left);
    }
}
