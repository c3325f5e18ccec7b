package bedmark.screen.arrival;

import bedmark.screen.part.Labels;
import bedmark.screen.part.Plate;
import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import bedmark.wording.Telling;
import bedmark.wording.Told;
import bedmark.wording.Wording;
import java.util.Optional;
import javafx.geometry.Pos;
import javafx.scene.control.Label;
import javafx.scene.control.ListCell;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** One survey of a pack: where, how it stands as shape and word, and what leads to that. */
final class SurveyCell extends ListCell<ArrivedSurvey> {
    private final Wording wording;

    SurveyCell(Wording wording) {
        this.wording = wording;
        setPrefWidth(0);
    }

    @Override
    protected void updateItem(ArrivedSurvey survey, boolean empty) {
        super.updateItem(survey, empty);
        setText(null);
        boolean bare = empty || survey == null;
        setGraphic(bare ? null : row(survey));
        setAccessibleText(bare ? null : survey.point() + ": " + verdict(survey)
                + atDesign(survey).map(told -> " " + told).orElse(""));
    }

    private HBox row(ArrivedSurvey survey) {
        LevelShape shape = shape(survey);
        HBox names = new HBox(Labels.label("tag", Wording.plain(survey.point())),
                Labels.label("what", Wording.plain("›  " + survey.conveyor())));
        names.getStyleClass().add("names");
        names.setAlignment(Pos.BASELINE_LEFT);
        if (survey.replaced()) {
            names.getChildren().add(new Plate(Plate.Tone.FAINT, wording.text("arrival.replaced")));
        }
        VBox words = new VBox(names, line(verdict(survey), survey.assessment().map(one ->
                LevelShape.valueOf(one.level().name())).orElse(shape)));
        atDesign(survey).ifPresent(told -> words.getChildren().add(line(told, shape)));
        words.setMinWidth(0);
        HBox.setHgrow(words, Priority.ALWAYS);
        HBox row = new HBox(new LevelGlyph(shape), words);
        row.getStyleClass().addAll("rule-row", "ranked");
        row.setAlignment(Pos.CENTER_LEFT);
        return row;
    }

    private static Label line(String told, LevelShape shape) {
        Label line = Labels.wrapped("verdict-line", told);
        line.getStyleClass().add(shape.styleClass());
        return line;
    }

    /** The verdict at design feed, where it is worse than today's and so the one that the shape shows. */
    private Optional<String> atDesign(ArrivedSurvey survey) {
        return survey.assessment().filter(one -> one.worstLevel() != one.level())
                .flatMap(one -> new Telling(wording, survey.form()).tell(one).atDesign());
    }

    private static LevelShape shape(ArrivedSurvey survey) {
        return survey.inspected() ? LevelShape.valueOf(survey.level().name()) : LevelShape.NOT_INSPECTED;
    }

    private String verdict(ArrivedSurvey survey) {
        if (!survey.inspected()) {
            String reason = Wording.plain(survey.survey().document().text("statusReason").orElse(""));
            String status = wording.text("screen.status." + survey.survey().inspectionStatus().code());
            return reason.isBlank() ? status : status + ": " + reason;
        }
        if (survey.impossible().isPresent()) {
            return wording.text("verdict.impossible", wording.sentence(survey.impossible().get()));
        }
        Told told = new Telling(wording, survey.form()).tell(survey.assessment().orElseThrow());
        return told.sentence() + told.sure().map(sure -> " (" + sure + ")").orElse("");
    }
}
