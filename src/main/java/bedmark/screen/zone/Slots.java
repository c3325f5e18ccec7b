package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.form.Choice;
import bedmark.form.ChoiceField;
import bedmark.form.Field;
import bedmark.form.FieldForm;
import bedmark.form.FlagField;
import bedmark.form.NumberField;
import bedmark.form.QuantityField;
import bedmark.form.SealsField;
import bedmark.form.Section;
import bedmark.form.SpeedField;
import bedmark.form.SpeedField.Way;
import bedmark.form.StationsField;
import bedmark.form.TextField;
import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Lays a form out as rows of cells; each kind of field has its one way of doing so. A key changes few answers and
 * seldom any row, so that what was laid out before is kept.
 */
final class Slots {

    /** Lays out one kind of field. */
    @FunctionalInterface
    private interface Layout {
        List<SlotRow> rows(Section section, Field field, Shape shape);
    }

    /** The way of reading the speed that the person chose, where the survey does not tell yet. */
    @FunctionalInterface
    interface Ways {
        Way of(SpeedField field);
    }

    /**
     * All that decides which rows a field has, besides the form.
     *
     * @param lines of a table; none elsewhere
     * @param way   in which the speed is read; nothing elsewhere
     */
    private record Shape(int lines, Optional<Way> way) {
        static Shape of(Field field, Branch survey, Ways ways) {
            int lines = field.answer(survey).filter(Node.Series.class::isInstance)
                    .map(answer -> ((Node.Series) answer).items().size()).orElse(0);
            return new Shape(lines, field instanceof SpeedField speed ? Optional.of(ways.of(speed)) : Optional.empty());
        }
    }

    /** How a field was laid out last. */
    private record Laid(Shape shape, List<SlotRow> rows) {
    }

    private static final Map<Class<? extends Field>, Layout> LAYOUTS = Map.of(
            TextField.class, (section, field, shape) -> one(section, field,
                    new Slot.TextSlot((TextField) field, field.where(), field.head().label())),
            NumberField.class, (section, field, shape) -> one(section, field,
                    new Slot.CountSlot(field, field.where(), field.head().label(), ((NumberField) field).count())),
            QuantityField.class, (section, field, shape) -> one(section, field, new Slot.MeasureSlot(field,
                    field.where(), field.head().label(), ((QuantityField) field).measure(), true)),
            ChoiceField.class, (section, field, shape) -> one(section, field, new Slot.ChoiceSlot(field,
                    field.where(), field.head().label(), ((ChoiceField) field).choices())),
            FlagField.class, (section, field, shape) -> one(section, field,
                    new Slot.FlagSlot(field, field.where(), field.head().label())),
            SpeedField.class, (section, field, shape) -> speed(section, (SpeedField) field, shape.way().orElseThrow()),
            StationsField.class, (section, field, shape) -> stations(section, (StationsField) field, shape.lines()),
            SealsField.class, (section, field, shape) -> seals(section, (SealsField) field, shape.lines()));

    private final FieldForm form;
    private final Map<Field, Laid> laid = new IdentityHashMap<>();
    private List<Laid> shown = List.of();
    private List<SlotRow> rows = List.of();

    Slots(FieldForm form) {
        this.form = form;
    }

    /** The rows of the form as the survey stands; only what the form shows, and the same list where nothing changed. */
    List<SlotRow> rows(Branch survey, Ways ways) {
        List<Laid> now = new ArrayList<>(shown.size());
        for (Section section : form.sections()) {
            for (Field field : section.fields()) {
                if (form.shows(field, survey)) {
                    now.add(laid(section, field, Shape.of(field, survey, ways)));
                }
            }
        }
        if (!now.equals(shown)) {
            shown = now;
            rows = now.stream().flatMap(each -> each.rows().stream()).toList();
        }
        return rows;
    }

