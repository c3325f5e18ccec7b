package bedmark.form;

import bedmark.document.Branch;
import java.util.List;

/** A plain number. */
public record NumberField(Head head, Count count) implements Field {

    @Override
    public List<Judgement> judge(Branch survey, Branch last) {
        return answer(survey).map(answer -> count.judge(where(), answer, answer(last))).orElse(List.of());
    }
}
