package bedmark.index;

import bedmark.document.Defect;
import java.util.List;

/**
 * What a proof of a whole store found; nothing was changed by it.
 *
 * @param segments    journal segments
 * @param entries     entries that are sound
 * @param last        sequence number of the last of them; 0 where there is none
 * @param chainIntact whether each entry names the hash of the one before it, without a gap, over all segments
 * @param torn        cut-off tails that are kept beside the journal, by file name
 * @param photos      photos that entries name
 * @param indexEqual  whether the index says what the journal says
 * @param defects     everything found, each with its place: bad entries (segment, offset, sequence), photos that are
 *                    missing or differ, and where the index is not equal
 * @param facts       what the entries and the volume tell beside
 */
public record StoreCheck(int segments, long entries, long last, boolean chainIntact, List<String> torn, long photos,
                         boolean indexEqual, List<Defect> defects, StoreFacts facts) {
    public StoreCheck {
        torn = List.copyOf(torn);
        defects = List.copyOf(defects);
    }

    /** Whether nothing at all is wrong. */
    public boolean sound() {
        return defects.isEmpty() && chainIntact && indexEqual;
    }
}
