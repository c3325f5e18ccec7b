package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.engine.Assessment;
import bedmark.engine.LoadingZone;
import bedmark.survey.Assessor;
import bedmark.survey.Survey;
import java.util.List;
import java.util.Optional;

/**
 * What a survey comes to: an assessment, or why there can be none.
 *
 * @param zone what the engine sees of the survey, where it can be
 */
public record Outcome(Optional<Assessment> assessment, Optional<Refused> impossible, Optional<LoadingZone> zone) {

    /** @param companions the other surveys of the conveyor's round, as the engine sees them */
    static Outcome of(Branch document, Assessor assessor, List<Assessor.Seen> companions) {
        Assessor.Seen seen;
        try {
            Survey judged = new Survey(document);
            seen = new Assessor.Seen(judged, assessor.zone(judged));
        } catch (Refused e) {
            return new Outcome(Optional.empty(), Optional.of(e), Optional.empty());
        }
        try {
            return new Outcome(Optional.of(assessor.assess(seen, companions)), Optional.empty(),
                    Optional.of(seen.zone()));
        } catch (Refused e) {
            return new Outcome(Optional.empty(), Optional.of(e), Optional.of(seen.zone()));
        }
    }
}
