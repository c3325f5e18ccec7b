package bedmark.office.trend;

import java.time.Instant;
import java.util.UUID;

/**
 * One survey's value of a measure.
 *
 * @param standardUncertainty of the value, in its unit
 * @param replaced            whether a correction stands in its place: shown, and not counted
 */
public record Observation(Instant at, double value, double standardUncertainty, UUID survey, int revision,
                          boolean replaced) {
}
