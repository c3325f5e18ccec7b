package bedmark.screen.notes;

import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Labels;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.IconView;
import java.util.Optional;
import javafx.geometry.Pos;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.layout.StackPane;
import javafx.scene.layout.VBox;

/** A photo as a button: its thumbnail, upright, and a line below it. */
final class PhotoTile extends StackPane {
    private final StackPane frame = new StackPane(new IconView(Icon.CAMERA));
    private final double width;
    private final double height;

    /**
     * @param line   what stands below it
     * @param name   for who cannot see it
     * @param width  of the picture (px)
     * @param height of the picture (px)
     */
    PhotoTile(String id, String line, String name, double width, double height, Runnable action) {
        this.width = width;
        this.height = height;
        getStyleClass().add("photo-tile");
        frame.getStyleClass().add("photo-frame");
        frame.setMinSize(width, height);
        frame.setPrefSize(width, height);
        frame.setMaxSize(width, height);
        Label words = Labels.label("photo-line", line);
        words.setMaxWidth(width);
        words.setWrapText(true);
        words.setMinHeight(Label.USE_PREF_SIZE);
        VBox content = new VBox(frame, words);
        content.setAlignment(Pos.TOP_CENTER);
        ActionButton button = new ActionButton(Weight.PLAIN, "", action);
        button.setGraphic(content);
        button.setContentDisplay(ContentDisplay.GRAPHIC_ONLY);
        button.setId(id);
        button.setAccessibleText(name);
        setAlignment(Pos.TOP_LEFT);
        getChildren().add(button);
    }

    /** Shows the photo; a tile whose photo can't be shown keeps its camera. */
    void show(Optional<Thumbnail> thumbnail) {
        thumbnail.ifPresent(found -> frame.getChildren().setAll(found.upright(width, height)));
    }
}
