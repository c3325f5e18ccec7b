package bedmark.engine;

import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Sensitivity;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Shaft power of all the skirted zones of a conveyor over its rated power. What several zones take from the same row of
 * the register, such as the drive's efficiency or the factor of one material, errs in all of them alike; readings and
 * the transfers' own data are each zone's own.
 *
 * @param share   of the rated power
 * @param lacking how many zones are not in it; with any, the share is a lower bound
 */
record ConveyorLoad(Estimate share, int lacking) {

    /** What one zone adds. */
    record Part(Tape tape, Deduced<Uncertain> driveShare) {
    }

    /** The sum over the zones whose share is known; nothing where none is. */
    static Optional<ConveyorLoad> of(List<Part> zones, int unsurveyed) {
        List<Part> known = zones.stream().filter(part -> part.driveShare().isKnown()).toList();
        if (known.isEmpty()) {
            return Optional.empty();
        }
        int lacking = unsurveyed + zones.size() - known.size();
        if (known.size() == 1) {
            return Optional.of(new ConveyorLoad(known.get(0).tape().estimate(known.get(0).driveShare().get()), lacking));
        }
        double sum = 0;
        double variance = 0;
        Map<Reading, Double> common = new HashMap<>();
        for (Part part : known) {
            sum += part.driveShare().get().value();
            for (Sensitivity sensitivity : part.tape().sensitivities(part.driveShare().get())) {
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
        return Optional.of(new ConveyorLoad(new Estimate(sum, Math.sqrt(variance)), lacking));
    }

    private static boolean isOwn(Reading reading) {
        return reading.name().startsWith("/readings/") || reading.name().startsWith("/transfer/");
    }
}
