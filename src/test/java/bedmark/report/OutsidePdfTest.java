package bedmark.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.office.OfficeStore;
import bedmark.quantity.UnitSystem;
import bedmark.report.paper.PaperSize;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The PDF in the hands of programs that are not ours. */
@Tag("outside-tool")
class OutsidePdfTest {
    @TempDir
    static Path folder;
    private static Path file;
    private static ReportContent content;

    @BeforeAll
    static void write() throws IOException {
        try (OfficeStore store = Reports.demo(folder)) {
            content = Reports.content(store);
            file = Files.write(folder.resolve("report.pdf"), Reports.pdf(content, Reports.options(Locale.ENGLISH,
                    UnitSystem.METRIC, PaperSize.A4, Reports.photos(store))));
        }
    }

    @Test
    void pdftotextFindsEachZoneAndItsNumbers() throws Exception {
        String text = OutsideTool.of("pdftotext", "-layout", file.toString(), "-").output();
        for (ReportZone zone : content.zones()) {
            assertTrue(text.contains("Working of " + zone.tag()), zone.tag());
        }
        String plain = text.replaceAll("[\\s\\u00A0]+", " ");
        assertTrue(plain.contains("1329 ± 530 N"));
        assertTrue(plain.contains("2.38 ± 0.96 kW"));
        assertTrue(plain.contains("ρ"), "a sign that the typeface lacks");
    }

    @Test
    void pdffontsFindsEveryFaceEmbedded() throws Exception {
        List<String> fonts = OutsideTool.of("pdffonts", file.toString()).output().lines().skip(2).toList();
        assertTrue(fonts.size() >= 3, fonts::toString);
        fonts.forEach(line -> assertTrue(line.matches(".*\\byes (yes|no ) yes +\\d+ +\\d+\\s*"), line));
    }

    @Test
    void qpdfFindsNothingWrong() throws Exception {
        OutsideTool.Result result = OutsideTool.of("qpdf", "--check", file.toString());
        assertEquals(0, result.code(), result.output());
        assertTrue(result.output().contains("No syntax or stream encoding errors found"), result.output());
    }

    @Test
    void pdfinfoFindsItTagged() throws Exception {
        String info = OutsideTool.of("pdfinfo", file.toString()).output();
        assertTrue(info.lines().anyMatch(line -> line.matches("Tagged: +yes")), info);
        assertTrue(info.lines().anyMatch(line -> line.startsWith("Title: ") && line.contains("Ostermere")), info);
    }
}
