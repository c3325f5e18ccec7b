package bedmark.engine.flow;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;

/**
 * Length that a loading zone needs for its bed and its dust to settle: the longest of those conventions that a site
 * goes by.
 *
 * <pre>max(Li + τ v, l_b, 3 ft)</pre>
 *
 * <p>Li impact length (m); τ = 1.2 s, which is 2 ft for every 100 ft/min [S9], or 1.8 s where much air comes with the
 * material (0.5 m³/s or more) [S9]; v belt speed (m/s); l_b acceleration length (m); 3 ft [R].
 */
public final class SettlingLength {
    private static final Uncertain LEAST = Uncertain.exact(3 * 0.3048);

    private SettlingLength() {
    }

    /** The length as it is printed. */
    public static Formula formula(LengthConventions conventions, boolean highAirFlow) {
        String first = !conventions.bySpeed() ? "0" : highAirFlow ? "Li + 1.8 · v" : "Li + 1.2 · v";
        String others = (conventions.byAcceleration() ? ", lb" : "") + (conventions.least() ? ", 0.9144" : "");
        return Formula.of("settling-length", "Ls", others.isEmpty() ? first : "max(" + first + others + ")", "S9, R");
    }

    /** The length (m); 0 where the site goes by no convention. */
    public static Uncertain of(LengthConventions conventions, Uncertain impactLength, Uncertain beltSpeed,
            Uncertain accelerationLength, boolean highAirFlow) {
        Uncertain longest = Uncertain.ZERO;
        if (conventions.bySpeed()) {
            longest = impactLength.plus(beltSpeed.times(highAirFlow ? 1.8 : 1.2));
        }
        if (conventions.byAcceleration()) {
            longest = longest.max(accelerationLength);
        }
        return conventions.least() ? longest.max(LEAST) : longest;
    }
}
