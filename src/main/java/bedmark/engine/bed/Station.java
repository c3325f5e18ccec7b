package bedmark.engine.bed;

import bedmark.engine.uncertainty.Reading;
import java.util.Objects;

/**
 * A place along the zone where a depth was read.
 *
 * @param position from the start of the zone (m), 0…L
 * @param raw      what was read there (m), not negative: depth, freeboard or centre depth after its method
 * @param method   how it was read
 */
public record Station(Reading position, Reading raw, DepthMethod method) {
    public Station {
        Objects.requireNonNull(position);
        Objects.requireNonNull(raw);
        Objects.requireNonNull(method);
    }
}
