package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.Survey;
import java.time.OffsetDateTime;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/**
 * The entries of a tablet that is used for ten years, always the same ones: rounds of 40 surveys with 14 answers each,
 * undone answers, corrections, packs and receipts. About 18 entries for a survey, 27,000 surveys in 500,000 entries.
 */
public final class Decade {
    private static final OffsetDateTime FIRST_DAY = OffsetDateTime.parse("2016-03-01T06:00:00Z");
    private static final UUID DEVICE = new UUID(0x4000L, 0x8000000000000007L);
    private static final int ROUND = 40;
    private static final int POINTS = 80;
    private static final int ANSWERS = 14;

    private final Deque<Act> ahead = new ArrayDeque<>();
    private final List<UUID> walked = new ArrayList<>();
    private long sequence;
    private int surveys;
    private int rounds;

    /** The next entry. */
    public Entry next() {
        if (ahead.isEmpty()) {
            plan();
        }
        sequence++;
        return new Entry(sequence, FIRST_DAY.plusMinutes(10 * sequence), "person " + rounds % 4, DEVICE, ahead.poll());
    }

    private void plan() {
        long first = sequence + 1;
        if (surveys % (ROUND * 100) == 0 && walked.isEmpty()) {
            ahead.add(register());
            first++;
        }
        if (walked.isEmpty()) {
            ahead.add(new Act.WalkStarted(round()));
            first++;
        }
        survey(first);
        if (walked.size() == ROUND) {
            ahead.add(new Act.WalkFinished(round()));
            ahead.add(new Act.SurveysQueued(walked));
            if (rounds % 50 != 49) {
                ahead.add(new Act.PackExported(walked, "pack-" + rounds + ".zip", "00ff", "/stick"));
                ahead.add(new Act.ReceiptNoted(walked.subList(0, ROUND - rounds % 3), Branch.EMPTY));
            }
            walked.clear();
            rounds++;
        }
    }

    private String round() {
        return "round-" + rounds % 5;
    }

    private Act register() {
        return new Act.RegisterTaken(Branch.EMPTY.with("plant", Branch.EMPTY.with("id", "p")
                .with("name", "Northern plant, year " + surveys / (ROUND * 100))));
    }

    private void survey(long first) {
        UUID id = id(++surveys);
        String transfer = "T" + surveys % POINTS;
        Survey begun = Survey.begin(id, round(), transfer, "loading-zone", 1, "person " + rounds % 4,
                FIRST_DAY.plusMinutes(10 * first));
        boolean correction = surveys % 200 == POINTS * 2 % 200 && surveys > 2 * POINTS;
        UUID old = id(surveys - POINTS);
        ahead.add(!correction ? new Act.SurveyOpened(id, begun.document()) : new Act.RevisionOpened(id, old,
                "wrong belt", begun.document().with("revision", Node.number(2)).with("supersedes", old.toString())));
        for (int i = 0; i < ANSWERS; i++) {
            ahead.add(new Act.AnswerSet(id, Pointer.of("readings").child("field" + i), Optional.of(Branch.EMPTY
                    .with("value", Node.number(surveys * 31L + i)).with("unit", "mm").with("quality", "measured"))));
        }
        if (surveys % 5 == 0) {
            ahead.add(new Act.AnswerUndone(id, first + ANSWERS));
        }
        if (surveys % 17 != 0 || walked.size() + 1 < ROUND) {
            ahead.add(new Act.SurveyCompleted(id, "person " + rounds % 4));
        } else {
            ahead.add(new Act.SurveyCompleted(id, ""));
        }
        walked.add(id);
    }

    static UUID id(int number) {
        return new UUID(0x4000L, 0x8000000000000000L + number);
    }
}
