package bedmark.screen.arrival;

import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Labels;
import bedmark.screen.part.Weight;
import javafx.scene.control.ProgressBar;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** Work that takes time: what it is, how far it is, and the button that stops it; away while nothing is done. */
final class WorkPane extends VBox {
    private final ProgressBar bar = new ProgressBar();

    WorkPane(String what, String stop, Runnable stopped) {
        getStyleClass().add("question");
        bar.setMaxWidth(Double.MAX_VALUE);
        bar.setAccessibleText(what);
        HBox.setHgrow(bar, Priority.ALWAYS);
        ActionButton button = new ActionButton(Weight.PLAIN, stop, stopped);
        button.setId("stop");
        HBox line = new HBox(bar, button);
        line.getStyleClass().add("progress");
        getChildren().addAll(Labels.wrapped("words", what), line);
        managedProperty().bind(visibleProperty());
        at(-1);
    }

    /** @param share from 0 to 1; negative while nothing is done */
    void at(double share) {
        setVisible(share >= 0);
        bar.setProgress(Math.max(0, share));
    }
}
