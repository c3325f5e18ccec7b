package bedmark.engine.flow;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;

/**
 * Length that a loading zone needs for its bed and its dust to settle.
 *
 * <pre>max(Li + τ v, l_b, 3 ft)</pre>
 *
 * <p>Li impact length (m); τ = 1.2 s, which is 2 ft for every 100 ft/min [S9], or 1.8 s where much air comes with the
 * material (0.5 m³/s or more) [S9]; v belt speed (m/s); l_b acceleration length (m); 3 ft [R].
 */
public final class SettlingLength {
    /** The length as it is printed. */
    public static final Formula FORMULA = Formula.of("settling-length", "Ls",
            "max(Li + 1.2 · v, lb, 0.9144)", "S9, R");

    /** The same where much air comes with the material. */
    public static final Formula FORMULA_HIGH_AIR = Formula.of("settling-length", "Ls",
            "max(Li + 1.8 · v, lb, 0.9144)", "S9, R");

    private static final Uncertain LEAST = Uncertain.exact(3 * 0.3048);

    private SettlingLength() {
    }

    /** The length (m). */
    public static Uncertain of(Uncertain impactLength, Uncertain beltSpeed, Uncertain accelerationLength,
            boolean highAirFlow) {
        return impactLength.plus(beltSpeed.times(highAirFlow ? 1.8 : 1.2)).max(accelerationLength).max(LEAST);
    }
}
