package bedmark.office.trend;

import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Level;
import bedmark.office.JudgedZone;
import bedmark.survey.merge.ZoneId;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/**
 * A loading zone over time.
 *
 * @param series   each measure that any survey tells
 * @param changes  what is not as it was before, in time order
 * @param interval how often the zone should be looked at
 * @param clashes  surveys whose sides clash and wait for a person; of each the worst side is told
 * @param undated  results that a wrong clock dated ahead, which have no place in time
 */
public record ZoneTrend(ZoneId zone, List<Series> series, List<Change> changes, Interval interval, int clashes,
                        int undated) {
    public ZoneTrend {
        series = List.copyOf(series);
        changes = List.copyOf(changes);
    }

    /**
     * Follows a zone.
     *
     * @param counted  the results that count, in time order; of one survey no more than one
     * @param replaced results in whose place others stand
     * @param undated  the results that were dated ahead, as their tablets have them in order; of one survey no more
     *                 than one
     * @param clashes  conflicts that wait for a person
     */
    public static ZoneTrend of(ZoneId zone, List<JudgedZone> counted, List<JudgedZone> replaced,
                               List<JudgedZone> undated, int clashes) {
        List<Change> changes = Regimes.changes(counted);
        List<Series> series = new ArrayList<>();
        for (Measure measure : Measure.values()) {
            List<Observation> observations = new ArrayList<>();
            counted.forEach(one -> observe(measure, one, false, observations));
            replaced.forEach(one -> observe(measure, one, true, observations));
            observations.sort((one, other) -> one.at().compareTo(other.at()));
            if (!observations.isEmpty()) {
                Measure.Limits limits = counted.isEmpty() ? Measure.Limits.NONE
                        : measure.limits(counted.get(counted.size() - 1).assessment());
                series.add(Series.of(measure, observations, begun(measure, changes), limits.near(),
                        limits.overloaded()));
            }
        }
        Optional<JudgedZone> last = counted.stream().reduce((one, other) -> other);
        Optional<JudgedZone> doubted = undated.stream().filter(one ->
                last.map(dated -> one.copy().mayFollow(dated.copy())).orElse(true)).reduce((one, other) -> other);
        Optional<Level> latest = Stream.concat(last.stream(), doubted.stream())
                .map(one -> one.assessment().worstLevel()).reduce(Level::or);
        Interval interval = Interval.of(series.stream().filter(one -> one.measure() == Measure.DEPTH).findFirst(),
                latest);
        return new ZoneTrend(zone, series, changes, interval, clashes, undated.size());
    }

    private static void observe(Measure measure, JudgedZone zone, boolean replaced, List<Observation> into) {
        measure.of(zone.survey(), zone.assessment()).ifPresent((Estimate value) -> into.add(new Observation(
                Instant.ofEpochMilli(zone.copy().moment()), value.value(), value.standardUncertainty(),
                zone.copy().id(), zone.copy().revision(), replaced)));
    }

    /** The depth does not mind new seals; everything else minds every change. */
    private static Instant begun(Measure measure, List<Change> changes) {
        Set<Change.Kind> minded = switch (measure) {
            case DEPTH -> Set.of(Change.Kind.MATERIAL, Change.Kind.SPEED, Change.Kind.BOARDS);
            case SEALS -> Set.of(Change.Kind.SEALS);
            case DRAG, POWER -> Set.of(Change.Kind.values());
        };
        return changes.stream().filter(change -> minded.contains(change.kind())).map(Change::at)
                .reduce((one, other) -> one.isAfter(other) ? one : other).orElse(Instant.EPOCH);
    }
}
