package bedmark.engine;

import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Uncertain;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Shaft power of all the skirted zones of a conveyor over its rated power.
 *
 * @param share   of the rated power, with the standard uncertainty that the readings bring
 * @param spread  standard uncertainty of the share that the disagreement of the drag methods brings; a method that errs
 *                does so in all zones alike
 * @param lacking how many zones are not in it; with any, the share is a lower bound
 * @param asToday how many are in it as they are today, since they cannot be reckoned at design throughput
 * @param feeders how many of them draw from a hopper, whose load is not in it either
 */
record ConveyorLoad(Estimate share, double spread, int lacking, int asToday, int feeders) {

    /**
     * The sum over the zones whose share is known; nothing where none is.
     *
     * @param asToday how many of them stand in it as they are today
     */
    static Optional<ConveyorLoad> of(List<FeedFacts> zones, int unsurveyed, int asToday) {
        List<Sum.Term> known = new ArrayList<>(zones.size());
        double spread = 0;
        int feeders = 0;
        for (FeedFacts zone : zones) {
            Deduced<Uncertain> share = zone.driveShare();
            if (share.isKnown()) {
                known.add(new Sum.Term(zone.zone().sources().tape(), share.get()));
                spread += zone.spreadOfShare();
                feeders += zone.zone().zone().is(LoadingZone.Mark.BELT_FEEDER) ? 1 : 0;
            }
        }
        return known.isEmpty() ? Optional.empty()
                : Optional.of(new ConveyorLoad(Sum.of(known), spread,
                        unsurveyed + zones.size() - known.size(), asToday, feeders));
    }

    /** Whether the drive bears more than the share says. */
    boolean isLowerBound() {
        return lacking > 0 || feeders > 0;
    }

    /** The share with everything that makes it uncertain. */
    Estimate counted() {
        return new Estimate(share.value(), Math.hypot(share.standardUncertainty(), spread));
    }
}
