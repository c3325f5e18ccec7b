package bedmark.engine.fit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.fit.SiteFit.Fitted;
import bedmark.engine.fit.SiteFit.Unfit;
import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Reading;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;

class SiteFitTest {
    private static final double FACTOR = 0.09;
    private static final double COEFFICIENT = FACTOR * 22_620.594_79;
    private static final double RATE = 50;
    private static final double SPEED = 2.5;
    private static final double LENGTH = 8;
    private static final double EFFICIENCY = 0.9 * 0.92;

    @Test
    void pairsWithoutErrorGiveTheFactorBack() {
        Fitted fitted = fitted(List.of(depths(0.3, 0.15, 0), depths(0.25, 0.1, 0), seals(16, 0)));
        assertEquals(FACTOR, fitted.factor().orElseThrow().value(), 1e-9);
        assertEquals(RATE, fitted.sealRate().orElseThrow().value(), 1e-6);
        assertEquals(3, fitted.pairs());
        assertEquals(0, fitted.residual(), 1e-9);
    }

    @Test
    void onlyDepthsGiveNoRateAndOnlySealsNoFactor() {
        Fitted depths = fitted(List.of(depths(0.3, 0.15, 0), depths(0.25, 0.1, 0)));
        assertEquals(Optional.empty(), depths.sealRate());
        assertEquals(FACTOR, depths.factor().orElseThrow().value(), 1e-9);
        Fitted seals = fitted(List.of(seals(16, 0), seals(16, 8)));
        assertEquals(Optional.empty(), seals.factor());
        assertEquals(RATE, seals.sealRate().orElseThrow().value(), 1e-6);
    }

    @Test
    void depthAndSealsChangedTogetherAndApartAreToldApart() {
        Fitted fitted = fitted(List.of(pair(0.3, 0.1, 16, 0, 0), depths(0.2, 0.1, 0), seals(16, 0), pair(0.1, 0.25,
                16, 4, 0)));
        assertEquals(FACTOR, fitted.factor().orElseThrow().value(), 1e-9);
        assertEquals(RATE, fitted.sealRate().orElseThrow().value(), 1e-6);
    }

    /** The standard uncertainty is the spread of the fits of many sets of readings, each with its errors drawn anew. */
    @Test
    void theUncertaintyIsTheSpreadOfManyFits() {
        Random random = new Random(17);
        List<Double> factors = new ArrayList<>();
        double stated = 0;
        for (int i = 0; i < 4_000; i++) {
            List<DrivePair> pairs = List.of(noisy(random, 0.3, 0.15), noisy(random, 0.28, 0.12),
                    noisy(random, 0.32, 0.18), noisy(random, 0.3, 0.1), noisy(random, 0.35, 0.2),
                    noisy(random, 0.3, 0.16));
            if (SiteFit.of(pairs) instanceof Fitted fitted) {
                factors.add(fitted.factor().orElseThrow().value());
                stated += fitted.factor().orElseThrow().standardUncertainty();
            }
        }
        assertTrue(factors.size() > 3_950, "by chance alone hardly any set contradicts itself");
        stated /= factors.size();
        double mean = factors.stream().mapToDouble(x -> x).average().orElseThrow();
        double spread = Math.sqrt(factors.stream().mapToDouble(x -> (x - mean) * (x - mean)).sum() / factors.size());
        assertEquals(FACTOR, mean, 0.01 * FACTOR);
        assertTrue(stated > 0.98 * spread && stated < 1.3 * spread, stated + " for " + spread);
    }

    @Test
    void anUncertainEfficiencyErrsInEveryPairAlike() {
        List<DrivePair> pairs = List.of(efficiency(0.3, 0.15), efficiency(0.25, 0.1), efficiency(0.3, 0.1));
        assertEquals(0.05 / 0.9, fitted(pairs).factor().orElseThrow().standardUncertainty() / FACTOR, 1e-4);
    }

    @Test
    void theMoreUncertainPairWeighsLess() {
        double wrong = COEFFICIENT * LENGTH * (0.3 * 0.3 - 0.15 * 0.15) * 1.1;
        DrivePair good = new DrivePair(exact("l", LENGTH), exact("v", SPEED), exact("d", 0.9), exact("m", 0.92),
                state(power(0.3, 0), 0.3, 20), state(power(0.15, 0), 0.15, 20));
        DrivePair poor = new DrivePair(exact("l", LENGTH), exact("v", SPEED), exact("d", 0.9), exact("m", 0.92),
                state(power(0.15, 0) + wrong * SPEED / EFFICIENCY, 0.3, 200), state(power(0.15, 0), 0.15, 200));
        double factor = fitted(List.of(good, poor)).factor().orElseThrow().value();
        assertEquals(FACTOR * (1 + 0.1 / 101), factor, 1e-9);
    }

