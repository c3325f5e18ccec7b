package bedmark.engine.flow;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;
import java.util.Optional;

/**
 * Length over which the belt brings the feed to its own speed, after ISO 5048 [R].
 *
 * <pre>l_b = (v² − v0²)/(2 g (μ1 cos δ − sin δ))        level belt: the standard's 2 g μ1</pre>
 *
 * <table><caption>Symbols</caption>
 * <tr><td>v, v0</td><td>belt speed, and velocity of the feed along the belt (m/s)</td></tr>
 * <tr><td>μ1</td><td>friction between material and belt, 0.5–0.7, usually 0.6</td></tr>
 * <tr><td>δ</td><td>slope of the belt (rad), rising positive</td></tr>
 * <tr><td>g</td><td>9.806 65 m/s², standard gravity [S11]</td></tr>
 * </table>
 */
public final class AccelerationLength {
    /** The length as it is printed. */
    public static final Formula FORMULA = Formula.of("acceleration-length", "lb",
            "(v² − v0²)/(2 · g · (μ1 · cos δ − sin δ))", "R");

    private static final double GRAVITY = 9.806_65;

    private AccelerationLength() {
    }

    /** l_b (m), negative where the feed is the faster one; nothing where the belt is too steep to carry it along. */
    public static Optional<Uncertain> of(Uncertain beltSpeed, Uncertain feedVelocity, Uncertain beltGrip,
            Uncertain incline) {
        Uncertain pull = beltGrip.times(incline.cosine()).minus(incline.sine());
        return pull.value() <= 0 ? Optional.empty() : Optional.of(
                beltSpeed.square().minus(feedVelocity.square()).over(pull.times(2 * GRAVITY)));
    }
}
