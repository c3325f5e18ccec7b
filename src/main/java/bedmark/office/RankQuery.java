package bedmark.office;

import bedmark.engine.verdict.Rule;
import java.time.Duration;
import java.util.Objects;
import java.util.Optional;

/**
 * Which zones a list holds; all conditions together.
 *
 * @param plant      the plant's id
 * @param area       the area's name
 * @param material   the material's name
 * @param finding    a rule that is not within its limits, and was neither accepted nor shelved
 * @param olderThan  zones whose last result is older, or that have none
 * @param staleAfter how long a result that found nothing bad counts
 */
public record RankQuery(Optional<String> plant, Optional<String> area, Optional<String> material,
                        Optional<Rule> finding, Optional<Duration> olderThan, Duration staleAfter) {

    /** Half a year: two rounds a year leave no zone stale. */
    public static final Duration STALE_AFTER = Duration.ofDays(200);
    /** Every zone. */
    public static final RankQuery ALL = new RankQuery(Optional.empty(), Optional.empty(), Optional.empty(),
            Optional.empty(), Optional.empty(), STALE_AFTER);

    public RankQuery {
        Objects.requireNonNull(plant);
        Objects.requireNonNull(area);
        Objects.requireNonNull(material);
        Objects.requireNonNull(finding);
        Objects.requireNonNull(olderThan);
        Objects.requireNonNull(staleAfter);
    }

    public RankQuery ofPlant(Optional<String> id) {
        return new RankQuery(id, area, material, finding, olderThan, staleAfter);
    }

    public RankQuery ofArea(Optional<String> name) {
        return new RankQuery(plant, name, material, finding, olderThan, staleAfter);
    }

    public RankQuery ofMaterial(Optional<String> name) {
        return new RankQuery(plant, area, name, finding, olderThan, staleAfter);
    }

    public RankQuery with(Optional<Rule> rule) {
        return new RankQuery(plant, area, material, rule, olderThan, staleAfter);
    }

    public RankQuery olderThan(Optional<Duration> age) {
        return new RankQuery(plant, area, material, finding, age, staleAfter);
    }

    public RankQuery staleAfter(Duration age) {
        return new RankQuery(plant, area, material, finding, olderThan, age);
    }

    /** Whether it holds every zone there is. */
    boolean holdsAll() {
        return equals(ALL.staleAfter(staleAfter));
    }

    boolean holds(RankedZone zone) {
        return plant.filter(id -> !zone.zone().plant().equals(id)).isEmpty()
                && area.filter(name -> !zone.names().area().equals(name)).isEmpty()
                && material.filter(name -> !zone.names().material().equals(name)).isEmpty()
                && finding.filter(rule -> zone.open().stream().noneMatch(line -> line.rule() == rule)).isEmpty()
                && olderThan.filter(age -> zone.age().filter(own -> own.compareTo(age) <= 0).isPresent()).isEmpty();
    }
}
