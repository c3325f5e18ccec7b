package bedmark.engine.uncertainty;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class DistributionTest {

    /** Mean 3 and sample standard deviation √2.5 of 1…5, whatever their order; the drawn numbers stay as they were. */
    @Test
    void meanAndStandardDeviationAreThoseOfTheSample() {
        double[] drawn = {4, 1, 5, 3, 2};
        Distribution of = Distribution.of(drawn);
        assertEquals(3, of.mean(), 1e-15);
        assertEquals(Math.sqrt(2.5), of.standardDeviation(), 1e-15);
        assertArrayEquals(new double[] {4, 1, 5, 3, 2}, drawn);
    }

    /** Of 1…n each stands in the middle of its share: 2.5 % lie under 0.025 n + 0.5, and as many over its mirror. */
    @Test
    void theIntervalLeavesTheSameShareOnBothSides() {
        for (int number : new int[] {20, 50, 60, 100, 1_000}) {
            Distribution of = Distribution.of(IntStream.rangeClosed(1, number).mapToDouble(i -> i).toArray());
            assertEquals(0.025 * number + 0.5, of.low(), 1e-9, number + " numbers");
            assertEquals(0.975 * number + 0.5, of.high(), 1e-9, number + " numbers");
        }
    }

    @Test
    void fewNumbersReachNoFartherThanTheirEnds() {
        Distribution of = Distribution.of(new double[] {7, 9});
        assertEquals(7, of.low());
        assertEquals(9, of.high());
        assertEquals(new Distribution(7, 0, 7, 7), Distribution.of(new double[] {7}));
    }
}
