package bedmark.engine.drag;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;

/**
 * Drag of the material by its active pressure on the boards, derived from Rankine's theory of earth pressure [D].
 *
 * <pre>F = μw · K · ρ g · ∫h² dx,        K = (1 − sin φ)/(1 + sin φ)</pre>
 *
 * <table><caption>Symbols</caption>
 * <tr><td>μw</td><td>coefficient of friction between material and board; 1 is taken where none is known</td></tr>
 * <tr><td>φ</td><td>angle of internal friction (rad), 0 to under π/2; the angle of repose where none is known</td></tr>
 * <tr><td>ρ</td><td>bulk density (kg/m³)</td></tr>
 * <tr><td>g</td><td>9.806 65 m/s², standard gravity [S11]</td></tr>
 * <tr><td>∫h² dx</td><td>square of the depth at the board, over the length of one side (m³)</td></tr>
 * <tr><td>F</td><td>drag on both boards together (N)</td></tr>
 * </table>
 *
 * <p>Each board bears {@code K ρ g h²/2} per length; the two make the whole. With μw = 1 it is CEMA's own expression
 * behind its table, {@code Cs = (2 γ/288) · (1 − sin φ)/(1 + sin φ)} with γ in lb/ft³ [R].
 */
public final class RankinePressure {
    /** K as it is printed. */
    public static final Formula RATIO = Formula.of("pressure-ratio", "K",
            "(1 − sin φ)/(1 + sin φ)", "D");

    /** The drag as it is printed. */
    public static final Formula FORMULA = Formula.of("rankine", "Fr", "μw · K · ρ · g · J2", "D");

    private static final double GRAVITY = 9.806_65;

    private RankinePressure() {
    }

    /**
     * Drag on both boards (N).
     *
     * @param wallFriction     μw, not negative
     * @param frictionAngle    φ (rad)
     * @param density          ρ (kg/m³)
     * @param integralOfSquare ∫h² dx (m³), not negative
     */
    public static Uncertain drag(Uncertain wallFriction, Uncertain frictionAngle, Uncertain density,
            Uncertain integralOfSquare) {
        return wallFriction.times(pressureRatio(frictionAngle)).times(density).times(GRAVITY).times(integralOfSquare);
    }

    /** K, the ratio of the pressure across to the pressure down. */
    public static Uncertain pressureRatio(Uncertain frictionAngle) {
        Uncertain sine = frictionAngle.sine();
        return Uncertain.ONE.minus(sine).over(sine.plus(1));
    }
}
