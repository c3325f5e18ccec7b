package bedmark.engine;

import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Component;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Rule;
import java.util.Collections;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * What the engine found of one conveyor: all its surveyed loading zones against its one drive.
 *
 * @param zones       the assessments of the zones, in the order in which they were given
 * @param lacking     how many of the conveyor's zones are not in the sum of the shares; with any, sums are lower bounds
 * @param sums        drags, powers, share and energy of the surveyed zones together; only what every one of them knows
 * @param leadingZone the place in {@code zones} of the one whose skirts take most power
 * @param leading     which of bed, seal and loading asks for most in all of them together
 */
public record ConveyorAssessment(List<Assessment> zones, int lacking, Map<Result, Estimate> sums,
        OptionalInt leadingZone, Optional<Component> leading) {

    public ConveyorAssessment {
        zones = List.copyOf(zones);
        Map<Result, Estimate> copy = new EnumMap<>(Result.class);
        copy.putAll(sums);
        sums = Collections.unmodifiableMap(copy);
    }

    /** The sum, where every surveyed zone knows its part. */
    public Optional<Estimate> get(Result result) {
        return Optional.ofNullable(sums.get(result));
    }

    /** The worst level of its zones; incomplete without any. */
    public Level level() {
        return zones.stream().map(Assessment::level).reduce(Level::or).orElse(Level.INCOMPLETE);
    }

    /** What was found against the one drive: of each rule on power the worst that a zone's readings tell. */
    public List<Finding> driveFindings() {
        return List.of(Rule.DRIVE_NEAR_RATING, Rule.SKIRTS_OVER_BUDGET).stream().flatMap(rule ->
                zones.stream().flatMap(zone -> zone.findings().stream()).filter(finding -> finding.rule() == rule)
                        .max(Comparator.comparing(Finding::level).thenComparing(Finding::observed)).stream()).toList();
    }
}
