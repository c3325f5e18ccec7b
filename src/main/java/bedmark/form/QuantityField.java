package bedmark.form;

import bedmark.document.Branch;
import java.util.List;

/** A number with a unit. */
public record QuantityField(Head head, Measure measure) implements Field {

    @Override
    public List<Judgement> judge(Branch survey, Branch last) {
        return answer(survey).map(answer -> measure.judge(where(), answer, answer(last))).orElse(List.of());
    }
}
