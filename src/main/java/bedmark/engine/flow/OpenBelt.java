package bedmark.engine.flow;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;
import java.util.Optional;

/**
 * Area that the open belt carries away from the boards, after ISO 5048 for three equal rolls [S5, R].
 *
 * <pre>
 * b  = 0.9 B − 0.05 m  for B ≤ 2 m,  else B − 0.25 m
 * S1 = [l3 + (b − l3) cos λ]² tan θ/6
 * S2 = [l3 + (b − l3)/2 · cos λ] · (b − l3)/2 · sin λ
 * S  = S1 + S2
 * </pre>
 *
 * <p>B belt width, b its usable width, l3 length of the centre roll (m); λ trough angle, θ surcharge angle (rad). On a
 * flat belt l3 has no part in it; a centre roll wider than the usable width counts as far as the latter.
 */
public final class OpenBelt {
    /** The usable width as it is printed. */
    public static final Formula USABLE = Formula.of("usable-width", "b", "0.9 · B − 0.05", "S5");

    /** The same for belts over 2 m. */
    public static final Formula USABLE_WIDE = Formula.of("usable-width", "b", "B − 0.25", "S5");

    /** The area as it is printed. */
    public static final Formula AREA = Formula.of("open-belt-area", "S",
            "(l3 + (b − l3) · cos λ)² · tan θ/6 + (l3 + (b − l3)/2 · cos λ) · (b − l3)/2 · sin λ", "S5, R");

    /** The same on a flat belt, or where the centre roll takes all of the usable width. */
    public static final Formula AREA_FLAT = Formula.of("open-belt-area", "S", "b² · tan θ/6", "S5, R");

    private OpenBelt() {
    }

    /** b (m); nothing where the belt is too narrow to carry anything by the standard. */
    public static Optional<Uncertain> usableWidth(Uncertain beltWidth) {
        Uncertain usable = beltWidth.value() <= 2 ? beltWidth.times(0.9).minus(0.05) : beltWidth.minus(0.25);
        return usable.value() > 0 ? Optional.of(usable) : Optional.empty();
    }

    /**
     * S, crown and trough together (m²).
     *
     * @param usableWidth b (m), positive
     * @param centreRoll  l3 (m)
     */
    public static Uncertain area(Uncertain usableWidth, Uncertain centreRoll, Uncertain troughAngle,
            Uncertain surchargeAngle) {
        return crown(usableWidth, centreRoll, troughAngle, surchargeAngle)
                .plus(trough(usableWidth, centreRoll, troughAngle));
    }

    /** S1, the parabola over the trough (m²). */
    public static Uncertain crown(Uncertain usableWidth, Uncertain centreRoll, Uncertain troughAngle,
            Uncertain surchargeAngle) {
        Uncertain centre = centreRoll.min(usableWidth);
        return centre.plus(usableWidth.minus(centre).times(troughAngle.cosine())).square()
                .times(surchargeAngle.tangent()).over(6);
    }

    /** S2, the trough (m²). */
    public static Uncertain trough(Uncertain usableWidth, Uncertain centreRoll, Uncertain troughAngle) {
        Uncertain centre = centreRoll.min(usableWidth);
        Uncertain wing = usableWidth.minus(centre).over(2);
        return centre.plus(wing.times(troughAngle.cosine())).times(wing).times(troughAngle.sine());
    }
}
