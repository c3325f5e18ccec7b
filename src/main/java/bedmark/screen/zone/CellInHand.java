package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.form.Measure;
import bedmark.quantity.BeltState;
import bedmark.quantity.QuantityFormat;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.screen.zone.ZoneModel.InHand;
import java.time.Clock;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.UnaryOperator;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleObjectProperty;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;

/** The cell that is filled in now: what is typed into it, and the unit, number format and belt state it is read by. */
final class CellInHand {
    private final Clock clock;
    private final UnitChoice unitChoice = new UnitChoice();
    private final LastTyping lastTyping = new LastTyping();
    private final ReadOnlyObjectWrapper<InHand> inHand = new ReadOnlyObjectWrapper<>();
    private final StringProperty typed = new SimpleStringProperty("");
    private final ObjectProperty<UnitSystem> units;
    private final ObjectProperty<Locale> locale;
    private final ObjectProperty<Optional<BeltState>> beltState = new SimpleObjectProperty<>(Optional.empty());

    /** @param clock the time that a reading carries */
    CellInHand(Clock clock, UnitSystem units, Locale locale) {
        this.clock = clock;
        this.units = new SimpleObjectProperty<>(units);
        this.locale = new SimpleObjectProperty<>(locale);
    }

    ReadOnlyObjectProperty<InHand> property() {
        return inHand.getReadOnlyProperty();
    }

    StringProperty typedProperty() {
        return typed;
    }

    ObjectProperty<UnitSystem> unitsProperty() {
        return units;
    }

    ObjectProperty<Locale> localeProperty() {
        return locale;
    }

    ObjectProperty<Optional<BeltState>> beltStateProperty() {
        return beltState;
    }

    /** Whether nothing was typed since the cell came to hand. */
    boolean untouched() {
        return typed.get().isEmpty();
    }

    void clear() {
        typed.set("");
    }

    Slot slot() {
        return inHand.get().slot();
    }

    /** Whether that cell is in hand with something typed into it. */
    boolean isTypedInto(Slot slot) {
        return inHand.get() != null && slot.equals(slot()) && !untouched();
    }

    /** Takes a cell to hand, with nothing typed. */
    void take(Slot slot, Branch survey) {
        clear();
        inHand.set(new InHand(slot, unitChoice.of(slot, survey, units.get())));
    }

    /** Shows the same cell in hand once more. */
    void hold() {
        inHand.set(new InHand(slot(), inHand.get().unit()));
    }

    /** The person's units changed: the cell is asked in another one, unless something is typed in the one before. */
    void followUnits(Branch survey) {
        if (untouched()) {
            inHand.set(new InHand(slot(), unitChoice.of(slot(), survey, units.get())));
        }
    }

    void choose(Unit chosen) {
        unitChoice.choose(slot(), chosen);
        inHand.set(new InHand(slot(), Optional.of(chosen)));
    }

    /** The unit after the one in which the cell is typed; nothing where it is no number with a unit. */
    Optional<Unit> nextUnit() {
        if (slot() instanceof Slot.MeasureSlot measured) {
            List<Unit> offered = measured.measure().units();
            return Optional.of(offered.get((offered.indexOf(inHand.get().unit().orElseThrow()) + 1) % offered.size()));
        }
        return Optional.empty();
    }

    Unit offered(Measure measure) {
        return unitChoice.offered(measure, units.get());
    }

    void like(UnaryOperator<Unit> better) {
        unitChoice.like(better);
    }

    /** What is typed keeps its meaning: the decimal sign of the one number format becomes that of the other. */
    void translate(Locale before) {
        char old = new QuantityFormat(before).decimalSign();
        char now = new QuantityFormat(locale.get()).decimalSign();
        if (old != now && !(slot() instanceof Slot.TextSlot)) {
            typed.set(typed.get().replace(old, now));
        }
    }

    Typing typing() {
        return new Typing(locale.get(), clock, beltState.get());
    }

    /**
     * What the typing comes to; nothing while nothing is typed.
     *
     * @param suspect whether the reading that stands in the cell is marked as suspect
     */
    Typing.Read read(boolean suspect) {
        if (untouched()) {
            lastTyping.forget();
            return Typing.Read.NOTHING;
        }
        return lastTyping.read(typing(), inHand.get(), typed.get(), suspect);
    }

    /** What stands in the cell, as the pad edits it. */
    String editable(Optional<Node> answer) {
        return untouched() ? typing().editable(answer, inHand.get().unit()) : typed.get();
    }

    void step(int direction, Optional<Node> answer) {
        typing().stepped(inHand.get(), editable(answer), direction).ifPresent(typed::set);
    }
}
