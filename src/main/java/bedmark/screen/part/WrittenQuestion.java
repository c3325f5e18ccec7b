package bedmark.screen.part;

import javafx.scene.control.Label;
import javafx.scene.control.TextField;
import javafx.scene.layout.VBox;

/** A question over the field into which its answer is written. */
public final class WrittenQuestion extends VBox {

    /** @param id of the field, by which it is found on the screen */
    public WrittenQuestion(String id, String question, TextField field) {
        field.setId(id);
        field.setAccessibleText(question);
        field.getStyleClass().add("secondary-target");
        Label label = new Label(question);
        label.setLabelFor(field);
        getChildren().addAll(label, field);
        getStyleClass().add("question");
    }
}
