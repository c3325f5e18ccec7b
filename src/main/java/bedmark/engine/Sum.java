package bedmark.engine;

import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Sensitivity;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * Sums over the zones of a conveyor. What several zones take from the same row of the register, such as the drive's
 * efficiency or the factor of one material, errs in all of them alike; readings and the transfers' own data are each
 * zone's own.
 */
final class Sum {
    private Sum() {
    }

    /** A number of one zone with the tape it is on. */
    record Term(Tape tape, Uncertain number) {
    }

    /** The sum with its standard uncertainty. */
    static Estimate of(List<Term> terms) {
        if (terms.size() == 1) {
            return terms.get(0).tape().estimate(terms.get(0).number());
        }
        double sum = 0;
        double variance = 0;
        Map<Reading, Double> common = new HashMap<>();
        for (Term term : terms) {
            sum += term.number().value();
            for (Sensitivity sensitivity : term.tape().sensitivities(term.number())) {
                if (isOwn(sensitivity.reading())) {
                    variance += sensitivity.variance();
                } else {
                    common.merge(sensitivity.reading(), sensitivity.derivative(), Double::sum);
                }
            }
        }
        for (Map.Entry<Reading, Double> entry : common.entrySet()) {
            variance += new Sensitivity(entry.getKey(), entry.getValue()).variance();
        }
        return new Estimate(sum, Math.sqrt(variance));
    }

    /** Whether a reading is one zone's own, rather than one that all zones take from the same row of the register. */
    static boolean isOwn(Reading reading) {
        return reading.name().startsWith("/readings/") || reading.name().startsWith("/transfer/");
    }
}
