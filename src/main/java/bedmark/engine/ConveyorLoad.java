package bedmark.engine;

import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Sensitivity;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Shaft power of all the skirted zones of a conveyor over its rated power. What several zones take from the same row of
 * the register, such as the drive's efficiency or the factor of one material, errs in all of them alike; readings and
 * the transfers' own data are each zone's own.
 *
 * @param share   of the rated power, with the standard uncertainty that the readings bring
 * @param spread  standard uncertainty of the share that the disagreement of the drag methods brings; a method that errs
 *                does so in all zones alike
 * @param lacking how many zones are not in it; with any, the share is a lower bound
 */
record ConveyorLoad(Estimate share, double spread, int lacking) {

    /** The sum over the zones whose share is known; nothing where none is. */
    static Optional<ConveyorLoad> of(List<FeedFacts> zones, int unsurveyed) {
        List<Known> known = new ArrayList<>(zones.size());
        double spread = 0;
        for (FeedFacts zone : zones) {
            Deduced<Uncertain> share = zone.driveShare();
            if (share.isKnown()) {
                known.add(new Known(zone.zone().sources().tape(), share.get()));
                spread += zone.spreadOfShare();
            }
        }
        return known.isEmpty() ? Optional.empty() : Optional.of(new ConveyorLoad(sum(known), spread,
                unsurveyed + zones.size() - known.size()));
    }

    /** The share with everything that makes it uncertain. */
    Estimate counted() {
        return new Estimate(share.value(), Math.hypot(share.standardUncertainty(), spread));
    }

    private record Known(Tape tape, Uncertain share) {
    }

    private static Estimate sum(List<Known> zones) {
        if (zones.size() == 1) {
            return zones.get(0).tape().estimate(zones.get(0).share());
        }
        double sum = 0;
        double variance = 0;
        Map<Reading, Double> common = new HashMap<>();
        for (Known zone : zones) {
            sum += zone.share().value();
            for (Sensitivity sensitivity : zone.tape().sensitivities(zone.share())) {
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
