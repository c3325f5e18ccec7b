package bedmark.screen.part;

import java.util.List;
import javafx.scene.control.Label;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** One question with its few answers side by side; the one that holds is pressed in. */
public final class ChoiceRow extends VBox {

    /**
     * One answer.
     *
     * @param id     of its button
     * @param holds  whether it is the answer now
     * @param action what choosing it does
     */
    public record Option(String id, String text, boolean holds, Runnable action) {
    }

    public ChoiceRow(String question, List<Option> options) {
        getStyleClass().add("question");
        HBox row = new HBox();
        row.getStyleClass().add("row");
        for (Option option : options) {
            ToggleButton button = new ToggleButton(option.text());
            button.setId(option.id());
            button.setAccessibleText(question + ": " + option.text());
            button.setSelected(option.holds());
            // An answer is changed by another one, never taken away.
            button.setOnAction(event -> {
                button.setSelected(true);
                option.action().run();
            });
            button.getStyleClass().add("secondary-target");
            button.setMaxWidth(Double.MAX_VALUE);
            button.setPrefWidth(100);
            button.setMinWidth(0);
            button.setWrapText(true);
            HBox.setHgrow(button, Priority.ALWAYS);
            row.getChildren().add(button);
        }
        getChildren().addAll(new Label(question), row);
    }
}
