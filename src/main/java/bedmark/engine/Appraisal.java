package bedmark.engine;

import bedmark.engine.bed.DepthPoint;
import bedmark.engine.bed.Profile;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Share;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.AllowedDepth;
import bedmark.engine.verdict.Component;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Judgement;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Rule;
import java.util.ArrayList;
import java.util.Collection;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.IntStream;

/** The assessment of one zone in the making: computed first, judged once its conveyor's load is known. */
final class Appraisal {
    private static final String OF_THIS_WALK = "/readings/";

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

    /** What this zone adds to its conveyor's load today. */
    ConveyorLoad.Part loadToday() {
        return new ConveyorLoad.Part(tape, today.driveShare());
    }

    /** The same at design throughput, or today's where that is not known. */
    ConveyorLoad.Part loadAtDesign() {
        return new ConveyorLoad.Part(tape, design.orElse(today).driveShare());
    }

    Assessment judge(Optional<ConveyorLoad> loadToday, Optional<ConveyorLoad> loadAtDesign) {
        Map<Result, Deduced<Uncertain>> results = results();
        Observations observations = new Observations(today, today);
        Map<Rule, Deduced<Uncertain>> observed = observations.all();
        List<Finding> findings = findings(observations, observed, loadToday);
        List<Finding> atDesign = design.map(feed -> {
            Observations then = new Observations(today, feed);
            return findings(then, then.all(), loadAtDesign);
        }).orElse(List.of());
        Requirements requirements = new Requirements(zone);
        List<String> required = requirements.required(today.materialDrag());
        List<Deduced<?>> numbers = new ArrayList<>(results.values());
        numbers.addAll(today.methods().values());
        numbers.addAll(observed.values());
        List<DepthPoint> profile = today.profile().value().map(this::points).orElse(List.of());
        List<Assumption> assumptions = new Assumptions(today).all(profile, design.isPresent());
        lowerBound(findings, loadToday).ifPresent(assumptions::add);
        Level level = level(findings, required);
        return new Assessment(today.materialDrag().value().map(drag -> today.method()),
                estimates(Result.class, results), estimates(DragMethod.class, today.methods()), energyKind(), profile,
                level, design.map(feed -> level(atDesign, required)), findings, atDesign, allowedDepths(),
                new Remedies(zone.zone(), zone.settings()).all(), assumptions,
                requirements.all(required, numbers), required, zone.sidesWithoutSeals(),
                today.skirtPower().value().map(tape::shares).orElse(List.<Share>of()), leading(), repeat(findings));
    }

    private Map<Result, Deduced<Uncertain>> results() {
        Map<Result, Deduced<Uncertain>> all = new EnumMap<>(Result.class);
        all.put(Result.BELT_SPEED, zone.beltSpeed());
        all.put(Result.MEAN_SQUARE_DEPTH, today.meanSquare());
        all.put(Result.MEAN_DEPTH, today.meanDepth());
        all.put(Result.DEEPEST_DEPTH, today.deepest());
        all.put(Result.SQUARE_OF_MEAN_SHARE, today.squareOfMeanShare());
        all.put(Result.MATERIAL_DRAG, today.materialDrag());
        all.put(Result.SEAL_DRAG, zone.sealDrag());
        all.put(Result.SKIRT_DRAG, today.skirtDrag());
        all.put(Result.LOADING_FORCE, today.loadingForce());
        all.put(Result.SKIRT_POWER, today.skirtPower());
        all.put(Result.DRIVE_POWER, today.drivePower());
        all.put(Result.DRIVE_SHARE, today.driveShare());
        all.put(Result.RUNNING_SHARE, runningShare());
        all.put(Result.BED_AREA, today.area());
        all.put(Result.IMPLIED_THROUGHPUT, today.impliedFlow());
        all.put(Result.FILL, today.fill());
        all.put(Result.BED_SPEED_RATIO, today.bedSpeedRatio());
        all.put(Result.DESIGN_DEPTH, zone.designDepth());
        all.put(Result.REFERENCE_DEPTH, zone.referenceDepth());
        all.put(Result.ACCELERATION_LENGTH, zone.accelerationLength());
        all.put(Result.ENERGY, today.energy());
        return all;
    }

