package bedmark.survey.merge;

import bedmark.survey.InspectionStatus;
import java.util.Comparator;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.UUID;

/**
 * One content of one survey: what the merge looks at. Two copies of the same digest are the same content.
 *
 * @param digest     SHA-256 of the survey's content, hexadecimal
 * @param id         the survey; each revision has its own
 * @param supersedes the survey that it corrects
 * @param round      the round's id; empty where it names none
 * @param status     whether the zone was inspected
 * @param begun      when it was begun, by the tablet's own clock (ms since 1970)
 * @param finished   when it was completed, by the tablet's own clock; nothing while it is under way
 */
public record Copy(String digest, UUID id, int revision, Optional<UUID> supersedes, ZoneId zone, String round,
                   InspectionStatus status, OptionalLong begun, OptionalLong finished, Origin origin) {

    /** The order in which visits were made, as far as the tablets' clocks tell; the digest where they don't. */
    public static final Comparator<Copy> IN_TIME = Comparator.comparingLong(Copy::moment)
            .thenComparingInt(Copy::revision).thenComparing(Copy::digest);

    public Copy {
        Objects.requireNonNull(digest);
        Objects.requireNonNull(id);
        Objects.requireNonNull(supersedes);
        Objects.requireNonNull(zone);
        Objects.requireNonNull(round);
        Objects.requireNonNull(status);
        Objects.requireNonNull(begun);
        Objects.requireNonNull(finished);
        Objects.requireNonNull(origin);
    }

    /** When the visit was, as well as the copy can tell: completed, else begun, else sent (ms since 1970). */
    public long moment() {
        return finished.orElse(begun.orElse(origin.createdAt()));
    }

    /** Whether it is a result that a zone can be judged by. */
    public boolean result() {
        return status == InspectionStatus.INSPECTED && finished.isPresent();
    }

    /**
     * Whether the tablet's clock can't have been right: completed before it was begun, or after it was sent.
     */
    public boolean clockWrong() {
        return finished.isPresent() && (finished.getAsLong() < begun.orElse(Long.MIN_VALUE)
                || finished.getAsLong() > origin.createdAt());
    }

    /** The same content, whichever of the two bundles it first left in. */
    public Copy or(Copy other) {
        if (!digest.equals(other.digest)) {
            throw new IllegalArgumentException("two contents: " + digest + ", " + other.digest);
        }
        return with(origin.or(other.origin));
    }

    private Copy with(Origin first) {
        return new Copy(digest, id, revision, supersedes, zone, round, status, begun, finished, first);
    }
}
