package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.engine.Assessment;
import bedmark.index.SurveyQuery;
import bedmark.picture.Handle;
import bedmark.picture.SideScale;
import bedmark.quantity.UnitSystem;
import bedmark.screen.part.FieldBox;
import bedmark.screen.zone.ZonePictureView;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.nio.file.Path;
import java.time.Clock;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import javafx.geometry.Point2D;
import javafx.scene.control.Label;
import javafx.scene.control.TextInputControl;
import javafx.scene.input.KeyCode;
import javafx.scene.input.MouseButton;
import javafx.stage.Stage;
import javafx.stage.Window;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A transfer point in the hands of a person: drawn, typed, turned, taken back, and told of. */
class TransferPointTest {
    private static final String FRESH = "TP-19";

    @TempDir
    private Path temp;

    private TabletApp app;

    @BeforeEach
    void walkBegins() throws Exception {
        app = new TabletApp(temp.resolve("store"), Optional.of(Path.of("sample-surveys")), temp, Clock.systemUTC(),
                1280, 800);
        app.setOutOnDemo();
        app.click("stop-" + FRESH);
        app.until(() -> app.has("verdict"));
    }

    @AfterEach
    void walkEnds() {
        app.close();
    }

    @Test
    void bedDrawnByDraggingGivesTheNumbersOfTypedDepthsAndIsTakenBackToTheBeginning() throws Exception {
        Branch opened = document();
        app.type("5");
        app.press(KeyCode.ENTER);
        app.click("slot-readings-beltSpeed");
        app.type("1.5");
        app.press(KeyCode.ENTER);
        Branch before = document();
        pull(1, 0.05, 1, 0.12);
        pull(2.5, 0.2, 2.5, 0.2);
        pull(4, 0.2, 4, 0.245);
        Assessment drawn = assessment();
        assertEquals(3, readings().branches("bedDepths").size());
        for (int i = 0; i < 3; i++) {
            app.click("pad-undo");
        }
        assertEquals(before, document());

        line(0, "1", "120");
        line(1, "2.5", "200");
        line(2, "4", "245");
        Assessment typed = assessment();
        assertEquals(typed.results(), drawn.results());
        assertEquals(typed.findings(), drawn.findings());
        assertEquals(typed.level(), drawn.level());

        for (int i = 0; i < 40 && history().newest().isPresent(); i++) {
            app.click(app.has("pad-undo") ? "pad-undo" : "entry-undo");
        }
        assertEquals(opened, document(), "undo leads back to the beginning");
    }

    private void line(int line, String position, String depth) throws Exception {
        if (line > 0) {
            app.click("add-bedDepths");
        } else {
            app.click("slot-readings-bedDepths-0-position");
        }
        app.type(position);
        app.press(KeyCode.ENTER);
        app.type(depth);
        app.press(KeyCode.ENTER);
    }

    @Test
    void stationIsMadeMovedAndTakenOutByFingerOrByButton() throws Exception {
        app.type("5");
        app.press(KeyCode.ENTER);
        pull(1, 0.1, 1, 0.1);
        Handle made = view().picture().orElseThrow().handles().get(0);
        SideScale scale = view().picture().orElseThrow().scale();
        drag(made.x(), made.y(), scale.x(3), made.y() + 2);
        assertEquals("3000", number("/readings/bedDepths/0/position/value"));
        assertEquals("100", number("/readings/bedDepths/0/depth/value"));
        app.click("add-station");
        app.type("1");
        app.press(KeyCode.ENTER);
        app.type("80");
        app.press(KeyCode.ENTER);
        assertEquals(2, readings().branches("bedDepths").size());
        app.click("slot-readings-bedDepths-0-depth");
        app.click("take-station");
        assertEquals(1, readings().branches("bedDepths").size());
        assertEquals("80", number("/readings/bedDepths/0/depth/value"));
    }

    @Test
    void askingForAnotherSpeedChangesNothing() throws Exception {
        app.type("5");
        app.press(KeyCode.ENTER);
        app.click("slot-readings-beltSpeed");
        app.type("1.5");
        app.press(KeyCode.ENTER);
        pull(1, 0.1, 1, 0.1);
        Branch before = document();
        app.click("what-if");
        app.click("faster");
        app.click("faster");
        app.click("slower");
        SideScale scale = view().picture().orElseThrow().scale();
        drag(scale.x(1), scale.y(0.1), scale.x(3), scale.y(0.2));
        assertTrue(app.has("what-if-end"));
        app.click("what-if-end");
        assertEquals(before, document());
    }

    @Test
    void languageAndUnitsSwitchedInMidEntryChangeNoStoredValue() throws Exception {
        app.type("5");
        app.press(KeyCode.ENTER);
        app.click("slot-readings-beltSpeed");
        app.type("1.");
        Branch before = document();
        prefer(Locale.forLanguageTag("es"), UnitSystem.US);
        assertEquals("1,", active().valueProperty().get());
        app.type("5");
        assertEquals("1,5", active().valueProperty().get());
        assertEquals("m/s", active().unitProperty().get(), "what is being typed keeps its unit");
        assertEquals(before, document());
        prefer(Locale.ENGLISH, UnitSystem.METRIC);
        assertEquals("1.5", active().valueProperty().get());
        app.press(KeyCode.ENTER);
        assertEquals("1.5", number("/readings/beltSpeed/value"));
        assertEquals("5", number("/readings/loadingZoneLength/value"));
    }

