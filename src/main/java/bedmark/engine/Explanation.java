package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.bed.ProfileFormula;
import bedmark.engine.bed.Section;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.drag.RankinePressure;
import bedmark.engine.drag.SiteFactor;
import bedmark.engine.drag.SpecialResistance;
import bedmark.engine.drag.TabulatedFactor;
import bedmark.engine.flow.AccelerationLength;
import bedmark.engine.flow.BeltSpeed;
import bedmark.engine.flow.BoardPlacement;
import bedmark.engine.flow.LoadingForce;
import bedmark.engine.flow.OpenBelt;
import bedmark.engine.flow.SettlingLength;
import bedmark.engine.seal.SealDrag;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Rule;
import bedmark.engine.working.Formula;
import bedmark.engine.working.Working;
import java.util.Map;
import java.util.Optional;

/**
 * Writes down how the numbers of one zone came about: every value is the one that the assessment computes, taken from
 * the same objects, and every formula is the one that stands beside the code.
 */
final class Explanation {
    private static final double GRAVITY = 9.806_65;
    private static final Formula OF_FLOW = SpecialResistance.FORMULA.withSigns(Map.of("Iv", "(Q/ρ)"));

    private final ZoneFacts zone;
    private final FeedFacts today;
    private final WorkingSheet sheet;

    Explanation(LoadingZone surveyed, Settings settings) {
        zone = new ZoneFacts(Sources.uncertain(surveyed, settings));
        today = FeedFacts.today(zone);
        sheet = new WorkingSheet(zone.sources().tape());
    }

    Working working() {
        inputs();
        speed();
        section();
        bed();
        flow();
        materialDrag();
        seals();
        sums();
        openBelt();
        design();
        rules();
        return sheet.working();
    }

    private void inputs() {
        Signs.OF_DATA.forEach((datum, sign) -> sheet.input(sign.sign(), zone.number(datum), sign.unit(),
                datum.pointer()));
        sheet.input("b1", zone.spacing(), "m", source(Datum.READ_SPACING, Datum.REGISTER_SPACING));
        sheet.input("H", zone.height(), "m", source(Datum.READ_HEIGHT, Datum.REGISTER_HEIGHT));
        if (zone.isFlat()) {
            sheet.input("l3", zone.spacing(), "m", source(Datum.READ_SPACING, Datum.REGISTER_SPACING));
        }
        sheet.constant("g", GRAVITY, "m/s2");
        sheet.input("μ1", Deduced.known(zone.sources().beltGrip()), "1", zone.settings().beltGrip().name());
        sheet.input("μ2", Deduced.known(zone.sources().boardGrip()), "1", zone.settings().boardGrip().name());
        assumed("v0", Datum.FEED_VELOCITY, 0, "m/s");
        assumed("Li", Datum.IMPACT_LENGTH, 0, "m");
        if (zone.settings().conventions().incline()) {
            assumed("δ", Datum.INCLINE, 0, "rad");
        } else {
            sheet.constant("δ", 0, "rad");
        }
        assumed("μw", Datum.WALL_FRICTION, 1, "1");
    }

    private String source(Datum read, Datum registered) {
        return (zone.number(read).isKnown() ? read : registered).pointer();
    }

    private void assumed(String sign, Datum datum, double value, String unit) {
        sheet.input(sign, Deduced.known(zone.sources().numberOr(datum, value)), unit, datum.pointer());
    }

    private void speed() {
        Deduced<Uncertain> speed = zone.beltSpeed();
        if (zone.number(Datum.BELT_SPEED).isKnown()) {
            sheet.input("v", speed, "m/s", Datum.BELT_SPEED.pointer());
        } else if (zone.number(Datum.TIMED_ELAPSED).isKnown()) {
            Datum belt = zone.number(Datum.TIMED_BELT_LENGTH).isKnown() ? Datum.TIMED_BELT_LENGTH : Datum.BELT_LENGTH;
            sheet.input("Lb", zone.number(belt), "m", belt.pointer());
            sheet.step(Result.BELT_SPEED.key(), BeltSpeed.TIMED, speed, "m/s");
        } else {
            sheet.step(Result.BELT_SPEED.key(), BeltSpeed.AT_PULLEY, speed, "m/s");
        }
    }

