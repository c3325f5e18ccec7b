package bedmark.screen.pad;

import java.util.Objects;
import java.util.Optional;
import java.util.function.Consumer;
import javafx.beans.binding.Bindings;
import javafx.beans.binding.StringBinding;
import javafx.beans.property.ReadOnlyBooleanProperty;
import javafx.beans.property.ReadOnlyBooleanWrapper;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.ReadOnlyStringProperty;
import javafx.beans.property.ReadOnlyStringWrapper;

/**
 * Edits the text of the field in hand, key by key, and says what changed. While a field is <em>fresh</em> its first
 * digit takes the place of the whole number, and any other key works on the number that is there.
 */
public final class PadModel {
    private final Consumer<PadCommand> commands;
    private final ReadOnlyObjectWrapper<Optional<PadSetup>> setup =
            new ReadOnlyObjectWrapper<>(this, "setup", Optional.empty());
    private final ReadOnlyStringWrapper text = new ReadOnlyStringWrapper(this, "text", "");
    private final ReadOnlyBooleanWrapper fresh = new ReadOnlyBooleanWrapper(this, "fresh", false);
    private final ReadOnlyObjectWrapper<Optional<PadNote>> note =
            new ReadOnlyObjectWrapper<>(this, "note", Optional.empty());
    private final StringBinding shown = Bindings.createStringBinding(() -> PadText.shown(text.get()), text);

    /** @param commands told what the person wants, on the thread of the key */
    public PadModel(Consumer<PadCommand> commands) {
        this.commands = Objects.requireNonNull(commands);
    }

    /** Takes a field in hand whose number nobody has begun to change. */
    public void open(PadSetup field, String current) {
        open(field, current, true);
    }

    /**
     * Takes a field in hand.
     *
     * @param untouched false where the person is in the middle of the number: the next digit then goes on with it
     */
    public void open(PadSetup field, String current, boolean untouched) {
        setup.set(Optional.of(field));
        text.set(current);
        fresh.set(untouched);
        note.set(Optional.empty());
    }

    /** Lets go of the field: no key does anything until the next one is opened. */
    public void close() {
        setup.set(Optional.empty());
        text.set("");
        fresh.set(false);
        note.set(Optional.empty());
    }

    /** Takes over a number that came from elsewhere: a step, an undo, the picture, the other unit. */
    public void take(String current) {
        text.set(current);
        fresh.set(true);
        note.set(Optional.empty());
    }

    /** Presses a key; one that the field does not offer does nothing. */
    public void press(PadKey key) {
        if (!offers(key)) {
            return;
        }
        note.set(Optional.empty());
        switch (key) {
            case DECIMAL -> edit(PadText.decimal(editable(), setup.get().orElseThrow().decimalSign()));
            case FRACTION -> edit(PadText.fraction(text.get()));
            case SIGN -> edit(PadText.turned(text.get()));
            case BACKSPACE -> edit(PadText.backspace(text.get()));
            case STEP_DOWN -> commands.accept(new PadCommand.Stepped(-1));
            case STEP_UP -> commands.accept(new PadCommand.Stepped(1));
            case UNIT -> commands.accept(new PadCommand.UnitSwitched());
            case HISTORY -> commands.accept(new PadCommand.HistoryAsked());
            case UNDO -> commands.accept(new PadCommand.Undone());
            case BACK -> commands.accept(new PadCommand.WentBack());
            case NEXT -> commands.accept(new PadCommand.WentOn());
            default -> edit(PadText.digit(editable(), key.digit()));
        }
    }

    /** A point or a comma from a keyboard: the comma where the locale writes a point is refused, not guessed at. */
    public void pressSign(char sign) {
        if (setup.get().isPresent() && sign == ',' && setup.get().get().decimalSign() != ',') {
            note.set(Optional.of(PadNote.OTHER_DECIMAL_SIGN));
        } else {
            press(PadKey.DECIMAL);
        }
    }

    /** Whether the field in hand can make use of a key. */
    public boolean offers(PadKey key) {
        return setup.get().map(field -> field.offers(key)).orElse(false);
    }

    /** What the pad offers now; nothing while no field is in hand. */
    public ReadOnlyObjectProperty<Optional<PadSetup>> setupProperty() {
        return setup.getReadOnlyProperty();
    }

    /** The text for who reads the number. */
    public ReadOnlyStringProperty textProperty() {
        return text.getReadOnlyProperty();
    }

    /** The text for the person's eye. */
    public StringBinding shownBinding() {
        return shown;
    }

    public ReadOnlyBooleanProperty freshProperty() {
        return fresh.getReadOnlyProperty();
    }

    /** Why the last key was refused. */
    public ReadOnlyObjectProperty<Optional<PadNote>> noteProperty() {
        return note.getReadOnlyProperty();
    }

    private String editable() {
        return fresh.get() ? "" : text.get();
    }

    private void edit(PadText.Outcome outcome) {
        if (outcome instanceof PadText.Outcome.Refused refused) {
            note.set(Optional.of(refused.note()));
        } else if (outcome instanceof PadText.Outcome.Changed changed) {
            fresh.set(false);
            if (!changed.text().equals(text.get())) {
                text.set(changed.text());
                commands.accept(new PadCommand.Typed(changed.text()));
            }
        }
    }
}
