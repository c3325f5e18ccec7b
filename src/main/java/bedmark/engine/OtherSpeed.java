package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.uncertainty.Uncertain;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The bed that the same flow would have at another belt speed: {@code A′ = A v/v′} at every station, and the depth that
 * the area then asks for [D]. A bed that lags behind its belt lags by the same share. Nothing is judged by it.
 *
 * <table><caption>Symbols</caption>
 * <tr><td>A, A′</td><td>area of the bed now and then (m²)</td></tr>
 * <tr><td>v, v′</td><td>belt speed now and then (m/s)</td></tr>
 * </table>
 *
 * @param speed        v′ (m/s)
 * @param speedNow     v (m/s)
 * @param meanDepth    mean depth at the board then (m)
 * @param meanDepthNow the same now (m)
 * @param depths       the bed then, by its stations
 */
public record OtherSpeed(double speed, double speedNow, double meanDepth, double meanDepthNow, List<At> depths) {

    /**
     * The bed at one station.
     *
     * @param position from the start of the zone (m)
     * @param depth    at the board (m), not negative
     */
    public record At(double position, double depth) {
    }

    public OtherSpeed {
        depths = List.copyOf(depths);
    }

    /**
     * The bed at another speed.
     *
     * @param speed v′ (m/s), positive
     * @return nothing where the bed, its section or its speed is not known
     */
    public static Optional<OtherSpeed> of(LoadingZone zone, Settings settings, double speed) {
        ZoneFacts facts = new ZoneFacts(Sources.uncertain(zone, settings)).certain();
        if (!(speed > 0) || !facts.beltSpeed().isKnown() || !facts.profile().isKnown()) {
            return Optional.empty();
        }
        double now = facts.beltSpeed().get().value();
        Deduced<Profile> then = FeedFacts.scaled(facts, Uncertain.exact(now / speed));
        return then.isKnown() ? Optional.of(new OtherSpeed(speed, now, mean(then.get()), mean(facts.profile().get()),
                depths(then.get()))) : Optional.empty();
    }

    private static double mean(Profile bed) {
        return bed.integral().value() / bed.length().value();
    }

    private static List<At> depths(Profile bed) {
        List<At> depths = new ArrayList<>();
        for (int i = 0; i < bed.stations(); i++) {
            depths.add(new At(bed.position(i).value(), bed.depth(i).value()));
        }
        return depths;
    }
}
