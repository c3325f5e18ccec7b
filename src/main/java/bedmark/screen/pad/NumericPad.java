package bedmark.screen.pad;

import bedmark.screen.part.Island;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.IconView;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import javafx.beans.value.ObservableValue;
import javafx.geometry.Pos;
import javafx.scene.control.Button;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.RowConstraints;
import javafx.scene.layout.StackPane;
import javafx.scene.text.TextAlignment;

/**
 * The keys of the pad, as wide and high as there is room: five across and four down, or seven across and three down
 * where the tablet stands upright. Quarters belong to lengths and a sign to what can lie below zero: one place serves
 * both.
 */
public final class NumericPad extends StackPane {
    private static final List<List<PadKey>> ROWS = List.of(
            List.of(PadKey.DIGIT_7, PadKey.DIGIT_8, PadKey.DIGIT_9, PadKey.STEP_DOWN, PadKey.BACKSPACE),
            List.of(PadKey.DIGIT_4, PadKey.DIGIT_5, PadKey.DIGIT_6, PadKey.STEP_UP, PadKey.UNIT),
            List.of(PadKey.DIGIT_1, PadKey.DIGIT_2, PadKey.DIGIT_3, PadKey.FRACTION, PadKey.BACK),
            List.of(PadKey.DIGIT_0, PadKey.DECIMAL, PadKey.HISTORY, PadKey.UNDO, PadKey.NEXT));

    private static final List<List<PadKey>> FLAT = List.of(
            List.of(PadKey.DIGIT_7, PadKey.DIGIT_8, PadKey.DIGIT_9, PadKey.STEP_DOWN, PadKey.STEP_UP, PadKey.UNIT,
                    PadKey.BACKSPACE),
            List.of(PadKey.DIGIT_4, PadKey.DIGIT_5, PadKey.DIGIT_6, PadKey.FRACTION, PadKey.HISTORY, PadKey.UNDO,
                    PadKey.BACK),
            List.of(PadKey.DIGIT_1, PadKey.DIGIT_2, PadKey.DIGIT_3, PadKey.DIGIT_0, PadKey.DECIMAL, PadKey.NEXT));

    private final PadModel model;
    private final PadWords words;
    private final Map<PadKey, Button> keys = new EnumMap<>(PadKey.class);
    /** What stands in the place of each key. */
    private final Map<PadKey, Region> places = new EnumMap<>(PadKey.class);
    private boolean undo;

    private final GridPane grid = new GridPane();

    /** @param undoable whether there is something that can be taken back */
    public NumericPad(PadModel model, PadWords words, ObservableValue<Boolean> undoable) {
        this.model = model;
        this.words = words;
        getStyleClass().add("numeric-pad");
        grid.getStyleClass().add("keys");
        Stream.of(PadKey.values()).forEach(this::key);
        layOut(ROWS);
        getChildren().addAll(new Island(grid), note());
        undoable.subscribe(can -> {
            undo = can;
            offer();
        });
        model.setupProperty().subscribe(setup -> offer());
    }

    /** Told when the tablet is turned. */
    public void turned(boolean portrait) {
        layOut(portrait ? FLAT : ROWS);
    }

    /** A row with fewer keys gives the room to its last one. */
    private void layOut(List<List<PadKey>> rows) {
        grid.getChildren().clear();
        grid.getRowConstraints().clear();
        grid.getColumnConstraints().clear();
        int across = rows.get(0).size();
        for (int row = 0; row < rows.size(); row++) {
            List<PadKey> line = rows.get(row);
            for (int column = 0; column < line.size(); column++) {
                int span = column == line.size() - 1 ? across - column : 1;
                grid.add(places.get(line.get(column)), column, row, span, 1);
                if (line.get(column) == PadKey.FRACTION) {
                    grid.add(places.get(PadKey.SIGN), column, row, span, 1);
                }
            }
            RowConstraints equal = new RowConstraints();
            equal.setPercentHeight(100.0 / rows.size());
            equal.setVgrow(Priority.ALWAYS);
            grid.getRowConstraints().add(equal);
        }
        for (int column = 0; column < across; column++) {
            ColumnConstraints equal = new ColumnConstraints();
            equal.setPercentWidth(100.0 / across);
            grid.getColumnConstraints().add(equal);
        }
    }

