package bedmark.command;

import bedmark.command.AssessCommand.Judged;
import bedmark.json.SurveyForm;
import bedmark.survey.Assessor.Assessed;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.wording.Told;
import bedmark.wording.Telling;
import bedmark.wording.Wording;
import java.io.PrintWriter;
import java.util.List;

/** Assessments as text for a person at a terminal: one block a survey. */
final class AssessmentText {
    private final Wording wording;

    AssessmentText(Wording wording) {
        this.wording = wording;
    }

    void print(List<Judged> judged, String notice, PrintWriter out) {
        for (Judged one : judged) {
            Register register = one.bundle().register();
            line(out, wording.text("command.assess.head", register.name(), one.surveys().size()));
            for (Assessed assessed : one.surveys()) {
                out.println();
                print(assessed, one, out);
            }
            out.println();
        }
        out.println(notice);
    }

    /** What a bundle brought along never commands the terminal. */
    private static void line(PrintWriter out, String text) {
        out.println(Wording.plain(text));
    }

    private void print(Assessed assessed, Judged judged, PrintWriter out) {
        Survey survey = assessed.survey();
        Register register = judged.bundle().register();
        Register.Transfer transfer = register.transfer(survey.transfer()).orElseThrow();
        line(out, title(survey, transfer, register)
                + (judged.superseded().contains(survey.id()) ? wording.text("command.assess.superseded") : ""));
        if (survey.inspectionStatus() != InspectionStatus.INSPECTED) {
            line(out, "  " + wording.text("command.assess.status." + survey.inspectionStatus().code(),
                    survey.document().text("statusReason").orElse("")));
            return;
        }
        Told told = new Telling(wording, SurveyForm.of(survey, judged.bundle().forms())).tell(assessed.assessment());
        line(out, "  " + told.sentence() + told.sure().map(sure -> " (" + sure + ")").orElse(""));
        told.figures().forEach(figure -> line(out, "    " + figure.label() + ": " + figure.number() + " "
                + figure.rest()));
        told.atDesign().ifPresent(line -> line(out, "  " + line));
        told.action().ifPresent(line -> line(out, "  " + line));
        told.repeat().ifPresent(line -> line(out, "  " + line));
    }

    private String title(Survey survey, Register.Transfer transfer, Register register) {
        String revision = survey.revision() > 1
                ? wording.text("command.assess.revision", survey.revision()) : "";
        String round = survey.round().orElse("");
        return transfer.tag() + transfer.from().map(from -> "  " + from).orElse("")
                + " > " + register.conveyorOf(transfer).tag() + (round.isEmpty() ? "" : "  [" + round + "]") + revision;
    }
}
