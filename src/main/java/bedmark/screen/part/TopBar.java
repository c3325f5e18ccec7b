package bedmark.screen.part;

import javafx.beans.property.StringProperty;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.StackPane;

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

    /**
     * Keeps as much room for what is said at the right as these words take: a change of what is said then lays out
     * nothing else. Nothing longer may be said.
     */
    public void keepRoomFor(String words) {
        Label longest = Labels.label("room", words);
        longest.setVisible(false);
        StackPane room = new StackPane(longest);
        room.setAlignment(Pos.CENTER_RIGHT);
        Island island = new Island(room);
        island.setMinWidth(USE_PREF_SIZE);
        // Told and not bound: what is bound has the bar laid out whenever the words change, managed as before or not.
        aside.textProperty().subscribe(said -> {
            island.setManaged(!said.isEmpty());
            island.setVisible(!said.isEmpty());
        });
        getChildren().set(getChildren().indexOf(aside), island);
        room.getChildren().add(aside);
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
