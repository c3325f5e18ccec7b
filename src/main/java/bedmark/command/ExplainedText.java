package bedmark.command;

import bedmark.document.Branch;
import bedmark.engine.Engine;
import bedmark.form.FieldForm;
import bedmark.json.SurveyForm;
import bedmark.survey.Assessor;
import bedmark.survey.Assessor.Assessed;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.wording.CalculationSheet;
import bedmark.wording.Telling;
import bedmark.wording.Told;
import bedmark.wording.Wording;
import java.io.PrintWriter;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** The working of each survey as a calculation sheet of its own, each with its head and the caution. */
final class ExplainedText {
    private static final DateTimeFormatter MINUTE = DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm xxx");
    private static final String RULE = "-".repeat(CalculationSheet.WIDTH);

    private final Wording wording;
    private final String notice;

    ExplainedText(Wording wording, String notice) {
        this.wording = wording;
        this.notice = notice;
    }

    /** Prints the sheets of one bundle. */
    void print(Register register, Assessor assessor, List<Assessed> surveys, List<Branch> forms, PrintWriter out) {
        for (Assessed assessed : surveys) {
            Survey survey = assessed.survey();
            FieldForm form = SurveyForm.of(survey, forms);
            head(survey, register, assessor).forEach(line -> CalculationSheet.wrapped(line).forEach(out::println));
            if (survey.inspectionStatus() == InspectionStatus.INSPECTED) {
                Told told = new Telling(wording, form).tell(assessed.assessment());
                CalculationSheet.wrapped(told.sentence() + told.sure().map(sure -> " (" + sure + ")").orElse(""))
                        .forEach(out::println);
                new CalculationSheet(wording, form).lines(survey, assessed.assessment(),
                        Engine.explain(assessor.zone(survey), assessor.settings())).forEach(out::println);
            } else {
                out.println(wording.text("command.assess.status." + survey.inspectionStatus().code(),
                        survey.document().text("statusReason").orElse("")));
            }
            CalculationSheet.wrapped(notice).forEach(out::println);
            out.println();
        }
    }

    private List<String> head(Survey survey, Register register, Assessor assessor) {
        Register.Transfer transfer = register.transfer(survey.transfer()).orElseThrow();
        String point = transfer.tag() + transfer.from().map(from -> "  " + from).orElse("") + " > "
                + register.conveyorOf(transfer).tag();
        String who = Stream.of(survey.round().map(round -> wording.text("working.round", round)),
                survey.completedAt().or(survey::startedAt).map(MINUTE::format),
                survey.inspector().map(name -> wording.text("working.inspector", name)),
                assessor.material(survey).map(material -> wording.text("working.material", material.name())),
                survey.revision() > 1 ? Optional.of(wording.text("working.revision",
                        Integer.toString(survey.revision()))) : Optional.<String>empty())
                .flatMap(Optional::stream).collect(Collectors.joining(" · "));
        return List.of(RULE, wording.text("working.title", register.name(), point), who);
    }
}
