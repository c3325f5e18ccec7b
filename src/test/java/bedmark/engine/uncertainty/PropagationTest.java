package bedmark.engine.uncertainty;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;

class PropagationTest {
    private final Tape tape = new Tape(0);
    private final Uncertain x = tape.take(new Reading("/readings/x", 0.7, 1));
    private final Uncertain y = tape.take(new Reading("/readings/y", 1.3, 1));

    @Test
    void everyOperationKnowsItsDerivative() {
        derivative(Uncertain::sine, Math::sin);
        derivative(Uncertain::cosine, Math::cos);
        derivative(Uncertain::tangent, Math::tan);
        derivative(Uncertain::square, v -> v * v);
        derivative(Uncertain::squareRoot, Math::sqrt);
        derivative(v -> v.plus(2), v -> v + 2);
        derivative(v -> v.minus(2), v -> v - 2);
        derivative(v -> v.times(-3), v -> -3 * v);
        derivative(v -> v.over(4), v -> v / 4);
        derivative(v -> v.plus(v), v -> v + v);
        derivative(v -> v.minus(Uncertain.ONE), v -> v - 1);
        derivative(v -> v.times(v).times(v), v -> v * v * v);
        derivative(v -> Uncertain.ONE.over(v.plus(1)), v -> 1 / (v + 1));
        derivative(v -> v.max(Uncertain.ZERO), v -> Math.max(v, 0));
        derivative(v -> v.min(Uncertain.ONE).times(2), v -> 2 * Math.min(v, 1));
    }

    @Test
    void independentReadingsAddTheirVariances() {
        assertEquals(Math.sqrt(2), tape.estimate(x.plus(y)).standardUncertainty(), 1e-15);
        assertEquals(Math.sqrt(1.3 * 1.3 + 0.7 * 0.7), tape.estimate(x.times(y)).standardUncertainty(), 1e-15);
    }

    @Test
    void aSharedReadingIsSharedAndCancels() {
        assertEquals(0, tape.estimate(x.minus(x)).standardUncertainty());
        assertEquals(1, tape.estimate(x.plus(y).minus(x)).standardUncertainty(), 1e-15);
    }

    @Test
    void anExactNumberCarriesNothing() {
        Uncertain exact = tape.take(Reading.exact("/readings/z", 5));
        assertEquals(new Estimate(10, 0), tape.estimate(exact.times(2)));
        assertEquals(List.of(), tape.shares(exact));
        assertEquals(List.of(), tape.sensitivities(exact));
        assertEquals(Optional.empty(), tape.traced(exact, "/").leading());
    }

    @Test
    void sharesAreOrderedAndAddUpToOne() {
        List<Share> shares = tape.shares(x.plus(y.times(2)));
        assertEquals(List.of("/readings/y", "/readings/x"), shares.stream().map(Share::reading).toList());
        assertEquals(0.8, shares.get(0).share(), 1e-15);
        assertEquals(0.2, shares.get(1).share(), 1e-15);
        assertEquals(List.of(), tape.shares(x.times(0)));
    }

    @Test
    void theLeadingReadingIsLookedForAmongThoseAskedFor() {
        Uncertain model = tape.take(new Reading("/material/m", 1, 10));
        Uncertain sum = model.plus(x).plus(y.times(2));
        assertEquals("/material/m", tape.traced(sum, "/").leading().orElseThrow());
        assertEquals("/readings/y", tape.traced(sum, "/readings/").leading().orElseThrow());
        assertEquals(Optional.empty(), tape.traced(model, "/readings/").leading());
    }

    @Test
    void ofEqualNumbersTheOneThatIsAskedIsTaken() {
        Uncertain twin = tape.take(new Reading("/readings/twin", 0.7, 1));
        assertEquals(List.of("/readings/x"), readings(x.max(twin)));
        assertEquals(List.of("/readings/twin"), readings(twin.max(x)));
        assertEquals(List.of("/readings/x"), readings(x.min(twin)));
        assertEquals(List.of("/readings/twin"), readings(twin.min(x)));
    }

    private List<String> readings(Uncertain number) {
        return tape.sensitivities(number).stream().map(sensitivity -> sensitivity.reading().name()).toList();
    }

