package bedmark.engine.bed;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;

/**
 * The space between the skirtboards over a trough of three equal rolls, and the bed that lies in it.
 *
 * <table><caption>Symbols</caption>
 * <tr><td>b1</td><td>clear width between the boards (m)</td></tr>
 * <tr><td>l3</td><td>length of the centre roll (m)</td></tr>
 * <tr><td>λ</td><td>trough angle (rad), 0 for a flat belt</td></tr>
 * <tr><td>θ</td><td>surcharge angle (rad)</td></tr>
 * <tr><td>s</td><td>run of the wing inside the boards, {@code max(0, (b1 − l3)/(2 cos λ))} (m)</td></tr>
 * <tr><td>h</td><td>depth of the bed against the board, up from the belt at the board (m)</td></tr>
 * </table>
 *
 * <p>Trough: depth under the board line {@code s sin λ}, area {@code (l3 + s cos λ) s sin λ}. Crown: the parabola of
 * ISO 5048 with the edge slope tan θ: rise {@code b1 tan θ/4}, area {@code b1² tan θ/6} [S5, R]. (DIN 22101 takes /4,
 * CEMA a circular arc.) Area of the bed: {@code (l3 + s cos λ) s sin λ + b1 h + b1² tan θ/6}.
 *
 * <p>Where the surface lies below the board line, the bed is narrower than the boards stand apart: its edge meets the
 * wing at the run {@code s′ < s}, and the same formulas hold with {@code b′ = l3 + 2 s′ cos λ} and no depth at the
 * board; within the centre roll it is a crown alone, of width {@code b′ = 4 D/tan θ} for the depth D at the centre [D].
 *
 * <p>Depths are kept as <em>levels</em>: {@code (area − area of trough and crown)/b1}. A level is the depth h where the
 * bed reaches the boards, and negative where it does not; the area is linear in it throughout.
 */
public final class Section {
    /** s as it is printed. */
    public static final Formula WING_RUN = Formula.of("wing-run", "s", "max(0, (b1 − l3)/(2 · cos λ))", "D");

    /** Depth of the trough under the board line. */
    public static final Formula TROUGH_DEPTH = Formula.of("trough-depth", "d", "s · sin λ", "D");

    /** Rise of the crown. */
    public static final Formula CROWN_RISE = Formula.of("crown-rise", "r", "b1 · tan θ/4", "S5, R");

    /** Area of trough and crown. */
    public static final Formula CARRIED = Formula.of("carried-area", "A0",
            "(l3 + s · cos λ) · s · sin λ + b1² · tan θ/6", "S5, R");

    /** Area of the bed by its mean level. */
    public static final Formula AREA = Formula.of("bed-area", "A", "A0 + b1 · hn", "D");

    /** Depth at the board by the depth at the centre. */
    public static final Formula OF_CENTRE = Formula.of("depth-of-centre", "h", "D − d − r", "D");

    /** Run to the edge of a bed that does not reach the boards, by its depth at the centre. */
    public static final Formula RUN_OF_CENTRE = Formula.of("edge-run", "s′",
            "(D − l3 · tan θ/4)/(sin λ + cos λ · tan θ/2)", "D");

    /** The same by how far its edge lies under the board line. */
    public static final Formula RUN_OF_DROP = Formula.of("edge-run", "s′", "s − (f − H)/sin λ", "D");

    /** Level of a bed whose edge lies on the wings. */
    public static final Formula LEVEL_ON_WINGS = Formula.of("level-under-boards", "h",
            "((l3 + s′ · cos λ) · s′ · sin λ + (l3 + 2 · s′ · cos λ)² · tan θ/6 − A0)/b1", "D");

    /** Level of a bed within the centre roll, by its depth at the centre. */
    public static final Formula LEVEL_ON_CENTRE = Formula.of("level-under-boards", "h",
            "((4 · D/tan θ)² · tan θ/6 − A0)/b1", "D");

    /** The same by how far its edge lies under the board line. */
    public static final Formula LEVEL_ON_CENTRE_OF_DROP = Formula.of("level-under-boards", "h",
            "((min(l3, b1) − 4 · (f − H − d)/tan θ)² · tan θ/6 − A0)/b1", "D");

    /** Level of no bed at all. */
    public static final Formula LEVEL_OF_NOTHING = Formula.of("level-under-boards", "h", "−A0/b1", "D");

    private final Uncertain spacing;
    private final Uncertain centreRoll;
    private final Uncertain wingRun;
    private final Uncertain sine;
    private final Uncertain cosine;
    private final Uncertain crownSlope;
    private final Uncertain troughDepth;
    private final Uncertain carried;

    private Section(Section other) {
        spacing = other.spacing.certain();
        centreRoll = other.centreRoll.certain();
        wingRun = other.wingRun.certain();
        sine = other.sine.certain();
        cosine = other.cosine.certain();
        crownSlope = other.crownSlope.certain();
        troughDepth = other.troughDepth.certain();
        carried = other.carried.certain();
    }

