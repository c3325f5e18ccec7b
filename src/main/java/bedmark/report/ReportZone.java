package bedmark.report;

import bedmark.office.RankedZone;
import bedmark.survey.Survey;
import java.util.Optional;

/**
 * A loading zone in the report.
 *
 * @param ranked   where it stands
 * @param examined the result that it is judged by; nothing where there is none, or none that can be judged
 * @param visit    the last visit, where that brought no result
 */
public record ReportZone(RankedZone ranked, Optional<Examined> examined, Optional<Survey> visit) {

    public String tag() {
        return ranked.names().tag();
    }

    /** What loads onto what, as the register words it. */
    public String way() {
        String conveyor = ranked.names().conveyorTag();
        return examined.flatMap(one -> one.transfer().from()).map(from -> from + " → " + conveyor)
                .orElse(conveyor.isEmpty() ? "" : "→ " + conveyor);
    }
}