    @Test
    void ofReadingsThatBringAsMuchTheFirstOneLeads() {
        assertEquals("/readings/x", tape.traced(x.plus(y), "/").leading().orElseThrow());
        assertEquals("/readings/x", tape.traced(y.minus(x), "/").leading().orElseThrow());
    }

    @Test
    void aVarianceThatADoubleCannotHoldIsSharedByNobody() {
        assertEquals(List.of(), tape.shares(x.times(1e-200)));
    }

    @Test
    void aReadingThatCameAfterAResultHasNoPartInIt() {
        Uncertain sum = x.plus(y);
        for (int i = 0; i < 60; i++) {
            tape.take(new Reading("/readings/later/" + i, 1, 1));
        }
        assertEquals(Math.sqrt(2), tape.estimate(sum).standardUncertainty(), 1e-15);
        assertEquals(2, tape.sensitivities(sum).size());
    }

    @Test
    void aRootOfNothingHasNoSlope() {
        assertEquals(0, tape.estimate(x.minus(x).squareRoot()).standardUncertainty());
    }

    @Test
    void numbersOfTwoComputationsDoNotMix() {
        Tape other = new Tape(4);
        Uncertain stranger = other.take(new Reading("/readings/x", 1, 1));
        assertThrows(IllegalArgumentException.class, () -> x.plus(stranger));
        assertThrows(IllegalArgumentException.class, () -> tape.estimate(stranger));
    }

    @Test
    void theNormalDistributionIsThatOfTheTables() {
        double[][] table = {{0, 0.5}, {1, 0.8413447460685429}, {-1, 0.15865525393145705},
                {1.2815515655446004, 0.9}, {1.959963984540054, 0.975}, {-3, 0.0013498980316300933},
                {5, 0.9999997133484281}, {-6, 9.865876450376981e-10}, {8, 0.9999999999999993}};
        for (double[] row : table) {
            assertEquals(row[1], NormalDistribution.over(0, new Estimate(row[0], 1)), 2e-15, () -> "z " + row[0]);
            assertEquals(row[1], NormalDistribution.under(0, new Estimate(-row[0] * 3, 3)), 2e-15);
        }
        assertEquals(1, NormalDistribution.over(0, new Estimate(9, 1)));
        assertEquals(0, NormalDistribution.over(0, new Estimate(-9, 1)));
    }

    @Test
    void theQuantileIsTheInverse() {
        assertEquals(0, NormalDistribution.quantile(0.5), 1e-11);
        assertEquals(1.2815515655446004, NormalDistribution.quantile(0.9), 1e-11);
        assertEquals(1.959963984540054, NormalDistribution.quantile(0.975), 1e-11);
        assertEquals(8.3, NormalDistribution.quantile(1), 0.15);
    }

    @Test
    void aCertainValueOnItsLimitIsNeitherOverNorUnder() {
        assertEquals(0, NormalDistribution.over(1, new Estimate(1, 0)));
        assertEquals(0, NormalDistribution.under(1, new Estimate(1, 0)));
        assertEquals(1, NormalDistribution.over(1, new Estimate(Math.nextUp(1.0), 0)));
        assertEquals(1, NormalDistribution.under(1, new Estimate(Math.nextDown(1.0), 0)));
        assertEquals(0.5, NormalDistribution.over(1, new Estimate(1, 0.1)));
    }

    private void derivative(UnaryOperator<Uncertain> operation, DoubleUnaryOperator plain) {
        double step = 1e-6;
        Uncertain result = operation.apply(x);
        assertEquals(plain.applyAsDouble(0.7), result.value(), 1e-15);
        double slope = (plain.applyAsDouble(0.7 + step) - plain.applyAsDouble(0.7 - step)) / (2 * step);
        List<Sensitivity> sensitivities = tape.sensitivities(result);
        assertTrue(sensitivities.size() == 1 && sensitivities.get(0).reading().name().equals("/readings/x"));
        assertEquals(slope, sensitivities.get(0).derivative(), 1e-8 * Math.max(1, Math.abs(slope)));
        assertEquals(Math.abs(slope), tape.estimate(result).standardUncertainty(), 1e-8 * Math.max(1, slope));
    }
}
