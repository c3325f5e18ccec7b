package bedmark.engine.verdict;

import java.util.OptionalDouble;

/**
 * The one reading to take again where a verdict is undecided.
 *
 * @param reading             its name, a JSON Pointer
 * @param rule                the rule that is undecided
 * @param standardUncertainty how good it must be (SI) for the rule to be decided, should it come out as before; nothing
 *                            where even a perfect one would not do, and others would have to be taken again too
 */
public record Repeat(String reading, Rule rule, OptionalDouble standardUncertainty) {
}
