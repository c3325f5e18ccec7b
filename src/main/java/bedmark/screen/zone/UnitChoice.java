package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Pointer;
import bedmark.form.Measure;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.function.UnaryOperator;

/** The unit in which each cell is typed: the one chosen there, else that of its answer, else the person's. */
final class UnitChoice {
    private final Map<Pointer, Unit> chosen = new HashMap<>();
    private UnaryOperator<Unit> liked = UnaryOperator.identity();

    void choose(Slot slot, Unit unit) {
        chosen.put(slot.where(), unit);
    }

    /** The unit of a cell; nothing where it takes no number with a unit. */
    Optional<Unit> of(Slot slot, Branch survey, UnitSystem system) {
        if (!(slot instanceof Slot.MeasureSlot measured)) {
            return Optional.empty();
        }
        return Optional.ofNullable(chosen.get(slot.where()))
                .or(() -> survey.at(slot.where()).flatMap(SlotWords::quantity).map(Quantity::unit)
                        .filter(measured.measure().units()::contains))
                .or(() -> Optional.of(offered(measured.measure(), system)));
    }

    /** The unit that a number is asked in first: the one that the person likes, where the form has it. */
    Unit offered(Measure measure, UnitSystem system) {
        Unit usual = measure.unit(system);
        return Optional.of(liked.apply(usual)).filter(measure.units()::contains).orElse(usual);
    }

    /** Asks first in the unit that the person likes better than a usual one. */
    void like(UnaryOperator<Unit> better) {
        liked = better;
    }
}
