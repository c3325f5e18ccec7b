package bedmark.form;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import java.math.BigDecimal;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * How a number with a unit is entered and judged.
 *
 * @param dimension what is measured
 * @param metric    the unit offered first in metric units
 * @param us        the unit offered first in US customary units
 * @param steps     the units that can be chosen, in order, each with what one press of plus or minus changes
 * @param plausible outside it a quantity is questioned once
 * @param possible  outside it a quantity is refused
 */
public record Measure(Dimension dimension, Unit metric, Unit us, Map<Unit, BigDecimal> steps,
                      Range<Quantity> plausible, Range<Quantity> possible) {

    public Measure {
        steps = Collections.unmodifiableMap(new LinkedHashMap<>(steps));
        if (!steps.containsKey(metric) || !steps.containsKey(us)) {
            throw new IllegalArgumentException("a unit offered first is not among the units");
        }
        if (!steps.keySet().stream().allMatch(unit -> unit.dimension() == dimension)) {
            throw new IllegalArgumentException("a unit does not measure " + dimension);
        }
    }

    /** The units that can be chosen, in order. */
    public List<Unit> units() {
        return List.copyOf(steps.keySet());
    }

    /** The unit offered first. */
    public Unit unit(UnitSystem system) {
        return system == UnitSystem.METRIC ? metric : us;
    }

    /** What one press of plus or minus changes; one where the unit is not among those of the form. */
    public BigDecimal step(Unit unit) {
        return steps.getOrDefault(unit, BigDecimal.ONE);
    }

    /**
     * Judges an answer.
     *
     * @param where the answer's place in the survey
     * @param last  the answer of the survey before
     */
    public List<Judgement> judge(Pointer where, Node answer, Optional<Node> last) {
        Optional<Quantity> quantity = read(answer);
        if (quantity.isEmpty()) {
            return List.of(Judgement.refusal(where, "answer-of-wrong-kind"));
        }
        if (quantity.get().unit().dimension() != dimension) {
            return List.of(Judgement.refusal(where, "unit-of-wrong-dimension",
                    Node.text(quantity.get().unit().code())));
        }
        return judge(where, quantity.get(), last.flatMap(Measure::read));
    }

    private List<Judgement> judge(Pointer where, Quantity quantity, Optional<Quantity> last) {
        if (possible.isUnder(quantity, Quantity.BY_SIZE)) {
            return List.of(Judgement.refusal(where, possible.excluded() ? "not-above-possible" : "under-possible",
                    show(quantity), show(possible.low().orElseThrow())));
        } else if (possible.isOver(quantity, Quantity.BY_SIZE)) {
            return List.of(Judgement.refusal(where, "over-possible", show(quantity),
                    show(possible.high().orElseThrow())));
        } else if (plausible.isUnder(quantity, Quantity.BY_SIZE)) {
            return List.of(Judgement.doubt(where, "under-plausible", show(quantity),
                    show(plausible.low().orElseThrow())));
        } else if (plausible.isOver(quantity, Quantity.BY_SIZE)) {
            return List.of(Judgement.doubt(where, "over-plausible", show(quantity),
                    show(plausible.high().orElseThrow())));
        }
        return last.filter(before -> before.unit().dimension() == dimension && Suspicion.tenTimesOff(
                        quantity.value(), quantity.unit().convert(before.value(), before.unit())))
                .map(before -> List.of(Judgement.doubt(where, "ten-times-off-last", show(quantity), show(before))))
                .orElse(List.of());
    }

    private static Node show(Quantity quantity) {
        return Branch.write(Quantity.of(quantity.value(), quantity.unit()));
    }

    /** The quantity that a node holds, where it holds one. */
    static Optional<Quantity> read(Node answer) {
        try {
            return answer instanceof Branch branch ? Optional.of(branch.asQuantity()) : Optional.empty();
        } catch (Refused e) {
            return Optional.empty();
        }
    }
}