    private void section() {
        zone.section().value().ifPresent(section -> section(section, Map.of(), zone.spacing().get()));
    }

    /** The section by one spacing, in its own signs. */
    private void section(Section section, Map<String, String> signs, Uncertain spacing) {
        if (zone.isFlat()) {
            sheet.constant(signs.getOrDefault("s", "s"), 0, "m");
        } else {
            sheet.step(Section.WING_RUN.withSigns(signs), Section.wingRun(spacing, zone.centreRoll().get(),
                    zone.number(Datum.TROUGH_ANGLE).get()), "m");
        }
        sheet.step(Section.CARRIED.withSigns(signs), section.carriedArea(), "m2");
    }

    private void bed() {
        zone.profile().value().ifPresent(bed -> {
            new StationWorking(zone, sheet).write(bed);
            sheet.step(ProfileFormula.depth(bed), bed.integral(), "m2");
            sheet.step(ProfileFormula.square(bed), bed.integralOfSquare(), "m3");
            sheet.step(Result.MEAN_DEPTH.key(), ZoneFormulas.MEAN_DEPTH, today.meanDepth(), "m");
            sheet.step(Result.MEAN_SQUARE_DEPTH.key(), ZoneFormulas.MEAN_SQUARE, today.meanSquare(), "m2");
            sheet.step(Result.DEEPEST_DEPTH.key(), ProfileFormula.deepest(bed), today.deepest(), "m");
            sheet.step(Result.SQUARE_OF_MEAN_SHARE.key(), ZoneFormulas.SQUARE_OF_MEAN, today.squareOfMeanShare(), "1");
        });
    }

    private void flow() {
        if (today.area().isKnown()) {
            Profile bed = zone.profile().get();
            boolean touches = ProfileFormula.touches(bed);
            if (!touches) {
                sheet.step(ProfileFormula.level(bed), bed.meanLevel(), "m");
            }
            Formula area = touches ? Section.AREA.withSigns(Map.of("hn", "hm")) : Section.AREA;
            sheet.step(Result.BED_AREA.key(), area, today.area(), "m2");
        }
        sheet.step(Result.IMPLIED_THROUGHPUT.key(), ZoneFormulas.IMPLIED_FLOW, today.impliedFlow(), "kg/s");
        if (today.statedFlow().isKnown()) {
            sheet.input("Q", today.statedFlow(), "kg/s", Datum.THROUGHPUT.pointer());
            sheet.step(Result.BED_SPEED_RATIO.key(), ZoneFormulas.BED_SPEED_RATIO, today.bedSpeedRatio(), "1");
        } else if (today.impliedFlow().isKnown()) {
            sheet.step(ZoneFormulas.FLOW_OF_BED, today.impliedFlow().get(), "kg/s");
        }
        sheet.step(Result.LOADING_FORCE.key(), LoadingForce.FORMULA, today.loadingForce(), "N");
    }

    private void materialDrag() {
        Map<DragMethod, Deduced<Uncertain>> methods = today.methods();
        sheet.step(key(DragMethod.TABULATED), TabulatedFactor.FORMULA, methods.get(DragMethod.TABULATED), "N");
        if (methods.get(DragMethod.RANKINE).isKnown()) {
            sheet.step(RankinePressure.RATIO,
                    RankinePressure.pressureRatio(zone.number(Datum.ANGLE_OF_REPOSE).get()), "1");
            sheet.step(key(DragMethod.RANKINE), RankinePressure.FORMULA, methods.get(DragMethod.RANKINE), "N");
        }
        sheet.step(Result.ACCELERATION_LENGTH.key(), AccelerationLength.FORMULA, zone.accelerationLength(), "m");
        if (methods.get(DragMethod.ISO_5048).isKnown()) {
            Uncertain acceleration = zone.accelerationLength().get();
            Uncertain within = SpecialResistance.within(acceleration, zone.length().get());
            boolean whole = within.value() == acceleration.value();
            if (!whole) {
                sheet.step(SpecialResistance.WITHIN, within, "m");
            }
            sheet.step(key(DragMethod.ISO_5048), whole ? OF_FLOW.withSigns(Map.of("lw", "lb")) : OF_FLOW,
                    methods.get(DragMethod.ISO_5048), "N");
        }
        sheet.step(key(DragMethod.SITE), SiteFactor.FORMULA, methods.get(DragMethod.SITE), "N");
        sheet.step(Result.MATERIAL_DRAG.key(), ZoneFormulas.materialDrag(today.method()), today.materialDrag(), "N");
    }

