package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Progress;
import bedmark.office.register.Table;
import bedmark.office.register.Tables;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Names and cells of what the office writes for other programs. */
class ExportNamesTest {

    @Test
    void aLongPlantIdGetsAFolderNameThatFitsAndIsItsOwn() {
        String longId = "ñ".repeat(300);
        assertEquals("ostermere", OfficeExport.folderName("ostermere"));
        assertTrue(("plant=" + OfficeExport.folderName(longId)).length() <= 255);
        assertNotEquals(OfficeExport.folderName(longId + "a"), OfficeExport.folderName(longId + "b"));
        assertTrue(!OfficeExport.folderName("~").contains("~"), "a short id can't look like a cut one");
    }

    @Test
    void aPlantWithALongIdIsExportedWhole(@TempDir Path folder) throws IOException {
        String id = "ñ".repeat(200);
        Branch document = Offices.sample("round-2026-03").document();
        Bundle bundle = new Bundle(document.with("plant", document.branch("plant").orElseThrow().with("id", id)));
        Path pack = Offices.pack(bundle, folder.resolve("tablet"), folder.resolve("packs/a.zip"));
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            assertInstanceOf(Received.Taken.class, store.receive(pack, "Ida Marsh"));
            new OfficeExport(store).write(folder.resolve("out"), Progress.NONE);
        }
        try (Stream<Path> files = Files.walk(folder.resolve("out/json"))) {
            List<Path> surveys = files.filter(file -> file.endsWith("surveys.jsonl")).toList();
            assertEquals(1, surveys.size());
            assertEquals(document.branches("surveys").size(), Files.readAllLines(surveys.get(0)).size());
        }
    }

    @Test
    void anExportThatIsCutShortLeavesItsFolderEmptyForTheNextAttempt(@TempDir Path folder) throws IOException {
        Path pack = Offices.pack(Offices.sample("round-2026-03"), folder.resolve("tablet"), folder.resolve("a.zip"));
        Path out = Files.createDirectory(folder.resolve("out"));
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            store.receive(pack, "Ida Marsh");
            Progress full = (done, total) -> {
                if (done == total) {
                    throw new Refused(Defect.in(out.toString(), "export-not-saved", "No space left on device"));
                }
            };
            assertThrows(Refused.class, () -> new OfficeExport(store).write(out, full));
            try (Stream<Path> files = Files.list(out)) {
                assertEquals(List.of(), files.toList());
            }
            assertEquals(25, new OfficeExport(store).write(out, Progress.NONE));
        }
    }

    @Test
    void aCellIsQuotedWhereASpreadsheetMightSplitIt() {
        assertEquals("\"a;=1+1\",\"b\t=1\",c\r\n", Csv.row(List.of("a;=1+1", "b\t=1", "c")));
    }

    @Test
    void theImportReadsAQuotedSeparatorBackAsItWas(@TempDir Path folder) throws IOException {
        Path file = Files.writeString(folder.resolve("areas.csv"), Csv.row(List.of("id", "name"))
                + Csv.row(List.of("a1", "a;=1+1")) + Csv.row(List.of("a2", "b\t=1")));
        List<Table.Row> rows = Tables.read(file).get(0).rows();
        assertEquals("a;=1+1", rows.get(1).cells().get(1).text());
        assertEquals("b\t=1", rows.get(2).cells().get(1).text());
    }
}
