package bedmark.index;

import static bedmark.index.StoreScript.NOON;
import static bedmark.index.StoreScript.PERSON;
import static bedmark.index.StoreScript.PHOTO;
import static bedmark.index.StoreScript.ROUND;
import static bedmark.index.StoreScript.id;
import static bedmark.index.StoreScript.opened;
import static bedmark.index.StoreScript.options;
import static bedmark.index.StoreScript.revision;
import static bedmark.index.StoreScript.speed;
import static bedmark.index.StoreScript.taken;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class StoreTest {
    @TempDir
    Path folder;

    private Store store;

    @BeforeEach
    void openStore() {
        store = Store.open(folder, options());
    }

    @AfterEach
    void closeStore() {
        store.close();
    }

    private void openAgain() {
        store.close();
        store = Store.open(folder, options());
    }

    @Test
    void everythingIsThereAfterOpeningAgain() {
        StoreScript.walk(store);
        List<SurveyLine> lines = store.surveys(SurveyQuery.ALL);
        Optional<SurveyHistory> history = store.history(id(1));
        Device device = store.device();
        openAgain();
        assertEquals(lines, store.surveys(SurveyQuery.ALL));
        assertEquals(history, store.history(id(1)));
        assertEquals(device, store.device());
        assertEquals(new Opening(false, 0, List.of()), store.opening());
        assertEquals("Northern plant", store.register().orElseThrow().branch("plant").orElseThrow().text("name")
                .orElseThrow());
    }

    @Test
    void aSurveyIsTheFoldOfItsEntries() {
        StoreScript.walk(store);
        SurveyHistory history = store.history(id(1)).orElseThrow();
        assertEquals("2.50", history.survey().readings().quantity("beltSpeed").orElseThrow().value().toPlainString());
        assertEquals(QueueState.EXPORTED, history.state());
        assertEquals(2, history.changes().size());
        assertTrue(history.changes().get(1).undone());
        assertEquals(1, history.survey().photos().size());
        assertEquals(Optional.empty(), store.history(id(77)));
    }

    @Test
    void linesTellStateRevisionAndLevel() {
        StoreScript.walk(store);
        SurveyLine first = store.survey(id(1)).orElseThrow();
        assertEquals(QueueState.EXPORTED, first.state());
        assertEquals(Optional.of(id(3)), first.supersededBy());
        assertFalse(first.current());
        assertEquals("level 1 of Northern plant", first.level());
        assertEquals(Optional.of(NOON), first.startedAt());
        SurveyLine second = store.survey(id(3)).orElseThrow();
        assertEquals(2, second.revision());
        assertEquals(Optional.of(id(1)), second.supersedes());
        assertEquals(17, second.last());
        assertEquals(List.of(id(90), id(2), id(3)), ids(SurveyQuery.ALL.current()));
        assertEquals(List.of(id(1), id(2), id(3)), ids(SurveyQuery.ALL.ofRound(ROUND)));
        assertEquals(List.of(id(2), id(90)), ids(SurveyQuery.ALL.in(QueueState.RECEIVED)).stream().sorted().toList());
        assertEquals(List.of(id(3)), store.open(ROUND).stream().map(SurveyLine::id).toList());
        assertEquals(List.of(), ids(SurveyQuery.ALL.ofTransfer("T3")));
    }

    private List<UUID> ids(SurveyQuery query) {
        return store.surveys(query).stream().map(SurveyLine::id).toList();
    }

    @Test
    void countsHaveANumberForEveryState() {
        StoreScript.walk(store);
        assertEquals(Map.of(QueueState.OPEN, 1L, QueueState.COMPLETED, 0L, QueueState.QUEUED, 0L,
                QueueState.EXPORTED, 1L, QueueState.RECEIVED, 2L), store.counts());
        assertEquals(List.of(), store.queue());
    }

    @Test
    void theQueueHoldsWhatWaitsForExport() {
        store.append(PERSON, opened(id(1), "T1"));
        store.append(PERSON, new Act.SurveyCompleted(id(1), PERSON));
        store.append(PERSON, new Act.SurveysQueued(List.of(id(1))));
        assertEquals(List.of(id(1)), store.queue().stream().map(SurveyLine::id).toList());
    }

    @Test
    void theLastResultIsThatOfTheRevisionThatStands() {
        store.append("", taken(id(90), "T1", "2026-01-01T10:00:00Z"));
        store.append("", taken(id(91), "T1", "2025-06-01T10:00:00Z"));
        store.append(PERSON, opened(id(1), "T1"));
        assertEquals(Optional.of(id(90)), latest(Optional.of(id(1))));
        store.append(PERSON, new Act.SurveyCompleted(id(1), PERSON));
        assertEquals(Optional.of(id(1)), latest(Optional.empty()));
        assertEquals(Optional.of(id(90)), latest(Optional.of(id(1))));
        assertEquals(Optional.of(id(91)), latest(Optional.of(id(90))));
        assertEquals(Optional.empty(), latest(Optional.of(id(91))));
        store.append(PERSON, revision(id(3), store.history(id(1)).orElseThrow().survey()));
        assertEquals(Optional.of(id(1)), latest(Optional.empty()), "an unfinished revision is no result yet");
        assertEquals(Optional.of(id(90)), latest(Optional.of(id(3))), "what it corrects is not an earlier result");
        store.append(PERSON, new Act.SurveyCompleted(id(3), PERSON));
        assertEquals(Optional.of(id(3)), latest(Optional.empty()));
        store.append(PERSON, opened(id(4), "T1"));
        store.append(PERSON, StoreScript.answer(id(4), "/inspectionStatus", Node.text("not-inspected")));
        store.append(PERSON, new Act.SurveyCompleted(id(4), PERSON));
        assertEquals(Optional.of(id(3)), latest(Optional.empty()), "who did not inspect found nothing");
    }

    private Optional<UUID> latest(Optional<UUID> before) {
        return store.latestFinished("T1", before).map(document -> new Survey(document).id());
    }

    @Test
    void walksAndExportsAreKept() {
        StoreScript.walk(store);
        Walk walk = store.walk(ROUND).orElseThrow();
        assertEquals(PERSON, walk.person());
        assertFalse(walk.underWay());
        assertEquals(List.of(walk), store.walks());
        assertEquals(Optional.empty(), store.walk("round-9"));
        store.append("A. Other", new Act.WalkStarted(ROUND));
        assertTrue(store.walk(ROUND).orElseThrow().underWay());
        Export export = store.exports().get(0);
        assertEquals("a.zip", export.pack());
        assertEquals("/stick", export.folder());
        assertEquals(List.of(id(1), id(2)), export.surveys());
    }

    @Test
    void theLastProposalOfAPointStandsUntilItIsWithdrawn() {
        Branch first = Branch.EMPTY.with("tag", "TP-7a");
        store.append(PERSON, new Act.PointProposed(id(1), first));
        store.append(PERSON, new Act.PointProposed(id(2), Branch.EMPTY.with("tag", "TP-9a")));
        store.append(PERSON, new Act.PointProposed(id(1), first.with("note", "behind the screen")));
        assertEquals(List.of("TP-7a", "TP-9a"), store.proposals().stream()
                .map(proposal -> proposal.text("tag").orElseThrow()).toList());
        assertEquals("behind the screen", store.proposals().get(0).text("note").orElseThrow());
        store.append(PERSON, new Act.PointProposed(id(1), Branch.EMPTY));
        assertEquals(1, store.proposals().size());
        assertTrue(store.check(Progress.NONE).sound());
    }

    @Test
    void theDeviceKeepsItsIdentityUnderANewName() {
        Device before = store.device();
        store.nameDevice("Tablet 4");
        assertEquals(new Device(before.id(), "Tablet 4"), store.device());
        openAgain();
        assertEquals(new Device(before.id(), "Tablet 4"), store.device());
    }

    @Test
    void impossibleActsAreRefusedAndNothingIsWritten() {
        store.append(PERSON, opened(id(1), "T1"));
        refused("survey-known", opened(id(1), "T1"));
        refused("survey-unknown", speed(id(2), "1"));
        refused("act-unfit", new Act.SurveysQueued(List.of(id(1))));
        refused("act-without-survey", new Act.SurveysQueued(List.of()));
        refused("act-unfit", new Act.AnswerUndone(id(1), 1));
        refused("photo-missing", new Act.PhotoAttached(id(1), Branch.EMPTY.with("file", "photos/a.jpg")));
        refused("act-unfit", StoreScript.answer(id(1), "/transfer", Node.text("T2")));
        refused("word-unknown", StoreScript.answer(id(1), "/inspectionStatus", Node.text("perhaps")));
        refused("revision-unfit", revision(id(2), store.history(id(1)).orElseThrow().survey()));
        store.append(PERSON, new Act.SurveyCompleted(id(1), PERSON));
        refused("act-unfit", speed(id(1), "1"));
        Survey completed = store.history(id(1)).orElseThrow().survey();
        store.append(PERSON, revision(id(2), completed));
        refused("revision-unfit", revision(id(3), completed));
        assertEquals(4, store.append(PERSON, speed(id(2), "1")).sequence());
    }

    private void refused(String code, Act act) {
        assertEquals(code, assertThrows(Refused.class, () -> store.append(PERSON, act)).defect().code());
    }

    @Test
    void aPhotoIsKeptUntouchedUnderItsDigest() throws IOException {
        store.append(PERSON, opened(id(1), "T1"));
        Path source = Files.write(folder.resolve("camera.JPG"), PHOTO);
        Entry entry = store.attachPhoto(source, id(1), PERSON, NOON, "left skirt");
        Branch photo = ((Act.PhotoAttached) entry.act()).photo();
        Path file = store.photoFile(photo);
        assertArrayEquals(PHOTO, Files.readAllBytes(file));
        assertArrayEquals(PHOTO, Files.readAllBytes(source));
        assertEquals("left skirt", photo.text("caption").orElseThrow());
        assertEquals(PHOTO.length, photo.number("bytes").orElseThrow().intValueExact());
        assertEquals("photos/" + photo.text("sha256").orElseThrow() + ".jpg", photo.text("file").orElseThrow());
        store.attachPhoto(PHOTO, id(1), PERSON, NOON, "");
        try (var files = Files.list(folder.resolve("photos"))) {
            assertEquals(1, files.count());
        }
        assertEquals("photo-missing", assertThrows(Refused.class, () ->
                store.photoFile(Branch.EMPTY.with("file", "photos/../device.json"))).defect().code());
    }

    @Test
    void whatIsNoPhotoIsRefused() throws IOException {
        store.append(PERSON, opened(id(1), "T1"));
        Path text = Files.writeString(folder.resolve("notes.jpg"), "no photo");
        assertEquals("photo-unfit", assertThrows(Refused.class, () ->
                store.attachPhoto(text, id(1), PERSON, NOON, "")).defect().code());
        assertEquals("photo-unreadable", assertThrows(Refused.class, () ->
                store.attachPhoto(folder.resolve("none.jpg"), id(1), PERSON, NOON, "")).defect().code());
    }

    @Test
    void observersHearOfEachSavedEntry() {
        List<Long> heard = new ArrayList<>();
        assertEquals(Optional.empty(), store.savedAt());
        Runnable leave = store.observe(new StoreObserver() {
            @Override
            public void saved(Entry entry) {
                heard.add(entry.sequence());
            }

            @Override
            public void notSaved(NotSaved why) {
                heard.add(-1L);
            }
        });
        store.append(PERSON, opened(id(1), "T1"));
        assertTrue(store.savedAt().isPresent());
        leave.run();
        store.append(PERSON, speed(id(1), "1"));
        assertEquals(List.of(1L), heard);
    }

    @Test
    void aSecondProgramIsToldThatTheStoreIsOpen() {
        Refused refused = assertThrows(Refused.class, () -> Store.open(folder, options()));
        assertEquals("store-locked", refused.defect().code());
        store.append(PERSON, opened(id(1), "T1"));
    }

    @Test
    void anInterruptedThreadClosesNothing() {
        Thread.currentThread().interrupt();
        store.append(PERSON, opened(id(1), "T1"));
        assertTrue(store.history(id(1)).isPresent());
        store.attachPhoto(PHOTO, id(1), PERSON, NOON, "");
        assertTrue(Thread.interrupted());
        store.append(PERSON, speed(id(1), "2"));
        assertTrue(store.check(Progress.NONE).sound());
    }

    @Test
    void aLostDeviceFileIsMadeAgainFromTheJournal() throws IOException {
        store.append(PERSON, opened(id(1), "T1"));
        Device device = store.device();
        store.close();
        Files.writeString(folder.resolve("device.json"), "{");
        store = Store.open(folder, options());
        assertEquals(device, store.device());
    }

    @Test
    void aLevelThatCannotBeFoundHoldsNothingUp() {
        store.close();
        store = Store.open(folder, options().withLevels((survey, register) -> {
            throw new IllegalStateException("no level");
        }));
        store.append(PERSON, opened(id(1), "T1"));
        assertEquals("", store.survey(id(1)).orElseThrow().level());
    }

    @Test
    void aClosedStoreSaysSo() {
        store.close();
        store.close();
        assertThrows(IllegalStateException.class, () -> store.append(PERSON, opened(id(1), "T1")));
    }

    @Test
    void aFolderThatTheDatabaseWouldMisreadIsRefused() {
        Refused refused = assertThrows(Refused.class, () -> Store.open(folder.resolve("a;INIT=x"), options()));
        assertEquals("store-folder-unfit", refused.defect().code());
    }
}
