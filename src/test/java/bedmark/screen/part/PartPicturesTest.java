package bedmark.screen.part;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.picture.Sketches;
import bedmark.picture.Snap;
import bedmark.quantity.Quality;
import bedmark.screen.Glass;
import bedmark.screen.pad.NumericPad;
import bedmark.screen.pad.PadKey;
import bedmark.screen.pad.PadModel;
import bedmark.screen.pad.PadSetup;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.IconView;
import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import bedmark.screen.theme.Light;
import bedmark.screen.zone.Grip;
import bedmark.screen.zone.PullListener;
import bedmark.screen.zone.ZonePictureView;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import javafx.beans.property.SimpleBooleanProperty;
import javafx.geometry.Bounds;
import javafx.geometry.Insets;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.Parent;
import javafx.scene.Scene;
import javafx.scene.control.CheckBox;
import javafx.scene.control.ComboBox;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.Labeled;
import javafx.scene.control.ListView;
import javafx.scene.control.ProgressBar;
import javafx.scene.control.TextField;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;
import javafx.scene.text.Text;
import org.junit.jupiter.api.Test;

/** Draws the parts, and a transfer point composed of them, for looking at. */
class PartPicturesTest {
    private static final PullListener NOBODY = new PullListener() {
        @Override
        public void touched(int station) {
        }

        @Override
        public void pulled(Grip grip, Snap.Stepped depth, Phase phase) {
        }

        @Override
        public void moved(int station, Snap.Stepped position, Phase phase) {
        }

        @Override
        public void sped(double forward) {
        }
    };

    private static NumericPad pad(PadSetup setup, String text, PadKey... keys) {
        PadModel model = new PadModel(command -> { });
        NumericPad pad = new NumericPad(model, Samples.WORDS, new SimpleBooleanProperty(true));
        model.open(setup, text);
        for (PadKey key : keys) {
            model.press(key);
        }
        return pad;
    }

    private static TopBar top() {
        TopBar bar = new TopBar();
        bar.titleProperty().set("TP-08");
        bar.subtitleProperty().set("Pit conveyor 4 onto stacker feed · bank gravel");
        bar.asideProperty().set("saved 10:42:07");
        return bar;
    }

