package bedmark.engine.seal;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;

/**
 * Drag of the skirt seals, segment by segment.
 *
 * <pre>F = Σ rate · multiplier(type, condition) · length</pre>
 *
 * <p>The rate is the convention of 3 lbf per foot of seal on each side, 43.78 N/m [S1 as 6 lbf/ft for both], unless the
 * site has its own. A seal pressed on the belt by N′ (N/m) with friction μ drags {@code μ N′} for each metre [D]; it
 * equals the convention for μ N′ = 43.78 N/m. The multipliers are those of {@link SealRates}.
 */
public final class SealDrag {
    /** The drag of one segment as it is printed. */
    public static final Formula FORMULA = Formula.of("seal-segment", "Fk", "q · k · ℓ", "S1");

    private SealDrag() {
    }

    /**
     * Drag of one segment (N).
     *
     * @param rate       of a sound, touching seal (N/m)
     * @param multiplier of its type and condition
     * @param length     (m)
     */
    public static Uncertain of(Uncertain rate, double multiplier, Uncertain length) {
        return rate.times(multiplier).times(length);
    }
}
