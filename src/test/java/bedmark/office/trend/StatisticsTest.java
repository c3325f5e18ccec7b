package bedmark.office.trend;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Random;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.hipparchus.distribution.continuous.NormalDistribution;
import org.hipparchus.stat.correlation.KendallsCorrelation;
import org.hipparchus.stat.descriptive.rank.Median;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;

/** The statistics against published examples and tables, against brute force, and against Hipparchus. */
class StatisticsTest {

    private static List<TimedValue> series(double... values) {
        return IntStream.range(0, values.length).mapToObj(i -> new TimedValue(i + 1, values[i])).toList();
    }

    /**
     * Rainfall of seeded over unseeded areas in five years: Hollander and Wolfe, Nonparametric Statistical Methods,
     * example 9.1 (recalled): slope −0.056, S −6 with P(S ≥ 6) 0.117, interval (−0.13, 0.01) at 91.6 %.
     */
    @Test
    void cloudSeedingOfHollanderAndWolfe() {
        List<TimedValue> rain = series(1.26, 1.27, 1.12, 1.16, 1.03);
        MannKendall test = MannKendall.of(rain);
        assertEquals(-6, test.s());
        assertEquals(2 * 0.117, test.probability(), 0.001);
        TheilSen line = TheilSen.of(rain, 0.916);
        assertEquals(-0.05625, line.slope(), 1e-12);
        assertEquals(-0.13, line.lower(), 1e-12);
        assertEquals(0.01, line.upper(), 1e-12);
        assertEquals(0.916, line.confidence(), 0.001);
    }

    /** Every file of {@code golden/} is a case; a new case is a new file and no code. */
    @TestFactory
    Stream<DynamicTest> everyFileHolds() throws IOException, URISyntaxException {
        Path folder = Path.of(Objects.requireNonNull(StatisticsTest.class.getResource("golden")).toURI());
        try (Stream<Path> files = Files.list(folder)) {
            List<Path> cases = files.sorted().toList();
            assertFalse(cases.isEmpty(), "golden files");
            return cases.stream().map(file -> DynamicTest.dynamicTest(file.getFileName().toString(), () ->
                    check(new ObjectMapper().readTree(file.toFile()))));
        }
    }

    private static void check(JsonNode golden) {
        assertTrue(golden.path("source").asText().length() > 10, "a source that can be found again");
        List<Double> values = new ArrayList<>();
        golden.path("values").forEach(value -> values.add(value.asDouble()));
        List<TimedValue> series = series(values.stream().mapToDouble(Double::doubleValue).toArray());
        MannKendall test = MannKendall.of(series);
        double variance = MannKendall.variance(series);
        Map<String, Double> results = Map.of("S", (double) test.s(), "varianceOfS", variance, "Z",
                MannKendall.z(test.s(), variance), "probability", test.probability());
        assertFalse(golden.path("expect").isEmpty(), "something that is expected");
        golden.path("expect").forEach(row -> {
            double value = row.path("value").asDouble();
            assertEquals(value, results.get(row.path("result").asText()), row.path("tolerance").asDouble()
                    * Math.abs(value), row.path("result").asText());
        });
    }

    /** Upper tails of Kendall's S as the tables of Kendall and of Hollander and Wolfe print them (recalled). */
    @Test
    void tailsOfTheTables() {
        assertEquals(0.375, new KendallDistribution(4).atLeast(2), 0.0005);
        assertEquals(0.167, new KendallDistribution(4).atLeast(4), 0.0005);
        assertEquals(0.042, new KendallDistribution(4).atLeast(6), 0.0005);
        assertEquals(0.242, new KendallDistribution(5).atLeast(4), 0.0005);
        assertEquals(0.117, new KendallDistribution(5).atLeast(6), 0.0005);
        assertEquals(0.0083, new KendallDistribution(5).atLeast(10), 0.00005);
        assertEquals(0.031, new KendallDistribution(8).atLeast(16), 0.0005);
        assertEquals(0.023, new KendallDistribution(10).atLeast(23), 0.0005);
    }

