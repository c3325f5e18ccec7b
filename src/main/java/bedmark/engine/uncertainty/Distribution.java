package bedmark.engine.uncertainty;

import java.util.Arrays;

/**
 * How a result is distributed, found by drawing its readings many times (JCGM 101:2008). All in the SI unit of the
 * quantity.
 *
 * @param mean              of the drawn results
 * @param standardDeviation of the drawn results: their standard uncertainty
 * @param low               2.5 % of the drawn results lie under it
 * @param high              2.5 % of them lie over it: with {@code low} the probabilistically symmetric coverage interval
 *                          of 95 % (JCGM 101:2008, 7.7)
 */
public record Distribution(double mean, double standardDeviation, double low, double high) {
    private static final double TAIL = 0.025;

    /** The distribution of some drawn results, at least one. */
    public static Distribution of(double[] drawn) {
        double[] sorted = drawn.clone();
        Arrays.sort(sorted);
        double sum = 0;
        for (double value : sorted) {
            sum += value;
        }
        double mean = sum / sorted.length;
        double squares = 0;
        for (double value : sorted) {
            squares += (value - mean) * (value - mean);
        }
        return new Distribution(mean, Math.sqrt(squares / Math.max(1, sorted.length - 1)), quantile(sorted, TAIL),
                quantile(sorted, 1 - TAIL));
    }

    /** Linear between the ordered results, each standing in the middle of its share. */
    private static double quantile(double[] sorted, double probability) {
        double place = Math.max(0, probability * sorted.length - 0.5);
        int under = (int) place;
        int over = Math.min(under + 1, sorted.length - 1);
        return sorted[under] + (place - under) * (sorted[over] - sorted[under]);
    }
}
