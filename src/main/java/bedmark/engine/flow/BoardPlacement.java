package bedmark.engine.flow;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;

/**
 * Where skirtboards may stand on a belt.
 *
 * <pre>
 * widest spacing     2/3 B [S8], for free-flowing material B/2 [S8]
 * least free edge    0.055 B + 0.9 in on each side (CEMA) [S12]
 * free edge          (B − min(l3, b1))/2 − s        along the belt, from the board to its edge
 * </pre>
 *
 * <p>B belt width, b1 spacing, l3 centre roll, s run of the wing inside the boards (m).
 */
public final class BoardPlacement {
    /** The widest spacing as it is printed. */
    public static final Formula WIDEST = Formula.of("widest-spacing", "bw", "2 · B/3", "S8");

    /** The same for free-flowing material. */
    public static final Formula WIDEST_FREE_FLOWING = Formula.of("widest-spacing", "bw", "B/2", "S8");

    /** The least edge as it is printed; 0.9 in in metres. */
    public static final Formula LEAST_EDGE = Formula.of("least-edge", "em",
            "0.055 · B + 0.02286", "S12");

    /** The free edge as it is printed. */
    public static final Formula FREE_EDGE = Formula.of("free-edge", "e",
            "(B − l3)/2 − s", "D");
    /** The same where the boards stand over the centre roll. */
    public static final Formula FREE_EDGE_ON_CENTRE = Formula.of("free-edge", "e", "(B − b1)/2", "D");

    private BoardPlacement() {
    }

    /** Widest spacing of the boards (m). */
    public static Uncertain widestSpacing(Uncertain beltWidth, boolean freeFlowing) {
        return freeFlowing ? beltWidth.over(2) : beltWidth.times(2).over(3);
    }

    /** Least free edge on each side (m). */
    public static Uncertain leastEdge(Uncertain beltWidth) {
        return beltWidth.times(0.055).plus(0.9 * 0.0254);
    }

    /** Free edge on each side (m). */
    public static Uncertain freeEdge(Uncertain beltWidth, Uncertain centreRoll, Uncertain spacing, Uncertain wingRun) {
        return beltWidth.minus(centreRoll.min(spacing)).over(2).minus(wingRun);
    }
}
