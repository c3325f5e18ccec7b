package bedmark.screen.zone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Pointer;
import bedmark.quantity.BeltState;
import bedmark.quantity.Quality;
import bedmark.quantity.UnitSystem;
import bedmark.screen.Glass;
import bedmark.screen.Listening;
import bedmark.screen.part.QualityButton;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Light;
import bedmark.survey.Survey;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.Set;
import javafx.scene.Node;
import javafx.scene.Scene;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A change shows those rows anew that it can have changed; nobody may see that it does not show the others. */
class FormPaneTest {
    private static final int ACTS = 300;

    @TempDir
    private Path temp;

    private final Set<Pointer> seen = new HashSet<>();
    private Listening listening = new Listening();
    private Fidget person;
    private ZoneModel model;
    private Scene scene;

    @BeforeEach
    void showAForm() throws Exception {
        person = new Fidget(temp.resolve("store"));
        model = person.model();
        scene = Glass.on(() -> Glass.show(form(), Light.DAY, Density.standard(), 490, 800));
    }

    @AfterEach
    void close() throws Exception {
        Glass.on(() -> {
            scene.getWindow().hide();
            return null;
        });
        person.close();
    }

    @Test
    void everyRowSaysWhatARowBuiltNowSays() throws Exception {
        Glass.on(() -> {
            for (int i = 0; i < ACTS; i++) {
                UnitSystem before = model.unitsProperty().get();
                person.act();
                if (before != model.unitsProperty().get()) {
                    scene.setRoot(form());
                    // No frame comes between the acts; without its look the form shows no row.
                    scene.getRoot().applyCss();
                }
                rowsSayWhatRowsBuiltNowSay("act " + i);
            }
            return null;
        });
        assertTrue(seen.size() > 20, "the form is walked");
    }

    @Test
    void offerToTakeOverMovesOnWhileWorkGoesOnElsewhere() throws Exception {
        Glass.on(() -> {
            rowsSayWhatRowsBuiltNowSay("opening");
            model.activate(Survey.READINGS.child("loadingZoneLength"));
            model.typedProperty().set("4");
            model.activate(BedLines.depth(0));
            rowsSayWhatRowsBuiltNowSay("the length");
            return null;
        });
    }

    @Test
    void marksOfWhatWasTakenOverFollowTheirLines() throws Exception {
        Glass.on(() -> {
            model.tables().carryOver();
            rowsSayWhatRowsBuiltNowSay("taking over");
            model.activate(BedLines.position(2));
            model.typedProperty().set("0.7");
            model.keep();
            model.tables().removeLine(BedLines.TABLE.child(0));
            rowsSayWhatRowsBuiltNowSay("the first line went");
            return null;
        });
    }

    @Test
    void depthInHandIsEstimatedAsSoonAsTheBeltIsSaidToRun() throws Exception {
        Glass.on(() -> {
            model.sayBeltState(BeltState.ISOLATED);
            model.activate(BedLines.depth(0));
            model.typedProperty().set("262");
            assertEquals(Quality.MEASURED, markOfDepth());
            model.sayBeltState(BeltState.RUNNING_LOADED);
            assertEquals(Quality.ESTIMATED, markOfDepth());
            rowsSayWhatRowsBuiltNowSay("the belt runs");
            return null;
        });
    }

    private Quality markOfDepth() {
        return ((QualityButton) scene.lookup("#quality" + BedLines.depth(0).toString().replace('/', '-')))
                .qualityProperty().get();
    }

    private void rowsSayWhatRowsBuiltNowSay(String after) {
        scene.getRoot().lookupAll(".row-place").forEach(place -> ((RowPlace) place).build());
        Set<Node> rows = scene.getRoot().lookupAll(".reading-row");
        assertFalse(rows.isEmpty(), "rows are shown after " + after);
        for (Node node : rows) {
            RowView shown = (RowView) node;
            seen.add(shown.row().place());
            assertEquals(RowSeen.in(new RowView(shown.row(), model, person.wording(), false)), RowSeen.in(shown),
                    "row " + shown.row().place() + " after " + after);
        }
    }

    /** The form as the screen makes it: anew whenever the person wants other units. */
    private FormPane form() {
        listening.end();
        listening = new Listening();
        return new FormPane(model, person.wording(), listening, false);
    }
}
