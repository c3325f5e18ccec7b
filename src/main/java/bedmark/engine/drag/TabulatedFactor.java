package bedmark.engine.drag;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;

/**
 * Drag of the material by the tabulated skirtboard friction factor: CEMA, <em>Belt Conveyors for Bulk Materials</em>,
 * Table 6-7 in the numbering of the 5th edition [S1].
 *
 * <pre>T = Cs · L · h²        lbf, with L in ft and h in in
 * F = 22 620.594 79 · Cs · ∫h² dx        N, with m</pre>
 *
 * <table><caption>Symbols</caption>
 * <tr><td>Cs</td><td>factor of the table (lbf/(ft·in²)), .0086 (sawdust) to .2760 (iron ore)</td></tr>
 * <tr><td>∫h² dx</td><td>square of the depth at the board, over the length of one side (m³)</td></tr>
 * <tr><td>F</td><td>drag on both boards together (N)</td></tr>
 * </table>
 *
 * <p>The number is 1 lbf/(ft·in²) in N/m³: 4.448 221 615 260 5/(0.3048 · 0.0254²), exact after NIST SP 811 [S11].
 */
public final class TabulatedFactor {
    /** The drag as it is printed. */
    public static final Formula FORMULA = Formula.of("tabulated", "Ft",
            "22620.59479 · Cs · J2", "S1");

    private static final double NEWTON_PER_CUBIC_METRE = 4.448_221_615_260_5 / (0.3048 * (0.0254 * 0.0254));

    private TabulatedFactor() {
    }

    /**
     * Drag on both boards (N).
     *
     * @param factor           Cs (lbf/(ft·in²)), not negative
     * @param integralOfSquare ∫h² dx (m³), not negative
     */
    public static Uncertain drag(Uncertain factor, Uncertain integralOfSquare) {
        return factor.times(integralOfSquare).times(NEWTON_PER_CUBIC_METRE);
    }
}
