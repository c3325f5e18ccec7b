package bedmark.screen.arrival;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Defect;
import bedmark.engine.verdict.Level;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.pack.FileKind;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import java.util.concurrent.BlockingQueue;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What the window of a file that came decides, without a window: the test's own thread is the screen's. */
class ArrivalModelTest {
    private static final int PATIENCE_SECONDS = 30;

    @TempDir
    private Path home;

    private final BlockingQueue<Runnable> screen = new LinkedBlockingQueue<>();
    private Path pack;

    @BeforeEach
    void pack() {
        pack = Offices.pack(Offices.sample("round-under-way"), home.resolve("tablet"), home.resolve("stick/round.zip"));
    }

    private ArrivalModel model() {
        return new ArrivalModel(pack, FileKind.PACK, home, Offices.NOW, screen::add, (title, begin) ->
                Optional.empty());
    }

    private void next() throws InterruptedException {
        Runnable task = screen.poll(PATIENCE_SECONDS, TimeUnit.SECONDS);
        assertTrue(task != null, "the work goes on");
        task.run();
    }

    private void settle(ArrivalModel model) throws InterruptedException {
        while (model.errand().running() || model.receptionProperty().get()
                .filter(open -> open.desk().progressProperty().get() >= 0).isPresent()) {
            next();
        }
    }

    @Test
    void surveysAreJudgedAsTheOfficeDoesAndStandWorstFirst() throws Exception {
        Bundle bundle = Offices.sample("round-under-way");
        Map<UUID, Level> judged = new HashMap<>();
        new Assessor(bundle.register()).assess(bundle.surveys()).forEach(one ->
                judged.put(one.survey().id(), one.assessment().worstLevel()));
        try (ArrivalModel model = model()) {
            settle(model);
            List<ArrivedSurvey> surveys = assertInstanceOf(Arrived.Pack.class, model.arrivedProperty().get()
                    .orElseThrow()).surveys();
            assertEquals(judged.size(), surveys.size());
            List<ArrivedSurvey> counted = surveys.stream().filter(one -> one.inspected() && !one.replaced()).toList();
            counted.forEach(one -> assertEquals(judged.get(one.survey().id()), one.level()));
            assertEquals(counted.stream().map(ArrivedSurvey::level).sorted(Comparator.reverseOrder()).toList(),
                    counted.stream().map(ArrivedSurvey::level).toList());
            assertEquals(counted, surveys.subList(0, counted.size()));
        }
    }

    @Test
    void proofThatIsStoppedShowsNothingOfThePackAndCanBeginAgain() throws Exception {
        try (ArrivalModel model = model()) {
            model.errand().cancel();
            settle(model);
            assertEquals(Optional.of("pack-cancelled"), model.errand().troubleProperty().get().map(Defect::code));
            assertTrue(model.arrivedProperty().get().isEmpty());
            model.prove();
            settle(model);
            assertTrue(model.arrivedProperty().get().isPresent());
        }
    }

    @Test
    void officeIsKnownWhileItIsThere() throws Exception {
        Path office = home.resolve("office");
        try (ArrivalModel model = model()) {
            settle(model);
            assertEquals(Optional.empty(), model.knownOffice());
            Offices.trusting(office, home.resolve("tablet")).close();
            model.receive(office);
            settle(model);
            assertTrue(model.receptionProperty().get().orElseThrow().in());
        }
        try (ArrivalModel model = model()) {
            assertEquals(Optional.of(office), model.knownOffice());
            Files.move(office, home.resolve(OfficeStore.USUAL_FOLDER));
            assertEquals(Optional.of(home.resolve(OfficeStore.USUAL_FOLDER)), model.knownOffice());
        }
    }

    @Test
    void officeThatIsInUseIsNamedAsSuch() throws Exception {
        Path office = home.resolve("office");
        try (OfficeStore open = Offices.trusting(office); ArrivalModel model = model()) {
            settle(model);
            model.receive(open.folder());
            settle(model);
            assertEquals(Optional.of("store-locked"), model.errand().troubleProperty().get().map(Defect::code));
            assertTrue(model.preferences().officeFolder().isEmpty());
        }
    }
}
