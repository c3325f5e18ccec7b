package bedmark.screen.notes;

import bedmark.quantity.Dimension;
import bedmark.quantity.NumberEntry;
import bedmark.quantity.Quantity;
import bedmark.quantity.TypedNumber;
import bedmark.quantity.Unit;
import bedmark.screen.pad.NumericPad;
import bedmark.screen.pad.PadCommand;
import bedmark.screen.pad.PadKeyboard;
import bedmark.screen.pad.PadModel;
import bedmark.screen.pad.PadSetup;
import bedmark.screen.pad.PadWords;
import bedmark.screen.part.FieldBox;
import bedmark.screen.part.Judgement;
import bedmark.screen.part.Labels;
import bedmark.survey.PlannedAction;
import bedmark.wording.Wording;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import javafx.beans.property.SimpleBooleanProperty;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** The size of a seal to order: four boxes that the pad types into. */
final class SealBoxes extends VBox {
    private static final int MOST_PIECES = 10_000;

    /** The boxes in their order. */
    private enum Part { WIDTH, THICKNESS, LENGTH, PIECES }

    private final Wording wording;
    private final PadModel pad = new PadModel(this::command);
    private final NumericPad keys;
    private final Map<Part, FieldBox> boxes = new LinkedHashMap<>();
    private final Map<Part, String> typed = new LinkedHashMap<>();
    private final Map<Part, Quantity> held = new LinkedHashMap<>();
    private final Label message = Labels.wrapped("message", "");
    private final Runnable leave;
    private OptionalInt pieces;
    private Part active = Part.WIDTH;

    /** @param leave runs when the last box is left */
    SealBoxes(Wording wording, PlannedAction.SealOrder order, Runnable leave) {
        this.wording = wording;
        this.leave = leave;
        this.pieces = order.pieces();
        order.width().ifPresent(size -> held.put(Part.WIDTH, size));
        order.thickness().ifPresent(size -> held.put(Part.THICKNESS, size));
        order.length().ifPresent(size -> held.put(Part.LENGTH, size));
        keys = new NumericPad(pad, words(), new SimpleBooleanProperty(false));
        getStyleClass().add("seal-boxes");
        HBox row = new HBox();
        row.getStyleClass().add("row");
        for (Part part : Part.values()) {
            String name = name(part);
            FieldBox box = new FieldBox(name, () -> activate(part));
            box.setId("seal-" + code(part));
            box.nameProperty().set(name);
            box.setPrefWidth(100);
            HBox.setHgrow(box, Priority.ALWAYS);
            boxes.put(part, box);
            row.getChildren().add(box);
        }
        message.managedProperty().bind(message.textProperty().isNotEmpty());
        getChildren().addAll(row, message);
        // A size to order has no history of its own.
        Optional.ofNullable(keys.lookup("#pad-history")).ifPresent(key -> key.setVisible(false));
        PadKeyboard.listen(this, pad);
        show();
    }

    /** The keys, for where there is room for them. */
    NumericPad keys() {
        return keys;
    }

    private static String code(Part part) {
        return part.name().toLowerCase(Locale.ROOT);
    }

    private String name(Part part) {
        return switch (part) {
            case WIDTH -> wording.text("notes.seal.width");
            case THICKNESS -> wording.text("notes.seal.thickness");
            case LENGTH -> wording.text("notes.seal.length");
            case PIECES -> wording.text("notes.seal.pieces");
        };
    }

    private PadWords words() {
        return new PadWords(wording.text("screen.pad.back"), wording.text("screen.pad.next"),
                wording.text("zone.history"), wording.text("screen.pad.undo"), wording.text("screen.pad.backspace"),
                wording.text("screen.pad.decimal"), wording.text("screen.pad.fraction"),
                wording.text("screen.pad.sign"), note -> wording.text("screen.pad.note." + note.code()));
    }

    /** Puts the pad at the first box. */
    void begin() {
        boxes.get(Part.WIDTH).requestFocus();
    }

    private Unit unit(Part part) {
        return Optional.ofNullable(held.get(part)).map(Quantity::unit).orElse(part == Part.LENGTH
                ? wording.unit(Dimension.LENGTH) : wording.smallLength());
    }

    private void activate(Part part) {
        active = part;
        pad.open(new PadSetup(wording.format().decimalSign(), false, part != Part.PIECES && unit(part) == Unit.INCH,
                Optional.empty(), Optional.empty()), editable(part));
        show();
    }

    private String editable(Part part) {
        return typed.getOrDefault(part, shown(part));
    }

    private String shown(Part part) {
        if (part == Part.PIECES) {
            return pieces.isPresent() ? Integer.toString(pieces.getAsInt()) : "";
        }
        return Optional.ofNullable(held.get(part)).map(wording.format()::entered).orElse("");
    }

    private void command(PadCommand command) {
        if (command instanceof PadCommand.Typed now) {
            typed.put(active, now.text());
            read(active);
            show();
        } else if (command instanceof PadCommand.WentOn) {
            move(1);
        } else if (command instanceof PadCommand.WentBack) {
            move(-1);
        }
    }

    private void move(int step) {
        List<Part> order = new ArrayList<>(boxes.keySet());
        int next = order.indexOf(active) + step;
        if (next >= order.size()) {
            pad.close();
            leave.run();
        } else if (next >= 0) {
            boxes.get(order.get(next)).requestFocus();
        }
    }

    /** What was typed counts as far as it is a size; what is none is judged, and not kept. */
    private boolean read(Part part) {
        String text = typed.getOrDefault(part, shown(part));
        if (part == Part.PIECES) {
            pieces = OptionalInt.empty();
        } else {
            held.remove(part);
        }
        if (text.isBlank()) {
            return true;
        }
        Unit unit = unit(part);
        NumberEntry entry = new NumberEntry(wording.words().locale());
        TypedNumber number = part == Part.PIECES ? entry.read(text) : entry.read(text, unit);
        if (!(number instanceof TypedNumber.Accepted accepted) || accepted.value().signum() <= 0) {
            return false;
        }
        if (part == Part.PIECES) {
            boolean whole = accepted.value().stripTrailingZeros().scale() <= 0
                    && accepted.value().compareTo(BigDecimal.valueOf(MOST_PIECES)) < 0;
            pieces = whole ? OptionalInt.of(accepted.value().intValueExact()) : OptionalInt.empty();
            return whole;
        }
        held.put(part, accepted.in(unit));
        return true;
    }

    private void show() {
        List<String> wrong = new ArrayList<>();
        boxes.forEach((part, box) -> {
            box.activeProperty().set(part == active && pad.setupProperty().get().isPresent());
            box.valueProperty().set(editable(part));
            box.unitProperty().set(part == Part.PIECES ? "" : wording.symbol(unit(part)));
            boolean fits = !typed.containsKey(part) || read(part);
            box.judgementProperty().set(fits ? Judgement.NONE : Judgement.WRONG);
            if (!fits) {
                wrong.add(name(part));
            }
        });
        message.setText(wrong.isEmpty() ? "" : wording.text("notes.seal.wrong", String.join(", ", wrong)));
    }

    /** The order with the type that was chosen beside it. */
    PlannedAction.SealOrder order(Optional<String> type) {
        return new PlannedAction.SealOrder(type, Optional.ofNullable(held.get(Part.WIDTH)),
                Optional.ofNullable(held.get(Part.THICKNESS)), Optional.ofNullable(held.get(Part.LENGTH)), pieces);
    }
}
