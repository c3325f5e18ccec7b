package bedmark.screen.start;

import bedmark.quantity.Unit;
import bedmark.screen.pad.NumericPad;
import bedmark.screen.pad.PadCommand;
import bedmark.screen.pad.PadKeyboard;
import bedmark.screen.pad.PadModel;
import bedmark.screen.pad.PadSetup;
import bedmark.screen.pad.PadWords;
import bedmark.screen.part.FieldBox;
import bedmark.screen.part.Judgement;
import bedmark.screen.start.NewPlantModel.Size;
import bedmark.wording.Wording;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import javafx.beans.property.SimpleBooleanProperty;
import javafx.scene.Node;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;

/** The boxes of a new plant's numbers, which one pad types into. */
final class PlantSizes {
    private final Wording wording;
    private final NewPlantModel model;
    private final PadModel pad = new PadModel(this::command);
    private final NumericPad keys;
    private final Map<Size, FieldBox> boxes = new EnumMap<>(Size.class);
    private final Runnable changed;
    private Size active = Size.WIDTH;

    /**
     * @param form    in which the keyboard types like the pad
     * @param changed runs when a number changed
     */
    PlantSizes(Wording wording, NewPlantModel model, Node form, Runnable changed) {
        this.wording = wording;
        this.model = model;
        this.changed = changed;
        keys = new NumericPad(pad, new PadWords(wording.text("screen.pad.back"), wording.text("screen.pad.next"),
                wording.text("zone.history"), wording.text("screen.pad.undo"), wording.text("screen.pad.backspace"),
                wording.text("screen.pad.decimal"), wording.text("screen.pad.fraction"),
                wording.text("screen.pad.sign"), note -> wording.text("screen.pad.note." + note.code())),
                new SimpleBooleanProperty(false));
        keys.getStyleClass().add("seal-keys");
        // What is typed here for the first time has no history.
        Optional.ofNullable(keys.lookup("#pad-history")).ifPresent(key -> key.setVisible(false));
        for (Size size : Size.values()) {
            String name = name(size);
            FieldBox box = new FieldBox(name, () -> activate(size));
            box.setId("plant-" + code(size));
            box.nameProperty().set(name);
            box.setPrefWidth(100);
            HBox.setHgrow(box, Priority.ALWAYS);
            boxes.put(size, box);
        }
        PadKeyboard.listen(form, pad);
        show();
    }

    static String code(Size size) {
        return size.name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    String name(Size size) {
        return wording.text("first.size." + code(size));
    }

    NumericPad keys() {
        return keys;
    }

    /** Some of the boxes, beside each other. */
    HBox row(Size... sizes) {
        HBox row = new HBox();
        row.getStyleClass().add("row");
        List.of(sizes).forEach(size -> row.getChildren().add(boxes.get(size)));
        return row;
    }

    void focus(Size size) {
        boxes.get(size).requestFocus();
    }

    private void activate(Size size) {
        active = size;
        pad.open(new PadSetup(wording.format().decimalSign(), false, model.unit(size) == Unit.INCH, Optional.empty(),
                Optional.empty()), model.shown(size));
        show();
    }

    private void command(PadCommand command) {
        if (command instanceof PadCommand.Typed now) {
            model.type(active, now.text());
            show();
            changed.run();
        } else if (command instanceof PadCommand.WentOn) {
            move(1);
        } else if (command instanceof PadCommand.WentBack) {
            move(-1);
        }
    }

    private void move(int step) {
        List<Size> asked = boxes.keySet().stream().filter(model::asked).toList();
        int next = asked.indexOf(active) + step;
        if (next >= 0 && next < asked.size()) {
            focus(asked.get(next));
        }
    }

    /** Shows what the model holds. */
    void show() {
        boxes.forEach((size, box) -> {
            box.setDisable(!model.asked(size));
            box.activeProperty().set(size == active && pad.setupProperty().get().isPresent());
            box.valueProperty().set(model.shown(size));
            box.unitProperty().set(wording.symbol(model.unit(size)));
            box.judgementProperty().set(model.fits(size) ? Judgement.NONE : Judgement.WRONG);
        });
    }
}
