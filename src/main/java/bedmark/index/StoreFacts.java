package bedmark.index;

import bedmark.survey.Act;
import bedmark.survey.Entry;
import java.time.OffsetDateTime;
import java.util.Optional;

/**
 * How a store does, as far as it is known without proving it.
 *
 * @param last      sequence number of the last entry; 0 where there is none
 * @param savedAt   when an entry was last forced to the medium
 * @param backup    the newest backup that was made and proved
 * @param freeBytes that can still be written to its volume; 0 where the system does not tell
 * @param sealed    whether what lies on disk is encrypted
 */
public record StoreFacts(long last, Optional<OffsetDateTime> savedAt, Optional<Made> backup, long freeBytes,
                         boolean sealed) {

    /**
     * A backup.
     *
     * @param upTo the last entry that it holds
     */
    public record Made(OffsetDateTime at, String folder, long upTo) {
        static Optional<Made> of(Entry entry) {
            return entry.act() instanceof Act.BackupMade made
                    ? Optional.of(new Made(entry.at(), made.folder(), made.upTo())) : Optional.empty();
        }
    }

    /** Entries that no backup holds; the note of the backup itself does not count. */
    public long notBackedUp() {
        return backup.map(made -> Math.max(0, last - made.upTo() - 1)).orElse(last);
    }
}
