package bedmark.engine.verdict;

import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One rule, judged.
 *
 * @param level                 within, near, undecided or overloaded
 * @param observed              in the unit of the rule
 * @param standardUncertainty   of the observed, in the same unit, with what the disagreement of the drag methods brings
 * @param near                  limit of warning, in the same unit
 * @param overloaded            limit of overload, in the same unit
 * @param probabilityNear       that the true value lies beyond {@code near}
 * @param probabilityOverloaded that it lies beyond {@code overloaded}
 * @param source                mark of the source of the limits
 * @param assumption            whether the limits are an assumption
 * @param drawn                 whether the probabilities were found by drawing (JCGM 101) rather than by the first order
 * @param leadingReading        the reading of this walk that brings the greatest share of the observed's variance
 */
public record Finding(Rule rule, Level level, double observed, double standardUncertainty, OptionalDouble near,
        OptionalDouble overloaded, OptionalDouble probabilityNear, OptionalDouble probabilityOverloaded,
        String source, boolean assumption, boolean drawn, Optional<String> leadingReading) {

    public String code() {
        return rule.code();
    }

    public String unit() {
        return rule.unit();
    }

    /** The code of what to do. */
    public String action() {
        return rule.action();
    }
}
