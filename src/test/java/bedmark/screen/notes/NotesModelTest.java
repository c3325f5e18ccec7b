package bedmark.screen.notes;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.json.BundleReader;
import bedmark.screen.Glass;
import bedmark.screen.TabletApp;
import bedmark.screen.Workplace;
import bedmark.survey.Act;
import bedmark.survey.Adoption;
import bedmark.survey.PlannedAction;
import bedmark.survey.Survey;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.UUID;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Actions and photos of one survey on a real store. */
class NotesModelTest {
    private static final Path SAMPLES = Path.of("sample-surveys");
    private static final Clock CLOCK = Clock.fixed(Instant.parse("2026-09-22T14:20:00Z"), ZoneOffset.ofHours(2));
    private static final UUID ID = UUID.fromString("00000000-0000-4000-8000-00000000000a");

    @TempDir
    private Path temp;

    private TabletApp app;
    private Workplace workplace;
    private NotesModel model;

    @BeforeEach
    void open() throws Exception {
        app = new TabletApp(temp.resolve("store"), Optional.empty(), temp, CLOCK, 1280, 800);
        workplace = app.workplace();
        workplace.adopt(Adoption.register(List.of(BundleReader.read(
                Files.readAllBytes(SAMPLES.resolve("round-under-way.json"))))));
        app.settle();
        workplace.store().append("A. Vale", new Act.SurveyOpened(ID, Survey.begin(ID, "2026-09", "TP-19",
                "loading-zone", 1, "A. Vale", OffsetDateTime.now(CLOCK)).document()));
        Branch last = Branch.EMPTY.with("actions", PlannedAction.series(List.of(
                PlannedAction.NONE.with("what", "Renew the right seal").with("workOrder", "wo-26-0877"),
                PlannedAction.NONE.with("what", "Mend the guard"),
                PlannedAction.NONE.with("what", "Clear the spillage").asDone())));
        model = Glass.on(() -> new NotesModel(workplace, workplace.store().history(ID).orElseThrow(),
                Optional.of(last)));
    }

    @AfterEach
    void close() {
        app.close();
    }

    private void on(Runnable work) throws Exception {
        Glass.on(() -> {
            work.run();
            return null;
        });
        app.until(() -> Glass.on(() -> model.attaching() == 0));
    }

    private Survey saved() {
        return workplace.store().history(ID).orElseThrow().survey();
    }

    @Test
    void whatTheOfficeKnowsAndTheLastSurveyLeftIsOpenOnce() throws Exception {
        assertEquals(List.of("Renew the right seal over its whole length", "Mend the guard"),
                model.openBefore().stream().map(PlannedAction::what).toList());
        assertEquals("plant office", model.officeNotes().get(0).by());
        on(() -> model.put(OptionalInt.empty(), model.openBefore().get(0).asDone()));
        assertEquals(List.of("Mend the guard"), model.openBefore().stream().map(PlannedAction::what).toList());
        assertTrue(PlannedAction.of(saved().document(), "actions").get(0).done());
    }

    @Test
    void actionsAreAddedChangedAndTakenOut() throws Exception {
        PlannedAction fresh = model.fresh();
        assertEquals("OST-LZ-019 2026-09-29", fresh.assetId() + " " + fresh.by().orElseThrow());
        on(() -> model.put(OptionalInt.empty(), fresh.with("what", "one")));
        on(() -> model.put(OptionalInt.empty(), fresh.with("what", "two")));
        on(() -> model.put(OptionalInt.of(0), fresh.with("what", "first")));
        assertEquals(List.of("first", "two"), PlannedAction.of(saved().document(), "actions").stream()
                .map(PlannedAction::what).toList());
        on(() -> model.remove(1));
        on(() -> model.remove(0));
        assertFalse(saved().document().has("actions"));
    }

    @Test
    void aPhotoIsKeptUntouchedWithItsTimeAndCaption() throws Exception {
        Path photo = SAMPLES.resolve("photos").resolve("tp-03-spillage.jpg");
        byte[] before = Files.readAllBytes(photo);
        on(() -> model.attach(photo));
        Branch attached = saved().photos().get(0);
        assertArrayEquals(before, Files.readAllBytes(workplace.store().photoFile(attached)));
        assertArrayEquals(before, Files.readAllBytes(photo));
        assertTrue(attached.time("takenAt").isPresent());
        String id = attached.text("id").orElseThrow();
        on(() -> model.caption(id, " left boards "));
        assertEquals("left boards", saved().photos().get(0).text("caption").orElseThrow());
        on(() -> model.detach(id));
        assertEquals(List.of(), saved().photos());
        assertEquals(List.of(), model.photos());
    }

    @Test
    void whatIsNoPhotoIsRefusedInWords() throws Exception {
        Path text = Files.writeString(temp.resolve("notes.jpg"), "these are words and no picture");
        on(() -> model.attach(text));
        assertEquals("pack-photo-kind", model.troubleProperty().get().orElseThrow().code());
        on(() -> model.attach(temp.resolve("none.jpg")));
        assertEquals("photo-unreadable", model.troubleProperty().get().orElseThrow().code());
        assertEquals(List.of(), saved().photos());
    }

    @Test
    void aCompletedSurveyTakesNothingMore() throws Exception {
        workplace.store().append("A. Vale", new Act.SurveyCompleted(ID, "A. Vale"));
        NotesModel completed = Glass.on(() -> new NotesModel(workplace, workplace.store().history(ID).orElseThrow(),
                Optional.empty()));
        Glass.on(() -> {
            completed.put(OptionalInt.empty(), completed.fresh().with("what", "late"));
            completed.attach(SAMPLES.resolve("photos").resolve("tp-03-spillage.jpg"));
            return null;
        });
        app.settle();
        assertEquals(List.of(), PlannedAction.of(saved().document(), "actions"));
        assertEquals(List.of(), saved().photos());
        assertFalse(completed.open());
    }
}