    private static String key(DragMethod method) {
        return "methods." + method.code();
    }

    private void seals() {
        if (!zone.sealDrag().isKnown()) {
            return;
        }
        Uncertain rate = zone.sealRate();
        boolean fitted = zone.method() == DragMethod.SITE && zone.number(Datum.SITE_SEAL_RATE).isKnown();
        sheet.input("q", Deduced.known(rate), "N/m", fitted ? Datum.SITE_SEAL_RATE.pointer() : "/plant/sealRates");
        StringBuilder sum = new StringBuilder();
        int number = 0;
        for (SealSegment segment : zone.zone().seals()) {
            number++;
            double multiplier = zone.settings().sealRates().multiplier(segment.type(), segment.condition());
            Uncertain length = zone.sources().take(segment.length());
            sheet.input("ℓ" + number, Deduced.known(length), "m", segment.length().name());
            sheet.constant("k" + number, multiplier, "1");
            sheet.step(SealDrag.FORMULA.withSigns(Map.of("k", "k" + number, "ℓ", "ℓ" + number, "Fk", "Fk" + number)),
                    SealDrag.of(rate, multiplier, length), "N");
            sum.append(number == 1 ? "" : " + ").append("Fk").append(number);
        }
        sheet.step(Result.SEAL_DRAG.key(), Formula.of("seal-drag", "Fs", sum.toString(), "D"), zone.sealDrag(), "N");
    }

    private void sums() {
        sheet.step(Result.SKIRT_DRAG.key(), ZoneFormulas.SKIRT_DRAG, today.skirtDrag(), "N");
        sheet.step(Result.SKIRT_POWER.key(), ZoneFormulas.SKIRT_POWER, today.skirtPower(), "W");
        sheet.step(Result.DRIVE_POWER.key(), ZoneFormulas.DRIVE_POWER, today.drivePower(), "W");
        sheet.step(Result.DRIVE_SHARE.key(), ZoneFormulas.DRIVE_SHARE, today.driveShare(), "1");
        if (zone.zone().get(Datum.RUNNING_POWER).filter(power -> power.value() > 0).isPresent()) {
            sheet.step(Result.RUNNING_SHARE.key(), ZoneFormulas.RUNNING_SHARE, Deduced.from(today.drivePower(),
                    Observations.runningShaftPower(zone), Uncertain::over), "1");
        }
        sheet.step(Result.ENERGY.key(), zone.number(Datum.MOTOR_EFFICIENCY).isKnown() ? ZoneFormulas.ENERGY_AT_MOTOR
                : ZoneFormulas.ENERGY_AT_SHAFT, today.energy(), "W.h");
    }

    private void openBelt() {
        if (zone.capacityArea().isKnown()) {
            Uncertain belt = zone.number(Datum.BELT_WIDTH).get();
            sheet.step(belt.value() <= 2 ? OpenBelt.USABLE : OpenBelt.USABLE_WIDE,
                    OpenBelt.usableWidth(belt).orElseThrow(), "m");
            boolean wings = !zone.isFlat()
                    && zone.centreRoll().get().value() < OpenBelt.usableWidth(belt).orElseThrow().value();
            sheet.step(!wings ? OpenBelt.AREA_FLAT : OpenBelt.AREA, zone.capacityArea().get(), "m2");
        }
        sheet.step(Result.FILL.key(), ZoneFormulas.FILL, today.fill(), "1");
    }

