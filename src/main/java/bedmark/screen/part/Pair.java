package bedmark.screen.part;

import java.util.List;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** Two questions beside each other, each as wide as the other. */
public final class Pair extends HBox {

    public Pair(VBox left, VBox right) {
        super(left, right);
        getStyleClass().add("pair");
        for (VBox box : List.of(left, right)) {
            box.setPrefWidth(100);
            HBox.setHgrow(box, Priority.ALWAYS);
        }
    }
}
