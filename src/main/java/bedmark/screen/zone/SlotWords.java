package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.form.Choice;
import bedmark.form.StationsField;
import bedmark.form.TextField;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.quantity.QuantityFormat;
import bedmark.quantity.Unit;
import bedmark.survey.Register;
import bedmark.wording.Wording;
import java.util.List;
import java.util.Optional;

/** What a cell shows: its answer as a number and a unit, or in words. */
final class SlotWords {
    private final Wording wording;
    private final Register register;

    /** What stands in a box. */
    record Shown(String value, String unit) {
        static final Shown NOTHING = new Shown("", "");
    }

    SlotWords(Wording wording, Register register) {
        this.wording = wording;
        this.register = register;
    }

    /** The label of a cell; the method of the depths has the words of its own. */
    String label(Slot slot) {
        if (slot.field() instanceof StationsField && slot instanceof Slot.ChoiceSlot) {
            return wording.text("screen.zone.depth-method");
        }
        return slot.label().in(wording.words().language());
    }

    Shown shown(Slot slot, Optional<Node> answer) {
        return answer.map(node -> shown(slot, node)).orElse(Shown.NOTHING);
    }

    /** The same in the unit that the person types in now, so that switching it shows what the number comes to. */
    Shown shownIn(Slot slot, Optional<Node> answer, Optional<Unit> unit) {
        Optional<Quantity> quantity = answer.flatMap(SlotWords::quantity);
        boolean fits = quantity.isPresent() && unit.filter(wanted -> wanted != quantity.get().unit()
                && wanted.dimension() == quantity.get().unit().dimension()).isPresent();
        return fits ? new Shown(wording.format().in(unit.get(), quantity.get()), wording.symbol(unit.get()))
                : shown(slot, answer);
    }

    private Shown shown(Slot slot, Node node) {
        if (slot instanceof Slot.MeasureSlot) {
            return quantity(node).map(quantity -> new Shown(wording.format().entered(quantity),
                    wording.symbol(quantity.unit()))).orElse(Shown.NOTHING);
        } else if (slot instanceof Slot.CountSlot) {
            return node instanceof Node.Decimal number
                    ? new Shown(wording.format().exact(number.value()), "") : Shown.NOTHING;
        } else if (slot instanceof Slot.FlagSlot) {
            return node instanceof Node.Flag flag
                    ? new Shown(wording.text(flag.value() ? "screen.yes" : "screen.no"), "") : Shown.NOTHING;
        }
        return node instanceof Node.Text text ? new Shown(words(slot, text.value()), "") : Shown.NOTHING;
    }

    /** A choice in words, without what explains it behind a colon; a material by its name. */
    private String words(Slot slot, String code) {
        List<Choice> choices = choices(slot);
        return choices.stream().filter(choice -> choice.code().equals(code)).findFirst()
                .map(choice -> choice.label().in(wording.words().language()).split(": ", 2)[0])
                .orElseGet(() -> isMaterial(slot) && register.materials().containsKey(code)
                        ? register.materials().get(code).name() : code);
    }

    static List<Choice> choices(Slot slot) {
        if (slot instanceof Slot.ChoiceSlot chosen) {
            return chosen.choices();
        }
        return slot instanceof Slot.WaySlot way ? way.choices() : List.of();
    }

    static boolean isMaterial(Slot slot) {
        return slot.field() instanceof TextField text
                && text.offers().filter(TextField.Offer.MATERIALS::equals).isPresent();
    }

    /** What the last survey found, in the unit that is typed now; never a value. */
    String ghost(Slot slot, Optional<Node> last, Unit unit) {
        if (slot instanceof Slot.MeasureSlot) {
            return last.flatMap(SlotWords::quantity).filter(quantity -> quantity.unit().dimension() == unit.dimension())
                    .map(quantity -> wording.text("screen.zone.was", wording.format().in(unit, quantity))).orElse("");
        }
        String words = shown(slot, last).value();
        return words.isEmpty() ? "" : wording.text("screen.zone.was", words);
    }

    static Optional<Quantity> quantity(Node node) {
        try {
            return node instanceof Branch branch ? Optional.of(branch.asQuantity()) : Optional.empty();
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    /** The mark of a reading, where it has one. */
    static Optional<Quality> quality(Node node) {
        return node instanceof Branch branch && branch.has("quality") ? quantity(node).flatMap(Quantity::quality)
                : Optional.empty();
    }

    /** A quantity in its own unit with the symbol. */
    String entered(Quantity quantity) {
        return QuantityFormat.with(wording.format().entered(quantity), quantity.unit(),
                wording.symbol(quantity.unit()));
    }
}