    private Laid laid(Section section, Field field, Shape shape) {
        Laid before = laid.get(field);
        if (before != null && before.shape().equals(shape)) {
            return before;
        }
        Laid now = new Laid(shape, LAYOUTS.get(field.getClass()).rows(section, field, shape));
        laid.put(field, now);
        return now;
    }

    private static List<SlotRow> one(Section section, Field field, Slot slot) {
        return List.of(row(section, field, field.where(), slot));
    }

    private static SlotRow row(Section section, Field field, Pointer place, Slot... slots) {
        return new SlotRow(section, field, place, Optional.empty(), List.of(slots), Optional.empty());
    }

    private static List<SlotRow> speed(Section section, SpeedField field, Way way) {
        List<SlotRow> rows = new ArrayList<>();
        List<Choice> choices = List.of(new Choice(Way.DIRECT.key(), field.direct().label()),
                new Choice(Way.TIMED.key(), field.timed().label()),
                new Choice(Way.PULLEY.key(), field.pulley().label()));
        rows.add(row(section, field, field.where().child("way"),
                new Slot.WaySlot(field, field.where().child("way"), field.head().label(), choices)));
        switch (way) {
            case DIRECT -> rows.add(row(section, field, way.where(), new Slot.MeasureSlot(field, way.where(),
                    field.direct().label(), field.direct().speed(), true)));
            case TIMED -> {
                rows.add(part(section, field, way, "beltLength", field.timed().beltLength()));
                rows.add(row(section, field, way.where().child("revolutions"), new Slot.CountSlot(field,
                        way.where().child("revolutions"), field.timed().revolutionsLabel(),
                        field.timed().revolutions())));
                rows.add(part(section, field, way, "elapsed", field.timed().elapsed()));
            }
            case PULLEY -> {
                rows.add(part(section, field, way, "diameter", field.pulley().diameter()));
                rows.add(part(section, field, way, "rotation", field.pulley().rotation()));
            }
        }
        return rows;
    }

    private static SlotRow part(Section section, SpeedField field, Way way, String key, SpeedField.Part part) {
        Pointer where = way.where().child(key);
        return row(section, field, where, new Slot.MeasureSlot(field, where, part.label(), part.measure(), true));
    }

    private static List<SlotRow> stations(Section section, StationsField field, int lines) {
        List<SlotRow> rows = new ArrayList<>();
        rows.add(row(section, field, StationsField.METHOD, new Slot.ChoiceSlot(field, StationsField.METHOD,
                field.head().label(), field.methods())));
        for (int i = 0; i < Math.max(1, lines); i++) {
            Pointer place = field.where().child(i);
            rows.add(new SlotRow(section, field, place, Optional.of(i + 1), List.of(
                    new Slot.MeasureSlot(field, place.child("position"), ZoneTexts.POSITION, field.position(), false),
                    new Slot.MeasureSlot(field, place.child("depth"), ZoneTexts.DEPTH, field.depth(), true)),
                    last(i, lines, field)));
        }
        return rows;
    }

    private static List<SlotRow> seals(Section section, SealsField field, int lines) {
        List<SlotRow> rows = new ArrayList<>();
        for (int i = 0; i < Math.max(1, lines); i++) {
            Pointer place = field.where().child(i);
            rows.add(new SlotRow(section, field, place, Optional.of(i + 1), List.of(
                    new Slot.ChoiceSlot(field, place.child("side"), ZoneTexts.SIDE, field.sides()),
                    new Slot.ChoiceSlot(field, place.child("type"), ZoneTexts.TYPE, field.types()),
                    new Slot.ChoiceSlot(field, place.child("condition"), ZoneTexts.CONDITION, field.conditions()),
                    new Slot.MeasureSlot(field, place.child("length"), ZoneTexts.LENGTH, field.length(), false)),
                    last(i, lines, field)));
        }
        return rows;
    }

    private static Optional<Pointer> last(int line, int lines, Field field) {
        return lines > 0 && line == lines - 1 ? Optional.of(field.where().child(lines)) : Optional.empty();
    }
}
