package bedmark.engine;

import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Traced;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Chance;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Judgement;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.RefusedVerdict;
import bedmark.engine.verdict.Repeat;
import bedmark.engine.verdict.Rule;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Collections;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/** The rules of one zone, judged at one feed. */
final class Findings {
    private static final String OF_THIS_WALK = "/readings/";
    private static final String HOPPER = "hopper-load-outside";
    private static final Rule[] RULES = Rule.values();
    /** What a zone's own depths decide. */
    static final Set<Rule> OF_DEPTHS = Collections.unmodifiableSet(
            EnumSet.of(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN));

    /**
     * The rules of a zone at both feeds.
     *
     * @param atDesign nothing where the zone cannot be judged at design throughput
     */
    record AtFeeds(Findings today, Optional<Findings> atDesign) {

        boolean isDoubtful(Set<Rule> rules) {
            return today.isDoubtful(rules) || atDesign.isPresent() && atDesign.get().isDoubtful(rules);
        }

        /** What was refused at either feed, each once. */
        List<RefusedVerdict> refused() {
            Set<RefusedVerdict> all = new LinkedHashSet<>(today.refused);
            atDesign.ifPresent(design -> all.addAll(design.refused));
            return List.copyOf(all);
        }

        boolean isDrawn() {
            return today.isDrawn() || atDesign.isPresent() && atDesign.get().isDrawn();
        }
    }

    private final Tape tape;
    private final Settings settings;
    private final Map<Rule, Finding> judged = new EnumMap<>(Rule.class);
    private final List<RefusedVerdict> refused = new ArrayList<>();
    private final Map<Rule, Deduced<Uncertain>> numbers = new EnumMap<>(Rule.class);

    private Findings(ZoneFacts zone) {
        tape = zone.sources().tape();
        settings = zone.settings();
    }

    /**
     * Judges every rule at today's feed.
     *
     * @param load the conveyor's, where it is known
     */
    static Findings today(FeedFacts today, Optional<ConveyorLoad> load) {
        Findings findings = new Findings(today.zone());
        Observations observations = new Observations(today, today);
        for (Rule rule : RULES) {
            findings.judge(rule, observations, load);
        }
        return findings;
    }

    /** Judges the rules that change with the feed anew; the others stand as they are today. */
    Findings atDesign(FeedFacts today, FeedFacts design, Optional<ConveyorLoad> load) {
        Findings findings = new Findings(today.zone());
        Observations observations = new Observations(today, design);
        for (Rule rule : RULES) {
            if (Observations.changesWithFeed(rule)) {
                findings.judge(rule, observations, load);
            } else if (judged.containsKey(rule)) {
                findings.judged.put(rule, judged.get(rule));
            }
        }
        return findings;
    }

    private void judge(Rule rule, Observations observations, Optional<ConveyorLoad> load) {
        Deduced<Uncertain> observed = observations.of(rule);
        numbers.put(rule, observed);
        Limit limit = observations.limit(rule);
        if (!limit.on()) {
            return;
        }
        Optional<String> outside = observations.outsideTheMethods(rule);
        if (outside.isPresent()) {
            refused.add(new RefusedVerdict(rule, outside.get()));
            return;
        }
        if (rule == Rule.SKIRTS_OVER_BUDGET) {
            load.ifPresent(sum -> judge(sum, observed, limit));
        } else if (observed.isKnown()) {
            Traced traced = tape.traced(observed.get(), OF_THIS_WALK);
            judged.put(rule, Judgement.of(rule, widened(traced.estimate(), observations.spread(rule)), limit,
                    settings.certainty(), traced.leading()));
        }
    }

    /** A sum that lacks zones, or a hopper's load, can only show that the limit is passed, never that it is kept. */
    private void judge(ConveyorLoad load, Deduced<Uncertain> ownPart, Limit limit) {
        Optional<String> leading = ownPart.value().flatMap(part -> tape.traced(part, OF_THIS_WALK).leading());
        Finding finding = Judgement.of(Rule.SKIRTS_OVER_BUDGET, load.counted(), limit, settings.certainty(), leading);
        if (!load.isLowerBound() || finding.level() != Level.WITHIN) {
            judged.put(Rule.SKIRTS_OVER_BUDGET, finding);
        } else if (load.feeders() > 0) {
            refused.add(new RefusedVerdict(Rule.SKIRTS_OVER_BUDGET, HOPPER));
        }
    }

    private static Estimate widened(Estimate estimate, double spread) {
        return spread == 0 ? estimate
                : new Estimate(estimate.value(), Math.hypot(estimate.standardUncertainty(), spread));
    }

    /** Whether one of the rules is too near to where its level changes for the first order alone. */
    private boolean isDoubtful(Set<Rule> rules) {
        for (Rule rule : rules) {
            if (judged.containsKey(rule) && Judgement.isDoubtful(judged.get(rule), settings.certainty())) {
                return true;
            }
        }
        return false;
    }

    private boolean isDrawn() {
        return judged.values().stream().anyMatch(Finding::drawn);
    }

    /** Judges the rules on the depth by what came of drawing their readings. */
    void draw(DrawnBed bed) {
        for (Rule rule : OF_DEPTHS) {
            if (judged.containsKey(rule)) {
                draw(rule, bed.observed(rule));
            }
        }
    }

    /** Judges a rule by what it observes in every trial. */
    void draw(Rule rule, double[] observed) {
        Finding finding = judged.get(rule);
        if (finding != null) {
            judged.put(rule, Judgement.drawn(finding, Chance.of(finding, observed), settings.certainty()));
        }
    }

    /** Every rule that could be evaluated, once, in their order. */
    List<Finding> all() {
        return List.copyOf(judged.values());
    }

    boolean has(Rule rule) {
        return judged.containsKey(rule);
    }

    /** What was observed, known or not; of what all zones of the conveyor do together this zone's part. */
    Collection<Deduced<Uncertain>> numbers() {
        return numbers.values();
    }

    /** The worst level of all, or that of a zone which lacks a required reading. */
    Level level(boolean lacking) {
        Level level = lacking ? Level.INCOMPLETE : Level.WITHIN;
        for (Finding finding : judged.values()) {
            level = level.or(finding.level());
        }
        return level;
    }

    /**
     * The reading to take again for the first rule which is undecided. What all zones of a conveyor do together may be
     * undecided where this zone's own part is not known yet: there is nothing to take again then, but to take.
     */
    Optional<Repeat> repeat() {
        for (Finding finding : judged.values()) {
            Deduced<Uncertain> number = numbers.get(finding.rule());
            if (finding.level() == Level.UNDECIDED && number.isKnown()) {
                return new Repetition(finding, settings.certainty()).of(tape.sensitivities(number.get()));
            }
        }
        return Optional.empty();
    }

    /** A limit of one rule as it stands for a whole that it is a share of. */
    static OptionalDouble times(OptionalDouble limit, double whole) {
        return limit.isPresent() ? OptionalDouble.of(limit.getAsDouble() * whole) : limit;
    }
}
