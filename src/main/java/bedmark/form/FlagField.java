package bedmark.form;

import bedmark.document.Branch;
import bedmark.document.Node;
import java.util.List;

/** Yes or no; not answered is neither. */
public record FlagField(Head head) implements Field {

    @Override
    public List<Judgement> judge(Branch survey, Branch last) {
        return answer(survey).filter(answer -> !(answer instanceof Node.Flag))
                .map(answer -> List.of(Judgement.refusal(where(), "answer-of-wrong-kind"))).orElse(List.of());
    }
}
