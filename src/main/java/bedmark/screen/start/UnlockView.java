package bedmark.screen.start;

import bedmark.index.Store;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.util.function.Consumer;
import javafx.scene.control.Label;
import javafx.scene.control.PasswordField;
import javafx.scene.control.TextField;
import javafx.scene.control.ToggleButton;

/** Asks for the passphrase of a store that is encrypted, and says plainly what a lost one means. */
public final class UnlockView extends LonePage {
    private final PasswordField hidden = new PasswordField();
    private final TextField shown = new TextField();

    /** @param opened takes the store once it is open */
    public UnlockView(Wording wording, UnlockModel model, Consumer<Store> opened) {
        super(wording, wording.text("store.unlock.title"));
        shown.textProperty().bindBidirectional(hidden.textProperty());
        hidden.setId("passphrase");
        shown.setId("passphrase-shown");
        for (TextField field : new TextField[] {hidden, shown}) {
            field.setPromptText(wording.text("store.passphrase"));
            field.setAccessibleText(wording.text("store.passphrase"));
            field.disableProperty().bind(model.busyProperty());
            field.managedProperty().bind(field.visibleProperty());
            field.setOnAction(event -> model.open(hidden.getText(), opened));
        }
        ToggleButton show = new ToggleButton(wording.text("store.unlock.show"));
        show.setId("show-passphrase");
        show.setMaxWidth(Double.MAX_VALUE);
        shown.visibleProperty().bind(show.selectedProperty());
        hidden.visibleProperty().bind(show.selectedProperty().not());
        ActionButton open = new ActionButton(Weight.PRIMARY, wording.text("store.unlock.open"),
                () -> model.open(hidden.getText(), opened));
        open.setId("unlock");
        open.setMaxWidth(Double.MAX_VALUE);
        open.disableProperty().bind(model.busyProperty().or(hidden.textProperty().isEmpty()));
        Label trouble = Texts.trouble("");
        trouble.setId("unlock-trouble");
        trouble.managedProperty().bind(trouble.visibleProperty());
        trouble.setVisible(false);
        model.troubleProperty().addListener((property, before, now) -> {
            trouble.setVisible(now.isPresent());
            trouble.setText(now.map(wording::sentence).orElse(""));
            hidden.selectAll();
        });
        Label working = Texts.wrapped(wording.text("store.unlock.working"));
        working.visibleProperty().bind(model.busyProperty());
        say(Texts.wrapped(wording.text("store.unlock.what")), hidden, shown, show, trouble, open, working,
                Texts.wrapped(wording.text("store.unlock.lost")));
    }

    /** Where the person types at once. */
    @Override
    public void focus() {
        hidden.requestFocus();
    }
}
