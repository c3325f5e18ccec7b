package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.OptionalDouble;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;

class InversionTest {
    private static double at(DoubleUnaryOperator rising, double target, double low, double high) {
        return Inversion.of(rising, target, low, high).orElseThrow();
    }

    @Test
    void theRootIsFoundToTheLastFigures() {
        assertEquals(Math.sqrt(2), at(x -> x * x, 2, 0, 2), 1e-15);
        assertEquals(0.5, at(x -> 3 * x - 1, 0.5, 0, 1), 1e-15);
        assertEquals(Math.log(3), at(Math::exp, 3, -5, 5), 1e-15);
        assertEquals(Math.pow(1e-3, 1 / 9.0), at(x -> Math.pow(x, 9), 1e-3, 0, 1), 1e-14);
        assertEquals(-Math.pow(1e-3, 1 / 9.0), at(x -> Math.pow(x, 9), -1e-3, -1, 1), 1e-14);
    }

    /** Where plain regula falsi would creep up from one side, halving the weight of the other brings both together. */
    @Test
    void aCrookedFunctionTakesFewSteps() {
        for (int power : new int[] {3, 9, 15}) {
            for (double target : new double[] {1e-2, 0.5, 0.99}) {
                AtomicInteger steps = new AtomicInteger();
                at(x -> {
                    steps.incrementAndGet();
                    return Math.pow(x, power);
                }, target, 0, 1);
                assertTrue(steps.get() <= 25, steps + " steps for the root of the power " + power);
                steps.set(0);
                at(x -> {
                    steps.incrementAndGet();
                    return -Math.pow(1 - x, power);
                }, -target, 0, 1);
                assertTrue(steps.get() <= 25, steps + " steps for the mirrored root of the power " + power);
            }
        }
    }

    @Test
    void bothBoundsMayBeTheRoot() {
        assertEquals(1, at(x -> x * x, 1, 1, 2));
        assertEquals(2, at(x -> x * x, 4, 1, 2));
        assertEquals(1, at(x -> 7, 7, 1, 2), "of a level function the lower one");
    }

    @Test
    void aTargetThatIsNotReachedHasNoArgument() {
        assertEquals(OptionalDouble.empty(), Inversion.of(x -> x, Math.nextDown(1.0), 1, 2));
        assertEquals(OptionalDouble.empty(), Inversion.of(x -> x, Math.nextUp(2.0), 1, 2));
        assertEquals(OptionalDouble.empty(), Inversion.of(x -> Double.NaN, 1, 1, 2));
    }
}
