package bedmark.screen.part;

import java.util.List;
import javafx.beans.property.BooleanProperty;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.SimpleBooleanProperty;
import javafx.beans.property.SimpleObjectProperty;
import javafx.beans.property.StringProperty;
import javafx.css.PseudoClass;
import javafx.geometry.Pos;
import javafx.scene.AccessibleRole;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/**
 * The box of a number: value and unit at the left, at the right the ghost of the last survey, which is never a value.
 * Pressing it puts the pad at it; typing goes through the pad.
 */
public final class FieldBox extends HBox {
    private static final PseudoClass ACTIVE = PseudoClass.getPseudoClass("active");
    private static final PseudoClass CARRIED = PseudoClass.getPseudoClass("carried");
    private static final PseudoClass FRESH = PseudoClass.getPseudoClass("fresh");

    private final VBox lines = new VBox();
    private final HBox top = new HBox();
    private final Label name = Labels.label("box-name");
    private final Label value = Labels.label("value");
    private final Label unit = Labels.label("unit");
    private final Label ghost = Labels.label("ghost");
    private final BooleanProperty active = new SimpleBooleanProperty(this, "active");
    private final BooleanProperty carried = new SimpleBooleanProperty(this, "carried");
    private final BooleanProperty fresh = new SimpleBooleanProperty(this, "fresh");
    private final ObjectProperty<Judgement> judgement =
            new SimpleObjectProperty<>(this, "judgement", Judgement.NONE);

    /**
     * @param name   of the field, for who cannot see it
     * @param chosen runs when the field is pressed, or comes into focus while the pad types elsewhere
     */
    public FieldBox(String name, Runnable chosen) {
        getStyleClass().add("field-box");
        setAccessibleRole(AccessibleRole.TEXT_FIELD);
        setAccessibleText(name);
        setFocusTraversable(true);
        Region between = new Region();
        HBox.setHgrow(between, Priority.ALWAYS);
        Region caret = new Region();
        caret.getStyleClass().add("caret");
        caret.visibleProperty().bind(active.and(value.textProperty().isEmpty()));
        caret.managedProperty().bind(caret.visibleProperty());
        HBox row = new HBox(caret, value, unit, between, ghost);
        row.getStyleClass().add("row");
        row.setAlignment(Pos.BASELINE_LEFT);
        top.getStyleClass().add("row");
        Region beside = new Region();
        HBox.setHgrow(beside, Priority.ALWAYS);
        top.getChildren().addAll(this.name, beside);
        lines.getChildren().addAll(top, row);
        lines.setAlignment(Pos.CENTER_LEFT);
        lines.setMinWidth(0);
        top.managedProperty().bind(this.name.textProperty().isNotEmpty());
        setAlignment(Pos.CENTER);
        Island island = new Island(lines);
        HBox.setHgrow(island, Priority.ALWAYS);
        getChildren().add(island);
        setMaxWidth(Double.MAX_VALUE);
        value.setMinWidth(Region.USE_PREF_SIZE);
        value.managedProperty().bind(value.textProperty().isNotEmpty());
        // A value makes its line higher: that alone can change how high the box has to be.
        value.managedProperty().subscribe(shown -> requestLayout());
        unit.setMinWidth(Region.USE_PREF_SIZE);
        active.subscribe(on -> pseudoClassStateChanged(ACTIVE, on));
        carried.subscribe(on -> pseudoClassStateChanged(CARRIED, on));
        fresh.subscribe(on -> pseudoClassStateChanged(FRESH, on));
        judgement.subscribe(judged -> judged.dress(this));
        // Taken here: the list that it stands in would take the focus for itself.
        setOnMousePressed(event -> {
            requestFocus();
            chosen.run();
            event.consume();
        });
        focusedProperty().subscribe(focused -> {
            if (focused && !active.get()) {
                chosen.run();
            }
        });
    }

    /** Puts the ghost beside the name, where the box is too narrow for it beside the value. */
    public FieldBox withGhostAbove() {
        top.getChildren().add(ghost);
        ghost.setMinWidth(Region.USE_PREF_SIZE);
        return this;
    }

    /** Lets the value run over several lines with the ghost below it: it is words and no number. */
    public FieldBox ofWords() {
        getStyleClass().add("words");
        setFillHeight(false);
        lines.setManaged(true);
        HBox.setHgrow(lines, Priority.ALWAYS);
        getChildren().setAll(lines);
        lines.getChildren().add(ghost);
        for (Label label : List.of(value, ghost)) {
            label.setMinHeight(Region.USE_PREF_SIZE);
        }
        ghost.setWrapText(true);
        ghost.managedProperty().bind(ghost.textProperty().isNotEmpty());
        value.setMinWidth(0);
        value.setWrapText(true);
        return this;
    }

    /** The name inside the box, over the value; empty where it stands beside or above the box. */
    public StringProperty nameProperty() {
        return name.textProperty();
    }

    /** What was typed, as typed; empty while the field is. */
    public StringProperty valueProperty() {
        return value.textProperty();
    }

    public StringProperty unitProperty() {
        return unit.textProperty();
    }

    /** What the last survey found, in words. */
    public StringProperty ghostProperty() {
        return ghost.textProperty();
    }

    /** Whether the pad types here. */
    public BooleanProperty activeProperty() {
        return active;
    }

    /** Whether the next digit takes the place of the whole value. */
    public BooleanProperty freshProperty() {
        return fresh;
    }

    /** Whether the value was taken over from the last survey and not read since. */
    public BooleanProperty carriedProperty() {
        return carried;
    }

    public ObjectProperty<Judgement> judgementProperty() {
        return judgement;
    }
}
