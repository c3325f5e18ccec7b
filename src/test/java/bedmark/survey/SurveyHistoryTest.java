package bedmark.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.UUID;
import org.junit.jupiter.api.Test;

class SurveyHistoryTest {
    private static final UUID ID = UUID.fromString("00000000-0000-4000-8000-00000000000a");
    private static final OffsetDateTime TIME = OffsetDateTime.parse("2026-03-01T08:30:00+01:00");
    private static final Pointer SPEED = Pointer.parse("/readings/beltSpeed");
    private static final Pointer NOTES = Pointer.parse("/notes");

    private final List<Entry> entries = new ArrayList<>();

    private SurveyHistory now() {
        Optional<SurveyHistory> history = Optional.empty();
        for (Entry entry : entries) {
            history = SurveyHistory.after(history, entry);
        }
        return history.orElseThrow();
    }

    private void act(Act act) {
        entries.add(new Entry(entries.size() + 1, TIME.plusSeconds(entries.size()), "A. Person", ID, act));
    }

    private void open() {
        act(new Act.SurveyOpened(ID, Survey.begin(ID, "r", "tp", "loading-zone", 1, "A. Person", TIME).document()));
    }

    private void set(Pointer where, String answer) {
        act(new Act.AnswerSet(ID, where, Optional.of(Node.text(answer))));
    }

    @Test
    void answersStandAsLastSet() {
        open();
        set(SPEED, "one");
        set(SPEED, "two");
        assertEquals(Optional.of(Node.text("two")), now().survey().document().at(SPEED));
        assertEquals(Optional.of(Node.text("one")), now().changes().get(1).before());
    }

    /** A revision of what a history holds. */
    private static Act.RevisionOpened revision(SurveyHistory corrected, String why) {
        Survey old = corrected.survey();
        UUID id = new UUID(7, old.revision() + 1);
        return new Act.RevisionOpened(id, old.id(), why, old.document().with("id", id.toString())
                .with("revision", Node.number(old.revision() + 1L)).with("supersedes", old.id().toString()));
    }

    private static SurveyHistory after(Act act, String person) {
        return SurveyHistory.after(Optional.empty(), new Entry(90, TIME.plusDays(1), person, ID, act)).orElseThrow();
    }

    @Test
    void aRevisionTellsTheWholeChainOfWhatItCorrects() {
        open();
        SurveyHistory second = after(revision(now(), "wrong belt"), "B. Person");
        Act.RevisionOpened again = revision(second, "wrong seal");
        SurveyHistory third = after(again, "C. Person");
        List<Branch> chain = third.survey().document().branches(SurveyHistory.REVISIONS);
        assertEquals(List.of("1 wrong belt B. Person", "2 wrong seal C. Person"), chain.stream().map(one ->
                one.number("revision").orElseThrow() + " " + one.text("why").orElseThrow() + " "
                        + one.text("correctedBy").orElseThrow()).toList());
        assertEquals(ID.toString(), chain.get(0).text("id").orElseThrow());
        assertEquals(TIME.plusDays(1), chain.get(1).time("correctedAt").orElseThrow());
        SurveyHistory takenOver = after(new Act.RevisionOpened(again.survey(), again.supersedes(), again.why(),
                third.survey().document()), "D. Person");
        assertEquals(chain, takenOver.survey().document().branches(SurveyHistory.REVISIONS), "told once");
    }

    @Test
    void undoingEverythingGivesTheSurveyAsOpened() {
        Random random = new Random(7);
        open();
        Survey opened = now().survey();
        for (int i = 0; i < 60; i++) {
            Pointer where = random.nextBoolean() ? SPEED : NOTES;
            if (random.nextInt(5) == 0) {
                act(new Act.AnswerSet(ID, where, Optional.empty()));
            } else {
                set(where, "answer " + i);
            }
        }
        while (now().newest().isPresent()) {
            act(new Act.AnswerUndone(ID, now().newest().orElseThrow().sequence()));
        }
        assertEquals(opened, now().survey());
        assertTrue(now().changes().stream().allMatch(SurveyHistory.Change::undone));
        assertEquals(60, now().changes().size());
    }

    @Test
    void undoingAnOlderChangeLeavesALaterOneOfTheSamePlace() {
        open();
        set(SPEED, "one");
        set(SPEED, "two");
        act(new Act.AnswerUndone(ID, 2));
        assertEquals(Optional.of(Node.text("two")), now().survey().document().at(SPEED));
    }

    @Test
    void undoneOlderChangeDoesNotComeBackWithTheLaterOne() {
        open();
        set(SPEED, "one");
        set(SPEED, "two");
        act(new Act.AnswerUndone(ID, 2));
        act(new Act.AnswerUndone(ID, 3));
        assertEquals(Optional.empty(), now().survey().document().at(SPEED));
    }

    @Test
    void completedSurveyTakesNoMoreAnswers() {
        open();
        act(new Act.SurveyCompleted(ID, "A. Person"));
        set(SPEED, "late");
        assertThrows(IllegalStateException.class, this::now);
    }

    @Test
    void surveyMovesForwardOnly() {
        open();
        act(new Act.SurveyCompleted(ID, "A. Person"));
        assertEquals(QueueState.COMPLETED, now().state());
        act(new Act.SurveysQueued(List.of(ID)));
        act(new Act.PackExported(List.of(ID), "p.zip", "00", "folder"));
        act(new Act.PackExported(List.of(ID), "p.zip", "00", "folder"));
        assertEquals(QueueState.EXPORTED, now().state());
        act(new Act.SurveysQueued(List.of(ID)));
        assertThrows(IllegalStateException.class, this::now);
    }

    private void attach(String photo) {
        act(new Act.PhotoAttached(ID, Branch.EMPTY.with("id", photo).with("file", photo + ".jpg")));
    }

    @Test
    void photosAreCaptionedAndTakenOffAndNoUndoBringsThemBack() {
        open();
        set(NOTES, "before");
        attach("p1");
        attach("p2");
        act(new Act.PhotoCaptioned(ID, "p1", "left seal"));
        act(new Act.PhotoDetached(ID, "p2"));
        act(new Act.AnswerUndone(ID, 2));
        assertEquals(List.of(Branch.EMPTY.with("id", "p1").with("file", "p1.jpg").with("caption", "left seal")),
                now().survey().photos());
        act(new Act.PhotoCaptioned(ID, "p1", " "));
        assertEquals(Optional.empty(), now().survey().photos().get(0).text("caption"));
    }

    @Test
    void aPhotoThatIsNotThereIsNeitherCaptionedNorTakenOff() {
        open();
        attach("p1");
        int sound = entries.size();
        act(new Act.PhotoCaptioned(ID, "p2", "what"));
        assertThrows(IllegalStateException.class, this::now);
        entries.subList(sound, entries.size()).clear();
        act(new Act.PhotoDetached(ID, "p2"));
        assertThrows(IllegalStateException.class, this::now);
        entries.subList(sound, entries.size()).clear();
        act(new Act.SurveyCompleted(ID, "A. Person"));
        act(new Act.PhotoDetached(ID, "p1"));
        assertThrows(IllegalStateException.class, this::now);
    }

    @Test
    void historyOfAFieldHoldsWhatLiesBelowIt() {
        open();
        set(SPEED.child("value"), "2");
        set(NOTES, "n");
        assertEquals(1, now().of(SPEED).size());
        assertEquals(1, now().of(Pointer.parse("/readings")).size());
    }
}
