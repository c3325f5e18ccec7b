package bedmark.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.journal.Progress;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.quantity.UnitSystem;
import bedmark.report.paper.PaperSize;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.apache.pdfbox.text.TextPosition;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A register may hold any text; the report stays on its pages. */
class HostileNamesTest {
    private static final List<String> NAMES = List.of("=HYPERLINK(\"http://x\",\"y\")", "W".repeat(400), "\u202E\u0007right",
            "Каменоломня №5", "🚧 belt", "<b>&amp;", "two\nlines", "(un(bal\\anced", "  ", "ﷺ".repeat(60));

    @TempDir
    private Path folder;

    private static Bundle renamed(Bundle bundle) {
        Branch plant = bundle.document().branch("plant").orElseThrow();
        return new Bundle(bundle.document().with("plant", plant.with("name", "W".repeat(150) + " \u0001<&>")
                .with("transfers", renamed(plant.branches("transfers"), "tag", "from"))
                .with("areas", renamed(plant.branches("areas"), "name"))
                .with("conveyors", renamed(plant.branches("conveyors"), "tag"))));
    }

    private static Node.Series renamed(List<Branch> rows, String... keys) {
        List<Node> renamed = new ArrayList<>();
        for (int i = 0; i < rows.size(); i++) {
            Branch row = rows.get(i);
            for (String key : keys) {
                row = row.with(key, NAMES.get(i % NAMES.size()));
            }
            renamed.add(row);
        }
        return new Node.Series(renamed);
    }

    @Test
    void anyNameStaysOnItsPage() throws IOException {
        Path tablet = folder.resolve("tablet");
        byte[] pdf;
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet)) {
            store.receive(List.of(Offices.pack(renamed(Offices.sample("round-2026-03")), tablet,
                    folder.resolve("round.zip"))), "Ida Marsh", Progress.NONE);
            ReportContent content = Reports.content(store);
            assertTrue(content.examined().size() > 20);
            pdf = Reports.pdf(content, Reports.options(Locale.ENGLISH, UnitSystem.METRIC, PaperSize.LETTER,
                    ReportPhotos.NONE));
        }
        try (PDDocument document = Loader.loadPDF(pdf)) {
            List<TextPosition> outside = new ArrayList<>();
            String text = new PDFTextStripper() {
                @Override
                protected void processTextPosition(TextPosition position) {
                    if (position.getX() < 30 || position.getEndX() > 612 - 30 || position.getY() < 20
                            || position.getY() > 792 - 12) {
                        outside.add(position);
                    }
                    super.processTextPosition(position);
                }
            }.getText(document);
            assertEquals(List.of(), outside.stream().map(position -> position + " at " + position.getX() + ", "
                    + position.getY()).limit(5).toList());
            assertTrue(text.contains("Каменоломня №5"));
        }
    }
}
