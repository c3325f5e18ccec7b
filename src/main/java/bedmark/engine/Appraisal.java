package bedmark.engine;

import bedmark.engine.bed.DepthPoint;
import bedmark.engine.bed.Profile;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Share;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Component;
import bedmark.engine.verdict.Remedy;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The assessment of one zone in the making: computed first, judged once its conveyor's load is known. */
final class Appraisal {
    private final ZoneFacts zone;
    private final Tape tape;
    private final FeedFacts today;
    private final Optional<FeedFacts> design;

    Appraisal(LoadingZone surveyed, Settings settings) {
        zone = new ZoneFacts(Sources.uncertain(surveyed, settings));
        tape = zone.sources().tape();
        today = FeedFacts.today(zone);
        design = FeedFacts.atDesign(zone).value();
    }

    /** The zone at today's feed. */
    FeedFacts today() {
        return today;
    }

    /** The zone at design throughput, or at today's feed where that is not known. */
    FeedFacts atDesign() {
        return design.orElse(today);
    }

    /** Whether it has a share of the drive, but none at design throughput. */
    boolean standsAsToday() {
        return design.isEmpty() && today.driveShare().isKnown();
    }

    /** Whether some depth is so uncertain that its square is no longer near enough to a straight line. */
    boolean isCoarse() {
        return today.profile().isKnown() && Assumptions.isCoarse(points(today.profile().get()));
    }

    /** Whether more than one station may be the deepest: the greatest of several numbers is no straight line either. */
    boolean isContested() {
        return today.profile().isKnown() && today.profile().get().isContested(points(today.profile().get()).stream()
                .mapToDouble(point -> point.depth().standardUncertainty()).toArray());
    }

    /** Judges the rules on the depth by drawing their readings. */
    void drawDepths(Findings.AtFeeds judged, Hypercube cube) {
        Hypercube.Zone readings = cube.zone(tape);
        judged.today().draw(new DrawnBed(today, readings));
        if (design.isPresent() && judged.atDesign().isPresent()) {
            judged.atDesign().get().draw(new DrawnBed(design.get(), readings));
        }
    }

    /** The rules at today's feed and, where it can be known, at design throughput. */
    Findings.AtFeeds judge(Optional<ConveyorLoad> loadToday, Optional<ConveyorLoad> loadAtDesign) {
        Findings findings = Findings.today(today, loadToday);
        return new Findings.AtFeeds(findings, design.map(feed -> findings.atDesign(today, feed, loadAtDesign)));
    }

    Assessment assessment(Findings.AtFeeds judged, Optional<ConveyorLoad> load,
            Optional<ConveyorLoad> loadAtDesign) {
        Map<Result, Deduced<Uncertain>> results = Results.of(today);
        Map<DragMethod, Deduced<Uncertain>> methods = today.methods();
        Findings findings = judged.today();
        Requirements requirements = new Requirements(zone);
        List<String> required = requirements.required(today.materialDrag());
        List<Deduced<?>> numbers = new ArrayList<>(results.values());
        numbers.addAll(methods.values());
        numbers.addAll(findings.numbers());
        List<DepthPoint> profile = today.profile().value().map(this::points).orElse(List.of());
        List<Assumption> assumptions = new Assumptions(today, methods).all(profile, judged, load, loadAtDesign);
        double othersShare = othersShare(load);
        List<Remedy> remedies = new Remedies(zone, findings.all(), othersShare).all();
        return new Assessment(today.materialDrag().value().map(drag -> today.method()),
                estimates(Result.class, results), estimates(DragMethod.class, methods), new Spread(today).of(methods),
                energyKind(), zone.settings().prices().currency(), profile, findings.level(!required.isEmpty()),
                judged.atDesign().map(then -> then.level(!required.isEmpty())), findings.all(),
                judged.atDesign().map(Findings::all).orElse(List.of()), judged.refused(),
                new AllowedDepths(today, othersShare).all(), remedies, assumptions,
                requirements.all(required, numbers), required, zone.sidesWithoutSeals(),
                today.skirtPower().value().map(tape::shares).orElse(List.<Share>of()), leading(), findings.repeat());
    }

    private double othersShare(Optional<ConveyorLoad> load) {
        return load.isPresent() && today.driveShare().isKnown()
                ? load.get().share().value() - today.driveShare().get().value() : 0;
    }

    private <K extends Enum<K>> Map<K, Estimate> estimates(Class<K> keys, Map<K, Deduced<Uncertain>> numbers) {
        Map<K, Estimate> estimates = new EnumMap<>(keys);
        for (Map.Entry<K, Deduced<Uncertain>> number : numbers.entrySet()) {
            if (number.getValue().isKnown()) {
                estimates.put(number.getKey(), tape.estimate(number.getValue().get()));
            }
        }
        return estimates;
    }

    private List<DepthPoint> points(Profile profile) {
        List<DepthPoint> points = new ArrayList<>(profile.stations());
        for (int i = 0; i < profile.stations(); i++) {
            points.add(new DepthPoint(profile.position(i).value(), tape.estimate(profile.depth(i))));
        }
        return points;
    }

    private Optional<Assessment.EnergyKind> energyKind() {
        return today.energy().value().map(energy -> zone.number(Datum.MOTOR_EFFICIENCY).isKnown()
                ? Assessment.EnergyKind.ELECTRICAL : Assessment.EnergyKind.SHAFT);
    }

    /** The greatest force of bed, seals and loading, where bed and seals are known. */
    private Optional<Component> leading() {
        return today.skirtDrag().value().map(drag -> {
            double bed = today.materialDrag().get().value();
            double seal = zone.sealDrag().get().value();
            double loading = today.loadingForce().value().map(Uncertain::value).orElse(0.0);
            if (loading > bed && loading > seal) {
                return Component.LOADING;
            }
            return seal > bed ? Component.SEAL : Component.BED;
        });
    }
}
