package bedmark.screen.round;

import bedmark.index.SurveyLine;
import bedmark.survey.InspectionStatus;
import bedmark.survey.QueueState;
import java.time.LocalDate;
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
 * @param last     what was found last time
 * @param dueBy    the last day on which it is to be surveyed, where one is set
 * @param notes    how many notes of the office and actions are open there
 */
public record RoundRow(String transfer, String tag, String what, String area, Optional<SurveyLine> survey,
                       Optional<Last> last, Optional<LocalDate> dueBy, int notes) {

    /**
     * The last finished survey of another round.
     *
     * @param level what it found; may be empty
     */
    public record Last(String level, Optional<LocalDate> on) {
    }

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

    /** Whether it waits for its survey. */
    public boolean waits() {
        return progress() == Progress.TO_DO || progress() == Progress.BEGUN;
    }

    /** Whether it waits though its day has passed. */
    public boolean overdue(LocalDate today) {
        return waits() && dueBy.filter(day -> day.isBefore(today)).isPresent();
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
