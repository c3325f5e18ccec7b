package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.form.SealsField;
import bedmark.form.StationsField;
import bedmark.quantity.Quantity;
import bedmark.survey.Survey;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;

/**
 * What a person takes over from the last survey, by an act of their own: lengths, boards, the places of the stations,
 * the kinds and lengths of the seals. Never a depth, a speed or the condition of a seal, and never over an answer that
 * is there. Each value stays marked until somebody reads it anew: its place within the readings stands in
 * {@code carriedOver}.
 */
final class CarriedOver {
    /** Where the marks lie. */
    static final Pointer MARKS = Pointer.of("carriedOver");

    private static final List<String> ALONE = List.of("loadingZoneLength", "skirtSpacing", "skirtHeight");
    private static final List<String> OF_STATION = List.of("position");
    private static final List<String> OF_SEAL = List.of("side", "type", "length");

    private CarriedOver() {
    }

    /**
     * What taking over comes to.
     *
     * @param marks    saved first: a value without its mark would pass for a reading
     * @param readings all readings with the values taken over
     */
    record Copy(Answers.Change marks, Answers.Change readings) {
    }

    /** What can be taken over from the last survey; nothing where all of it is answered. */
    static Optional<Copy> from(Optional<Branch> last, Branch document) {
        Branch then = last.flatMap(survey -> survey.at(Survey.READINGS)).filter(Branch.class::isInstance)
                .map(Branch.class::cast).orElse(Branch.EMPTY);
        Branch readings = document.at(Survey.READINGS).filter(Branch.class::isInstance).map(Branch.class::cast)
                .orElse(Branch.EMPTY);
        List<String> marks = new ArrayList<>(marks(document));
        int before = marks.size();
        for (String key : ALONE) {
            Optional<Node> value = readings.has(key) ? Optional.empty() : then.get(key).flatMap(CarriedOver::bare);
            if (value.isPresent()) {
                readings = readings.with(key, value.get());
                marks.add(key);
            }
        }
        readings = table(readings, then, StationsField.KEY, OF_STATION, marks);
        readings = table(readings, then, SealsField.KEY, OF_SEAL, marks);
        return marks.size() == before ? Optional.empty() : Optional.of(new Copy(change(marks),
                new Answers.Change(Survey.READINGS, Optional.of(readings))));
    }

    private static Branch table(Branch readings, Branch then, String key, List<String> columns, List<String> marks) {
        if (!items(readings.get(key)).isEmpty()) {
            return readings;
        }
        List<Node> lines = new ArrayList<>();
        for (Node line : items(then.get(key))) {
            Branch taken = Branch.EMPTY;
            for (String column : columns) {
                Optional<Node> value = line instanceof Branch row ? row.get(column).flatMap(CarriedOver::bare)
                        : Optional.empty();
                if (value.isPresent()) {
                    taken = taken.with(column, value.get());
                    marks.add(key + "/" + lines.size() + "/" + column);
                }
            }
            if (!taken.members().isEmpty()) {
                lines.add(taken);
            }
        }
        return lines.isEmpty() ? readings : readings.with(key, new Node.Series(lines));
    }

    private static List<Node> items(Optional<Node> table) {
        return table.filter(Node.Series.class::isInstance).map(node -> ((Node.Series) node).items()).orElse(List.of());
    }

    /** A value without the time, quality and belt's state of its old reading. */
    private static Optional<Node> bare(Node value) {
        if (!(value instanceof Branch branch)) {
            return Optional.of(value);
        }
        try {
            Quantity read = branch.asQuantity();
            Quantity number = Quantity.of(read.value(), read.unit());
            return Optional.of(Branch.write(read.entered().map(number::enteredAs).orElse(number)));
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    /** Whether the reading of that key is a plain one that can be taken over. */
    static boolean isPlain(String key) {
        return ALONE.contains(key);
    }

    /**
     * The key of the first plain reading that is still to be answered: beside it stands the offer to take over.
     */
    static Optional<String> firstOpen(Branch document) {
        return ALONE.stream().filter(key -> document.at(Survey.READINGS.child(key)).isEmpty()).findFirst();
    }

    /** The marks of a survey. */
    static List<String> marks(Branch document) {
        return items(document.get(MARKS.last())).stream().filter(Node.Text.class::isInstance)
                .map(mark -> ((Node.Text) mark).value()).toList();
    }

    /** Whether the answer of a cell was taken over and not read since. */
    static boolean holds(Branch document, Pointer where) {
        return document.has(MARKS.last()) && mark(where).filter(marks(document)::contains).isPresent()
                && document.at(where).isPresent();
    }

    private static Optional<String> mark(Pointer where) {
        return Survey.READINGS.holds(where) && where.tokens().size() > 1
                ? Optional.of(String.join("/", where.tokens().subList(1, where.tokens().size()))) : Optional.empty();
    }

    /** The change that takes the mark off a cell that was read anew; nothing where it has none. */
    static Optional<Answers.Change> readAnew(Branch document, Pointer where) {
        return mark(where).flatMap(mark -> without(document, one -> one.equals(mark) ? "" : one));
    }

    /** The change that lets the marks follow their lines where one was taken out of a table. */
    static Optional<Answers.Change> withoutLine(Branch document, Pointer line) {
        String table = line.tokens().get(1) + "/";
        int removed = Integer.parseInt(line.last());
        return without(document, mark -> {
            if (!mark.startsWith(table)) {
                return mark;
            }
            String[] parts = mark.split("/", 3);
            int index = Integer.parseInt(parts[1]);
            return index == removed ? "" : index < removed ? mark : table + (index - 1) + "/" + parts[2];
        });
    }

    private static Optional<Answers.Change> without(Branch document, UnaryOperator<String> change) {
        List<String> before = marks(document);
        List<String> after = before.stream().map(change).filter(mark -> !mark.isEmpty()).toList();
        return after.equals(before) ? Optional.empty() : Optional.of(change(after));
    }

    private static Answers.Change change(List<String> marks) {
        return new Answers.Change(MARKS, marks.isEmpty() ? Optional.empty()
                : Optional.of(new Node.Series(marks.stream().<Node>map(Node::text).toList())));
    }
}
