package bedmark.engine.flow;

import bedmark.engine.uncertainty.Uncertain;

/**
 * Belt speed from what can be read from outside the guards (m/s).
 *
 * <pre>
 * timed:   v = n · belt length / t
 * pulley:  v = π D n        (ignores slip between pulley and belt)
 * </pre>
 */
public final class BeltSpeed {
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
