package bedmark.engine.uncertainty;

import java.util.Optional;

/**
 * A result that was traced back to its readings.
 *
 * @param leading the name of the reading, among those asked for, that brings the most variance; none where none brings
 *                any
 */
public record Traced(Estimate estimate, Optional<String> leading) {
}