    @Test
    void turningTheTabletInMidEntryLosesNeitherFocusNorCharacter() throws Exception {
        app.type("12");
        turn(800, 1280);
        assertEquals("slot-readings-loadingZoneLength", focused());
        app.type(".5");
        turn(1280, 800);
        assertEquals("slot-readings-loadingZoneLength", focused());
        app.type("0");
        app.press(KeyCode.ENTER);
        assertEquals("12.50", number("/readings/loadingZoneLength/value"));

        app.click("slot-permit");
        app.type("LO");
        turn(800, 1280);
        assertEquals("text-entry", focused());
        app.type("TO");
        turn(1280, 800);
        app.type(" 7");
        assertEquals("LOTO 7", ((TextInputControl) app.node("text-entry")).getText());
        app.press(KeyCode.ENTER);
        assertEquals(Optional.of("LOTO 7"), document().text("permit"));
    }

    @Test
    void historyOfAFieldIsOneTapAway() throws Exception {
        app.type("5");
        app.press(KeyCode.ENTER);
        app.press(KeyCode.SHIFT, KeyCode.ENTER);
        app.type("6");
        app.press(KeyCode.ENTER);
        app.press(KeyCode.SHIFT, KeyCode.ENTER);
        app.click("pad-history");
        List<String> told = Glass.on(() -> Window.getWindows().stream()
                .flatMap(window -> window.getScene().getRoot().lookupAll("#history .label").stream())
                .map(node -> ((Label) node).getText()).toList());
        assertTrue(told.contains("5 m → 6 m"), told.toString());
        assertTrue(told.contains("empty → 5 m"), told.toString());
        assertTrue(told.stream().anyMatch(line -> line.endsWith("A. Vale")), told.toString());
        assertTrue(told.stream().anyMatch(line -> line.startsWith("Last survey: 3.60")), told.toString());
        app.press(KeyCode.ESCAPE);
    }

    @Test
    void geometryIsTakenOverByAnActAndMarkedUntilItIsReadAnew() throws Exception {
        Branch opened = document();
        app.click("carry-over");
        Branch carried = document();
        assertTrue(readings().has("loadingZoneLength"));
        assertFalse(readings().has("beltSpeed"));
        for (Branch station : readings().branches("bedDepths")) {
            assertTrue(station.has("position") && !station.has("depth"));
        }
        for (Branch seal : readings().branches("seals")) {
            assertTrue(seal.has("length") && seal.has("type") && !seal.has("condition"));
        }
        assertTrue(marks(carried).contains("loadingZoneLength"));
        assertTrue(marks(carried).contains("bedDepths/0/position"));
        app.click("slot-readings-loadingZoneLength");
        assertTrue(active().carriedProperty().get());
        app.type("3.7");
        app.press(KeyCode.ENTER);
        assertFalse(marks(document()).contains("loadingZoneLength"), "what is read anew is carried over no longer");
        app.click("pad-undo");
        assertEquals(carried, document());
        app.click("pad-undo");
        assertEquals(opened, document());
    }

    private static List<String> marks(Branch document) {
        return document.series("carriedOver").stream().map(node -> ((Node.Text) node).value()).toList();
    }

    private String focused() throws Exception {
        return Glass.on(() -> app.shell().scene().getFocusOwner().getId());
    }

    private void turn(double width, double height) throws Exception {
        Glass.on(() -> {
            Stage stage = (Stage) app.shell().scene().getWindow();
            stage.setWidth(width);
            stage.setHeight(height);
            return null;
        });
        app.until(() -> app.shell().scene().getWidth() == width && app.shell().scene().getHeight() == height);
    }

    private void prefer(Locale language, UnitSystem units) throws Exception {
        Glass.on(() -> {
            app.workplace().preferencesProperty().set(app.workplace().preferences().withLocale(language)
                    .withUnits(units));
            return null;
        });
        app.settle();
    }

    private FieldBox active() throws Exception {
        return Glass.on(() -> app.shell().scene().getRoot().lookupAll(".field-box").stream()
                .map(FieldBox.class::cast).filter(box -> box.activeProperty().get()).findFirst().orElseThrow());
    }

    private ZonePictureView view() {
        return (ZonePictureView) app.node("zone-picture");
    }

    /** Pulls the bed from one place and depth (m) to another. */
    private void pull(double position, double depth, double toPosition, double toDepth) throws Exception {
        SideScale scale = view().picture().orElseThrow().scale();
        drag(scale.x(position), scale.y(depth), scale.x(toPosition), scale.y(toDepth));
    }

    private void drag(double fromX, double fromY, double toX, double toY) throws Exception {
        Point2D from = view().localToScreen(fromX, fromY);
        Point2D to = view().localToScreen(toX, toY);
        app.robot().moveTo(from).press(MouseButton.PRIMARY).moveTo(from.midpoint(to)).moveTo(to)
                .release(MouseButton.PRIMARY);
        app.settle();
    }

    private SurveyHistory history() {
        return app.workplace().store().surveys(SurveyQuery.ALL.ofTransfer(FRESH).in(QueueState.OPEN)).stream()
                .findFirst().flatMap(line -> app.workplace().store().history(line.id())).orElseThrow();
    }

    private Branch document() {
        return history().survey().document();
    }

    private Branch readings() {
        return history().survey().readings();
    }

    private String number(String place) {
        return ((Node.Decimal) document().at(Pointer.parse(place)).orElseThrow()).value().toPlainString();
    }

    private Assessment assessment() {
        return app.workplace().site().assessor().assess(new Survey(document()), List.of());
    }
}
