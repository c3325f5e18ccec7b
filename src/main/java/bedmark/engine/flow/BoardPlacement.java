package bedmark.engine.flow;

import bedmark.engine.uncertainty.Uncertain;

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
