package bedmark.screen.start;

import bedmark.index.Store;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Texts;
import bedmark.screen.part.TopBar;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.util.function.Consumer;
import javafx.scene.control.Label;
import javafx.scene.control.PasswordField;
import javafx.scene.control.TextField;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** Asks for the passphrase of a store that is encrypted, and says plainly what a lost one means. */
public final class UnlockView extends BorderPane {
    private static final double WIDEST = 720;

    private final PasswordField hidden = new PasswordField();
    private final TextField shown = new TextField();

    /** @param opened takes the store once it is open */
    public UnlockView(Wording wording, UnlockModel model, Consumer<Store> opened) {
        TopBar bar = new TopBar();
        bar.titleProperty().set(wording.text("screen.name"));
        bar.subtitleProperty().set(wording.text("store.unlock.title"));
        setTop(bar);
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
        VBox asked = new VBox(Texts.wrapped(wording.text("store.unlock.what")), hidden, shown, show, trouble, open,
                working, Texts.wrapped(wording.text("store.unlock.lost")));
        asked.getStyleClass().add("questions");
        asked.setMaxWidth(WIDEST);
        asked.setMaxHeight(Region.USE_PREF_SIZE);
        setCenter(asked);
    }

    /** Where the person types at once. */
    public void focus() {
        hidden.requestFocus();
    }
}
