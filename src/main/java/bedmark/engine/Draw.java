package bedmark.engine;

import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Uncertain;
import java.util.HashMap;
import java.util.Map;
import java.util.Random;

/**
 * One drawing of all readings of the zones of a conveyor. {@link Random} is used because its numbers are laid down by
 * its specification, bit for bit.
 */
final class Draw {
    /** After so many impossible draws the value itself is taken; nothing plausible comes near it. */
    private static final int MOST_DRAWS = 1_000;

    private final Random random;
    private final Map<Reading, Uncertain> common = new HashMap<>();

    Draw(Random random) {
        this.random = random;
    }

    /** A number that the reading may stand for. */
    Uncertain take(Reading reading) {
        if (reading.standardUncertainty() == 0) {
            return Uncertain.exact(reading.value());
        }
        return Sum.isOwn(reading) ? draw(reading) : common.computeIfAbsent(reading, this::draw);
    }

    /** A number between −1 and 1, evenly. */
    double even() {
        return 2 * random.nextDouble() - 1;
    }

    private Uncertain draw(Reading reading) {
        Domain domain = domain(reading);
        for (int i = 0; i < MOST_DRAWS; i++) {
            double drawn = reading.value() + reading.standardUncertainty() * random.nextGaussian();
            if (domain.holds(drawn)) {
                return Uncertain.exact(drawn);
            }
        }
        return Uncertain.exact(reading.value());
    }

    /** What a reading may be: what its datum says; positions and depths may be 0, lengths of seal and rates may not. */
    static Domain domain(Reading reading) {
        return Datum.ofPointer(reading.name()).map(Datum::domain).orElseGet(() ->
                reading.name().startsWith(ZoneFacts.DEPTHS) ? Domain.NOT_NEGATIVE
                        : reading.name().startsWith("/plant/limits/") ? Domain.EFFICIENCY : Domain.POSITIVE);
    }
}
