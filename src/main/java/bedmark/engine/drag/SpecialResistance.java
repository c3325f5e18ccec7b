package bedmark.engine.drag;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;

/**
 * Drag of the material on the skirtboards as a special resistance of ISO 5048 and DIN 22101 [R].
 *
 * <pre>
 * while the feed comes to belt speed:  F = μ2 Iv² ρ g l_b / {[(v + v0)/2]² b1²}
 * beyond:                              F = μ2 Iv² ρ g l / (v² b1²),        l = L − min(l_b, L)
 * </pre>
 *
 * <table><caption>Symbols</caption>
 * <tr><td>μ2</td><td>friction between material and board, 0.5–0.7 [S7], usually 0.6</td></tr>
 * <tr><td>Iv</td><td>volume flow (m³/s)</td></tr>
 * <tr><td>ρ</td><td>bulk density (kg/m³)</td></tr>
 * <tr><td>g</td><td>9.806 65 m/s², standard gravity [S11]</td></tr>
 * <tr><td>v, v0</td><td>belt speed, and velocity of the feed along the belt (m/s); {@code v + v0 > 0}</td></tr>
 * <tr><td>b1</td><td>clear width between the boards (m)</td></tr>
 * <tr><td>l_b</td><td>acceleration length (m); within the zone it counts as far as the boards reach, and not at all
 *     where the feed is faster than the belt</td></tr>
 * <tr><td>L</td><td>length of the boards (m)</td></tr>
 * </table>
 *
 * <p>The depth behind it is the mean depth over the width, {@code Iv/(v b1)}: not the depth at the board, and never to
 * be mixed with it.
 */
public final class SpecialResistance {
    /** The length in which the feed comes to belt speed, as far as the boards reach. */
    public static final Formula WITHIN = Formula.of("boards-while-speeding", "lw",
            "min(max(lb, 0), L)", "R");

    /** The drag as it is printed. */
    public static final Formula FORMULA = Formula.of("iso-5048", "Fi",
            "μ2 · Iv² · ρ · g/b1² · (lw/((v + v0)/2)² + (L − lw)/v²)", "R");

    private static final double GRAVITY = 9.806_65;

    private SpecialResistance() {
    }

    /** Drag on both boards over the whole zone (N); belt speed and {@code v + v0} are positive. */
    public static Uncertain drag(Uncertain boardGrip, Uncertain volumeFlow, Uncertain density, Uncertain beltSpeed,
            Uncertain feedVelocity, Uncertain spacing, Uncertain accelerationLength, Uncertain length) {
        Uncertain within = within(accelerationLength, length);
        Uncertain perLength = boardGrip.times(volumeFlow.square()).times(density).times(GRAVITY)
                .over(spacing.square());
        Uncertain meanSpeed = beltSpeed.plus(feedVelocity).over(2);
        return perLength.times(within.over(meanSpeed.square())
                .plus(length.minus(within).over(beltSpeed.square())));
    }

    /** Length (m) of the boards along which the feed comes to belt speed. */
    public static Uncertain within(Uncertain accelerationLength, Uncertain length) {
        return accelerationLength.max(Uncertain.ZERO).min(length);
    }
}
