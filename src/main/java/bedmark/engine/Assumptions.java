package bedmark.engine;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.DepthPoint;
import bedmark.engine.bed.Station;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.seal.SealRates;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Rule;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** What was taken for granted in the results of one zone. */
final class Assumptions {
    /** Above this relative uncertainty of a depth the square is no longer near enough to a straight line. */
    private static final double COARSE = 0.10;

    private final ZoneFacts zone;
    private final FeedFacts today;
    private final Map<DragMethod, Deduced<Uncertain>> methods;

    Assumptions(FeedFacts today, Map<DragMethod, Deduced<Uncertain>> methods) {
        zone = today.zone();
        this.today = today;
        this.methods = methods;
    }

    /**
     * All of them.
     *
     * @param profile      the depths of today
     * @param judged       the rules
     * @param load         the conveyor's today
     * @param loadAtDesign the same at design throughput
     */
    List<Assumption> all(List<DepthPoint> profile, Findings.AtFeeds judged, Optional<ConveyorLoad> load,
            Optional<ConveyorLoad> loadAtDesign) {
        Set<Assumption> all = new LinkedHashSet<>();
        geometry(all);
        speed(all);
        material(all);
        bed(all, profile);
        seals(all);
        flow(all, judged.atDesign().isPresent());
        verdict(all, judged, load);
        atDesign(all, judged, loadAtDesign);
        outside(all);
        return new ArrayList<>(all);
    }

    private void geometry(Set<Assumption> all) {
        fromRegister(all, zone.spacing(), Datum.READ_SPACING, Datum.REGISTER_SPACING);
        fromRegister(all, zone.height(), Datum.READ_HEIGHT, Datum.REGISTER_HEIGHT);
        if (zone.settings().conventions().incline()) {
            absent(all, "incline-level", Datum.INCLINE, zone.accelerationLength());
        } else if (zone.number(Datum.INCLINE).isKnown() && zone.accelerationLength().isKnown()) {
            all.add(Assumption.of("incline-not-counted"));
        }
        absent(all, "feed-velocity-zero", Datum.FEED_VELOCITY, today.loadingForce());
        if (zone.settings().conventions().lengths().bySpeed()) {
            absent(all, "impact-length-zero", Datum.IMPACT_LENGTH, zone.settlingLength());
        }
        if (zone.designDepth().value().filter(depth -> depth.value() == 0).isPresent()) {
            all.add(Assumption.of("design-flow-carried-by-trough"));
        }
        if (zone.beltSpeed().isKnown() && !zone.accelerationLength().isKnown()) {
            all.add(Assumption.of("acceleration-length-endless", Datum.INCLINE.pointer()));
        }
    }

    private void speed(Set<Assumption> all) {
        if (zone.beltSpeed().isKnown() && !zone.number(Datum.BELT_SPEED).isKnown()) {
            if (zone.number(Datum.TIMED_ELAPSED).isKnown()) {
                fromRegister(all, zone.beltSpeed(), Datum.TIMED_BELT_LENGTH, Datum.BELT_LENGTH);
            } else {
                all.add(Assumption.of("pulley-slip-ignored"));
            }
        }
    }

    private void material(Set<Assumption> all) {
        if (methods.get(DragMethod.RANKINE).isKnown()) {
            all.add(Assumption.of("repose-for-friction-angle"));
            absent(all, "wall-friction-one", Datum.WALL_FRICTION, methods.get(DragMethod.RANKINE));
        }
    }

    private void bed(Set<Assumption> all, List<DepthPoint> profile) {
        for (int i = 0; i < profile.size(); i++) {
            Station station = zone.zone().stations().get(i);
            DepthPoint point = profile.get(i);
            if (station.method() == DepthMethod.WEAR_LINE) {
                all.add(Assumption.of("wear-line-is-history", station.raw().name()));
            }
            if (today.profile().get().level(i).value() < 0) {
                all.add(Assumption.of("bed-below-boards", station.raw().name()));
            }
            if (isCoarse(point)) {
                all.add(Assumption.of("first-order-coarse", station.raw().name()));
            }
        }
        if (profile.size() == 1) {
            all.add(Assumption.of("depth-constant-along-zone"));
        }
    }