    @Test
    void whatThePairsCannotCarryIsRefusedWithItsReason() {
        assertEquals("site-pairs-too-few", unfit(List.of()));
        assertEquals("site-pairs-too-few", unfit(List.of(depths(0.3, 0.15, 0))));
        assertEquals("site-pairs-too-few", unfit(List.of(depths(0.3, 0.15, 0), seals(16, 0))));
        assertEquals("site-depths-alike", unfit(List.of(depths(0.3, 0.299, 0.005), depths(0.25, 0.25, 0.005))));
        assertEquals("site-depths-alike", unfit(List.of(depths(0.3, 0.3, 0), depths(0.2, 0.2, 0))));
        assertEquals("site-changes-together", unfit(List.of(pair(0.3, 0.1, 16, 0, 0), pair(0.3, 0.1, 16, 0, 0),
                pair(0.1, 0.3, 0, 16, 0))));
        assertEquals("site-factor-not-positive", unfit(List.of(swapped(0.3, 0.15), swapped(0.25, 0.1))));
        assertEquals("site-seal-rate-not-positive", unfit(List.of(swappedSeals(16), swappedSeals(12))));
        assertEquals("site-pairs-contradict", unfit(List.of(depths(0.3, 0.15, 0), depths(0.3, 0.15, 0),
                swapped(0.3, 0.15))));
        assertEquals("site-flows-differ", unfit(List.of(flowing(300, 280), flowing(300, 300))));
        assertEquals("site-factor-too-uncertain", unfit(List.of(vague(0.3, 0.15), vague(0.3, 0.15))));
    }

    /** A drag that does not change with the depth, or with the seals, has no factor and no rate. */
    @Test
    void whatChangesNothingIsNotPositive() {
        List<DrivePair> level = List.of(new DrivePair(exact("l", LENGTH), exact("v", SPEED), exact("d", 0.9),
                exact("m", 0.92), state(20_000, 0.3, 30), state(20_000, 0.15, 30)), new DrivePair(exact("l", LENGTH),
                exact("v", SPEED), exact("d", 0.9), exact("m", 0.92), state(20_000, 0.25, 30),
                state(20_000, 0.1, 30)));
        assertEquals("site-factor-not-positive", unfit(level));
        DriveState lifted = new DriveState(new Reading("p", 20_000, 30), Optional.empty(),
                Optional.of(exact("s", 0)), Optional.empty());
        DriveState lowered = new DriveState(new Reading("p", 20_000, 30), Optional.empty(),
                Optional.of(exact("s", 16)), Optional.empty());
        DrivePair seals = new DrivePair(exact("l", LENGTH), exact("v", SPEED), exact("d", 0.9), exact("m", 0.92),
                lowered, lifted);
        assertEquals("site-seal-rate-not-positive", unfit(List.of(seals, seals)));
    }

    /** h² falls by 1/16 m² over 1 m, uncertain by 1/32: twice the uncertainty is not yet apart, a little more is. */
    @Test
    void depthsWithinTwiceTheirUncertaintyAreAlike() {
        assertEquals("site-depths-alike", unfit(List.of(emptied(0.0625), emptied(0.0625))));
        assertTrue(SiteFit.of(List.of(emptied(0.062), emptied(0.062))) instanceof Fitted);
    }

    private static DrivePair emptied(double spread) {
        return new DrivePair(exact("l", 1), exact("v", SPEED), exact("d", 0.9), exact("m", 0.92),
                new DriveState(new Reading("p1", 20_000, 0), depth(0.25, spread), Optional.empty(), Optional.empty()),
                new DriveState(new Reading("p2", 19_000, 0), depth(0, 0), Optional.empty(), Optional.empty()));
    }

    @Test
    void aFlowThatHardlyDiffersIsTheSame() {
        assertTrue(SiteFit.of(List.of(flowing(100, 95), flowing(95, 100))) instanceof Fitted, "5 % and no more");
        assertEquals("site-flows-differ", unfit(List.of(flowing(100, 94.9), flowing(100, 100))));
        assertTrue(SiteFit.of(List.of(flowing(300, 290), flowing(300, 310))) instanceof Fitted);
    }

    @Test
    void readingsThatCannotBeAreRefused() {
        for (double speed : new double[]{0, -1, 2e9}) {
            assertThrows(ImpossibleReading.class, () -> new DrivePair(exact("l", 1), exact("v", speed),
                    exact("d", 0.9), exact("m", 0.9), state(1, 0.1, 0), state(1, 0.1, 0)));
        }
        ImpossibleReading over = assertThrows(ImpossibleReading.class, () -> new DrivePair(exact("l", 1),
                exact("v", 1), exact("d", 0.9), exact("m", 1.1), state(1, 0.1, 0), state(1, 0.1, 0)));
        assertEquals("m", over.readingName());
        ImpossibleReading negative = assertThrows(ImpossibleReading.class, () -> new DrivePair(exact("l", 1),
                exact("v", 1), exact("d", 1.2), exact("m", 1), state(-1, 0.1, 0), state(1, 0.1, 0)));
        assertEquals("d", negative.readingName());
        assertEquals("reading-negative", assertThrows(ImpossibleReading.class, () -> new DrivePair(exact("l", 1),
                exact("v", 1), exact("d", 1), exact("m", 1), state(1, 0.1, 0), state(-1, 0.1, 0))).code());
    }

