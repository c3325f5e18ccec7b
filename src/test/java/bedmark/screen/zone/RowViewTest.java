package bedmark.screen.zone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Pointer;
import bedmark.quantity.Quality;
import bedmark.quantity.Unit;
import bedmark.screen.Glass;
import bedmark.screen.part.FieldBox;
import bedmark.screen.part.Judgement;
import bedmark.screen.part.QualityButton;
import bedmark.survey.Survey;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A row makes its words anew only where something changed that they are made of; nobody may see that it does not. */
class RowViewTest {
    private static final int ACTS = 400;

    @TempDir
    private Path temp;

    private final Map<SlotRow, RowView> rows = new HashMap<>();
    private Fidget person;
    private ZoneModel model;

    @BeforeEach
    void openASurvey() throws Exception {
        person = new Fidget(temp.resolve("store"));
        model = person.model();
    }

    @AfterEach
    void close() {
        person.close();
    }

    @Test
    void rowShownAnewSaysWhatARowBuiltNowSays() throws Exception {
        Glass.on(() -> {
            for (int i = 0; i < ACTS; i++) {
                person.act();
                for (SlotRow row : model.rowsProperty().get()) {
                    RowView shown = rows.computeIfAbsent(row, this::build);
                    shown.update();
                    assertEquals(RowSeen.in(build(row)), RowSeen.in(shown), "row " + row.place() + " after act " + i);
                }
            }
            return null;
        });
        assertTrue(rows.size() > 20, "the form is walked");
    }

    @Test
    void qualityThatCannotBeIsTakenBackFromItsButton() throws Exception {
        Glass.on(() -> {
            model.activate(BedLines.depth(0));
            model.typedProperty().set("262");
            model.next();
            RowView shown = build(person.row(BedLines.depth(0)));
            QualityButton button = (QualityButton) shown.lookup(".quality");
            assertEquals(Quality.ESTIMATED, button.qualityProperty().get());
            button.qualityProperty().set(Quality.MEASURED);
            model.mark(Quality.MEASURED);
            shown.update();
            assertEquals(Quality.ESTIMATED, button.qualityProperty().get(), "the belt is not isolated");
            return null;
        });
    }

    @Test
    void stationIsJudgedAnewWhenTheZoneTurnsOutShorter() throws Exception {
        Glass.on(() -> {
            enter(Survey.READINGS.child("loadingZoneLength"), "4");
            enter(BedLines.position(0), "3");
            RowView shown = build(person.row(BedLines.position(0)));
            assertEquals(List.of(Judgement.NONE, Judgement.NONE), judgements(shown));
            enter(Survey.READINGS.child("loadingZoneLength"), "2");
            model.activateFirst();
            shown.update();
            assertEquals(List.of(Judgement.WRONG, Judgement.NONE), judgements(shown), "it stands outside the zone");
            enter(Survey.READINGS.child("loadingZoneLength"), "5");
            shown.update();
            assertEquals(List.of(Judgement.NONE, Judgement.NONE), judgements(shown));
            return null;
        });
    }

    private void enter(Pointer where, String number) {
        model.activate(where);
        model.chooseUnit(Unit.METRE);
        model.typedProperty().set(number);
        model.keep();
    }

    private static List<Judgement> judgements(RowView row) {
        return row.lookupAll(".field-box").stream().map(box -> ((FieldBox) box).judgementProperty().get()).toList();
    }

    private RowView build(SlotRow row) {
        return new RowView(row, model, person.wording(), false);
    }
}
