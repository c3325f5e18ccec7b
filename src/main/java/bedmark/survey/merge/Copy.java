package bedmark.survey.merge;

import bedmark.survey.InspectionStatus;
import java.time.Duration;
import java.util.Comparator;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.UUID;
import java.util.stream.Stream;

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
 * @param came       when the office first received it (ms since 1970), where the tablet dated it later than that by
 *                   more than {@link #SLACK}; nothing where its date can be believed
 */
public record Copy(String digest, UUID id, int revision, Optional<UUID> supersedes, ZoneId zone, String round,
                   InspectionStatus status, OptionalLong begun, OptionalLong finished, Origin origin,
                   OptionalLong came) {

    /** The order in which visits were made, as far as the tablets' clocks tell; the digest where they don't. */
    public static final Comparator<Copy> IN_TIME = Comparator.comparingLong(Copy::moment)
            .thenComparingInt(Copy::revision).thenComparing(Copy::digest);

    /**
     * A clock may be ahead of the office's by so much: that of a tablet in another zone of time, or set by hand. Common
     * practice, no source.
     */
    public static final Duration SLACK = Duration.ofDays(1);

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
        Objects.requireNonNull(came);
    }

    /** When the visit was, as well as the copy can tell: completed, else begun, else sent (ms since 1970). */
    public long moment() {
        return finished.orElse(begun.orElse(origin.createdAt()));
    }

    /** Whether the tablet dated it later than it came, so that nobody knows when the visit was. */
    public boolean datedAhead() {
        return came.isPresent();
    }

    /** Whether it was dated ahead, and may be newer than another whose date can be believed. */
    public boolean mayFollow(Copy other) {
        return datedAhead() && came.getAsLong() >= other.moment();
    }

    /** As the office has it that received it at a moment (ms since 1970). */
    public Copy receivedAt(long moment) {
        return moment() - moment > SLACK.toMillis() ? with(origin, OptionalLong.of(moment)) : this;
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
        OptionalLong first = Stream.of(came, other.came).flatMapToLong(OptionalLong::stream).min();
        Copy copy = with(origin.or(other.origin), OptionalLong.empty());
        // One that says nothing of its time is as old as its bundle, and an older bundle may have been made before it came.
        return first.isPresent() ? copy.receivedAt(first.getAsLong()) : copy;
    }

    private Copy with(Origin first, OptionalLong received) {
        return new Copy(digest, id, revision, supersedes, zone, round, status, begun, finished, first, received);
    }
}
