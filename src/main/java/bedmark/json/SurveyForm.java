package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.form.FieldForm;
import bedmark.form.Texts;
import bedmark.survey.Survey;
import java.util.List;
import java.util.Optional;

/** Finds the form that a survey was made with among those that came with it. */
public final class SurveyForm {
    private static final FieldForm NONE = new FieldForm("none", 1, Texts.of("", ""), List.of());

    private SurveyForm() {
    }

    /** The survey's form; where none of that id is whole, an empty one, by which the readings go by their keys. */
    public static FieldForm of(Survey survey, List<Branch> forms) {
        Optional<String> id = survey.document().branch("form").flatMap(form -> form.text("id"));
        return forms.stream().filter(form -> id.isPresent() && form.text("id").equals(id)).findFirst()
                .flatMap(SurveyForm::whole).orElse(NONE);
    }

    private static Optional<FieldForm> whole(Branch form) {
        try {
            return Optional.of(FormReader.read(form));
        } catch (Refused e) {
            return Optional.empty();
        }
    }
}
