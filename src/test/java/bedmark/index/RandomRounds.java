package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.survey.Act;
import bedmark.survey.SurveyHistory;
import java.util.List;
import java.util.Random;
import java.util.UUID;

/** Seeded rounds of work on a store: possible acts and impossible ones, in any order. */
final class RandomRounds {
    private static final int SURVEYS = 24;

    private final Random random;
    private final Store store;

    RandomRounds(long seed, Store store) {
        this.random = new Random(seed);
        this.store = store;
    }

    /** Appends so many acts; the impossible ones are refused and count too. */
    void append(int acts) {
        for (int i = 0; i < acts; i++) {
            try {
                store.append("person " + random.nextInt(3), act(i));
            } catch (Refused e) {
                continue;
            }
        }
    }

    private UUID survey() {
        return StoreScript.id(1 + random.nextInt(SURVEYS));
    }

    private Act act(int number) {
        UUID survey = survey();
        return switch (random.nextInt(16)) {
            case 0 -> StoreScript.register("plant " + number);
            case 1 -> StoreScript.taken(survey, "T" + random.nextInt(4), "2025-0" + (1 + random.nextInt(9))
                    + "-01T10:00:00+02:00");
            case 2, 3, 4 -> StoreScript.opened(survey, "T" + random.nextInt(4));
            case 5 -> new Act.SurveyCompleted(survey, StoreScript.PERSON);
            case 6 -> new Act.SurveysQueued(List.of(survey, survey()));
            case 7 -> new Act.PackExported(List.of(survey), "pack-" + number + ".zip", "00", "/stick");
            case 8 -> new Act.ReceiptNoted(List.of(survey), Branch.EMPTY);
            case 9 -> new Act.WalkStarted("round-" + random.nextInt(3));
            case 10 -> new Act.WalkFinished("round-" + random.nextInt(3));
            case 11 -> revision(survey);
            case 12 -> undo(survey);
            case 13 -> StoreScript.answer(survey, "/inspectionStatus", Node.text("not-inspected"));
            default -> StoreScript.speed(survey, number + ".50");
        };
    }

    private Act revision(UUID survey) {
        return store.history(survey()).map(SurveyHistory::survey).<Act>map(corrected ->
                StoreScript.revision(survey, corrected)).orElse(StoreScript.opened(survey, "T1"));
    }

    private Act undo(UUID survey) {
        return store.history(survey).flatMap(SurveyHistory::newest).<Act>map(change ->
                new Act.AnswerUndone(survey, change.sequence())).orElse(StoreScript.opened(survey, "T2"));
    }
}
