package bedmark.report.table;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.dhatim.fastexcel.reader.CellType;
import org.dhatim.fastexcel.reader.ReadableWorkbook;
import org.dhatim.fastexcel.reader.Row;
import org.junit.jupiter.api.Test;

/** Names that come from elsewhere stay text, whatever they begin with and hold. */
class HostileCellsTest {
    private static final List<String> NAMES = List.of("=1+1", "+1+1", "-2+3", "@SUM(A1)", "\t=1", "\r=1", "\n=1",
            "=cmd|' /C calc'!A0", "'quoted", "''twice", "a,b", "say \"so\"", "two\r\nlines", "\uFF1D1+1", " =1", "ρ ≤ √2",
            "=HYPERLINK(\"x\",\"y\")", "-", "-5", "1E5", "<b>&amp;</b>", "null", "");

    private static Table<String> table(List<String> names) {
        return new Table<>("names", List.of(new Column<>("name", "Name", "text", "", Cell::text),
                new Column<>("again", "Again", "text", "", Cell::text)), names);
    }

    private static List<CSVRecord> read(List<String> names) throws IOException {
        StringBuilder text = new StringBuilder();
        CsvTable.write(table(names), text);
        return CSVParser.parse(text.toString(), CSVFormat.RFC4180.builder().setHeader().setSkipHeaderRecord(true)
                .setIgnoreEmptyLines(false).get()).getRecords();
    }

    @Test
    void noCellOfCsvBeginsAsAFormulaDoes() throws IOException {
        for (CSVRecord row : read(NAMES)) {
            for (String cell : row) {
                assertTrue(cell.isEmpty() || cell.matches("-?[0-9].*")
                        || "=+-@\t\r\n\uFF1D\uFF0B\uFF0D\uFF20".indexOf(cell.charAt(0)) < 0, cell);
            }
        }
    }

    @Test
    void everyTextIsReadBackWithoutItsGuard() throws IOException {
        List<String> names = new ArrayList<>(NAMES);
        Random random = new Random(20_260_401);
        String signs = "=+-@'\",\r\n\t ;a1é√\uFF1D";
        for (int i = 0; i < 2_000; i++) {
            StringBuilder name = new StringBuilder();
            for (int length = random.nextInt(6); length >= 0; length--) {
                name.append(signs.charAt(random.nextInt(signs.length())));
            }
            names.add(name.toString());
        }
        List<CSVRecord> read = read(names);
        assertEquals(names.size(), read.size());
        for (int i = 0; i < names.size(); i++) {
            for (String cell : read.get(i)) {
                assertEquals(names.get(i), cell.startsWith("'") ? cell.substring(1) : cell);
            }
        }
    }

    @Test
    void everyTextIsACellOfTextInTheWorkbook() throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        List<String> names = NAMES.stream().filter(name -> !name.isEmpty()).toList();
        WorkbookFile.write(List.of(table(names)), new Table<>("dictionary", table(names).columns(), List.of()), "1.0",
                out);
        try (ReadableWorkbook book = new ReadableWorkbook(new ByteArrayInputStream(out.toByteArray()))) {
            List<Row> rows = book.findSheet("names").orElseThrow().read();
            for (int i = 0; i < names.size(); i++) {
                assertEquals(CellType.STRING, rows.get(i + 1).getCell(0).getType(), names.get(i));
                assertEquals(names.get(i).replace("\r\n", "\n").replace('\r', '\n'),
                        rows.get(i + 1).getCellText(0).replace("\r\n", "\n").replace('\r', '\n'));
            }
        }
    }

    @Test
    void whatNoWorkbookMayHoldIsReplacedAndCut() throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        List<String> names = List.of("a\u0000b\u001F\uD800c", "x".repeat(40_000));
        WorkbookFile.write(List.of(table(names)), new Table<>("dictionary", table(names).columns(), List.of()), "1.0",
                out);
        try (ReadableWorkbook book = new ReadableWorkbook(new ByteArrayInputStream(out.toByteArray()))) {
            List<Row> rows = book.findSheet("names").orElseThrow().read();
            assertEquals("a\uFFFDb\uFFFD\uFFFDc", rows.get(1).getCellText(0));
            assertEquals(32_767, rows.get(2).getCellText(0).length());
        }
    }
}
