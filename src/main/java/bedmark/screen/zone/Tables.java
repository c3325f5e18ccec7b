package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.quantity.Quantity;
import java.util.Optional;

/** What is done to the tables of a survey as a whole: lines come and go, are pulled on the picture, or taken over. */
public final class Tables {
    private final ZoneModel model;
    private final SurveyInWork work;
    private final Optional<Branch> last;

    Tables(ZoneModel model, SurveyInWork work, Optional<Branch> last) {
        this.model = model;
        this.work = work;
        this.last = last;
    }

    private Branch document() {
        return work.documentProperty().get();
    }

    private int lines(Pointer table) {
        return document().at(table).filter(Node.Series.class::isInstance)
                .map(node -> ((Node.Series) node).items().size()).orElse(0);
    }

    /** Adds a station or a segment behind the last one of a table and makes it active. */
    public void addLine(Pointer table) {
        if (model.keep()) {
            work.change(Answers.withLine(document(), table, Branch.EMPTY));
            model.activate(table.child(lines(table) - 1));
        }
    }

    /** Takes a line out of a table, and makes the one active that then stands in its place. */
    public void removeLine(Pointer line) {
        model.typedProperty().set("");
        Optional<Answers.Change> marks = CarriedOver.withoutLine(document(), line);
        work.change(Answers.withoutLine(document(), line));
        marks.ifPresent(work::change);
        Pointer table = new Pointer(line.tokens().subList(0, line.tokens().size() - 1));
        model.activate(table.child(Math.max(0, Math.min(Integer.parseInt(line.last()), lines(table) - 1))));
    }

    /**
     * Sets the depth of a station as pulled on the picture: it starts as estimated.
     *
     * @param line     the station's index; the number of stations for a new one
     * @param position from the start of the zone, for a new station
     */
    public void pull(int line, Quantity position, Quantity depth) {
        model.typedProperty().set("");
        work.change(BedLines.pulled(document(), line, position, model.typing().stamped(depth)));
        model.activate(BedLines.depth(line));
    }

    /** Moves a station along the zone; its depth goes with it. */
    public void move(int line, Quantity position) {
        model.typedProperty().set("");
        work.change(BedLines.moved(document(), line, position));
        CarriedOver.readAnew(document(), BedLines.position(line)).ifPresent(work::change);
        model.activate(BedLines.position(line));
    }

    /** The survey as it would be with the bed pulled to a depth; nothing is saved. */
    public Branch previewPull(int line, Quantity position, Quantity depth) {
        return BedLines.pulled(document(), line, position, model.typing().stamped(depth)).in(document());
    }

    /** The survey as it would be with a station moved; nothing is saved. */
    public Branch previewMove(int line, Quantity position) {
        return BedLines.moved(document(), line, position).in(document());
    }

    /** Whether the geometry of the last survey can be taken over, and the offer belongs beside the field of that key. */
    boolean carriesOverAt(String key) {
        return work.open() && CarriedOver.firstOpen(document()).filter(key::equals).isPresent()
                && CarriedOver.from(last, document()).isPresent();
    }

    /** Takes the geometry of the last survey over where nothing is answered yet; see {@link CarriedOver}. */
    public void carryOver() {
        if (work.open() && model.keep()) {
            CarriedOver.from(last, document()).ifPresent(copy -> {
                work.change(copy.marks());
                work.change(copy.readings());
                model.activateFirst();
            });
        }
    }
}
