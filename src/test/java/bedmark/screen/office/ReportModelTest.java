package bedmark.screen.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import bedmark.journal.Progress;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicReference;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ReportModelTest {
    @TempDir
    Path folder;

    @Test
    void aReportThatAPersonStopsIsToldAsStopped() throws Exception {
        Path tablet = folder.resolve("tablet");
        Path into = Files.createDirectory(folder.resolve("out"));
        OfficeStore store = Offices.trusting(folder.resolve("office"), tablet);
        store.receive(List.of(Offices.pack(Offices.sample("round-2026-03"), tablet, folder.resolve("a.zip"))), "Ida",
                Progress.NONE);
        AtomicReference<OfficeDesk> at = new AtomicReference<>();
        // Whoever is told how far it is stops it at once.
        try (OfficeDesk desk = new OfficeDesk(store, Offices.NOW, told -> {
            told.run();
            at.get().cancel();
        }, (title, last) -> Optional.empty())) {
            at.set(desk);
            ReportModel model = new ReportModel(desk);
            CompletableFuture<ReportModel.Outcome> come = new CompletableFuture<>();
            model.outcomeProperty().addListener((property, before, now) -> now.ifPresent(come::complete));
            model.write(into);
            ReportModel.Outcome outcome = come.get(1, TimeUnit.MINUTES);
            assertFalse(outcome.written());
            assertEquals(into, outcome.file().getParent());
        }
        try (Stream<Path> files = Files.list(into)) {
            assertEquals(0, files.count());
        }
    }
}
