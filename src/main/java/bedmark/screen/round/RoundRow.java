package bedmark.screen.round;

import bedmark.index.SurveyLine;
import bedmark.survey.InspectionStatus;
import bedmark.survey.QueueState;
import java.util.Locale;
import java.util.Optional;

/**
 * One stop of the round.
 *
 * @param transfer  id in the register
 * @param tag       what people call it
 * @param what      what is fed onto what
 * @param area      the area's name
 * @param survey    this round's survey of it, where one was begun
 * @param lastLevel the level that was found last time; empty where there is none
 */
public record RoundRow(String transfer, String tag, String what, String area, Optional<SurveyLine> survey,
                       String lastLevel) {

    /** How far a stop is. */
    public enum Progress { TO_DO, BEGUN, DONE, SKIPPED }

    public Progress progress() {
        return survey.map(line -> {
            if (line.state() == QueueState.OPEN) {
                return Progress.BEGUN;
            }
            return line.inspectionStatus() == InspectionStatus.INSPECTED ? Progress.DONE : Progress.SKIPPED;
        }).orElse(Progress.TO_DO);
    }

    /** The level that stands: this round's where it was surveyed, and nothing else. */
    public String level() {
        return survey.filter(line -> line.inspectionStatus() == InspectionStatus.INSPECTED)
                .map(SurveyLine::level).orElse("");
    }

    /** Whether the tag, the names or the area hold what was typed. */
    boolean matches(String typed) {
        String wanted = typed.strip().toLowerCase(Locale.ROOT);
        return (tag + " " + what + " " + area).toLowerCase(Locale.ROOT).contains(wanted);
    }
}
