package bedmark.screen;

import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Weight;
import bedmark.screen.part.TopBar;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** Makes the head of a screen: where the person is and whether all is saved; below it, trouble in words. */
public final class Heads {
    private Heads() {
    }

    /**
     * A head that goes on listening until {@code listening} ends.
     *
     * @param more buttons at the far right
     */
    public static VBox head(Workplace workplace, Listening listening, String title, String subtitle,
                            Node... more) {
        TopBar bar = new TopBar(more);
        bar.titleProperty().set(title);
        bar.subtitleProperty().set(subtitle);
        bar.keepRoomFor(SavedMark.longest(workplace.wording()));
        listening.to(SavedMark.of(workplace), bar.asideProperty()::set);
        VBox head = new VBox(bar);
        listening.to(workplace.scribe().troubleProperty(), defect -> {
            head.getChildren().removeIf(node -> node != bar);
            SavedMark.trouble(workplace).ifPresent(words -> head.getChildren().add(trouble(workplace, words)));
        });
        return head;
    }

    private static HBox trouble(Workplace workplace, String sentence) {
        Label words = new Label(sentence);
        words.setWrapText(true);
        words.setMaxWidth(Double.MAX_VALUE);
        HBox.setHgrow(words, Priority.ALWAYS);
        HBox trouble = new HBox(words, new ActionButton(Weight.PLAIN, workplace.wording().text("screen.try-again"),
                workplace.scribe()::retry));
        trouble.getStyleClass().add("trouble");
        return trouble;
    }
}
