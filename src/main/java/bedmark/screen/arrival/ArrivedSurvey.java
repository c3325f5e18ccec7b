package bedmark.screen.arrival;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.engine.Assessment;
import bedmark.engine.verdict.Level;
import bedmark.form.FieldForm;
import bedmark.json.SurveyForm;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;

/**
 * A survey of a pack, judged anew from its readings by the register that came with it.
 *
 * @param point      the transfer point's tag
 * @param conveyor   the receiving conveyor's tag
 * @param form       by which its readings are called
 * @param assessment nothing where it was not inspected or can't be judged
 * @param impossible why it can't be judged
 * @param replaced   whether a later revision in the same pack takes its place
 */
public record ArrivedSurvey(Survey survey, String point, String conveyor, FieldForm form,
                            Optional<Assessment> assessment, Optional<Defect> impossible, boolean replaced) {

    /** What is replaced comes last, before it what was not inspected; the others by their level, then today's. */
    private static final Comparator<ArrivedSurvey> WORST_FIRST = Comparator.comparing(ArrivedSurvey::replaced)
            .thenComparing(ArrivedSurvey::inspected, Comparator.reverseOrder())
            .thenComparing(ArrivedSurvey::level, Comparator.reverseOrder())
            .thenComparing(ArrivedSurvey::today, Comparator.reverseOrder());

    public boolean inspected() {
        return survey.inspectionStatus() == InspectionStatus.INSPECTED;
    }

    /** How the office ranks it, today or at design feed; what can't be judged is as good as incomplete. */
    public Level level() {
        return assessment.map(Assessment::worstLevel).orElse(Level.INCOMPLETE);
    }

    private Level today() {
        return assessment.map(Assessment::level).orElse(Level.INCOMPLETE);
    }

    /** The surveys of a bundle, worst first, else in their order. One that can't be judged hides no other. */
    static List<ArrivedSurvey> judged(Bundle bundle) {
        List<Survey> surveys = bundle.surveys();
        Register register = bundle.register();
        Map<UUID, Defect> impossible = new HashMap<>();
        Map<UUID, Assessment> found = judge(surveys, register, impossible);
        Set<UUID> replaced = Survey.superseded(surveys);
        List<ArrivedSurvey> all = new ArrayList<>();
        for (Survey survey : surveys) {
            Register.Transfer point = register.transfer(survey.transfer()).orElseThrow();
            boolean inspected = survey.inspectionStatus() == InspectionStatus.INSPECTED;
            all.add(new ArrivedSurvey(survey, point.tag(), register.conveyorOf(point).tag(),
                    SurveyForm.of(survey, bundle.forms()),
                    Optional.ofNullable(found.get(survey.id())).filter(one -> inspected),
                    Optional.ofNullable(impossible.get(survey.id())).filter(one -> inspected),
                    replaced.contains(survey.id())));
        }
        return all.stream().sorted(WORST_FIRST).toList();
    }

    private static Map<UUID, Assessment> judge(List<Survey> surveys, Register register,
                                               Map<UUID, Defect> impossible) {
        Map<UUID, Assessment> found = new HashMap<>();
        try {
            Assessor assessor = new Assessor(register);
            List<Survey> sound = new ArrayList<>();
            for (Survey survey : surveys) {
                try {
                    assessor.zone(survey);
                    sound.add(survey);
                } catch (Refused e) {
                    impossible.put(survey.id(), e.defect());
                }
            }
            assessor.assess(sound).forEach(one -> found.put(one.survey().id(), one.assessment()));
        } catch (Refused e) {
            // The plant's own settings can't be, or a drive as a whole: that holds for every survey.
            surveys.forEach(survey -> impossible.putIfAbsent(survey.id(), e.defect()));
        }
        return found;
    }
}