    private void design() {
        boolean other = zone.number(Datum.READ_SPACING).isKnown() || !zone.section().isKnown();
        if (zone.designDepth().isKnown() && other) {
            Uncertain spacing = zone.number(Datum.REGISTER_SPACING).get();
            sheet.input("br", Deduced.known(spacing), "m", Datum.REGISTER_SPACING.pointer());
            section(zone.registeredSection().get(), ZoneFormulas.REGISTERED, spacing);
        }
        sheet.step(Result.DESIGN_DEPTH.key(), other ? ZoneFormulas.DESIGN_DEPTH
                : ZoneFormulas.DESIGN_DEPTH.withSigns(Map.of("br", "b1", "A0r", "A0")), zone.designDepth(), "m");
        sheet.step(Result.REFERENCE_DEPTH.key(), zone.number(Datum.DESIGN_BED_DEPTH).isKnown()
                ? ZoneFormulas.REFERENCE_REGISTERED : ZoneFormulas.REFERENCE_DEPTH, zone.referenceDepth(), "m");
    }

    private void rules() {
        placement();
        Observations observations = new Observations(today, today);
        int defects = 0;
        for (SealSegment segment : zone.zone().seals()) {
            defects += segment.condition().isDefect() ? 1 : 0;
        }
        sheet.constant("nd", defects, "1");
        for (Rule rule : Rule.values()) {
            Deduced<Uncertain> observed = observations.of(rule);
            if (observed.isKnown() && observations.limit(rule).on()) {
                sheet.step(rule.code(), ZoneFormulas.observed(rule), observed, rule.unit());
            }
        }
    }

    /** What several rules compare with. */
    private void placement() {
        Deduced<Uncertain> settling = zone.settlingLength();
        if (settling.isKnown()) {
            if (!zone.accelerationLength().isKnown()) {
                sheet.constant("lb", 0, "m");
            }
            sheet.step(SettlingLength.formula(zone.settings().conventions().lengths(),
                    zone.zone().is(LoadingZone.Mark.HIGH_AIR_FLOW)), settling.get(), "m");
        }
        Optional<Uncertain> belt = zone.number(Datum.BELT_WIDTH).value();
        if (belt.isPresent() && zone.spacing().isKnown()) {
            boolean free = zone.zone().is(LoadingZone.Mark.FREE_FLOWING);
            sheet.step(free ? BoardPlacement.WIDEST_FREE_FLOWING : BoardPlacement.WIDEST,
                    BoardPlacement.widestSpacing(belt.get(), free), "m");
            sheet.step(BoardPlacement.LEAST_EDGE, BoardPlacement.leastEdge(belt.get()), "m");
            freeEdge(belt.get());
        }
        today.profile().value().filter(bed -> bed.stations() > 1 && today.meanDepth().get().value() != 0)
                .ifPresent(bed -> {
                    sheet.step(ProfileFormula.atLastQuarter(bed), bed.levelAtLastQuarter(), "m");
                    sheet.step(ProfileFormula.changeOverLastQuarter(bed), bed.changeOverLastQuarter(), "m");
                });
    }

    private void freeEdge(Uncertain belt) {
        Deduced<Uncertain> trough = zone.number(Datum.TROUGH_ANGLE);
        if (trough.isKnown() && zone.centreRoll().isKnown()) {
            Uncertain run = Section.wingRun(zone.spacing().get(), zone.centreRoll().get(), trough.get());
            if (!zone.section().isKnown()) {
                sheet.step(Section.WING_RUN, run, "m");
            }
            sheet.step(zone.centreRoll().get().value() < zone.spacing().get().value() ? BoardPlacement.FREE_EDGE
                    : BoardPlacement.FREE_EDGE_ON_CENTRE, BoardPlacement.freeEdge(belt, zone.centreRoll().get(),
                    zone.spacing().get(), run), "m");
        }
    }
}
