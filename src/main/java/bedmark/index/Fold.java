package bedmark.index;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;

/** Which acts are possible on which survey, and what they make of it. */
final class Fold {
    private Fold() {
    }

    /** The surveys that an act is about, each once. */
    static List<UUID> touched(Act act) {
        if (act instanceof Act.SurveysQueued queued) {
            return queued.surveys().stream().distinct().toList();
        } else if (act instanceof Act.PackExported exported) {
            return exported.surveys().stream().distinct().toList();
        } else if (act instanceof Act.ReceiptNoted noted) {
            return noted.surveys().stream().distinct().toList();
        }
        return act.about().stream().toList();
    }

    /** Whether an act makes a survey. */
    static boolean opens(Act act) {
        return act instanceof Act.SurveyOpened || act instanceof Act.RevisionOpened
                || act instanceof Act.SurveyTaken;
    }

    /**
     * The survey after one more entry.
     *
     * @throws Refused {@code survey-known}, {@code survey-unknown}, {@code act-unfit}, or what is wrong in a document
     */
    static SurveyHistory next(Optional<SurveyHistory> history, Entry entry, UUID survey) {
        if (opens(entry.act()) == history.isPresent()) {
            throw new Refused(Defect.in(survey.toString(), history.isPresent() ? "survey-known" : "survey-unknown"));
        }
        try {
            SurveyHistory next = SurveyHistory.after(history, entry).orElseThrow();
            if (!isReading(entry.act())) {
                requireSame(history, next, survey);
                requireReadable(next.survey());
            }
            return next;
        } catch (IllegalStateException | IllegalArgumentException | ArithmeticException e) {
            throw new Refused(Defect.in(survey.toString(), "act-unfit", entry.act().code(),
                    history.map(known -> known.state().name().toLowerCase(Locale.ROOT)).orElse("new")), e);
        }
    }

    /** Most answers by far stand where they can change nothing else. */
    private static boolean isReading(Act act) {
        return act instanceof Act.AnswerSet set && (Survey.READINGS.holds(set.where())
                || Survey.OBSERVATIONS.holds(set.where()));
    }

    /** No answer may turn a survey into another one. */
    private static void requireSame(Optional<SurveyHistory> before, SurveyHistory after, UUID id) {
        Survey survey = after.survey();
        boolean same = survey.id().equals(id) && before.map(SurveyHistory::survey)
                .filter(old -> old.revision() != survey.revision() || !old.transfer().equals(survey.transfer())
                        || !old.supersedes().equals(survey.supersedes())).isEmpty();
        if (!same) {
            throw new IllegalArgumentException("the act changes which survey it is");
        }
    }

    /** What lists show must be readable. */
    private static void requireReadable(Survey survey) {
        survey.revision();
        survey.inspectionStatus();
        survey.startedAt();
        survey.completedAt();
        survey.round();
        survey.supersedes();
    }
}
