package bedmark.survey;

import java.time.OffsetDateTime;
import java.util.Objects;
import java.util.UUID;

/**
 * An act with who did it, when, and on which device.
 *
 * @param sequence the entry's number in its journal, from 1 without a gap
 * @param at       the tablet's own time
 * @param person   the person's name as given at the start of the walk; may be empty for what the program did itself
 */
public record Entry(long sequence, OffsetDateTime at, String person, UUID device, Act act) {
    public Entry {
        if (sequence < 1) {
            throw new IllegalArgumentException("entries are numbered from 1");
        }
        Objects.requireNonNull(at);
        Objects.requireNonNull(person);
        Objects.requireNonNull(device);
        Objects.requireNonNull(act);
    }
}
