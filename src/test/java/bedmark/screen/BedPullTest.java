package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.index.SurveyQuery;
import bedmark.picture.Handle;
import bedmark.picture.SideScale;
import bedmark.screen.part.FieldBox;
import bedmark.screen.zone.ZonePictureView;
import bedmark.survey.QueueState;
import java.nio.file.Path;
import java.time.Clock;
import java.util.List;
import java.util.Optional;
import javafx.geometry.Point2D;
import javafx.scene.input.KeyCode;
import javafx.scene.input.MouseButton;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The zone picture as an input: what is pulled on it stands in the table and in the journal. */
class BedPullTest {
    private static final String TRANSFER = "TP-19";

    @TempDir
    private Path temp;

    private TabletApp app;

    @Test
    void bedThatIsPulledStandsInTheTableAndInTheJournal() throws Exception {
        try (TabletApp opened = new TabletApp(temp.resolve("store"), Optional.of(Path.of("sample-surveys")), temp,
                Clock.systemUTC(), 1280, 800)) {
            app = opened;
            app.setOutOnDemo();
            app.click("stop-" + TRANSFER);
            app.until(() -> app.has("verdict"));
            app.type("5.2");
            app.press(KeyCode.ENTER);

            SideScale scale = view().picture().orElseThrow().scale();
            pull(scale.x(2.02), scale.y(0.1), scale.x(2.02), scale.y(0.121));
            assertEquals("2000", value("position", 0));
            assertEquals("120", value("depth", 0));
            assertTrue(box("depth", 0).activeProperty().get());
            assertEquals("estimated", depth(0).text("quality").orElseThrow());

            scale = view().picture().orElseThrow().scale();
            pull(scale.x(4), scale.y(0.2), scale.x(4), scale.y(0.2));
            assertEquals("200", value("depth", 1));
            assertEquals(2, depths().size());

            app.click("slot-permit");
            Handle first = view().picture().orElseThrow().handles().stream()
                    .filter(handle -> handle.station() == 0).findFirst().orElseThrow();
            pull(first.x() + 6, first.y() + 6, first.x() + 6, first.y() + 6);
            assertTrue(box("depth", 0).activeProperty().get(), "touching near a handle takes its station in hand");
            assertEquals("120", value("depth", 0));
            assertEquals(2, depths().size());

            first = view().picture().orElseThrow().handles().stream()
                    .filter(handle -> handle.station() == 0).findFirst().orElseThrow();
            scale = view().picture().orElseThrow().scale();
            pull(first.x(), first.y(), first.x(), scale.y(0.09));
            assertEquals("90", value("depth", 0));
            assertEquals("90", depth(0).number("value").orElseThrow().toPlainString());
            assertEquals("estimated", depth(0).text("quality").orElseThrow());
        }
    }

    private ZonePictureView view() {
        return (ZonePictureView) app.node("zone-picture");
    }

    private void pull(double fromX, double fromY, double toX, double toY) throws Exception {
        Point2D from = view().localToScreen(fromX, fromY);
        Point2D to = view().localToScreen(toX, toY);
        app.robot().moveTo(from).press(MouseButton.PRIMARY).moveTo(to).release(MouseButton.PRIMARY);
        app.settle();
    }

    private FieldBox box(String cell, int line) {
        return (FieldBox) app.node("slot-readings-bedDepths-" + line + "-" + cell);
    }

    private String value(String cell, int line) {
        return box(cell, line).valueProperty().get();
    }

    private List<Branch> depths() {
        return app.workplace().store().surveys(SurveyQuery.ALL.ofTransfer(TRANSFER).in(QueueState.OPEN)).stream()
                .findFirst().flatMap(line -> app.workplace().store().history(line.id())).orElseThrow()
                .survey().readings().branches("bedDepths");
    }

    private Branch depth(int line) {
        return depths().get(line).branch("depth").orElseThrow();
    }
}
