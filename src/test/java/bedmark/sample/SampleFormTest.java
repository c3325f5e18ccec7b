package bedmark.sample;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.form.Field;
import bedmark.form.FieldForm;
import bedmark.json.FormReader;
import bedmark.survey.Bundle;
import bedmark.survey.Survey;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;

/** The surveys of the demo plant could have been entered by its form. */
class SampleFormTest {

    @Test
    void nothingEnteredIsImpossibleOrImplausible() {
        Set<String> doubted = new TreeSet<>();
        for (Survey survey : all()) {
            FieldForm form = form(survey);
            assertEquals(List.of(), form.refusals(survey.document()), survey.transfer());
            form.fields().values().stream().filter(field -> !field.judge(survey.document(), Branch.EMPTY).isEmpty())
                    .forEach(field -> doubted.add(survey.transfer() + " " + field.key()));
        }
        assertEquals(Set.of(), doubted);
    }

    @Test
    void everythingSeenIsAskedByTheForm() {
        for (Survey survey : all()) {
            FieldForm form = form(survey);
            for (String key : survey.observations().members().keySet()) {
                Field field = form.field(key).orElseThrow(() -> new AssertionError(survey.transfer() + " " + key));
                assertTrue(form.shows(field, survey.document()), survey.transfer() + " " + key);
            }
        }
    }

    @Test
    void completedSurveysHaveNoGaps() {
        for (Survey survey : all()) {
            List<String> gaps = form(survey).gaps(survey.document()).stream().map(Field::key).toList();
            assertTrue(gaps.isEmpty() || survey.completedAt().isEmpty(), survey.transfer() + " " + gaps);
        }
    }

    private static List<Survey> all() {
        return SampleRound.ALL.stream().flatMap(round -> SampleFiles.committed(round).surveys().stream()).toList();
    }

    private static FieldForm form(Survey survey) {
        Bundle bundle = SampleFiles.committed(SampleRound.ALL.get(0));
        Branch named = survey.document().branch("form").orElseThrow();
        Branch form = bundle.forms().stream().filter(one -> one.get("id").equals(named.get("id"))
                && one.get("version").equals(named.get("version"))).findFirst().orElseThrow();
        return FormReader.read(form);
    }
}
