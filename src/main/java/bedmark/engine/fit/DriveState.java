package bedmark.engine.fit;

import bedmark.engine.uncertainty.Reading;
import java.util.Optional;

/**
 * A drive and its loading zone in one of the two states of a pair.
 *
 * @param power      running electrical power (W), not negative
 * @param depth      bed depth at the board, constant along the zone or its root mean square (m)
 * @param sealLength length of seal that touches the belt, both sides together (m); 0 where they are lifted
 * @param throughput mass flow by belt scale (kg/s)
 */
public record DriveState(Reading power, Optional<Reading> depth, Optional<Reading> sealLength,
        Optional<Reading> throughput) {
}
