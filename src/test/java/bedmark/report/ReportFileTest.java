package bedmark.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Refused;
import bedmark.journal.Progress;
import bedmark.office.OfficeStore;
import bedmark.quantity.UnitSystem;
import bedmark.report.paper.PaperSize;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.stream.Stream;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ReportFileTest {
    @TempDir
    static Path folder;
    private static OfficeStore store;
    private static ReportContent content;

    @TempDir
    Path into;
    private Path former;

    @BeforeAll
    static void open() {
        store = Reports.demo(folder);
        content = Reports.content(store);
    }

    @AfterAll
    static void close() {
        store.close();
    }

    @BeforeEach
    void writeFormer() throws IOException {
        former = Files.writeString(into.resolve("report.pdf"), "the former report");
    }

    private static ReportOptions options(Progress progress) {
        ReportOptions usual = Reports.options(Locale.ENGLISH, UnitSystem.METRIC, PaperSize.A4, Reports.photos(store));
        return new ReportOptions(usual.wording(), usual.paper(), usual.photos(), usual.version(), progress);
    }

    /** Work that is to stop as soon as it can. */
    private static final class Stopping implements Progress {
        @Override
        public void at(long done, long total) {
            assertTrue(total > 0);
        }

        @Override
        public boolean cancelled() {
            return true;
        }
    }

    private void requireFormerAlone() throws IOException {
        assertEquals("the former report", Files.readString(former));
        try (Stream<Path> files = Files.list(into)) {
            assertEquals(1, files.count());
        }
    }

    @Test
    void aStoppedReportLeavesTheFormerOneAndNoPart() throws IOException {
        for (ReportFile.Kind kind : ReportFile.Kind.values()) {
            assertFalse(ReportFile.write(former, kind, content, options(new Stopping())), kind.toString());
            requireFormerAlone();
        }
        assertTrue(ReportFile.write(former, ReportFile.Kind.CSV, content, options(Progress.NONE)));
        assertTrue(Files.readString(former).contains("TP-01"));
    }

    @Test
    void aReportThatFailsHalfwayLeavesNoPart() throws IOException {
        assertThrows(IllegalStateException.class, () -> ReportFile.write(former, ReportFile.Kind.PDF, content,
                options((done, total) -> {
                    throw new IllegalStateException();
                })));
        requireFormerAlone();
    }

    @Test
    void aFolderDoesNotGiveWayToAReport() throws IOException {
        Path place = Files.createDirectory(into.resolve("d.pdf"));
        Refused refused = assertThrows(Refused.class, () -> ReportFile.write(place, ReportFile.Kind.PDF, content,
                options(Progress.NONE)));
        assertEquals("file-is-folder", refused.defect().code());
        assertTrue(Files.isDirectory(place));
    }
}