    private void key(PadKey key) {
        Button button = new Button();
        button.getStyleClass().addAll("pad-key", key.digit() >= 0 || key == PadKey.DECIMAL ? "figure" : "word");
        button.setId("pad-" + key.name().toLowerCase(Locale.ROOT).replace('_', '-'));
        button.setFocusTraversable(false);
        button.setMaxSize(Double.MAX_VALUE, Double.MAX_VALUE);
        button.setOnAction(event -> model.press(key));
        if (key == PadKey.BACKSPACE || key == PadKey.HISTORY) {
            button.setGraphic(new IconView(key == PadKey.HISTORY ? Icon.HISTORY : Icon.BACKSPACE));
            button.setContentDisplay(ContentDisplay.GRAPHIC_ONLY);
        }
        if (key == PadKey.UNIT) {
            // "short ton/h" takes two lines.
            button.setWrapText(true);
            button.setTextAlignment(TextAlignment.CENTER);
        }
        if (key == PadKey.NEXT) {
            button.getStyleClass().add("primary");
        }
        keys.put(key, button);
        // Each field puts faces of its own on these: that is no matter of the other keys.
        places.put(key, key == PadKey.STEP_DOWN || key == PadKey.STEP_UP || key == PadKey.UNIT ? new Island(button)
                : button);
    }

    /** The refusal, on a plate over the upper edge of the keys, where it covers no face of a key. */
    private Label note() {
        Label note = new Label();
        note.getStyleClass().add("pad-note");
        note.setMouseTransparent(true);
        note.setMaxWidth(Double.MAX_VALUE);
        note.setWrapText(true);
        StackPane.setAlignment(note, Pos.TOP_LEFT);
        note.textProperty().bind(model.noteProperty().map(refusal -> refusal.map(words.note()).orElse("")));
        note.visibleProperty().bind(note.textProperty().isNotEmpty());
        return note;
    }

    /** Puts the faces of the field in hand on the keys, and takes those away that it has no use for. */
    private void offer() {
        Optional<PadSetup> setup = model.setupProperty().get();
        keys.forEach((key, button) -> {
            String face = face(key, setup);
            button.setText(face);
            button.setAccessibleText(name(key, face));
            button.setDisable(!model.offers(key) || key == PadKey.UNDO && !undo);
        });
        boolean sign = model.offers(PadKey.SIGN) && !model.offers(PadKey.FRACTION);
        keys.get(PadKey.SIGN).setVisible(sign);
        keys.get(PadKey.FRACTION).setVisible(!sign);
    }

    private String face(PadKey key, Optional<PadSetup> setup) {
        return switch (key) {
            case DECIMAL -> setup.map(field -> String.valueOf(field.decimalSign())).orElse("");
            case FRACTION -> "¼ ½ ¾";
            case SIGN -> "±";
            case STEP_DOWN -> setup.flatMap(PadSetup::steps).map(PadSetup.Steps::down).orElse("");
            case STEP_UP -> setup.flatMap(PadSetup::steps).map(PadSetup.Steps::up).orElse("");
            case UNIT -> setup.flatMap(PadSetup::units).orElse("");
            case BACKSPACE, HISTORY -> "";
            case UNDO -> words.undo();
            case BACK -> words.back();
            case NEXT -> words.next();
            default -> String.valueOf(key.digit());
        };
    }

    private String name(PadKey key, String face) {
        return switch (key) {
            case DECIMAL -> words.decimal();
            case FRACTION -> words.fraction();
            case SIGN -> words.sign();
            case BACKSPACE -> words.backspace();
            case HISTORY -> words.history();
            default -> face;
        };
    }
}
