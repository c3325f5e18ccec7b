package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.form.FieldForm;
import bedmark.screen.Scribe;
import bedmark.survey.Assessor;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.time.Clock;
import java.util.List;
import java.util.Optional;

/**
 * What a transfer point's screen works on.
 *
 * @param form       what is asked
 * @param history    the survey so far
 * @param register   the plant
 * @param assessor   judges by that register
 * @param companions surveys of the same round at the same conveyor
 * @param last       the last finished survey of this transfer point
 * @param scribe     saves what is done
 * @param person     who does it
 * @param clock      when
 */
public record ZoneSetting(FieldForm form, SurveyHistory history, Register register, Assessor assessor,
                          List<Survey> companions, Optional<Branch> last, Scribe scribe, String person, Clock clock) {
    public ZoneSetting {
        companions = List.copyOf(companions);
    }

    /** The transfer point in the register. */
    public Register.Transfer transfer() {
        return register.transfer(history.survey().transfer()).orElseThrow();
    }
}
