package bedmark.screen.office;

import bedmark.screen.Listening;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.util.Optional;
import javafx.scene.control.Label;
import javafx.scene.control.TextField;
import javafx.scene.input.KeyCode;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.VBox;

/** The office's name beside the way to change it; a new one can be taken back. */
final class OfficeNamePane extends VBox {
    private final Wording wording;
    private final Label told = Texts.wrapped("");
    private final ActionButton save;
    private final ActionButton back;

    OfficeNamePane(OfficeNameModel model, Wording wording, Listening listening) {
        this.wording = wording;
        getStyleClass().add("office-name");
        TextField field = new TextField();
        field.setId("office-name");
        field.textProperty().bindBidirectional(model.typedProperty());
        listening.onEnd(() -> field.textProperty().unbindBidirectional(model.typedProperty()));
        field.setPromptText(wording.text("arrival.nameless"));
        field.setOnAction(event -> model.name());
        field.setOnKeyPressed(event -> {
            if (event.getCode() == KeyCode.ESCAPE) {
                model.leave();
                event.consume();
            }
        });
        Label caption = new Label(wording.text("office.name.caption"));
        caption.getStyleClass().add("caption");
        caption.setLabelFor(field);
        field.setAccessibleText(caption.getText());
        save = new ActionButton(Weight.PLAIN, wording.text("office.name.save"), model::name);
        save.setId("office-name-save");
        back = new ActionButton(Weight.PLAIN, "", model::back);
        back.setId("office-name-back");
        told.setId("office-name-told");
        FlowPane line = new FlowPane(field, save, back);
        line.getStyleClass().add("buttons");
        getChildren().addAll(caption, line, told);
        listening.to(model.typedProperty(), typed -> save.setDisable(!model.differs()));
        listening.to(model.stateProperty(), state -> {
            save.setDisable(!model.differs());
            show(state);
        });
    }

    private void show(OfficeNameModel.State state) {
        Optional<String> before = state.before();
        back.setText(before.map(name -> Wording.plain(wording.text("office.name.back", name))).orElse(""));
        back.setAccessibleText(back.getText());
        back.setVisible(before.isPresent());
        back.setManaged(before.isPresent());
        told.getStyleClass().setAll("label", state.refused().isPresent() ? "trouble-text" : "soft");
        told.setText(state.refused().map(wording::sentence).orElse(before.isEmpty() ? ""
                : wording.text("office.name.from-now", state.name())));
        told.setManaged(!told.getText().isEmpty());
    }
}
