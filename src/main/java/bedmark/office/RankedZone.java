package bedmark.office;

import bedmark.engine.verdict.Level;
import bedmark.index.office.ZoneNames;
import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.ZoneId;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A loading zone in the worst-first list.
 *
 * @param names       plant, area, conveyor and transfer point as today's register names them
 * @param place       where it stands
 * @param level       the worse of today's level and that at design feed, whatever was accepted; nothing where the zone
 *                    was never inspected or can't be judged
 * @param survey      digest of the content that it is judged by
 * @param surveyed    when that was completed
 * @param age         since then; never negative; nothing where a wrong clock dated it ahead
 * @param stale       whether that is too long ago to count, or nobody knows how long
 * @param visitStatus what came of the last visit; nothing where there was none
 * @param visited     when that was
 * @param driveShare  drive power of the zone as a share of the rated power, 0–1
 * @param skirtPower  at the belt (W)
 * @param energyWh    of the skirts in a year (Wh)
 * @param cost        of that energy, in the site's currency
 * @param co2         of that energy (kg)
 * @param saving      of the best remedy
 * @param findings    what is not within its limits
 * @param answers     the findings among them that were accepted or shelved and stay away
 * @param clashes     contents that can't all be right, and wait for a person
 * @param clockWrong  whether a tablet's clock can't have been right: out of order, or ahead of the office's by a day
 */
public record RankedZone(ZoneNames names, Place place, Optional<Level> level, Optional<String> survey,
                         Optional<Instant> surveyed, Optional<Duration> age, boolean stale,
                         Optional<InspectionStatus> visitStatus, Optional<Instant> visited, OptionalDouble driveShare,
                         OptionalDouble skirtPower, OptionalDouble energyWh, OptionalDouble cost, OptionalDouble co2,
                         Optional<String> energyKind, Optional<String> currency, Optional<Saving> saving,
                         List<FindingLine> findings, List<Answered> answers, int clashes, boolean clockWrong) {
    public RankedZone {
        findings = List.copyOf(findings);
        answers = List.copyOf(answers);
    }

    public ZoneId zone() {
        return names.zone();
    }

    /** The findings that nobody accepted or shelved. */
    public List<FindingLine> open() {
        return findings.stream().filter(line -> answers.stream().noneMatch(one -> one.rule() == line.rule())).toList();
    }
}
