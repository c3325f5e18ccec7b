package bedmark.journal;

import java.util.Objects;
import java.util.UUID;

/**
 * The last entry that somebody outside the journal knows to be saved.
 *
 * @param journal the journal's identity
 */
public record Mark(UUID journal, long sequence, Place place) {
    public Mark {
        Objects.requireNonNull(journal);
        Objects.requireNonNull(place);
    }
}
