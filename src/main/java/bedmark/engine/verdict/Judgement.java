package bedmark.engine.verdict;

import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.NormalDistribution;
import java.util.Optional;
import java.util.OptionalDouble;

/** Judges what was observed by the limits of its rule. */
public final class Judgement {
    private static final double BY_THE_THRESHOLD = 0.2;
    /** Of the probability at which the level changes. */
    private static final double MARGIN = 0.25;

    private Judgement() {
    }

    /**
     * The finding of one rule: overloaded where it is sure enough that the limit of overload is exceeded, undecided
     * where it may well be, else near or within by the limit of warning.
     *
     * @param observed in the unit of the rule
     * @param limit    in the same unit
     * @param leading  the reading that brings most of the uncertainty
     */
    public static Finding of(Rule rule, Estimate observed, Limit limit, Certainty certainty,
            Optional<String> leading) {
        OptionalDouble overNear = probability(rule.sense(), observed, limit.near());
        OptionalDouble overOverloaded = probability(rule.sense(), observed, limit.overloaded());
        return new Finding(rule, level(overNear, overOverloaded, certainty), observed.value(),
                observed.standardUncertainty(), limit.near(), limit.overloaded(), overNear, overOverloaded,
                limit.source(), limit.assumption(), false, leading);
    }

    /** The same finding by what came of drawing its readings. */
    public static Finding drawn(Finding finding, Chance chance, Certainty certainty) {
        return new Finding(finding.rule(), level(chance.near(), chance.overloaded(), certainty), finding.observed(),
                chance.standardDeviation(), finding.near(), finding.overloaded(), chance.near(), chance.overloaded(),
                finding.source(), finding.assumption(), true, finding.leadingReading());
    }

    /**
     * Whether a finding lies so near to where its level changes that how its number is distributed may decide: the
     * probability of overload about the band of the undecided, or that of the warning about its own threshold.
     */
    public static boolean isDoubtful(Finding finding, Certainty certainty) {
        double over = finding.probabilityOverloaded().orElse(0);
        double near = finding.probabilityNear().orElse(0);
        return over > MARGIN * certainty.undecided() && over < 1 - MARGIN * (1 - certainty.overloaded())
                || Math.abs(near - certainty.near()) < BY_THE_THRESHOLD;
    }

    /** How the observed value stands, taken as certain: overloaded or near beyond the limit of that name. */
    public static Level certain(Rule rule, double observed, OptionalDouble near, OptionalDouble overloaded) {
        return isBeyond(rule.sense(), observed, overloaded) ? Level.OVERLOADED
                : isBeyond(rule.sense(), observed, near) ? Level.NEAR : Level.WITHIN;
    }

    private static boolean isBeyond(Sense sense, double observed, OptionalDouble limit) {
        return limit.isPresent() && (sense == Sense.OVER ? observed > limit.getAsDouble()
                : observed < limit.getAsDouble());
    }

    private static Level level(OptionalDouble overNear, OptionalDouble overOverloaded, Certainty certainty) {
        if (overOverloaded.isPresent() && overOverloaded.getAsDouble() >= certainty.overloaded()) {
            return Level.OVERLOADED;
        }
        if (overOverloaded.isPresent() && overOverloaded.getAsDouble() >= certainty.undecided()) {
            return Level.UNDECIDED;
        }
        return overNear.isPresent() && overNear.getAsDouble() >= certainty.near() ? Level.NEAR : Level.WITHIN;
    }

    private static OptionalDouble probability(Sense sense, Estimate observed, OptionalDouble limit) {
        if (limit.isEmpty()) {
            return limit;
        }
        return OptionalDouble.of(sense == Sense.OVER ? NormalDistribution.over(limit.getAsDouble(), observed)
                : NormalDistribution.under(limit.getAsDouble(), observed));
    }
}
