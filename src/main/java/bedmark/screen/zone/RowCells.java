package bedmark.screen.zone;

import bedmark.document.Pointer;
import bedmark.form.StationsField;
import bedmark.quantity.Quality;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.FieldBox;
import bedmark.screen.part.QualityButton;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Pane;
import javafx.scene.layout.Priority;

/** The boxes of a row as they stand beside each other, with the mark of its reading and the offer to take over. */
final class RowCells {
    private final SlotRow row;
    private final ZoneModel model;
    private final Wording wording;
    private final SlotWords words;
    private final Map<Pointer, FieldBox> boxes = new LinkedHashMap<>();
    private final Optional<QualityButton> quality;
    private final Optional<ActionButton> carry;
    private final Pane pane;

    /** @param marked runs when a person marked the reading */
    RowCells(SlotRow row, ZoneModel model, Wording wording, SlotWords words, Runnable marked) {
        this.row = row;
        this.model = model;
        this.wording = wording;
        this.words = words;
        row.slots().forEach(slot -> boxes.put(slot.where(), box(slot)));
        this.quality = row.slots().stream()
                .filter(slot -> slot instanceof Slot.MeasureSlot measured && measured.markable())
                .findFirst().map(slot -> quality(slot, marked));
        this.carry = CarriedOver.isPlain(row.field().key()) ? Optional.of(carryButton()) : Optional.empty();
        this.pane = laidOut();
    }

    Pane pane() {
        return pane;
    }

    /** The box of the cell at a place, where it is in this row. */
    Optional<FieldBox> at(Pointer where) {
        return Optional.ofNullable(boxes.get(where));
    }

    private String name() {
        String field = row.field().head().label().in(wording.words().language());
        return row.line().map(line -> wording.text("screen.zone.line", line, field)).orElse(field);
    }

    private Pane laidOut() {
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
        carry.ifPresent(line.getChildren()::add);
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

    private QualityButton quality(Slot slot, Runnable marked) {
        QualityButton button = new QualityButton(Quality.MEASURED,
                mark -> wording.text("screen.quality." + mark.code()),
                mark -> {
                    model.activate(slot);
                    model.mark(mark);
                    marked.run();
                });
        button.setId("quality" + slot.where().toString().replace('/', '-'));
        return button;
    }

    /** Shows how the reading is marked; nothing where there is none. */
    void mark(Optional<Quality> mark) {
        quality.ifPresent(button -> {
            // A press turns the button before it is known whether the reading can be marked so.
            button.setVisible(mark.isPresent());
            button.setManaged(mark.isPresent());
            mark.ifPresent(button.qualityProperty()::set);
        });
    }

    /** Shows the offer to take over where it belongs here. */
    void offer() {
        carry.ifPresent(button -> {
            button.setVisible(model.tables().carriesOverAt(row.field().key()));
            button.setManaged(button.isVisible());
        });
    }
}
