package bedmark.engine.verdict;

import bedmark.engine.uncertainty.Distribution;
import java.util.OptionalDouble;

/**
 * How often a rule was broken when its readings were drawn many times (JCGM 101:2008).
 *
 * @param near              share of the trials beyond the limit of warning, where there is one
 * @param overloaded        share of the trials beyond the limit of overload, where there is one
 * @param standardDeviation of what the rule observes, in its unit
 */
public record Chance(OptionalDouble near, OptionalDouble overloaded, double standardDeviation) {

    /** The chance from what was observed in every trial. */
    public static Chance of(Rule rule, double[] observed, Limit limit) {
        return of(rule, observed, limit.near(), limit.overloaded());
    }

    /** The same by the limits of a finding. */
    public static Chance of(Finding finding, double[] observed) {
        return of(finding.rule(), observed, finding.near(), finding.overloaded());
    }

    private static Chance of(Rule rule, double[] observed, OptionalDouble near, OptionalDouble overloaded) {
        return new Chance(share(rule, observed, near), share(rule, observed, overloaded),
                Distribution.of(observed).standardDeviation());
    }

    private static OptionalDouble share(Rule rule, double[] observed, OptionalDouble limit) {
        if (limit.isEmpty()) {
            return limit;
        }
        int beyond = 0;
        for (double value : observed) {
            if (rule.sense() == Sense.OVER ? value > limit.getAsDouble() : value < limit.getAsDouble()) {
                beyond++;
            }
        }
        return OptionalDouble.of((double) beyond / observed.length);
    }
}
