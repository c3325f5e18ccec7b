package bedmark.screen.zone;

import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.screen.pad.PadText;
import bedmark.screen.part.FieldBox;
import bedmark.screen.part.Judgement;
import bedmark.wording.Wording;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import javafx.scene.control.Label;
import javafx.scene.layout.VBox;

/** One row of the form: its name, the boxes of its cells, the mark of its reading, and below it what is to be said. */
final class RowView extends VBox {
    private final SlotRow row;
    private final ZoneModel model;
    private final Wording wording;
    private final SlotWords words;
    private final RowCells cells;
    private final Label message = new Label();
    private final boolean quiet;
    private Optional<LineButtons> lineButtons = Optional.empty();
    private final Map<Pointer, Face> faces = new HashMap<>();
    private Said said = new Said("", Judgement.NONE);

    /**
     * All that the words in a box are made of, besides what stays as long as the row does: while it is the same, so
     * are they. Whatever a key saves asks each row of the form to show itself anew.
     *
     * @param typed what is being typed into the box; nothing where the pad types elsewhere
     * @param hand  the unit that is typed in; nothing where the pad types elsewhere
     * @param usual the unit that stands in an empty box; nothing where it takes no number with a unit
     */
    private record Face(Optional<Node> answer, boolean active, String typed, Optional<Unit> hand,
                        Optional<Unit> usual) {
    }

    /** @param quiet whether what is to be said is said elsewhere, since large keys take the room */
    RowView(SlotRow row, ZoneModel model, Wording wording, boolean quiet) {
        this.row = row;
        this.model = model;
        this.wording = wording;
        this.quiet = quiet;
        this.words = new SlotWords(wording, model.setting().register());
        this.cells = new RowCells(row, model, wording, words, this::update);
        getStyleClass().add("reading-row");
        message.getStyleClass().addAll("message", "help");
        message.setWrapText(true);
        message.managedProperty().bind(message.visibleProperty());
        message.visibleProperty().bind(message.textProperty().isNotEmpty());
        message.setMinHeight(USE_PREF_SIZE);
        getChildren().addAll(cells.pane(), message);
        if (row.line().isPresent() && model.open()) {
            lineButtons = Optional.of(new LineButtons(row, model, wording));
            lineButtons.ifPresent(getChildren()::add);
        }
        update();
    }

    SlotRow row() {
        return row;
    }

    /** Told when the tablet is turned. */
    void turned(boolean upright) {
        cells.turned(upright);
    }

    /** The active box, where it is in this row. */
    Optional<FieldBox> activeBox() {
        return cells.at(model.active().where());
    }

    /** Shows what the survey holds now. */
    void update() {
        for (Slot slot : row.slots()) {
            update(slot, cells.at(slot.where()).orElseThrow());
        }
        said = saying();
        message.setText(quiet ? "" : said.words());
        said.judgement().dress(message);
        cells.offer();
        lineButtons.ifPresent(LineButtons::update);
    }

    /** What is said below a row, and how. */
    record Said(String words, Judgement judgement) {
    }

    /** What was to be said of the row when it was last shown anew. */
    Said said() {
        return said;
    }

    /** What is to be said of the row: what is wrong or doubtful, else that it was taken over, else how it is read. */
    private Said saying() {
        Optional<Note> note = holdsActive() ? model.noteProperty().get()
                : row.slots().stream().flatMap(slot -> model.impossible(slot).stream()).findFirst();
        if (note.isPresent()) {
            return new Said(sentence(note.get()), judgement(note.get()));
        }
        if (row.slots().stream().anyMatch(model::carriedOver)) {
            return new Said(wording.text("zone.carried-over"), Judgement.NONE);
        }
        return new Said(holdsActive() && row.line().filter(line -> line > 1 || row.slots().size() < 3).isEmpty()
                ? row.field().head().help().map(help -> help.in(wording.words().language())).orElse("") : "",
                Judgement.NONE);
    }

    private void update(Slot slot, FieldBox box) {
        Face face = face(slot);
        if (!face.equals(faces.put(slot.where(), face))) {
            show(slot, box, face);
        }
        box.judgementProperty().set(judged(slot, face.active()));
        box.carriedProperty().set(model.carriedOver(slot));
        if (slot instanceof Slot.MeasureSlot measured && measured.markable()) {
            cells.mark(face.answer().flatMap(SlotWords::quality));
        }
    }

    private Face face(Slot slot) {
        boolean active = slot.equals(model.active());
        return new Face(model.answer(slot), active, active ? model.typedProperty().get() : "",
                active ? model.inHandProperty().get().unit() : Optional.empty(),
                slot instanceof Slot.MeasureSlot measured ? Optional.of(model.offered(measured.measure()))
                        : Optional.empty());
    }

    private void show(Slot slot, FieldBox box, Face face) {
        box.activeProperty().set(face.active());
        Unit unit = unit(slot, face);
        if (!face.typed().isEmpty()) {
            box.valueProperty().set(slot instanceof Slot.TextSlot ? face.typed() : PadText.shown(face.typed()));
            box.unitProperty().set(unit == null ? "" : wording.symbol(unit));
        } else {
            SlotWords.Shown shown = face.active() ? words.shownIn(slot, face.answer(), Optional.ofNullable(unit))
                    : words.shown(slot, face.answer());
            box.valueProperty().set(slot instanceof Slot.MeasureSlot ? PadText.shown(shown.value()) : shown.value());
            box.unitProperty().set(shown.unit().isEmpty() && unit != null ? wording.symbol(unit) : shown.unit());
        }
        box.freshProperty().set(face.active() && face.typed().isEmpty() && !box.valueProperty().get().isEmpty());
        box.ghostProperty().set(row.slots().size() == 1 || slot.where().last().equals("depth")
                ? words.ghost(slot, model.lastAnswer(slot), unit) : "");
    }

    private static Unit unit(Slot slot, Face face) {
        if (!(slot instanceof Slot.MeasureSlot)) {
            return null;
        }
        return face.active() ? face.hand().orElseThrow()
                : face.answer().flatMap(SlotWords::quantity).map(Quantity::unit).or(face::usual).orElseThrow();
    }

    private Judgement judged(Slot slot, boolean active) {
        return (active ? model.noteProperty().get() : model.impossible(slot)).map(RowView::judgement)
                .orElse(Judgement.NONE);
    }

    private static Judgement judgement(Note note) {
        return note.isWrong() ? Judgement.WRONG : Judgement.QUESTIONED;
    }

    private String sentence(Note note) {
        if (note instanceof Note.Judged judged) {
            return wording.sentence(judged.judgement(), judged.field());
        } else if (note instanceof Note.NoNumber none) {
            return wording.sentence(none.reason());
        } else if (note instanceof Note.Gap gap) {
            return wording.text("screen.zone.gap", gap.field().head().label().in(wording.words().language()));
        }
        return wording.text("screen.zone.isolate-first");
    }

    /** Puts the focus on the active box, if it is in this row. */
    void focusActive() {
        activeBox().ifPresent(FieldBox::requestFocus);
    }

    /** Whether the active cell is in this row. */
    boolean holdsActive() {
        return activeBox().isPresent();
    }
}
