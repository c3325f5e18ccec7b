package bedmark.index;

import java.time.OffsetDateTime;
import java.util.Optional;

/**
 * The newest walk of a round.
 *
 * @param person     who started it
 * @param finishedAt nothing while it is under way
 */
public record Walk(String round, String person, OffsetDateTime startedAt, Optional<OffsetDateTime> finishedAt) {
    public boolean underWay() {
        return finishedAt.isEmpty();
    }
}