    private void seals(Set<Assumption> all) {
        SealRates rates = zone.settings().sealRates();
        for (SealSegment segment : zone.zone().seals()) {
            if (rates.isSiteAssumption(segment.type(), segment.condition())) {
                all.add(Assumption.of("seal-multiplier-site", segment.type().code(), segment.condition().code(),
                        Double.toString(rates.multiplier(segment.type(), segment.condition()))));
            }
        }
        boolean fitted = zone.method() == DragMethod.SITE && zone.number(Datum.SITE_SEAL_RATE).isKnown();
        if (fitted) {
            all.add(Assumption.of("seal-rate-fitted",
                    Double.toString(zone.number(Datum.SITE_SEAL_RATE).get().value())));
        } else if (rates.rate() != SealRates.CONVENTION && zone.sealDrag().isKnown()) {
            all.add(Assumption.of("seal-rate-site", Double.toString(rates.rate())));
        }
    }

    private void flow(Set<Assumption> all, boolean atDesign) {
        boolean read = zone.number(Datum.THROUGHPUT).isKnown();
        if (!read && today.impliedFlow().isKnown()) {
            all.add(Assumption.of("bed-at-belt-speed"));
        }
        if (!atDesign) {
            all.add(Assumption.of("verdict-holds-at-todays-feed",
                    read ? Datum.DESIGN_THROUGHPUT.pointer() : Datum.THROUGHPUT.pointer()));
        }
    }

    private void verdict(Set<Assumption> all, Findings.AtFeeds judged, Optional<ConveyorLoad> load) {
        if (judged.isDrawn()) {
            all.add(Assumption.of("monte-carlo-used", Integer.toString(zone.settings().conventions().trials())));
        }
        if (load.isPresent() && load.get().lacking() > 0 && judged.today().has(Rule.SKIRTS_OVER_BUDGET)) {
            all.add(Assumption.of("conveyor-sum-lower-bound", Integer.toString(load.get().lacking())));
        }
    }

    /** What the verdict at design feed leaves out, where it tells of the drive at all. */
    private void atDesign(Set<Assumption> all, Findings.AtFeeds judged, Optional<ConveyorLoad> load) {
        boolean drive = judged.atDesign().filter(design -> design.has(Rule.DRIVE_NEAR_RATING)).isPresent();
        boolean skirts = judged.atDesign().filter(design -> design.has(Rule.SKIRTS_OVER_BUDGET)).isPresent();
        if (drive && zone.number(Datum.DESIGN_THROUGHPUT).get().value()
                > zone.number(Datum.THROUGHPUT).get().value()) {
            all.add(Assumption.of("drive-lower-bound-at-design"));
        }
        if (skirts && load.isPresent() && load.get().asToday() > 0) {
            all.add(Assumption.of("conveyor-sum-at-todays-feed", Integer.toString(load.get().asToday())));
        }
    }

    /** What stands outside the methods altogether. */
    private void outside(Set<Assumption> all) {
        if (zone.zone().is(LoadingZone.Mark.BELT_FEEDER)) {
            all.add(Assumption.of("hopper-load-outside"));
        }
        if (zone.zone().is(LoadingZone.Mark.FULLY_SKIRTED)) {
            all.add(Assumption.of("no-open-belt"));
        }
    }

    /** Whether some depth is so uncertain that its square is no longer near enough to a straight line. */
    static boolean isCoarse(List<DepthPoint> profile) {
        for (DepthPoint point : profile) {
            if (isCoarse(point)) {
                return true;
            }
        }
        return false;
    }

    private static boolean isCoarse(DepthPoint point) {
        return point.depth().value() > 0 && point.depth().standardUncertainty() > COARSE * point.depth().value();
    }

    private void fromRegister(Set<Assumption> all, Deduced<Uncertain> used, Datum read, Datum registered) {
        if (used.isKnown() && !zone.number(read).isKnown()) {
            all.add(Assumption.of("register-used", registered.pointer()));
        }
    }

    private void absent(Set<Assumption> all, String code, Datum datum, Deduced<Uncertain> user) {
        if (user.isKnown() && !zone.number(datum).isKnown()) {
            all.add(Assumption.of(code, datum.pointer()));
        }
    }
}
