package bedmark.index;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import java.util.function.Function;
import java.util.function.Predicate;

/** Which acts are possible as things stand, so that none is saved that no survey can take in. */
final class ActRules {
    private ActRules() {
    }

    /**
     * The surveys that an entry is about, as they stand after it.
     *
     * @param histories the surveys as they stand before it
     * @param free      whether no revision corrects a survey yet
     * @throws Refused where the entry's act is not possible
     */
    static Map<UUID, SurveyHistory> after(Entry entry, Function<UUID, Optional<SurveyHistory>> histories,
                                          Predicate<UUID> free) {
        Act act = entry.act();
        List<UUID> touched = Fold.touched(act);
        boolean aboutNone = act instanceof Act.SurveysQueued || act instanceof Act.PackExported
                || act instanceof Act.ReceiptNoted;
        if (aboutNone && touched.isEmpty()) {
            throw new Refused(Defect.in("", "act-without-survey", act.code()));
        }
        Map<UUID, SurveyHistory> after = new LinkedHashMap<>();
        for (UUID survey : touched) {
            after.put(survey, Fold.next(histories.apply(survey), entry, survey));
        }
        if (act instanceof Act.RevisionOpened revision) {
            requireFit(revision, histories, free);
        }
        return after;
    }

    /** A revision follows a finished survey that no other one corrects. */
    private static void requireFit(Act.RevisionOpened revision, Function<UUID, Optional<SurveyHistory>> histories,
                                   Predicate<UUID> free) {
        SurveyHistory corrected = histories.apply(revision.supersedes()).orElseThrow(() ->
                new Refused(Defect.in(revision.supersedes().toString(), "survey-unknown")));
        Survey old = corrected.survey();
        Survey fresh = new Survey(revision.document());
        if (!free.test(old.id()) || corrected.state() == QueueState.OPEN || fresh.revision() != old.revision() + 1
                || !fresh.supersedes().equals(Optional.of(old.id())) || !fresh.transfer().equals(old.transfer())) {
            throw new Refused(Defect.in(revision.survey().toString(), "revision-unfit", old.id().toString(),
                    Integer.toString(old.revision())));
        }
    }
}
