package bedmark.engine;

import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Component;
import bedmark.engine.verdict.Rule;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import java.util.function.Function;

/** The assessment of one conveyor in the making: its zones are computed first, and judged once their sum is known. */
final class ConveyorAppraisal {
    private static final Set<Rule> OF_ALL_ZONES = EnumSet.of(Rule.SKIRTS_OVER_BUDGET);

    private final List<LoadingZone> zones;
    private final int unsurveyed;
    private final Settings settings;
    private final List<Appraisal> appraisals = new ArrayList<>();
    private final Optional<ConveyorLoad> today;
    private final Optional<ConveyorLoad> atDesign;

    ConveyorAppraisal(List<LoadingZone> zones, int unsurveyed, Settings settings) {
        this.zones = zones;
        this.unsurveyed = unsurveyed;
        this.settings = settings;
        List<FeedFacts> feedsToday = new ArrayList<>(zones.size());
        List<FeedFacts> feedsAtDesign = new ArrayList<>(zones.size());
        int asToday = 0;
        for (LoadingZone zone : zones) {
            Appraisal appraisal = new Appraisal(zone, settings);
            appraisals.add(appraisal);
            feedsToday.add(appraisal.today());
            feedsAtDesign.add(appraisal.atDesign());
            asToday += appraisal.standsAsToday() ? 1 : 0;
        }
        today = ConveyorLoad.of(feedsToday, unsurveyed, 0);
        atDesign = ConveyorLoad.of(feedsAtDesign, unsurveyed, asToday);
    }

    ConveyorAssessment assess() {
        List<Findings.AtFeeds> findings = new ArrayList<>(zones.size());
        for (Appraisal appraisal : appraisals) {
            findings.add(appraisal.judge(today, atDesign));
        }
        if (settings.conventions().trials() > 0) {
            drawDepths(findings);
            drawSum(findings);
        }
        List<Assessment> assessments = new ArrayList<>(zones.size());
        for (int i = 0; i < zones.size(); i++) {
            assessments.add(appraisals.get(i).assessment(findings.get(i), today, atDesign));
        }
        return new ConveyorAssessment(assessments, today.map(ConveyorLoad::lacking).orElse(unsurveyed + zones.size()),
                sums(), leadingZone(), leading(assessments));
    }

    /** Each zone by itself, so that its verdict does not hang on which others were surveyed with it. */
    private void drawDepths(List<Findings.AtFeeds> findings) {
        for (int i = 0; i < zones.size(); i++) {
            Appraisal zone = appraisals.get(i);
            if (findings.get(i).isDoubtful(Findings.OF_DEPTHS) && (zone.isCoarse() || zone.isContested())) {
                zone.drawDepths(findings.get(i), new Hypercube(settings.conventions().trials()));
            }
        }
    }

    private void drawSum(List<Findings.AtFeeds> findings) {
        boolean doubtful = false;
        for (Findings.AtFeeds zone : findings) {
            doubtful |= zone.isDoubtful(OF_ALL_ZONES);
        }
        if (doubtful && appraisals.stream().anyMatch(Appraisal::isCoarse)) {
            DrawnLoad drawn = DrawnLoad.of(appraisals, new Hypercube(settings.conventions().trials()));
            for (Findings.AtFeeds zone : findings) {
                zone.today().draw(Rule.SKIRTS_OVER_BUDGET, drawn.today());
                zone.atDesign().ifPresent(design -> design.draw(Rule.SKIRTS_OVER_BUDGET, drawn.atDesign()));
            }
        }
    }

    private Map<Result, Estimate> sums() {
        Map<Result, Estimate> sums = new EnumMap<>(Result.class);
        sum(FeedFacts::materialDrag).ifPresent(sum -> sums.put(Result.MATERIAL_DRAG, sum));
        sum(feed -> feed.zone().sealDrag()).ifPresent(sum -> sums.put(Result.SEAL_DRAG, sum));
        sum(FeedFacts::skirtDrag).ifPresent(sum -> sums.put(Result.SKIRT_DRAG, sum));
        sum(FeedFacts::loadingForce).ifPresent(sum -> sums.put(Result.LOADING_FORCE, sum));
        sum(FeedFacts::skirtPower).ifPresent(sum -> sums.put(Result.SKIRT_POWER, sum));
        sum(FeedFacts::drivePower).ifPresent(sum -> sums.put(Result.DRIVE_POWER, sum));
        sum(FeedFacts::driveShare).ifPresent(sum -> sums.put(Result.DRIVE_SHARE, sum));
        sum(FeedFacts::energy).ifPresent(sum -> sums.put(Result.ENERGY, sum));
        return sums;
    }

    /** Nothing where one of the zones does not know its part. */
    private Optional<Estimate> sum(Function<FeedFacts, Deduced<Uncertain>> part) {
        List<Sum.Term> terms = new ArrayList<>(zones.size());
        for (Appraisal appraisal : appraisals) {
            Deduced<Uncertain> number = part.apply(appraisal.today());
            if (!number.isKnown()) {
                return Optional.empty();
            }
            terms.add(new Sum.Term(appraisal.today().zone().sources().tape(), number.get()));
        }
        return terms.isEmpty() ? Optional.empty() : Optional.of(Sum.of(terms));
    }

    /** The zone whose skirts take most power. */
    private OptionalInt leadingZone() {
        int leading = -1;
        double most = Double.NEGATIVE_INFINITY;
        for (int i = 0; i < zones.size(); i++) {
            Deduced<Uncertain> power = appraisals.get(i).today().skirtPower();
            if (power.isKnown() && power.get().value() > most) {
                most = power.get().value();
                leading = i;
            }
        }
        return leading < 0 ? OptionalInt.empty() : OptionalInt.of(leading);
    }

    /** The greatest force of all zones together, where bed and seals of some are known. */
    private static Optional<Component> leading(List<Assessment> zones) {
        Map<Component, Double> forces = new EnumMap<>(Component.class);
        for (Assessment zone : zones) {
            if (zone.get(Result.SKIRT_DRAG).isPresent()) {
                add(forces, Component.BED, zone.get(Result.MATERIAL_DRAG));
                add(forces, Component.SEAL, zone.get(Result.SEAL_DRAG));
                add(forces, Component.LOADING, zone.get(Result.LOADING_FORCE));
            }
        }
        return forces.entrySet().stream().max(Map.Entry.comparingByValue()).map(Map.Entry::getKey);
    }

    private static void add(Map<Component, Double> forces, Component component, Optional<Estimate> force) {
        force.ifPresent(known -> forces.merge(component, known.value(), Double::sum));
    }
}