    private Section(Uncertain spacing, Uncertain centreRoll, Uncertain troughAngle, Uncertain surchargeAngle) {
        this.spacing = spacing;
        this.centreRoll = centreRoll;
        sine = troughAngle.sine();
        cosine = troughAngle.cosine();
        crownSlope = surchargeAngle.tangent();
        wingRun = wingRun(spacing, centreRoll, troughAngle);
        troughDepth = wingRun.times(sine);
        carried = troughArea(wingRun).plus(crownArea(spacing));
    }

    /**
     * The section over a trough.
     *
     * @param spacing        b1 (m), positive
     * @param centreRoll     l3 (m), positive
     * @param troughAngle    λ (rad), 0 to under π/2
     * @param surchargeAngle θ (rad), 0 to under π/2
     */
    public static Section troughed(Uncertain spacing, Uncertain centreRoll, Uncertain troughAngle,
            Uncertain surchargeAngle) {
        return new Section(spacing, centreRoll, troughAngle, surchargeAngle);
    }

    /**
     * The section over a flat belt, all of it over one roll.
     *
     * @param spacing        b1 (m), positive
     * @param surchargeAngle θ (rad), 0 to under π/2
     */
    public static Section flat(Uncertain spacing, Uncertain surchargeAngle) {
        return new Section(spacing, spacing, Uncertain.ZERO, surchargeAngle);
    }

    /** The same section without uncertainty. */
    public Section certain() {
        return new Section(this);
    }

    /** s, the run of each wing inside the boards (m). */
    public static Uncertain wingRun(Uncertain spacing, Uncertain centreRoll, Uncertain troughAngle) {
        return spacing.minus(centreRoll).over(troughAngle.cosine().times(2)).max(Uncertain.ZERO);
    }

    /** Depth of the trough under the board line (m). */
    public Uncertain troughDepth() {
        return troughDepth;
    }

    /** Rise of the crown between the boards (m). */
    public Uncertain crownRise() {
        return spacing.times(crownSlope).over(4);
    }

    /** Area of trough and crown (m²). */
    public Uncertain carriedArea() {
        return carried;
    }

    /** Depth that the area of trough and crown would have between the boards alone (m). */
    public Uncertain carriedDepth() {
        return carried.over(spacing);
    }

    /** Area of the bed at a level (m²). */
    public Uncertain area(Uncertain level) {
        return carried.plus(spacing.times(level));
    }

    /** Level of a bed of that area (m): the inverse of {@link #area}. */
    public Uncertain level(Uncertain area) {
        return area.minus(carried).over(spacing);
    }

    /**
     * The level of a bed by its depth at the belt's centre: less the trough under the board line and the rise of the
     * crown, where it reaches the boards.
     *
     * @param centreDepth D (m), not negative
     */
    public Uncertain levelOfCentreDepth(Uncertain centreDepth) {
        Uncertain depth = centreDepth.minus(troughDepth).minus(crownRise());
        return depth.value() >= 0 ? depth : level(areaUnderCentre(centreDepth));
    }

    /**
     * The level of a bed whose edge lies under the board line.
     *
     * @param drop how far it lies under it (m), positive
     */
    public Uncertain levelUnderBoardLine(Uncertain drop) {
        return level(areaUnderEdge(drop));
    }

    /** Run of the wing (m) to the edge of a bed narrower than the boards, by its depth (m) at the belt's centre. */
    public Uncertain runOfCentreDepth(Uncertain centreDepth) {
        return centreDepth.minus(centreRoll.times(crownSlope).over(4))
                .over(sine.plus(cosine.times(crownSlope).over(2)));
    }

    /** Run of the wing (m) to the edge of a bed that lies so far (m) under the board line, on the wings. */
    public Uncertain runUnderBoardLine(Uncertain drop) {
        return wingRun.minus(drop.over(sine));
    }

    /** Rise (m) of a bed within the centre roll whose edge would lie so far (m) under the board line; none under 0. */
    public Uncertain riseUnderBoardLine(Uncertain drop) {
        return centreRoll.min(spacing).times(crownSlope).over(4).minus(drop.minus(troughDepth));
    }

    /** Area of a bed that is narrower than the boards, by its depth D at the belt's centre (m²). */
    private Uncertain areaUnderCentre(Uncertain centreDepth) {
        Uncertain run = runOfCentreDepth(centreDepth);
        return run.value() >= 0 ? areaToRun(run) : crownOfRise(centreDepth);
    }

    /** Area of a bed whose edge lies so far (m) under the board line (m²). */
    private Uncertain areaUnderEdge(Uncertain drop) {
        if (drop.value() < troughDepth.value()) {
            return areaToRun(runUnderBoardLine(drop));
        }
        return crownOfRise(riseUnderBoardLine(drop));
    }

    private Uncertain areaToRun(Uncertain run) {
        return troughArea(run).plus(crownArea(centreRoll.plus(run.times(cosine).times(2))));
    }

    private Uncertain troughArea(Uncertain run) {
        return centreRoll.plus(run.times(cosine)).times(run.times(sine));
    }

    private Uncertain crownArea(Uncertain width) {
        return width.square().times(crownSlope).over(6);
    }

    private Uncertain crownOfRise(Uncertain rise) {
        return rise.value() > 0 ? crownArea(rise.times(4).over(crownSlope)) : Uncertain.ZERO;
    }
}
