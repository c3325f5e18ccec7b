package bedmark.engine.flow;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;

/**
 * Force that brings the feed to belt speed [form confirmed by S3].
 *
 * <pre>F = Q (v − v0)</pre>
 *
 * <p>Q mass flow (kg/s), v belt speed, v0 velocity of the feed along the belt (m/s). The customary form
 * {@code Tam = 2.8755e-4 Q (V − V0)}, short ton/h and ft/min, takes g as 32.2 ft/s² [R]: 0.08 % off.
 */
public final class LoadingForce {
    /** The force as it is printed. */
    public static final Formula FORMULA = Formula.of("loading-force", "Fl", "Q · (v − v0)", "S3");

    private LoadingForce() {
    }

    /** The force (N); negative where the feed is faster than the belt and pushes it. */
    public static Uncertain of(Uncertain massFlow, Uncertain beltSpeed, Uncertain feedVelocity) {
        return massFlow.times(beltSpeed.minus(feedVelocity));
    }
}
