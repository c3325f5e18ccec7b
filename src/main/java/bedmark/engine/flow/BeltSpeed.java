package bedmark.engine.flow;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;

/**
 * Belt speed from what can be read from outside the guards (m/s).
 *
 * <pre>
 * timed:   v = n · belt length / t
 * pulley:  v = π D n        (ignores slip between pulley and belt)
 * </pre>
 */
public final class BeltSpeed {
    /** By timing, as it is printed. */
    public static final Formula TIMED = Formula.of("belt-speed-timed", "v", "n · Lb/t", "D");

    /** From a pulley, as it is printed. */
    public static final Formula AT_PULLEY = Formula.of("belt-speed-pulley", "v", "π · Dp · N", "D");

    private BeltSpeed() {
    }

    /**
     * From the time of some revolutions of the belt.
     *
     * @param beltLength  of the whole belt (m)
     * @param revolutions n of the belt
     * @param elapsed     t (s), positive
     */
    public static Uncertain timed(Uncertain beltLength, Uncertain revolutions, Uncertain elapsed) {
        return revolutions.times(beltLength).over(elapsed);
    }

    /**
     * From the rotation of a pulley.
     *
     * @param diameter D over the lagging (m)
     * @param rotation n (revolutions per second)
     */
    public static Uncertain atPulley(Uncertain diameter, Uncertain rotation) {
        return diameter.times(rotation).times(Math.PI);
    }
}
