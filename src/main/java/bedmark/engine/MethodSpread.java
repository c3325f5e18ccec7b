package bedmark.engine;

import bedmark.engine.drag.DragMethod;
import java.util.List;

/**
 * How far the methods for the material drag lie apart, and why. Every one of them is
 * {@code F = k · μ · ρ g · ∫h² dx} with its own lateral pressure k (pressure across over pressure down), its own wall
 * friction μ and its own depth, so that the ratio of two of them is the product of three ratios.
 *
 * @param lowest              the method that asks for least
 * @param highest             the method that asks for most
 * @param ratio               highest over lowest
 * @param reasons             why, the greatest first; what is the same in both is left out
 * @param standardUncertainty what the spread brings into the material drag (N): that of a value which may lie anywhere
 *                            between the methods that read the same depth as the one which decides (JCGM 100:2008,
 *                            4.3.7: the range over 2 √3) [S10]; 0 where the site's own factor decides, or a method that
 *                            reads its own depth, or where the site does not count it
 */
public record MethodSpread(DragMethod lowest, DragMethod highest, double ratio, List<Reason> reasons,
        double standardUncertainty) {

    /** What two methods take differently. */
    public enum Cause {
        /** Pressure across over pressure down: Rankine's from the angle of repose, 1 in ISO 5048, any in a factor. */
        LATERAL_PRESSURE("lateral-pressure"),
        /** Friction between material and board: the material's, μ2 of ISO 5048, 1 behind a factor. */
        WALL_FRICTION("wall-friction"),
        /** The depth at the board, or the mean depth over the width that the flow needs. */
        WHICH_DEPTH("which-depth");

        private final String code;

        Cause(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }
    }

    /**
     * One reason.
     *
     * @param ratio of the highest method's to the lowest's; the ratios of all reasons multiply up to the whole
     */
    public record Reason(Cause cause, double ratio) {
    }

    public MethodSpread {
        reasons = List.copyOf(reasons);
    }
}
