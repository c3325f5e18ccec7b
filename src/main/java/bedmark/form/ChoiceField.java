package bedmark.form;

import bedmark.document.Branch;
import bedmark.document.Node;
import java.util.List;

/** One of several words. */
public record ChoiceField(Head head, List<Choice> choices) implements Field {
    public ChoiceField {
        choices = List.copyOf(choices);
    }

    @Override
    public List<Judgement> judge(Branch survey, Branch last) {
        return answer(survey).map(answer -> {
            if (!(answer instanceof Node.Text text)) {
                return List.of(Judgement.refusal(where(), "answer-of-wrong-kind"));
            }
            return Choice.has(choices, text.value()) ? List.<Judgement>of()
                    : List.of(Judgement.refusal(where(), "choice-unknown", text));
        }).orElse(List.of());
    }
}