    private static FootBar foot() {
        return new FootBar(Optional.of(ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.QUIET, "TP-07",
                () -> { })), Optional.of(Samples.ticks(24)), Optional.of(ActionButton.with(Icon.NEXT,
                ContentDisplay.RIGHT, Weight.PRIMARY, "Done, on to TP-09", () -> { })));
    }

    private static VBox result(double pictureHeight) {
        ZonePictureView view = new ZonePictureView(Sketches.gravel(), Density.standard(), NOBODY);
        view.setPrefHeight(pictureHeight);
        VerdictBlock verdict = new VerdictBlock(List.of(new ActionButton(Weight.PLAIN, "Show the working",
                () -> { })));
        verdict.show(Samples.OVERLOADED);
        VBox pane = new VBox(view, verdict);
        pane.setSpacing(12);
        VBox.setVgrow(view, Priority.ALWAYS);
        return pane;
    }

    private static SectionHeader header() {
        SectionHeader header = new SectionHeader("Bed depth at the board");
        header.asideProperty().set("station 3 of 4");
        return header;
    }

    private static Parent landscape(Hand hand) {
        NumericPad pad = pad(Samples.MILLIMETRES, "262");
        VBox form = hand == Hand.BARE
                ? new VBox(header(), Samples.depth("2.2 m", "205", "was 121", Quality.MEASURED, false),
                        Samples.depth("4.0 m", "262", "was 142", Quality.ESTIMATED, true),
                        new CautionStrip("Belt running: sight only, from outside the guards"), pad)
                : new VBox(Samples.depth("4.0 m", "262", "was 142", Quality.ESTIMATED, true),
                        new CautionStrip("Belt running: sight only, from outside the guards"), pad);
        VBox.setVgrow(pad, Priority.ALWAYS);
        form.setSpacing(hand == Hand.BARE ? 7 : 4);
        form.setPadding(hand == Hand.BARE ? new Insets(8, 16, 8, 16) : new Insets(5, 16, 5, 16));
        form.setPrefWidth(471);
        form.setStyle("-fx-border-color: transparent -bm-line transparent transparent; -fx-border-width: 0 1px 0 0;");
        VBox result = result(380);
        result.setPadding(new Insets(12, 20, 10, 20));
        BorderPane pane = new BorderPane(result, top(), null, foot(), form);
        BorderPane.setAlignment(form, Pos.TOP_LEFT);
        return pane;
    }

    private static Parent portrait() {
        VBox result = result(330);
        result.setPadding(new Insets(12, 20, 4, 20));
        VBox.setVgrow(result, Priority.ALWAYS);
        NumericPad pad = pad(Samples.MILLIMETRES, "262");
        VBox form = new VBox(header(), Samples.depth("4.0 m", "262", "was 142", Quality.ESTIMATED, true),
                new CautionStrip("Belt running: sight only, from outside the guards"), pad);
        form.setSpacing(8);
        form.setPadding(new Insets(8, 16, 8, 16));
        VBox middle = new VBox(result, form);
        return new BorderPane(middle, top(), null, foot(), null);
    }

    private static Parent gallery() {
        HBox levels = new HBox(16);
        for (LevelShape level : LevelShape.values()) {
            levels.getChildren().add(new VBox(6, new LevelGlyph(level), new Label(level.styleClass())));
        }
        FlowPane icons = new FlowPane(14, 14);
        for (Icon icon : Icon.values()) {
            icons.getChildren().add(new IconView(icon));
        }
        ActionButton off = new ActionButton(Weight.PRIMARY, "Complete", () -> { });
        off.setDisable(true);
        HBox buttons = new HBox(10, new ActionButton(Weight.PRIMARY, "Complete", () -> { }),
                new ActionButton(Weight.PLAIN, "Skip, with a reason", () -> { }),
                new ActionButton(Weight.QUIET, "Later", () -> { }), off,
                ActionButton.of(Icon.CAMERA, Weight.PLAIN, "photos", () -> { }),
                ActionButton.with(Icon.EXPORT, ContentDisplay.LEFT, Weight.PLAIN, "Export", () -> { }));
        HBox plates = new HBox(10, new Plate(Plate.Tone.PLAIN, "262 mm"), new Plate(Plate.Tone.OVER, "due today"),
                new Plate(Plate.Tone.FAINT, "not inspected"));
        ReadingRow fresh = Samples.depth("2.2 m", "205", "was 121", Quality.MEASURED, true);
        fresh.box().freshProperty().set(true);
        ReadingRow wrong = Samples.depth("4.0 m", "9000", "was 142", Quality.SUSPECT, false);
        wrong.box().judgementProperty().set(Judgement.WRONG);
        wrong.messageProperty().set("Deeper than the board is high (350 mm): read it again.");
        ReadingRow questioned = Samples.depth("5.6 m", "23.8", "was 240", Quality.MEASURED, false);
        questioned.box().judgementProperty().set(Judgement.QUESTIONED);
        questioned.messageProperty().set("Ten times less than last time. Is it millimetres?");
        FieldBox speed = new FieldBox("belt speed", () -> { });
        speed.unitProperty().set("m/s");
        speed.ghostProperty().set("was 1.62");
        ReadingRow above = new ReadingRow("Belt speed, by tachometer", ReadingRow.Lead.ABOVE, speed,
                Optional.empty());
        VerdictBlock verdict = new VerdictBlock(List.of(new ActionButton(Weight.PLAIN, "Go there", () -> { })));
        verdict.show(Samples.INCOMPLETE);
        ToggleButton one = new ToggleButton("vertical");
        ToggleButton two = new ToggleButton("oblique");
        two.setSelected(true);
        ComboBox<String> combo = new ComboBox<>();
        combo.getItems().addAll("bank gravel", "coal");
        combo.getSelectionModel().select(0);
        CheckBox box = new CheckBox("belt isolated, locked and tried");
        box.setSelected(true);
        HBox controls = new HBox(10, one, two, combo, new TextField("TP-08"));
        ProgressBar progress = new ProgressBar(0.6);
        progress.setPrefWidth(300);
        ListView<String> list = new ListView<>();
        list.getItems().addAll("TP-01", "TP-02", "TP-03");
        list.setMinHeight(214);
        VBox left = new VBox(14, levels, icons, buttons, plates, controls, box, progress, list, Samples.ticks(24),
                Samples.ticks(80));
        VBox right = new VBox(14, header(), above, fresh, questioned, wrong, verdict,
                new CautionStrip("Stay outside the guards. Stand still to read the screen. Never reach, probe or lean "
                        + "over a moving belt; take depths and touch seals only with the belt stopped, isolated, "
                        + "locked and tried."), pad(Samples.INCHES, "9", PadKey.FRACTION, PadKey.DECIMAL));
        for (Node half : List.of(left, right)) {
            ((VBox) half).setPrefWidth(700);
        }
        HBox all = new HBox(30, left, right);
        all.setPadding(new Insets(20));
        return all;
    }

    @Test
    void picturesOfTheParts() throws Exception {
        for (Light light : Light.values()) {
            String name = light.name().toLowerCase(Locale.ROOT);
            Glass.picture("parts-" + name, PartPicturesTest::gallery, light, Density.standard(), 1480, 1240, 1);
            Glass.picture("landscape-" + name, () -> landscape(Hand.BARE), light, Density.standard(), 1280, 800, 1);
            Glass.picture("portrait-" + name, PartPicturesTest::portrait, light, Density.standard(), 800, 1280, 1);
        }
        Glass.picture("landscape-gloved", () -> landscape(Hand.GLOVED), Light.DAY,
                new Density(Density.DEFAULT_DPI, Hand.GLOVED), 1280, 800, 1);
        Glass.picture("landscape-day-double", () -> landscape(Hand.BARE), Light.DAY,
                Density.of(299, 2, Hand.BARE), 1280, 800, 2);
    }

    private static List<Labeled> labels(Parent parent) {
        List<Labeled> labels = new ArrayList<>();
        for (Node child : parent.getChildrenUnmodifiable()) {
            if (child instanceof Labeled labeled && !labeled.getText().isEmpty() && labeled.isVisible()
                    && labeled.getContentDisplay() != ContentDisplay.GRAPHIC_ONLY) {
                labels.add(labeled);
            }
            if (child instanceof Parent inner) {
                labels.addAll(labels(inner));
            }
        }
        return labels;
    }

    private static void assertWhole(Parent root, Density density, double width, double height) {
        Scene scene = Glass.show(root, Light.DAY, density, width, height);
        for (Labeled label : labels(root)) {
            Text shown = (Text) label.lookup(".text");
            assertEquals(label.getText().replaceAll("[ \n]", ""), shown.getText().replaceAll("[ \n]", ""));
            Bounds place = label.localToScene(label.getLayoutBounds());
            assertTrue(place.getMinX() >= 0 && place.getMinY() >= 0 && place.getMaxX() <= width
                    && place.getMaxY() <= height, () -> label.getText() + " at " + place);
        }
        scene.getWindow().hide();
    }

    @Test
    void noTextIsCutAndNothingLeavesTheGlass() throws Exception {
        Glass.on(() -> {
            assertWhole(landscape(Hand.BARE), Density.standard(), 1280, 800);
            assertWhole(landscape(Hand.GLOVED), new Density(Density.DEFAULT_DPI, Hand.GLOVED), 1280, 800);
            assertWhole(portrait(), Density.standard(), 800, 1280);
            for (double[] glass : new double[][] {{149, 1}, {224, 1.5}, {299, 2}}) {
                assertWhole(landscape(Hand.BARE), Density.of(glass[0], glass[1], Hand.BARE), 1280, 800);
            }
            return "";
        });
    }
}
