package bedmark.screen;

import bedmark.screen.part.ActionButton;
import bedmark.screen.part.CautionStrip;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.RoundTicks;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.TopBar;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import bedmark.screen.theme.Light;
import bedmark.screen.theme.Theme;
import java.time.Clock;
import java.time.LocalTime;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import javafx.scene.Scene;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.VBox;
import org.controlsfx.control.textfield.CustomTextField;

/**
 * The scene of the window, with the pane that each screen is put into.
 *
 * @param root holds head, body and foot
 */
record FirstScene(Scene scene, BorderPane root) {

    /** A scene that nobody has dressed yet. */
    static FirstScene plain(double width, double height) {
        BorderPane root = new BorderPane();
        return new FirstScene(new Scene(root, width, height), root);
    }

    /**
     * A scene in the person's colours that has shown, unseen, the parts that a first screen is made of: what is read
     * and made for them the first time is there when the store is open. Called by the screen.
     */
    static FirstScene ready(Preferences preferences, Clock clock, double width, double height) {
        FirstScene made = plain(width, height);
        Light light = preferences.lighting().at(LocalTime.now(clock));
        Theme.apply(made.scene, light, Shell.density(preferences));
        made.root.setTop(new TopBar(button()));
        ScrollPane scroll = new ScrollPane(stops());
        scroll.setFitToWidth(true);
        scroll.getStyleClass().add("form-scroll");
        VBox listed = new VBox(new HBox(new CustomTextField(), new ToggleButton(" ")), scroll);
        listed.getStyleClass().add("stops");
        made.root.setCenter(listed);
        VBox side = new VBox(new SectionHeader(" "), new CautionStrip(" "));
        side.getStyleClass().add("summary");
        made.root.setRight(side);
        RoundTicks ticks = new RoundTicks();
        ticks.show(List.of(RoundTicks.Tick.TO_DO), OptionalInt.empty());
        made.root.setBottom(new FootBar(Optional.of(button()), Optional.of(ticks), Optional.of(button())));
        made.root.applyCss();
        made.root.layout();
        made.root.getChildren().clear();
        return made;
    }

    private static VBox stops() {
        ActionButton stop = button();
        stop.setGraphic(new HBox(new LevelGlyph(LevelShape.NOT_INSPECTED), new Label(" ")));
        HBox row = new HBox(stop);
        row.getStyleClass().add("row");
        VBox stops = new VBox(row);
        stops.getStyleClass().add("rows");
        return stops;
    }

    private static ActionButton button() {
        return ActionButton.with(Icon.NEXT, ContentDisplay.RIGHT, Weight.PLAIN, " ", () -> { });
    }
}
