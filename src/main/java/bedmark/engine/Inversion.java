package bedmark.engine;

import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;

/** Where a rising function reaches a value: regula falsi in the Illinois form, which always keeps the root between. */
final class Inversion {
    private static final int MOST_STEPS = 100;
    private static final double CLOSE = 1e-15;

    private Inversion() {
    }

    /** The argument between two bounds at which the function reaches the target; nothing where it does not. */
    static OptionalDouble of(DoubleUnaryOperator rising, double target, double low, double high) {
        double from = low;
        double to = high;
        double under = rising.applyAsDouble(from) - target;
        double over = rising.applyAsDouble(to) - target;
        if (!(under <= 0 && over >= 0)) {
            return OptionalDouble.empty();
        }
        double best = under == 0 ? from : to;
        int side = 0;
        for (int step = 0; step < MOST_STEPS && over > 0 && under < 0; step++) {
            double between = Math.min(to, Math.max(from, (from * over - to * under) / (over - under)));
            double excess = rising.applyAsDouble(between) - target;
            boolean arrived = Math.abs(between - best) <= CLOSE * Math.abs(between);
            best = between;
            if (arrived) {
                break;
            }
            if (excess >= 0) {
                to = between;
                over = excess;
                under = side == 1 ? under / 2 : under;
                side = 1;
            } else {
                from = between;
                under = excess;
                over = side == -1 ? over / 2 : over;
                side = -1;
            }
        }
        return OptionalDouble.of(best);
    }
}
