package bedmark.engine;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Judgement;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Rule;
import java.util.Collection;
import java.util.EnumSet;
import java.util.Optional;
import java.util.Set;

/** Which rules a zone breaks, its numbers taken as they stand, and how badly. */
final class Breaches {
    private static final Rule[] RULES = Rule.values();

    private final Set<Rule> near = EnumSet.noneOf(Rule.class);
    private final Set<Rule> overloaded = EnumSet.noneOf(Rule.class);

    private Breaches() {
    }

    /** Those of a zone as it was judged. */
    static Breaches of(Collection<Finding> findings) {
        Breaches breaches = new Breaches();
        for (Finding finding : findings) {
            breaches.add(finding.rule(), Judgement.certain(finding.rule(), finding.observed(), finding.near(),
                    finding.overloaded()));
        }
        return breaches;
    }

    /**
     * Those of a zone after a change.
     *
     * @param feed        without uncertainty
     * @param touched     the rules that the change may break
     * @param othersShare of the rated power, for the skirts of the conveyor's other zones
     */
    static Breaches of(FeedFacts feed, Set<Rule> touched, double othersShare) {
        Breaches breaches = new Breaches();
        Observations observations = new Observations(feed, feed);
        for (Rule rule : touched) {
            Deduced<Uncertain> observed = observations.of(rule);
            Limit limit = observations.limit(rule);
            if (observed.isKnown() && limit.on()) {
                double own = observed.get().value();
                breaches.add(rule, Judgement.certain(rule, rule == Rule.SKIRTS_OVER_BUDGET ? own + othersShare : own,
                        limit.near(), limit.overloaded()));
            }
        }
        return breaches;
    }

    private void add(Rule rule, Level level) {
        if (level != Level.WITHIN) {
            (level == Level.NEAR ? near : overloaded).add(rule);
        }
    }

    boolean contains(Rule rule) {
        return near.contains(rule) || overloaded.contains(rule);
    }

    /** The first rule that is broken worse there than here. */
    Optional<Rule> worseIn(Breaches other) {
        for (Rule rule : RULES) {
            boolean over = other.overloaded.contains(rule) && !overloaded.contains(rule);
            if (over || other.near.contains(rule) && !contains(rule)) {
                return Optional.of(rule);
            }
        }
        return Optional.empty();
    }
}
