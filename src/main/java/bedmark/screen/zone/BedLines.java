package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.form.StationsField;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.survey.Survey;
import java.util.List;
import java.util.Optional;

/** The table of bed depths as the picture changes it: a line is pulled to a depth, made, or moved along the zone. */
final class BedLines {
    /** Where the table lies. */
    static final Pointer TABLE = Survey.READINGS.child(StationsField.KEY);

    private BedLines() {
    }

    /** Lines of the table. */
    static List<Node> of(Branch document) {
        return document.at(TABLE).filter(Node.Series.class::isInstance).map(node -> ((Node.Series) node).items())
                .orElse(List.of());
    }

    static Pointer depth(int line) {
        return TABLE.child(line).child("depth");
    }

    static Pointer position(int line) {
        return TABLE.child(line).child("position");
    }

    /**
     * The change that sets a line's depth as seen: it starts as estimated.
     *
     * @param line     the number of lines for a new one
     * @param position of a new line
     */
    static Answers.Change pulled(Branch document, int line, Quantity position, Quantity depth) {
        Branch seen = Branch.write(depth.withQuality(Quality.ESTIMATED));
        return line < of(document).size()
                ? Answers.change(document, depth(line), Optional.of(seen))
                : Answers.withLine(document, TABLE, Branch.EMPTY.with("position", position).with("depth", seen));
    }

    /** The change that moves a line along the zone; its depth goes with it. */
    static Answers.Change moved(Branch document, int line, Quantity position) {
        return Answers.change(document, position(line), Optional.of(Branch.write(position)));
    }

    /** The line that a cell stands in. */
    static Optional<Integer> lineOf(Slot slot) {
        return TABLE.holds(slot.where()) && slot.where().tokens().size() > TABLE.tokens().size() + 1
                ? Optional.of(Integer.parseInt(slot.where().tokens().get(TABLE.tokens().size()))) : Optional.empty();
    }
}
