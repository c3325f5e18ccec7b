package bedmark.screen.arrival;

import bedmark.screen.ClockedLight;
import bedmark.screen.LookButtons;
import bedmark.screen.Preferences;
import bedmark.screen.ToolkitLanguage;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import bedmark.screen.theme.Theme;
import java.util.Optional;
import javafx.scene.Scene;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.HBox;

/** The window around what came: dresses it, turns it, and shows it anew in another language or light. */
public final class ArrivalShell {
    private final ArrivalModel model;
    private final Runnable close;
    private final Runnable toOffice;
    private final BorderPane root = new BorderPane();
    private final Scene scene;
    private final ClockedLight light;
    private Optional<ArrivalView> view = Optional.empty();

    /**
     * A window of that size.
     *
     * @param close    closes the window
     * @param toOffice goes on in the office's window
     */
    public ArrivalShell(ArrivalModel model, double width, double height, Runnable close, Runnable toOffice) {
        this.model = model;
        this.close = close;
        this.toOffice = toOffice;
        this.scene = new Scene(root, width, height);
        this.light = new ClockedLight(model.clock(), () -> model.preferences().lighting(), now ->
                Theme.applyOffice(scene, now, density(model.preferences())));
        root.getStyleClass().add("arrival");
        model.preferencesProperty().addListener((property, before, now) -> {
            if (!before.locale().equals(now.locale()) || before.lighting() != now.lighting()
                    || before.dpi() != now.dpi()) {
                show();
            }
        });
        scene.widthProperty().addListener((property, before, now) -> turn());
        scene.heightProperty().addListener((property, before, now) -> turn());
        show();
    }

    public Scene scene() {
        return scene;
    }

    /** What is shown now. */
    ArrivalView view() {
        return view.orElseThrow();
    }

    private static Density density(Preferences preferences) {
        return new Density(preferences.dpi(), Hand.BARE, preferences.text());
    }

    private void show() {
        ToolkitLanguage.set(model.preferences().locale());
        light.dress();
        view.ifPresent(ArrivalView::left);
        ArrivalView shown = new ArrivalView(model, close, toOffice, buttons());
        view = Optional.of(shown);
        turn();
        root.setTop(shown.head());
        root.setCenter(shown.body());
        root.setBottom(shown.foot());
    }

    private HBox buttons() {
        HBox buttons = new HBox(LookButtons.language(model.preferencesProperty()),
                LookButtons.light(model.preferencesProperty()));
        buttons.getChildren().forEach(button -> button.getStyleClass().add("secondary-target"));
        return buttons;
    }

    private void turn() {
        view.ifPresent(shown -> shown.turned(scene.getHeight() > scene.getWidth()));
    }

    /** Lets go of the screen and of what it shows. */
    public void close() {
        light.stop();
        view.ifPresent(ArrivalView::left);
        model.close();
    }
}
