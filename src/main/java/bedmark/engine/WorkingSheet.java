package bedmark.engine;

import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;
import bedmark.engine.working.Step;
import bedmark.engine.working.Symbol;
import bedmark.engine.working.Working;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/** A working in the making: what is known by its sign, and the steps so far. */
final class WorkingSheet {
    private final Tape tape;
    private final Map<String, Symbol> known = new LinkedHashMap<>();
    private final Map<String, Working.Input> inputs = new LinkedHashMap<>();
    private final List<Step> steps = new ArrayList<>();
    private final Set<String> used = new HashSet<>();

    WorkingSheet(Tape tape) {
        this.tape = tape;
    }

    boolean knows(String sign) {
        return known.containsKey(sign);
    }

    /** Something that was read or registered, where it is known. */
    void input(String sign, Deduced<Uncertain> number, String unit, String pointer) {
        number.value().ifPresent(value -> {
            Estimate estimate = tape.estimate(value);
            input(new Symbol(sign, estimate.value(), unit, Optional.of(pointer)), estimate.standardUncertainty());
        });
    }

    /** A number that is taken as it stands and that nobody read. */
    void constant(String sign, double value, String unit) {
        input(new Symbol(sign, value, unit, Optional.empty()), 0);
    }

    private void input(Symbol symbol, double standardUncertainty) {
        known.put(symbol.sign(), symbol);
        inputs.put(symbol.sign(), new Working.Input(symbol, standardUncertainty));
    }

    /** A result, where it could be computed. */
    void step(String result, Formula formula, Deduced<Uncertain> number, String unit) {
        number.value().ifPresent(value -> step(result, formula, value, unit));
    }

    /** An intermediate number. */
    void step(Formula formula, Uncertain value, String unit) {
        step(formula.code(), formula, value, unit);
    }

    private void step(String result, Formula formula, Uncertain value, String unit) {
        List<Symbol> symbols = new ArrayList<>();
        for (String sign : formula.signs()) {
            Symbol symbol = known.get(sign);
            if (symbol == null) {
                throw new IllegalStateException(formula.code() + " uses " + sign + ", of which nothing is known");
            }
            symbols.add(symbol);
            used.add(sign);
        }
        Estimate estimate = tape.estimate(value);
        Step step = new Step(result, formula, symbols, estimate.value(),
                OptionalDouble.of(estimate.standardUncertainty()), unit);
        steps.add(step);
        known.put(formula.sign(), step.outcome());
    }

    /** All of it; inputs that no step uses are left out. */
    Working working() {
        return new Working(inputs.values().stream().filter(input -> used.contains(input.symbol().sign())).toList(),
                steps);
    }
}
