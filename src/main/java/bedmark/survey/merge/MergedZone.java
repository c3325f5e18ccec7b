package bedmark.survey.merge;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;

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

    /**
     * The visit that was made last, whatever came of it. One that was dated ahead stands in its place only where there
     * is no other, or where it brought no result and may be the newer of the two: a wrong clock makes no zone look
     * inspected.
     */
    public Optional<Copy> last() {
        Optional<Copy> believed = lastOf(visits.stream().filter(copy -> !copy.datedAhead()));
        Optional<Copy> doubted = lastOf(doubted(visits, believed));
        return believed.isEmpty() || doubted.isPresent() && believed.get().result() && !doubted.get().result()
                ? doubted : believed;
    }

    /** The results, in time order. */
    public List<Copy> results() {
        return visits.stream().filter(Copy::result).toList();
    }

    /** The result whose age is the zone's: the last one, and one that was dated ahead only where there is no other. */
    public Optional<Copy> newest() {
        Optional<Copy> believed = lastOf(results().stream().filter(copy -> !copy.datedAhead()));
        return believed.isPresent() ? believed : lastOf(results().stream());
    }

    /**
     * The last result; where it clashes with others, they stand beside it, and the zone is as bad as the worst of them.
     * So does the last one of those that were dated ahead, unless it had come before the last result was made: which
     * of the two is newer, nobody can tell.
     */
    public List<Copy> latest() {
        List<Copy> results = results();
        Optional<Copy> newest = newest();
        Set<Copy> leading = Stream.concat(newest.stream(), lastOf(doubted(results, newest)).stream())
                .collect(Collectors.toSet());
        return results.stream().filter(copy -> leading.stream().anyMatch(lead -> lead.equals(copy)
                || clashes.stream().anyMatch(clash -> clash.has(lead) && clash.has(copy)))).toList();
    }

    /** Those that were dated ahead and may be newer than another one, in time order by their tablets. */
    private static Stream<Copy> doubted(List<Copy> copies, Optional<Copy> believed) {
        return copies.stream().filter(copy -> believed.map(copy::mayFollow).orElse(copy.datedAhead()));
    }

    private static Optional<Copy> lastOf(Stream<Copy> copies) {
        return copies.reduce((one, other) -> other);
    }
}
