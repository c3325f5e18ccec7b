package bedmark.screen.zone;

import bedmark.document.Pointer;
import bedmark.form.Field;
import bedmark.form.Section;
import java.util.List;
import java.util.Optional;

/**
 * One row of the form pane.
 *
 * @param section the part of the form that the row stands in
 * @param field   what it asks for
 * @param place   what the row is about: the field, or one line of its table
 * @param line    the number of the line in a table, from 1
 * @param slots   the cells, from left to right
 * @param growing where the row is the last of a table: the place where one more line goes
 */
public record SlotRow(Section section, Field field, Pointer place, Optional<Integer> line, List<Slot> slots,
                      Optional<Pointer> growing) {
    public SlotRow {
        slots = List.copyOf(slots);
    }
}