    private static Fitted fitted(List<DrivePair> pairs) {
        SiteFit fit = SiteFit.of(pairs);
        assertTrue(fit instanceof Fitted, fit::toString);
        return (Fitted) fit;
    }

    private static String unfit(List<DrivePair> pairs) {
        SiteFit fit = SiteFit.of(pairs);
        assertTrue(fit instanceof Unfit, fit::toString);
        return ((Unfit) fit).code();
    }

    /** Power (W) of a drive that bears 12 kN of all else, a bed so deep and so many metres of seal. */
    private static double power(double depth, double seals) {
        return (12_000 + COEFFICIENT * LENGTH * depth * depth + RATE * seals) * SPEED / EFFICIENCY;
    }

    private static DrivePair depths(double first, double second, double spread) {
        return pair(first, second, 16, 16, spread);
    }

    private static DrivePair pair(double first, double second, double firstSeals, double secondSeals, double spread) {
        return new DrivePair(exact("l", LENGTH), exact("v", SPEED), exact("d", 0.9), exact("m", 0.92),
                new DriveState(new Reading("p1", power(first, firstSeals), 30), depth(first, spread),
                        Optional.of(exact("s1", firstSeals)), Optional.empty()),
                new DriveState(new Reading("p2", power(second, secondSeals), 30), depth(second, spread),
                        Optional.of(exact("s2", secondSeals)), Optional.empty()));
    }

    private static DrivePair seals(double first, double second) {
        return new DrivePair(exact("l", LENGTH), exact("v", SPEED), exact("d", 0.9), exact("m", 0.92),
                new DriveState(new Reading("p1", power(0.2, first), 30), depth(0.2, 0.02),
                        Optional.of(exact("s1", first)), Optional.empty()),
                new DriveState(new Reading("p2", power(0.2, second), 30), Optional.empty(),
                        Optional.of(exact("s2", second)), Optional.empty()));
    }

    private static DrivePair swapped(double first, double second) {
        return new DrivePair(exact("l", LENGTH), exact("v", SPEED), exact("d", 0.9), exact("m", 0.92),
                state(power(second, 0), first, 30), state(power(first, 0), second, 30));
    }

    private static DrivePair swappedSeals(double length) {
        return new DrivePair(exact("l", LENGTH), exact("v", SPEED), exact("d", 0.9), exact("m", 0.92),
                new DriveState(new Reading("p1", power(0.2, 0), 30), Optional.empty(),
                        Optional.of(exact("s1", length)), Optional.empty()),
                new DriveState(new Reading("p2", power(0.2, length), 30), Optional.empty(),
                        Optional.of(exact("s2", 0)), Optional.empty()));
    }

    private static DrivePair vague(double first, double second) {
        return new DrivePair(exact("l", LENGTH), exact("v", SPEED), exact("d", 0.9), exact("m", 0.92),
                state(power(first, 0), first, 2_500), state(power(second, 0), second, 2_500));
    }

    private static DrivePair flowing(double first, double second) {
        return new DrivePair(exact("l", LENGTH), exact("v", SPEED), exact("d", 0.9), exact("m", 0.92),
                new DriveState(new Reading("p1", power(0.3, 0), 30), depth(0.3, 0), Optional.empty(),
                        Optional.of(exact("q1", first))),
                new DriveState(new Reading("p2", power(0.15, 0), 30), depth(0.15, 0), Optional.empty(),
                        Optional.of(exact("q2", second))));
    }

    private static DrivePair efficiency(double first, double second) {
        return new DrivePair(exact("l", LENGTH), exact("v", SPEED), new Reading("d", 0.9, 0.05), exact("m", 0.92),
                state(power(first, 0), first, 0.1), state(power(second, 0), second, 0.1));
    }

    private static DrivePair noisy(Random random, double first, double second) {
        return new DrivePair(exact("l", LENGTH), exact("v", SPEED), exact("d", 0.9), exact("m", 0.92),
                noisyState(random, first), noisyState(random, second));
    }

    private static DriveState noisyState(Random random, double depth) {
        return new DriveState(new Reading("p", power(depth, 0) + 300 * random.nextGaussian(), 300),
                Optional.of(new Reading("h", depth + 0.005 * random.nextGaussian(), 0.005)), Optional.empty(),
                Optional.empty());
    }

    private static DriveState state(double power, double depth, double spread) {
        return new DriveState(new Reading("p", power, spread), Optional.of(exact("h", depth)), Optional.empty(),
                Optional.empty());
    }

    private static Optional<Reading> depth(double depth, double spread) {
        return Optional.of(new Reading("h", depth, spread));
    }

    private static Reading exact(String name, double value) {
        return Reading.exact(name, value);
    }
}
