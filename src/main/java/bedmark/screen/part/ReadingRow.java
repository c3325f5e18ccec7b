package bedmark.screen.part;

import java.util.Optional;
import javafx.beans.property.StringProperty;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** One reading of a form: what it is, its box, what stands beside the box, below them the message of its judgement. */
public final class ReadingRow extends VBox {
    private final Label message = Labels.wrapped("message", "");
    private final FieldBox box;

    /** How the name of the reading stands to its box. */
    public enum Lead {
        /** Beside it, as a position stands beside its depth. */
        BESIDE,
        /** Above it. */
        ABOVE
    }

    /**
     * @param beside what stands at the right of the box, usually a {@link QualityButton}
     */
    public ReadingRow(String name, Lead lead, FieldBox box, Optional<Node> beside) {
        this.box = box;
        getStyleClass().add("reading-row");
        Label label = Labels.label(lead == Lead.BESIDE ? "lead" : "name", name);
        label.setLabelFor(box);
        HBox row = new HBox();
        row.getStyleClass().add("row");
        row.setAlignment(Pos.CENTER_LEFT);
        if (lead == Lead.BESIDE) {
            row.getChildren().add(label);
        } else {
            getChildren().add(label);
        }
        HBox.setHgrow(box, Priority.ALWAYS);
        row.getChildren().add(box);
        beside.ifPresent(row.getChildren()::add);
        getChildren().addAll(row, message);
        message.managedProperty().bind(message.visibleProperty());
        message.visibleProperty().bind(message.textProperty().isNotEmpty());
        box.judgementProperty().subscribe(judged -> judged.dress(message));
    }

    public FieldBox box() {
        return box;
    }

    /** What is wrong and how to mend it; empty for nothing. */
    public StringProperty messageProperty() {
        return message.textProperty();
    }
}
