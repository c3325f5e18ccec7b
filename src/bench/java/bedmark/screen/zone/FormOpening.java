package bedmark.screen.zone;

import bedmark.form.FieldForm;
import bedmark.quantity.UnitSystem;
import bedmark.screen.Listening;
import bedmark.screen.Workplace;
import bedmark.survey.Act;
import bedmark.survey.Survey;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import javafx.scene.layout.StackPane;

/** How long a form takes to open, by the number of its fields: its model, its rows, their style and layout. */
public final class FormOpening {
    private static final int WARM_UP = 20;

    private FormOpening() {
    }

    /**
     * Opens a long and a short form in turn. Called on the screen's thread.
     *
     * @param room a place in a window that is shown
     * @return the median time of the long form over that of the short one
     */
    public static double ratio(Workplace workplace, StackPane room, int fields, int fewer, int turns) {
        List<Double> many = new ArrayList<>();
        List<Double> few = new ArrayList<>();
        for (int turn = -WARM_UP; turn < turns; turn++) {
            double longForm = millis(workplace, room, LongForms.of(fields));
            double shortForm = millis(workplace, room, LongForms.of(fewer));
            if (turn >= 0) {
                many.add(longForm);
                few.add(shortForm);
            }
        }
        return median(many) / median(few);
    }

    private static double median(List<Double> millis) {
        Collections.sort(millis);
        return millis.get(millis.size() / 2);
    }

    private static double millis(Workplace workplace, StackPane room, FieldForm form) {
        UUID id = UUID.randomUUID();
        String transfer = workplace.site().register().transfers().keySet().iterator().next();
        workplace.store().append("A. Vale", new Act.SurveyOpened(id, Survey.begin(id, "bench", transfer, form.id(),
                form.version(), "A. Vale", OffsetDateTime.now(workplace.clock())).document()));
        ZoneSetting setting = new ZoneSetting(form, workplace.store().history(id).orElseThrow(),
                workplace.site().register(), workplace.site().assessor(), List.of(), Optional.empty(),
                workplace.scribe(), "A. Vale", workplace.clock());
        room.getChildren().clear();
        Listening listening = new Listening();
        long start = System.nanoTime();
        ZoneModel model = new ZoneModel(setting, UnitSystem.METRIC, Locale.ENGLISH);
        FormPane pane = new FormPane(model, workplace.wording(), listening, false);
        room.getChildren().setAll(pane);
        pane.applyCss();
        room.layout();
        double taken = (System.nanoTime() - start) / 1e6;
        listening.end();
        return taken;
    }
}
