package bedmark.survey.merge;

import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * What is known of one loading zone.
 *
 * @param visits  the contents that count, in time order: nothing supersedes them and no person set them aside
 * @param clashes those among them that can't all be right
 */
public record MergedZone(ZoneId zone, List<Copy> visits, List<Clash> clashes) {
    public MergedZone {
        Objects.requireNonNull(zone);
        visits = List.copyOf(visits);
        clashes = List.copyOf(clashes);
    }

    /** The visit that was made last, whatever came of it. */
    public Optional<Copy> last() {
        return visits.isEmpty() ? Optional.empty() : Optional.of(visits.get(visits.size() - 1));
    }

    /** The results, in time order. */
    public List<Copy> results() {
        return visits.stream().filter(Copy::result).toList();
    }

    /**
     * The last result; where it clashes with others, they stand beside it, and the zone is as bad as the worst of them.
     */
    public List<Copy> latest() {
        List<Copy> results = results();
        if (results.isEmpty()) {
            return List.of();
        }
        Copy newest = results.get(results.size() - 1);
        return results.stream().filter(copy -> copy.equals(newest)
                || clashes.stream().anyMatch(clash -> clash.has(newest) && clash.has(copy))).toList();
    }
}
