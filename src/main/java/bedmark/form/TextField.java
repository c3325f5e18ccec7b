package bedmark.form;

import bedmark.document.Branch;
import bedmark.document.Node;
import java.util.List;
import java.util.Optional;

/**
 * Words.
 *
 * @param longest the most characters that the answer may have, at least 1
 * @param lines   whether the answer may have several lines
 * @param offers  what the answer is chosen from; typed freely where absent
 */
public record TextField(Head head, int longest, boolean lines, Optional<Offer> offers) implements Field {

    /** Things of the register that an answer is chosen from: the name is shown, the id is stored. */
    public enum Offer {
        /** The plant's materials. */
        MATERIALS
    }

    @Override
    public List<Judgement> judge(Branch survey, Branch last) {
        return answer(survey).map(answer -> {
            if (!(answer instanceof Node.Text text)) {
                return List.of(Judgement.refusal(where(), "answer-of-wrong-kind"));
            }
            return text.value().length() > longest
                    ? List.of(Judgement.refusal(where(), "text-too-long", Node.number(longest)))
                    : List.<Judgement>of();
        }).orElse(List.of());
    }
}
