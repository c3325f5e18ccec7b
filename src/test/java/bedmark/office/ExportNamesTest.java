package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.office.register.Table;
import bedmark.office.register.Tables;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
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
