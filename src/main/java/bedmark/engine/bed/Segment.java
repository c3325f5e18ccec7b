package bedmark.engine.bed;

import java.util.function.DoubleBinaryOperator;

/**
 * The mean of the depth, and of its square, over a stretch along which the level runs straight from a to b. Where the
 * level is negative the bed does not reach the boards and the depth is 0 [D]:
 *
 * <pre>
 * a, b ≥ 0            mean of h² = (a² + a b + b²)/3        mean of h = (a + b)/2
 * from p &gt; 0 to −n    mean of h² = p³/(3 (p + n))           mean of h = p²/(2 (p + n))
 * a, b ≤ 0            0
 * </pre>
 */
final class Segment {
    /** Mean of h² (m²). */
    static final Mean SQUARE = new Mean(Segment::meanSquare, Segment::squareSlope);
    /** Mean of h (m). */
    static final Mean DEPTH = new Mean(Segment::meanDepth, Segment::depthSlope);
    /** Mean of the level itself (m). */
    static final Mean LEVEL = new Mean((a, b) -> (a + b) / 2, (a, b) -> 0.5);

    /**
     * The mean of something over a stretch, from the levels (m) at its two ends; it is the same from either end.
     *
     * @param value the mean
     * @param slope its derivative by the first level
     */
    record Mean(DoubleBinaryOperator value, DoubleBinaryOperator slope) {

        double of(double a, double b) {
            return value.applyAsDouble(a, b);
        }

        double slope(double a, double b) {
            return slope.applyAsDouble(a, b);
        }
    }

    private Segment() {
    }

    private static double meanSquare(double a, double b) {
        if (a >= 0 && b >= 0) {
            return (a * a + a * b + b * b) / 3;
        }
        double high = Math.max(a, b);
        return high <= 0 ? 0 : high * high * share(high, Math.min(a, b)) / 3;
    }

    private static double meanDepth(double a, double b) {
        if (a >= 0 && b >= 0) {
            return (a + b) / 2;
        }
        double high = Math.max(a, b);
        return high <= 0 ? 0 : high * share(high, Math.min(a, b)) / 2;
    }

    /** Derivative of the mean of h² by a. */
    private static double squareSlope(double a, double b) {
        if (a >= 0 && b >= 0) {
            return (2 * a + b) / 3;
        }
        if (a > 0) {
            return share(a, b) * share(a, b) * (2 * a - 3 * b) / 3;
        }
        return b > 0 ? share(b, a) * share(b, a) * b / 3 : 0;
    }

    /** Derivative of the mean of h by a. */
    private static double depthSlope(double a, double b) {
        if (a >= 0 && b >= 0) {
            return 0.5;
        }
        if (a > 0) {
            return share(a, b) * (2 - share(a, b)) / 2;
        }
        return b > 0 ? share(b, a) * share(b, a) / 2 : 0;
    }

    /** The part of the stretch along which the bed touches the boards. */
    private static double share(double high, double low) {
        return high / (high - low);
    }
}
