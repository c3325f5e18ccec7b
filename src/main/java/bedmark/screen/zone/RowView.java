package bedmark.screen.zone;

import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.form.StationsField;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.screen.pad.PadText;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.FieldBox;
import bedmark.screen.part.Judgement;
import bedmark.screen.part.QualityButton;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javafx.scene.control.Label;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** One row of the form: its name, the boxes of its cells, the mark of its reading, and below it what is to be said. */
final class RowView extends VBox {
    private final SlotRow row;
    private final ZoneModel model;
    private final Wording wording;
    private final SlotWords words;
    private final Map<Pointer, FieldBox> boxes = new LinkedHashMap<>();
    private final Label message = new Label();
    private final boolean quiet;
    private Optional<QualityButton> quality = Optional.empty();
    private Optional<ActionButton> carry = Optional.empty();
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
        getStyleClass().add("reading-row");
        message.getStyleClass().addAll("message", "help");
        message.setWrapText(true);
        message.managedProperty().bind(message.visibleProperty());
        message.visibleProperty().bind(message.textProperty().isNotEmpty());
        message.setMinHeight(USE_PREF_SIZE);
        getChildren().addAll(cells(), message);
        if (row.line().isPresent() && model.open()) {
            lineButtons = Optional.of(new LineButtons(row, model, wording));
            lineButtons.ifPresent(getChildren()::add);
        }
        update();
    }

    SlotRow row() {
        return row;
    }

    private String name() {
        String field = row.field().head().label().in(wording.words().language());
        return row.line().map(line -> wording.text("screen.zone.line", line, field)).orElse(field);
    }

    private javafx.scene.Node cells() {
        row.slots().forEach(slot -> boxes.put(slot.where(), box(slot)));
        quality = row.slots().stream().filter(slot -> slot instanceof Slot.MeasureSlot measured && measured.markable())
                .findFirst().map(this::quality);
        List<FieldBox> cells = new ArrayList<>(boxes.values());
        if (cells.size() == 4) {
            GridPane grid = new GridPane();
            grid.getStyleClass().add("cells");
            cells.forEach(cell -> {
                GridPane.setHgrow(cell, Priority.ALWAYS);
                cell.setPrefWidth(100);
            });
            grid.getChildren().addAll(cells);
            turned(false);
            return grid;
        }
        HBox line = new HBox();
        line.getStyleClass().add("row");
        cells.forEach(cell -> HBox.setHgrow(cell, Priority.ALWAYS));
        if (cells.size() == 2) {
            cells.get(1).withGhostAbove();
            cells.get(0).getStyleClass().add("narrow");
            HBox.setHgrow(cells.get(0), Priority.NEVER);
        }
        line.getChildren().addAll(cells);
        quality.ifPresent(line.getChildren()::add);
        if (CarriedOver.isPlain(row.field().key())) {
            carry = Optional.of(carryButton());
            carry.ifPresent(line.getChildren()::add);
        }
        return line;
    }

    /** Takes the geometry of the last survey over: an act of its own, beside the first thing that it fills in. */
    private ActionButton carryButton() {
        ActionButton button = new ActionButton(Weight.PLAIN, wording.text("zone.carry-over"),
                model.tables()::carryOver);
        button.setId("carry-over");
        button.getStyleClass().add("beside");
        button.setMinWidth(0);
        return button;
    }

    /** Four cells stand two by two, or side by side where the tablet stands upright. */
    void turned(boolean upright) {
        int across = upright ? 4 : 2;
        int place = 0;
        for (FieldBox cell : boxes.size() == 4 ? boxes.values() : List.<FieldBox>of()) {
            GridPane.setConstraints(cell, place % across, place / across);
            place++;
        }
    }

    private FieldBox box(Slot slot) {
        FieldBox box = new FieldBox(name() + ", " + words.label(slot), () -> model.activate(slot));
        box.nameProperty().set(boxName(slot));
        box.setId("slot" + slot.where().toString().replace('/', '-'));
        if (!(slot instanceof Slot.MeasureSlot || slot instanceof Slot.CountSlot)) {
            box.ofWords();
        }
        return box;
    }

    /** A narrow box has no room for more than the number of its line and one word. */
    private String boxName(Slot slot) {
        if (row.line().isEmpty() || slot != row.slots().get(0)) {
            return words.label(slot);
        }
        return row.field() instanceof StationsField ? wording.text("screen.zone.station", row.line().get())
                : wording.text("screen.zone.line", row.line().get(), words.label(slot));
    }

    /** The active box, where it is in this row. */
    Optional<FieldBox> activeBox() {
        return Optional.ofNullable(boxes.get(model.active().where()));
    }

    private QualityButton quality(Slot slot) {
        QualityButton button = new QualityButton(Quality.MEASURED,
                mark -> wording.text("screen.quality." + mark.code()),
                mark -> {
                    model.activate(slot);
                    model.mark(mark);
                    update();
                });
        button.setId("quality" + slot.where().toString().replace('/', '-'));
        return button;
    }

    /** Shows what the survey holds now. */
    void update() {
        for (Slot slot : row.slots()) {
            update(slot, boxes.get(slot.where()));
        }
        said = saying();
        message.setText(quiet ? "" : said.words());
        said.judgement().dress(message);
        carry.ifPresent(button -> {
            button.setVisible(model.tables().carriesOverAt(row.field().key()));
            button.setManaged(button.isVisible());
        });
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
        quality.filter(button -> slot instanceof Slot.MeasureSlot measured && measured.markable()).ifPresent(button -> {
            // A press turns the button before it is known whether the reading can be marked so.
            Optional<Quality> mark = face.answer().flatMap(SlotWords::quality);
            button.setVisible(mark.isPresent());
            button.setManaged(mark.isPresent());
            mark.ifPresent(button.qualityProperty()::set);
        });
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
        return boxes.containsKey(model.active().where());
    }
}
