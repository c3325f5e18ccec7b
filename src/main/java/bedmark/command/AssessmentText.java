package bedmark.command;

import bedmark.command.AssessCommand.Judged;
import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.form.FieldForm;
import bedmark.form.Texts;
import bedmark.json.FormReader;
import bedmark.survey.Assessor.Assessed;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.wording.Told;
import bedmark.wording.Telling;
import bedmark.wording.Wording;
import java.io.PrintWriter;
import java.util.List;
import java.util.Optional;

/** Assessments as text for a person at a terminal: one block a survey. */
final class AssessmentText {
    private final Wording wording;

    AssessmentText(Wording wording) {
        this.wording = wording;
    }

    void print(List<Judged> judged, String notice, PrintWriter out) {
        for (Judged one : judged) {
            Register register = one.bundle().register();
            out.println(wording.text("command.assess.head", register.name(), one.surveys().size()));
            for (Assessed assessed : one.surveys()) {
                out.println();
                print(assessed, register, one.bundle().forms(), out);
            }
            out.println();
        }
        out.println(notice);
    }

    private void print(Assessed assessed, Register register, List<Branch> forms, PrintWriter out) {
        Survey survey = assessed.survey();
        Register.Transfer transfer = register.transfer(survey.transfer()).orElseThrow();
        out.println(title(survey, transfer, register));
        if (survey.inspectionStatus() != InspectionStatus.INSPECTED) {
            out.println("  " + wording.text("command.assess.status." + survey.inspectionStatus().code(),
                    survey.document().text("statusReason").orElse("")));
            return;
        }
        Told told = new Telling(wording, form(survey, forms)).tell(assessed.assessment());
        out.println("  " + told.sentence() + told.sure().map(sure -> " (" + sure + ")").orElse(""));
        told.figures().forEach(figure -> out.println("    " + figure.label() + ": " + figure.number() + " "
                + figure.rest()));
        told.atDesign().ifPresent(line -> out.println("  " + line));
        told.action().ifPresent(line -> out.println("  " + line));
        told.repeat().ifPresent(line -> out.println("  " + line));
    }

    private String title(Survey survey, Register.Transfer transfer, Register register) {
        String revision = survey.revision() > 1
                ? wording.text("command.assess.revision", survey.revision()) : "";
        String round = survey.round().orElse("");
        return transfer.tag() + transfer.from().map(from -> "  " + from).orElse("")
                + " > " + register.conveyorOf(transfer).tag() + (round.isEmpty() ? "" : "  [" + round + "]") + revision;
    }

    /** The form that the survey was made with; without a whole one the readings go by their keys. */
    static FieldForm form(Survey survey, List<Branch> forms) {
        Optional<String> id = survey.document().branch("form").flatMap(form -> form.text("id"));
        return forms.stream().filter(form -> id.isPresent() && form.text("id").equals(id)).findFirst()
                .flatMap(AssessmentText::whole)
                .orElseGet(() -> new FieldForm("none", 1, Texts.of("", ""), List.of()));
    }

    private static Optional<FieldForm> whole(Branch form) {
        try {
            return Optional.of(FormReader.read(form));
        } catch (Refused e) {
            return Optional.empty();
        }
    }
}
