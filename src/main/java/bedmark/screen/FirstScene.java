package bedmark.screen;

import bedmark.screen.part.ActionButton;
import bedmark.screen.part.CautionStrip;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.RoundTicks;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.TopBar;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import bedmark.screen.theme.Light;
import bedmark.screen.theme.Theme;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.Supplier;
import javafx.scene.Node;
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
    /** What a first screen is made of, those first that take longest to be made the first time. */
    static final List<Supplier<Node>> PARTS = List.of(FirstScene::list, FirstScene::side, FirstScene::head,
            FirstScene::foot);

    /** A scene that nobody has dressed yet. */
    static FirstScene plain(double width, double height) {
        BorderPane root = new BorderPane();
        return new FirstScene(new Scene(root, width, height), root);
    }

    /** The same in the person's colours, with its style sheets read. Called by the screen. */
    static FirstScene dressed(Light light, Density density, double width, double height) {
        FirstScene made = plain(width, height);
        Theme.apply(made.scene, light, density);
        made.root.applyCss();
        return made;
    }

    /**
     * Shows a part unseen: what is read and made for it the first time is there when the store is open. Called by the
     * screen.
     */
    void tryOn(Node part) {
        root.setCenter(part);
        root.applyCss();
        root.layout();
        root.getChildren().clear();
    }

    private static Node head() {
        return new TopBar(button());
    }

    private static Node list() {
        ScrollPane scroll = new ScrollPane(stops());
        scroll.setFitToWidth(true);
        scroll.getStyleClass().add("form-scroll");
        VBox list = new VBox(new HBox(new CustomTextField(), new ToggleButton(" ")), scroll);
        list.getStyleClass().add("stops");
        return list;
    }

    private static Node side() {
        VBox side = new VBox(new SectionHeader(" "), new CautionStrip(" "));
        side.getStyleClass().add("summary");
        return side;
    }

    private static Node foot() {
        RoundTicks ticks = new RoundTicks();
        ticks.show(List.of(RoundTicks.Tick.TO_DO), OptionalInt.empty());
        return new FootBar(Optional.of(button()), Optional.of(ticks), Optional.of(button()));
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
