package bedmark.index;

import java.time.OffsetDateTime;
import java.util.List;
import java.util.UUID;

/**
 * A pack that left the tablet.
 *
 * @param sequence the journal entry that tells of it
 * @param pack     the pack's file name
 * @param sha256   the pack's digest, hexadecimal
 * @param folder   where it was put
 * @param surveys  what was in it, in the pack's order
 */
public record Export(long sequence, String pack, String sha256, String folder, OffsetDateTime at, String person,
                     List<UUID> surveys) {
    public Export {
        surveys = List.copyOf(surveys);
    }
}
