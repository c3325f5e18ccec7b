package bedmark.screen.start;

import bedmark.screen.part.TopBar;
import bedmark.wording.Wording;
import javafx.scene.Node;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** A page before there is a store: a few lines in the middle under the program's name. */
public abstract class LonePage extends BorderPane {
    private static final double WIDEST = 720;

    /** @param subtitle beside the name; may be empty */
    LonePage(Wording wording, String subtitle) {
        TopBar bar = new TopBar();
        bar.titleProperty().set(wording.text("screen.name"));
        bar.subtitleProperty().set(subtitle);
        setTop(bar);
    }

    /** Puts the lines below each other in the middle. */
    void say(Node... lines) {
        VBox said = new VBox(lines);
        said.getStyleClass().add("questions");
        said.setMaxWidth(WIDEST);
        said.setMaxHeight(Region.USE_PREF_SIZE);
        setCenter(said);
    }

    /** Puts the focus where the person goes on. */
    public abstract void focus();
}
