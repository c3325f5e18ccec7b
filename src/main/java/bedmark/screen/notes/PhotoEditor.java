package bedmark.screen.notes;

import bedmark.screen.part.ActionButton;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.wording.Wording;
import java.util.List;
import java.util.Optional;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.TextField;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.StackPane;
import javafx.scene.layout.VBox;

/** One photo, large, with its caption. */
final class PhotoEditor extends VBox {
    /** The longer side of the picture (px). */
    static final double SIDE = 640;
    private static final double HEIGHT = 330;

    private final TextField caption = new TextField();
    private final StackPane frame = new StackPane();

    /** What the person decided. */
    interface Outcome {
        /** The caption is as it stands now. */
        void captioned(String text);

        /** The photo does not belong here. */
        void detached();
    }

    /**
     * @param taken when it was taken, in words
     * @param open  whether the survey still takes a change
     */
    PhotoEditor(Wording wording, String before, String taken, boolean open, Outcome outcome) {
        getStyleClass().addAll("questions", "photo-editor");
        SectionHeader header = new SectionHeader(wording.text("notes.photo-title"));
        header.asideProperty().set(taken);
        frame.getStyleClass().add("photo-frame");
        frame.setMinHeight(HEIGHT);
        frame.setPrefHeight(HEIGHT);
        frame.setMaxHeight(HEIGHT);
        caption.setText(before);
        caption.setId("photo-caption");
        caption.setAccessibleText(wording.text("notes.caption"));
        caption.setEditable(open);
        caption.setOnAction(event -> outcome.captioned(caption.getText()));
        Label label = new Label(wording.text("notes.caption"));
        label.setLabelFor(caption);
        VBox question = new VBox(label, caption);
        question.getStyleClass().add("question");
        ActionButton keep = ActionButton.with(Icon.CHECK, ContentDisplay.LEFT, Weight.PRIMARY,
                wording.text("notes.keep-photo"), () -> outcome.captioned(open ? caption.getText() : before));
        keep.setId("photo-keep");
        ActionButton off = ActionButton.with(Icon.CROSS, ContentDisplay.LEFT, Weight.PLAIN,
                wording.text("notes.take-off"), outcome::detached);
        off.setId("photo-detach");
        off.setDisable(!open);
        HBox buttons = new HBox(off, keep);
        buttons.getStyleClass().add("row");
        for (ActionButton button : List.of(off, keep)) {
            button.setMaxWidth(Double.MAX_VALUE);
            button.setPrefWidth(100);
            HBox.setHgrow(button, Priority.ALWAYS);
        }
        getChildren().addAll(header, frame, question, buttons);
    }

    void begin() {
        caption.requestFocus();
        caption.end();
    }

    void show(Optional<Thumbnail> large) {
        large.ifPresent(found -> frame.getChildren().setAll(found.upright(SIDE, HEIGHT)));
    }
}
