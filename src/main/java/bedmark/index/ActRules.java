package bedmark.index;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/** Which acts are possible as things stand, so that none is saved that no survey can take in. */
final class ActRules {
    private ActRules() {
    }

    /** @throws Refused where the entry's act is not possible */
    static void requirePossible(Index index, Entry entry) {
        Act act = entry.act();
        List<UUID> touched = Fold.touched(act);
        boolean aboutNone = act instanceof Act.SurveysQueued || act instanceof Act.PackExported
                || act instanceof Act.ReceiptNoted;
        if (aboutNone && touched.isEmpty()) {
            throw new Refused(Defect.in("", "act-without-survey", act.code()));
        }
        for (UUID survey : touched) {
            Fold.next(index.folded(survey).history(), entry, survey);
        }
        if (act instanceof Act.RevisionOpened revision) {
            requireFit(index, revision);
        }
    }

    /** A revision follows a finished survey that no other one corrects. */
    private static void requireFit(Index index, Act.RevisionOpened revision) {
        SurveyHistory corrected = index.folded(revision.supersedes()).history().orElseThrow(() ->
                new Refused(Defect.in(revision.supersedes().toString(), "survey-unknown")));
        Survey old = corrected.survey();
        Survey fresh = new Survey(revision.document());
        boolean free = new Queries(index).row(old.id()).filter(row -> row.line().current()).isPresent();
        if (!free || corrected.state() == QueueState.OPEN || fresh.revision() != old.revision() + 1
                || !fresh.supersedes().equals(Optional.of(old.id())) || !fresh.transfer().equals(old.transfer())) {
            throw new Refused(Defect.in(revision.survey().toString(), "revision-unfit", old.id().toString(),
                    Integer.toString(old.revision())));
        }
    }
}
