package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.engine.OtherSpeed;
import bedmark.picture.BedCurve;
import bedmark.picture.ZoneSketch;
import bedmark.quantity.Dimension;
import bedmark.quantity.Unit;
import bedmark.survey.Survey;
import bedmark.wording.Wording;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The question what the same flow would look like at another belt speed; nothing of it is ever saved. */
final class AskedSpeed {
    /** How far a finger goes for one step of speed (mm). */
    private static final double MM_PER_STEP = 3;

    private final ZoneSetting setting;
    private final Wording wording;
    private final Unit unit;
    private final BigDecimal step;
    private long steps;
    private double pulled;

    AskedSpeed(ZoneSetting setting, Wording wording, double speedNow) {
        this.setting = setting;
        this.wording = wording;
        this.unit = wording.units().unit(Dimension.SPEED);
        this.step = unit == Unit.METRE_PER_SECOND ? new BigDecimal("0.05") : BigDecimal.TEN;
        this.steps = Math.max(1, new BigDecimal(unit.fromSi(speedNow)).divide(step, 0, RoundingMode.HALF_UP)
                .longValueExact());
    }

    /** What another speed would bring, where all that it takes is known. */
    static Optional<OtherSpeed> at(ZoneSetting setting, Branch document, double speed) {
        try {
            return OtherSpeed.of(setting.assessor().zone(new Survey(document)), setting.assessor().settings(), speed);
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    /** One step faster or slower; the belt never stops. */
    void step(int direction) {
        steps = Math.max(1, steps + direction);
    }

    /** Follows a finger that went so far (mm) in the direction of travel. */
    void pull(double forward) {
        pulled += forward;
        int whole = (int) (pulled / MM_PER_STEP);
        pulled -= whole * MM_PER_STEP;
        step(whole);
    }

    /** The asked speed (m/s). */
    double speed() {
        return unit.toSi(step.multiply(BigDecimal.valueOf(steps)));
    }

    /** The sketch with the bed of the asked speed over it. */
    ZoneSketch over(ZoneSketch sketch, Branch document) {
        return at(setting, document, speed()).flatMap(bed -> curve(bed, sketch)
                .map(curve -> sketch.asIf(curve, words(bed)))).orElse(sketch);
    }

    private String words(OtherSpeed bed) {
        Unit small = wording.units().smallLength();
        return wording.text("zone.as-if", wording.computed(bed.speed(), unit),
                wording.computed(bed.meanDepth(), small), wording.computed(bed.meanDepthNow(), small));
    }

    private static Optional<BedCurve> curve(OtherSpeed bed, ZoneSketch sketch) {
        if (sketch.boards().length().isEmpty() || bed.depths().isEmpty()) {
            return Optional.empty();
        }
        List<BedCurve.Knot> knots = new ArrayList<>();
        knots.add(new BedCurve.Knot(0, bed.depths().get(0).depth()));
        bed.depths().stream().filter(at -> at.position() > 0)
                .forEach(at -> knots.add(new BedCurve.Knot(at.position(), at.depth())));
        double end = sketch.boards().length().getAsDouble();
        OtherSpeed.At last = bed.depths().get(bed.depths().size() - 1);
        if (last.position() < end) {
            knots.add(new BedCurve.Knot(end, last.depth()));
        }
        return Optional.of(new BedCurve(knots));
    }
}
