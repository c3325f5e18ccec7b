package bedmark.survey;

import bedmark.document.Branch;
import java.util.Collections;
import java.util.List;
import java.util.SortedSet;
import java.util.TreeSet;

/**
 * What somebody says of one thing, and everybody who said exactly so.
 *
 * @param identity of the document, see {@link Identity}
 * @param origins  the bundles it came in, oldest first; never empty
 */
public record Variant(String identity, Branch document, SortedSet<Origin> origins) {
    public Variant {
        origins = Collections.unmodifiableSortedSet(new TreeSet<>(origins));
        if (origins.isEmpty()) {
            throw new IllegalArgumentException("a variant comes from somewhere");
        }
    }

    static Variant of(Branch document, Origin origin) {
        return new Variant(Identity.of(document), document, new TreeSet<>(List.of(origin)));
    }

    /** Both say the same; of two orders of keys the one that was told first stands. */
    Variant with(Variant other) {
        SortedSet<Origin> both = new TreeSet<>(origins);
        both.addAll(other.origins);
        int earlier = origins.first().compareTo(other.origins.first());
        boolean mine = earlier < 0 || earlier == 0 && document.toString().compareTo(other.document.toString()) <= 0;
        return new Variant(identity, mine ? document : other.document, both);
    }

    /** The bundle that said so last. */
    public Origin newest() {
        return origins.last();
    }
}
