package bedmark.engine.working;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One formula applied.
 *
 * @param result              key of the number in an assessment, or code of the rule that observes it; the formula's
 *                            code for an intermediate number
 * @param symbols             the numbers put in, in the order of the expression
 * @param value               what the engine computed, in SI
 * @param standardUncertainty in the same unit; nothing where it is taken as it stands
 * @param unit                UCUM code of the SI unit; {@code 1} for a plain number
 */
public record Step(String result, Formula formula, List<Symbol> symbols, double value,
        OptionalDouble standardUncertainty, String unit) {
    public Step {
        symbols = List.copyOf(symbols);
    }

    /** What came out, as it goes into a later step. */
    public Symbol outcome() {
        return new Symbol(formula.sign(), value, unit, Optional.empty());
    }
}
