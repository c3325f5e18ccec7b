package bedmark.form;

import bedmark.document.Node;
import bedmark.document.Pointer;
import java.math.BigDecimal;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * How a plain number is entered and judged.
 *
 * @param plausible outside it a number is questioned once
 * @param possible  outside it a number is refused
 * @param step      what one press of plus or minus changes, above zero
 */
public record Count(Range<BigDecimal> plausible, Range<BigDecimal> possible, BigDecimal step) {

    /**
     * Judges an answer.
     *
     * @param where  the answer's place in the survey
     * @param last   the answer of the survey before
     */
    public List<Judgement> judge(Pointer where, Node answer, Optional<Node> last) {
        if (!(answer instanceof Node.Decimal decimal)) {
            return List.of(Judgement.refusal(where, "answer-of-wrong-kind"));
        }
        BigDecimal number = decimal.value();
        Comparator<BigDecimal> order = Comparator.naturalOrder();
        if (possible.isUnder(number, order)) {
            String code = possible.excluded() ? "not-above-possible" : "under-possible";
            return List.of(Judgement.refusal(where, code, answer, Node.number(possible.low().orElseThrow())));
        } else if (possible.isOver(number, order)) {
            return List.of(Judgement.refusal(where, "over-possible", answer,
                    Node.number(possible.high().orElseThrow())));
        } else if (plausible.isUnder(number, order)) {
            return List.of(Judgement.doubt(where, "under-plausible", answer,
                    Node.number(plausible.low().orElseThrow())));
        } else if (plausible.isOver(number, order)) {
            return List.of(Judgement.doubt(where, "over-plausible", answer,
                    Node.number(plausible.high().orElseThrow())));
        }
        return last.filter(before -> before instanceof Node.Decimal known
                        && Suspicion.tenTimesOff(number, known.value()))
                .map(before -> List.of(Judgement.doubt(where, "ten-times-off-last", answer, before)))
                .orElse(List.of());
    }
}
