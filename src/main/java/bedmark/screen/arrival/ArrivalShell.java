package bedmark.screen.arrival;

import bedmark.screen.Preferences;
import bedmark.screen.ToolkitLanguage;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.Theme;
import java.time.LocalTime;
import java.util.Locale;
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
        Preferences preferences = model.preferences();
        ToolkitLanguage.set(preferences.locale());
        Theme.applyOffice(scene, preferences.lighting().at(LocalTime.now(model.clock())), density(preferences));
        view.ifPresent(ArrivalView::left);
        ArrivalView shown = new ArrivalView(model, close, toOffice, 
                new HBox(language(preferences), light(preferences)));
        view = Optional.of(shown);
        turn();
        root.setTop(shown.head());
        root.setCenter(shown.body());
        root.setBottom(shown.foot());
    }

    private ActionButton light(Preferences preferences) {
        boolean night = preferences.night();
        ActionButton button = ActionButton.of(night ? Icon.SUN : Icon.MOON, Weight.PLAIN,
                model.wording().text(night ? "screen.start.light.day" : "screen.start.light.night"), () ->
                        model.preferencesProperty().set(model.preferences().withNight(!night)));
        button.setId("light");
        button.getStyleClass().add("secondary-target");
        return button;
    }

    private ActionButton language(Preferences preferences) {
        boolean spanish = preferences.locale().getLanguage().equals("es");
        ActionButton button = new ActionButton(Weight.PLAIN, spanish ? "English" : "Español", () ->
                model.preferencesProperty().set(model.preferences()
                        .withLocale(Locale.forLanguageTag(spanish ? "en" : "es"))));
        button.setId("language");
        button.getStyleClass().add("secondary-target");
        return button;
    }

    private void turn() {
        view.ifPresent(shown -> shown.turned(scene.getHeight() > scene.getWidth()));
    }

    /** Lets go of the screen and of what it shows. */
    public void close() {
        view.ifPresent(ArrivalView::left);
        model.close();
    }
}
