package bedmark.screen.part;

import java.util.Optional;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.StackPane;

/** The foot of every screen: the way back at the left, the one way on at the right, what orders the walk between. */
public final class FootBar extends HBox {

    public FootBar(Optional<Button> back, Optional<Node> middle, Optional<Button> onward) {
        getStyleClass().add("foot-bar");
        setAlignment(Pos.CENTER_LEFT);
        StackPane centre = new StackPane();
        centre.getStyleClass().add("middle");
        HBox.setHgrow(centre, Priority.ALWAYS);
        centre.setMinWidth(0);
        middle.ifPresent(centre.getChildren()::add);
        back.ifPresent(getChildren()::add);
        getChildren().add(centre);
        onward.ifPresent(getChildren()::add);
        onward.ifPresent(button -> button.getStyleClass().add("onward"));
        getChildren().forEach(child -> {
            if (child instanceof Button button) {
                button.setMaxHeight(Double.MAX_VALUE);
                button.setMinWidth(USE_PREF_SIZE);
            }
        });
    }
}
