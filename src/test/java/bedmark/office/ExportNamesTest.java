package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;

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
}
