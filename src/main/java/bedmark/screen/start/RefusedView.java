package bedmark.screen.start;

import bedmark.document.Defect;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Labels;
import bedmark.screen.part.Texts;
import bedmark.screen.part.TopBar;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import javafx.scene.control.Label;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** Says in one sentence why nothing opens: who starts the program by its icon sees no terminal. */
public final class RefusedView extends BorderPane {
    private static final double WIDEST = 720;

    private final ActionButton done;

    /** @param close closes the window */
    public RefusedView(Wording wording, Defect why, Runnable close) {
        TopBar bar = new TopBar();
        bar.titleProperty().set(wording.text("screen.name"));
        setTop(bar);
        Label sentence = Texts.trouble(wording.sentence(why));
        sentence.setId("refusal");
        done = new ActionButton(Weight.PRIMARY, wording.text("arrival.close"), close);
        done.setId("close");
        done.setMaxWidth(Double.MAX_VALUE);
        VBox said = new VBox(Labels.wrapped("card-title", wording.text("screen.not-opened")), sentence, done);
        said.getStyleClass().add("questions");
        said.setMaxWidth(WIDEST);
        said.setMaxHeight(Region.USE_PREF_SIZE);
        setCenter(said);
    }

    /** Lets Enter close it. */
    public void focus() {
        done.requestFocus();
    }
}
