package bedmark.screen;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.index.Store;
import bedmark.survey.Round;
import java.nio.file.StandardOpenOption;
import java.time.Clock;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.time.ZonedDateTime;
import java.time.temporal.ChronoUnit;
import java.util.Optional;

/**
 * The walk that a person set out on, remembered beside the store: a program that ended in its midst, as when the
 * battery died, goes on there, since the safety card is acknowledged once a walk. Losing the file loses no more than
 * that.
 */
public final class WalkMemory {
    static final String FILE = "walk.json";
    /** After that the walk is another one, however long it has been under way. */
    static final Duration LONGEST = Duration.ofHours(16);

    private final Store store;
    private final Clock clock;
    private final KeptFile file;

    /** What the file holds. */
    private record Kept(String round, String person, OffsetDateTime acknowledgedAt) {

        static Optional<Kept> of(Branch document) {
            return document.text("round").flatMap(round -> document.text("person").flatMap(person ->
                    document.time("acknowledgedAt").map(at -> new Kept(round, person, at))));
        }

        Branch document() {
            return Branch.EMPTY.with("round", round).with("person", person)
                    .with("acknowledgedAt", Node.time(acknowledgedAt));
        }
    }

    WalkMemory(Store store, Clock clock) {
        this.store = store;
        this.clock = clock;
        this.file = new KeptFile(store.folder().resolve(FILE));
    }

    /** Somebody has acknowledged the safety card and sets out; this lasts once it returns. */
    public void begin(Round round, String person) {
        file.write(new Kept(round.id(), person, OffsetDateTime.now(clock).truncatedTo(ChronoUnit.SECONDS)).document(),
                StandardOpenOption.SYNC);
    }

    /** The walk is finished, or left for the start of another one. */
    public void end() {
        file.forget();
    }

    /**
     * The round that is still being walked.
     *
     * @return nothing where the walk was ended, is another person's, was acknowledged neither today nor within the last
     *         16 hours, or where the plant has no such round or the journal no such walk under way
     */
    public Optional<Round> goingOn(Site site, String person) {
        return file.read(Kept::of).flatMap(kept -> kept)
                .filter(kept -> kept.person().equals(person) && lately(kept.acknowledgedAt()))
                .flatMap(kept -> site.round(kept.round())).filter(round -> underWay(round, person));
    }

    private boolean underWay(Round round, String person) {
        return store.walk(round.id()).filter(walk -> walk.underWay() && walk.person().equals(person)).isPresent();
    }

    private boolean lately(OffsetDateTime acknowledged) {
        ZonedDateTime now = ZonedDateTime.now(clock);
        Duration since = Duration.between(acknowledged, now);
        return acknowledged.atZoneSameInstant(clock.getZone()).toLocalDate().equals(now.toLocalDate())
                || !since.isNegative() && since.compareTo(LONGEST) <= 0;
    }
}
