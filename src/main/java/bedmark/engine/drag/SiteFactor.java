package bedmark.engine.drag;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;

/**
 * Drag of the material by a factor that a site fitted from readings of its own drive [D]: what the other methods take
 * from a table or a theory, measured.
 *
 * <pre>F = 22 620.594 79 · C · ∫h² dx        N, with m</pre>
 *
 * <table><caption>Symbols</caption>
 * <tr><td>C</td><td>the site's factor, in the unit of the tabulated one, so that the two can be compared
 *     (lbf/(ft·in²)), positive; fitted by least squares, with its standard uncertainty and its date</td></tr>
 * <tr><td>∫h² dx</td><td>square of the depth at the board, over the length of one side (m³)</td></tr>
 * <tr><td>F</td><td>drag on both boards together (N)</td></tr>
 * </table>
 *
 * <p>It holds for the material, the boards and the moisture at which it was fitted. The number is
 * 1 lbf/(ft·in²) in N/m³, exact after NIST SP 811 [S11].
 */
public final class SiteFactor {
    /** The drag as it is printed. */
    public static final Formula FORMULA = Formula.of("site", "Fc",
            "22620.59479 · C · J2", "D");

    private static final double NEWTON_PER_CUBIC_METRE = 4.448_221_615_260_5 / (0.3048 * (0.0254 * 0.0254));

    private SiteFactor() {
    }

    /**
     * Drag on both boards (N).
     *
     * @param factor           C (lbf/(ft·in²)), positive
     * @param integralOfSquare ∫h² dx (m³), not negative
     */
    public static Uncertain drag(Uncertain factor, Uncertain integralOfSquare) {
        return factor.times(integralOfSquare).times(NEWTON_PER_CUBIC_METRE);
    }
}
