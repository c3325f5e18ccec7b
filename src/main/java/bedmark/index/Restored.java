package bedmark.index;

import java.util.List;
import java.util.UUID;

/**
 * What restoring a backup did.
 *
 * @param fresh     whether a store was made of it, with its whole history; otherwise its surveys were taken over into
 *                  the store that was there
 * @param taken     surveys that are there now and were not before
 * @param known     surveys that were there already, the same
 * @param differing surveys that are there with another content; nothing was changed in them
 */
public record Restored(boolean fresh, List<UUID> taken, List<UUID> known, List<UUID> differing) {
    public Restored {
        taken = List.copyOf(taken);
        known = List.copyOf(known);
        differing = List.copyOf(differing);
    }
}
