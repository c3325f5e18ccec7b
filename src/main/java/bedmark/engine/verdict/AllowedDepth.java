package bedmark.engine.verdict;

import java.util.OptionalDouble;

/**
 * The depth at the board that a rule allows (m): the inverse of its limits. For a rule on the root mean square it is
 * the constant depth.
 */
public record AllowedDepth(Rule rule, OptionalDouble near, OptionalDouble overloaded) {
}
