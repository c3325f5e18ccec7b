package bedmark.office;

import bedmark.engine.Assessment;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.ZoneId;

/**
 * A survey, judged.
 *
 * @param copy     what the merge knows of it
 * @param register by which it was judged
 */
public record JudgedZone(ZoneId zone, Copy copy, Survey survey, Register register, Assessment assessment) {
}
