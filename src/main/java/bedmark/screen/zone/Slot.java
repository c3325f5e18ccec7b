package bedmark.screen.zone;

import bedmark.document.Pointer;
import bedmark.form.Choice;
import bedmark.form.Count;
import bedmark.form.Field;
import bedmark.form.Measure;
import bedmark.form.SpeedField;
import bedmark.form.TextField;
import bedmark.form.Texts;
import java.util.List;

/** One cell that a person fills in: a field, or one part of a field that is a table. */
public sealed interface Slot {

    /** The field that the cell belongs to. */
    Field field();

    /** Where in the survey the answer lies; inside a list by its index. */
    Pointer where();

    /** What is asked. */
    Texts label();

    /** A number with a unit; {@code markable} ones carry quality and belt state. */
    record MeasureSlot(Field field, Pointer where, Texts label, Measure measure, boolean markable) implements Slot {
    }

    /** A plain number. */
    record CountSlot(Field field, Pointer where, Texts label, Count count) implements Slot {
    }

    /** One of several words. */
    record ChoiceSlot(Field field, Pointer where, Texts label, List<Choice> choices) implements Slot {
        public ChoiceSlot {
            choices = List.copyOf(choices);
        }
    }

    /** Words of the person's own. */
    record TextSlot(TextField field, Pointer where, Texts label) implements Slot {
    }

    /** Yes or no. */
    record FlagSlot(Field field, Pointer where, Texts label) implements Slot {
    }

    /** The way in which the speed is read, a place of its own; choosing one leads to the cells of that way. */
    record WaySlot(SpeedField field, Pointer where, Texts label, List<Choice> choices) implements Slot {
        public WaySlot {
            choices = List.copyOf(choices);
        }
    }
}
