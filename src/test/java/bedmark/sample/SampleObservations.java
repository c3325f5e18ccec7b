package bedmark.sample;

import bedmark.document.Branch;
import bedmark.document.Node;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** What a person saw at one stop, under the keys and in the order of the form {@code loading-zone}. */
final class SampleObservations {
    private static final List<String> KEYS = List.of("spillage", "spillageAt", "dust", "dustAt", "linerWear",
            "linerThickness", "beltEdge", "beltEdgeSide", "mistracking", "mistrackingOffset", "boardGap",
            "boardGapOpens", "beltSupport", "guards", "guardsFault");
    private static final List<String> QUANTITIES = List.of("linerThickness", "mistrackingOffset", "boardGap");
    private static final Map<String, String> USUAL = Map.of("spillage", "none", "dust", "none", "linerWear", "normal",
            "beltEdge", "normal", "mistracking", "none", "beltSupport", "normal", "guards", "normal");

    private SampleObservations() {
    }

    /** The {@code observations}; what nobody noticed is as usual, and nothing while the survey is open. */
    static Branch of(SampleVisit visit) {
        Branch observations = Branch.EMPTY;
        for (String key : KEYS) {
            Optional<String> seen = visit.completed() ? visit.said(key).or(() -> Optional.ofNullable(USUAL.get(key)))
                    : visit.said(key);
            if (seen.isPresent()) {
                observations = observations.with(key, QUANTITIES.contains(key)
                        ? Branch.write(SampleQuantity.parse(seen.get())) : Node.text(seen.get()));
            }
        }
        return observations;
    }
}
