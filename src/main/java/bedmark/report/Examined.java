package bedmark.report;

import bedmark.document.Branch;
import bedmark.engine.Assessment;
import bedmark.engine.Engine;
import bedmark.form.FieldForm;
import bedmark.office.JudgedZone;
import bedmark.office.Rejudged;
import bedmark.survey.Assessor;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.wording.CalculationSheet;
import bedmark.wording.SheetPart;
import bedmark.wording.Wording;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;

/**
 * The result that a zone is judged by.
 *
 * @param today    the same by the register that holds today; nothing where it can't be judged by that
 * @param assessor judges by the register that the survey was made with
 * @param form     that the survey was made with
 */
public record Examined(JudgedZone judged, Optional<JudgedZone> today, Assessor assessor, FieldForm form) {

    public Survey survey() {
        return judged.survey();
    }

    public Assessment assessment() {
        return judged.assessment();
    }

    /** Both judgements, where the register that holds today comes to another one. */
    public Optional<Rejudged> rejudged() {
        return today.map(other -> new Rejudged(judged, other)).filter(Rejudged::differs);
    }

    /** The register that the survey was made with. */
    public Register register() {
        return judged.register();
    }

    public Register.Transfer transfer() {
        return register().transfer(survey().transfer()).orElseThrow();
    }

    /** When it was completed, by the tablet's own clock. */
    public Optional<OffsetDateTime> at() {
        return survey().completedAt().or(survey()::startedAt);
    }

    /** The working, from the readings to the verdict. */
    public List<SheetPart> sheet(Wording wording) {
        return new CalculationSheet(wording, form).parts(survey(), assessment(),
                Engine.explain(assessor.zone(survey()), assessor.settings()));
    }

    /** The photos that the survey names, in its order. */
    public List<Branch> photos() {
        return survey().photos();
    }
}
