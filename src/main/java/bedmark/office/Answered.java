package bedmark.office;

import bedmark.engine.verdict.Rule;
import bedmark.survey.OfficeDeed;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.util.Optional;

/**
 * A finding that was accepted or shelved.
 *
 * @param until the last day on which it stays away; nothing for as long as it is not worse
 */
public record Answered(Rule rule, OfficeDeed.Answer answer, String reason, String person, OffsetDateTime at,
                       Optional<LocalDate> until, FindingLine before) {

    /** Whether the finding stays away: the day has not passed, and it is not worse than it was. */
    boolean holds(FindingLine now, LocalDate today) {
        return until.filter(today::isAfter).isEmpty() && !now.worseThan(before);
    }
}