    @Test
    void theExactDistributionIsThatOfAllOrders() {
        int[] order = {0, 1, 2, 3, 4, 5};
        List<Long> all = new ArrayList<>();
        permute(order, 0, all);
        KendallDistribution distribution = new KendallDistribution(order.length);
        for (long s = -15; s <= 15; s++) {
            long bound = s;
            assertEquals(all.stream().filter(one -> one >= bound).count() / 720.0, distribution.atLeast(s), 1e-12);
        }
    }

    private static void permute(int[] order, int from, List<Long> all) {
        if (from == order.length) {
            all.add(MannKendall.of(series(IntStream.of(order).asDoubleStream().toArray())).s());
            return;
        }
        for (int i = from; i < order.length; i++) {
            swap(order, from, i);
            permute(order, from + 1, all);
            swap(order, from, i);
        }
    }

    private static void swap(int[] order, int one, int other) {
        int held = order[one];
        order[one] = order[other];
        order[other] = held;
    }

    @Test
    void agreesWithHipparchus() {
        Random random = new Random(5);
        NormalDistribution normal = new NormalDistribution();
        for (int round = 0; round < 200; round++) {
            int n = 5 + random.nextInt(60);
            double[] times = new double[n];
            double[] values = new double[n];
            List<TimedValue> series = new ArrayList<>();
            for (int i = 0; i < n; i++) {
                times[i] = i * 30 + random.nextDouble() * 20;
                values[i] = random.nextGaussian() + 0.01 * times[i] * random.nextInt(2);
                series.add(new TimedValue(times[i], values[i]));
            }
            MannKendall test = MannKendall.of(series);
            assertEquals(Math.round(new KendallsCorrelation().correlation(times, values) * n * (n - 1) / 2), test.s());
            double z = Math.max(0, Math.abs(test.s()) - 1) / Math.sqrt(n * (n - 1.0) * (2.0 * n + 5) / 18);
            assertEquals(2 * (1 - normal.cumulativeProbability(z)), test.probability(), test.exact() ? 0.03 : 1e-9);
            List<Double> slopes = new ArrayList<>();
            for (int i = 0; i < n; i++) {
                for (int j = i + 1; j < n; j++) {
                    slopes.add((values[j] - values[i]) / (times[j] - times[i]));
                }
            }
            TheilSen line = TheilSen.of(series, 0.95);
            assertEquals(new Median().evaluate(slopes.stream().mapToDouble(Double::doubleValue).toArray()),
                    line.slope(), 1e-12);
            assertTrue(line.lower() <= line.slope() && line.slope() <= line.upper());
            assertTrue(line.confidence() >= 0.95 - 1e-12);
        }
        for (double z = 0; z < 8; z += 0.01) {
            double reference = normal.cumulativeProbability(-z);
            assertEquals(reference, Normal.above(z), 1e-9 * Math.max(reference, 1e-6), () -> "z");
        }
    }

    /** The interval holds the true slope as often as it says, or more often. */
    @Test
    void theIntervalHoldsTheSlope() {
        Random random = new Random(17);
        int held = 0;
        int rounds = 4000;
        for (int round = 0; round < rounds; round++) {
            double[] values = new double[9];
            for (int i = 0; i < values.length; i++) {
                values[i] = 3 + 0.4 * (i + 1) + random.nextGaussian();
            }
            TheilSen line = TheilSen.of(series(values), 0.95);
            held += line.lower() <= 0.4 && 0.4 <= line.upper() ? 1 : 0;
        }
        assertTrue(held >= rounds * 0.945, "held " + held);
    }

    @Test
    void fourPointsAreTooFewForNinetyFivePerCent() {
        assertThrows(IllegalArgumentException.class, () -> TheilSen.of(series(1, 2, 3, 4), 0.95));
        assertEquals(1, TheilSen.of(series(1, 2, 3, 4, 5), 0.95).slope());
    }

    @Test
    void equalValuesAreNoTrend() {
        MannKendall test = MannKendall.of(series(2, 2, 2, 2, 2, 2));
        assertEquals(0, test.s());
        assertEquals(1, test.probability());
    }
}