    /** Share of the shaft power that was running; nothing where none was read. */
    private Deduced<Uncertain> runningShare() {
        if (zone.zone().get(Datum.RUNNING_POWER).filter(power -> power.value() > 0).isEmpty()) {
            return Deduced.nothing();
        }
        Deduced<Uncertain> running = Observations.runningShaftPower(zone);
        return Deduced.from(() -> today.drivePower().get().over(running.get()), today.drivePower(), running);
    }

    private <K extends Enum<K>> Map<K, Estimate> estimates(Class<K> keys, Map<K, Deduced<Uncertain>> numbers) {
        Map<K, Estimate> estimates = new EnumMap<>(keys);
        numbers.forEach((key, number) ->
                number.value().ifPresent(known -> estimates.put(key, tape.estimate(known))));
        return estimates;
    }

    private List<DepthPoint> points(Profile profile) {
        return IntStream.range(0, profile.stations()).mapToObj(station -> new DepthPoint(
                profile.position(station).value(), tape.estimate(profile.depth(station)))).toList();
    }

    private List<Finding> findings(Observations observations, Map<Rule, Deduced<Uncertain>> observed,
            Optional<ConveyorLoad> load) {
        List<Finding> findings = new ArrayList<>();
        for (Rule rule : Rule.values()) {
            Limit limit = observations.limit(rule);
            if (!limit.on()) {
                continue;
            }
            if (rule == Rule.SKIRTS_OVER_BUDGET) {
                load.map(sum -> judge(rule, sum.share(), limit, today.driveShare().value()))
                        .filter(finding -> load.get().lacking() == 0 || finding.level() != Level.WITHIN)
                        .ifPresent(findings::add);
            } else {
                observed.get(rule).value().ifPresent(number ->
                        findings.add(judge(rule, tape.estimate(number), limit, Optional.of(number))));
            }
        }
        return findings;
    }

    private Finding judge(Rule rule, Estimate observed, Limit limit, Optional<Uncertain> cause) {
        return Judgement.of(rule, observed, limit, zone.settings().certainty(),
                cause.flatMap(number -> tape.leading(number, OF_THIS_WALK)));
    }

    /** A sum that lacks zones can only show that the limit is passed, never that it is kept. */
    private static Optional<Assumption> lowerBound(List<Finding> findings, Optional<ConveyorLoad> load) {
        return load.filter(sum -> sum.lacking() > 0
                && findings.stream().anyMatch(finding -> finding.rule() == Rule.SKIRTS_OVER_BUDGET))
                .map(sum -> Assumption.of("conveyor-sum-lower-bound", Integer.toString(sum.lacking())));
    }

    private static Level level(Collection<Finding> findings, List<String> missingRequired) {
        return findings.stream().map(Finding::level)
                .reduce(missingRequired.isEmpty() ? Level.WITHIN : Level.INCOMPLETE, Level::or);
    }

    private List<AllowedDepth> allowedDepths() {
        List<AllowedDepth> depths = new ArrayList<>();
        allowed(Rule.BED_OVER_BOARD, zone.height()).ifPresent(depths::add);
        allowed(Rule.BED_OVER_DESIGN, zone.referenceDepth()).ifPresent(depths::add);
        return depths;
    }

    private Optional<AllowedDepth> allowed(Rule rule, Deduced<Uncertain> whole) {
        Limit limit = zone.settings().limits().of(rule);
        return whole.value().filter(depth -> limit.on()).map(depth -> new AllowedDepth(rule,
                times(limit.near(), depth.value()), times(limit.overloaded(), depth.value())));
    }

    private static OptionalDouble times(OptionalDouble limit, double depth) {
        return limit.isPresent() ? OptionalDouble.of(limit.getAsDouble() * depth) : limit;
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

    private static Optional<String> repeat(List<Finding> findings) {
        return findings.stream().filter(finding -> finding.level() == Level.UNDECIDED)
                .flatMap(finding -> finding.leadingReading().stream()).findFirst();
    }
}
