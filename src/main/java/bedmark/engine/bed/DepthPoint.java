package bedmark.engine.bed;

import bedmark.engine.uncertainty.Estimate;

/**
 * The bed at one station.
 *
 * @param position from the start of the zone (m)
 * @param depth    in contact with the board (m); 0 where the surface lies below the board line
 */
public record DepthPoint(double position, Estimate depth) {
}
