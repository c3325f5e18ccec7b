package bedmark.screen.part;

import javafx.beans.property.StringProperty;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;

/** The head of every screen: where the person is, at the right whether everything is saved. */
public final class TopBar extends HBox {
    private final Label title = Labels.label("title");
    private final Label subtitle = Labels.label("subtitle");
    private final Label aside = Labels.label("aside");

    /**
     * @param more quiet buttons at the far right
     */
    public TopBar(Node... more) {
        getStyleClass().add("top-bar");
        setAlignment(Pos.CENTER_LEFT);
        Region between = new Region();
        HBox.setHgrow(between, Priority.ALWAYS);
        title.setMinWidth(USE_PREF_SIZE);
        subtitle.setWrapText(true);
        aside.setMinWidth(USE_PREF_SIZE);
        getChildren().addAll(title, subtitle, between, aside);
        getChildren().addAll(more);
        if (more.length > 0) {
            getStyleClass().add("with-button");
        }
    }

    public StringProperty titleProperty() {
        return title.textProperty();
    }

    public StringProperty subtitleProperty() {
        return subtitle.textProperty();
    }

    public StringProperty asideProperty() {
        return aside.textProperty();
    }
}
