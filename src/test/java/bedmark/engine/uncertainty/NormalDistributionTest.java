package bedmark.engine.uncertainty;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.Duration;
import org.junit.jupiter.api.Assertions;
import org.junit.jupiter.api.Test;

class NormalDistributionTest {

    /** Φ(1), Φ(2), Φ(3) as every table of the normal distribution prints them. */
    @Test
    void theTablesAreMet() {
        double[] table = {0.5, 0.841_344_746, 0.977_249_868, 0.998_650_102};
        for (int z = 0; z < table.length; z++) {
            assertEquals(table[z], NormalDistribution.over(0, new Estimate(z, 1)), 5e-10);
            assertEquals(table[z], NormalDistribution.under(0, new Estimate(-z, 1)), 5e-10);
            assertEquals(1 - table[z], NormalDistribution.over(z, new Estimate(0, 1)), 5e-10);
        }
        assertEquals(1.959_963_985, NormalDistribution.quantile(0.975), 5e-10);
        assertEquals(0, NormalDistribution.quantile(0.5), 1e-12);
    }

    @Test
    void whatIsCertainIsOverItsLimitOrNot() {
        assertEquals(0, NormalDistribution.over(1, new Estimate(1, 0)));
        assertEquals(1, NormalDistribution.over(1, new Estimate(1.000_001, 0)));
        assertEquals(0, NormalDistribution.under(1, new Estimate(1, 0)));
        assertEquals(1, NormalDistribution.over(0, new Estimate(8.4, 1)));
        assertEquals(0, NormalDistribution.over(0, new Estimate(-8.4, 1)));
        assertEquals(1, NormalDistribution.over(-1e308, new Estimate(1e308, 1e-300)));
        assertEquals(0, NormalDistribution.under(Double.NEGATIVE_INFINITY, new Estimate(0, 1)));
    }

    /** The series would never end over what is no number. */
    @Test
    void overNoNumberThereIsNoProbability() {
        for (double[] numbers : new double[][] {{Double.NaN, 1, 1}, {0, Double.NaN, 1}, {0, 1, Double.NaN},
            {Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY, 1}}) {
            Estimate estimate = new Estimate(numbers[1], numbers[2]);
            Assertions.assertTimeoutPreemptively(Duration.ofSeconds(20), () -> {
                assertThrows(IllegalArgumentException.class, () -> NormalDistribution.over(numbers[0], estimate));
                assertThrows(IllegalArgumentException.class, () -> NormalDistribution.under(numbers[0], estimate));
            });
        }
    }

    @Test
    void strataHaveTheirMiddlesInTheMiddleOfTheirShare() {
        for (int number : new int[] {1, 2, 3, 7, 1_000, 50_001}) {
            double[] scores = NormalDistribution.strata(number);
            assertEquals(number, scores.length);
            for (int i = 0; i < number; i++) {
                assertEquals((i + 0.5) / number, NormalDistribution.under(0, new Estimate(-scores[i], 1)), 1e-14);
                assertTrue(i == 0 || scores[i] > scores[i - 1]);
            }
        }
        assertEquals(1, Distribution.of(NormalDistribution.strata(1_000)).standardDeviation(), 0.002);
    }
}
