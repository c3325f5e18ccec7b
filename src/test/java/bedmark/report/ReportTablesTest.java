package bedmark.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.Result;
import bedmark.engine.uncertainty.Estimate;
import bedmark.office.OfficeStore;
import bedmark.quantity.UnitSystem;
import bedmark.report.paper.PaperSize;
import bedmark.report.table.CsvTable;
import bedmark.report.table.Table;
import bedmark.report.table.WorkbookFile;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDateTime;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.dhatim.fastexcel.reader.Cell;
import org.dhatim.fastexcel.reader.CellType;
import org.dhatim.fastexcel.reader.ReadableWorkbook;
import org.dhatim.fastexcel.reader.Row;
import org.dhatim.fastexcel.reader.Sheet;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The report's numbers, read back by other libraries and by a general office suite. */
class ReportTablesTest {
    private static final double EXACT = 1e-12;

    @TempDir
    static Path folder;
    private static ReportContent content;
    private static ReportTables english;
    private static byte[] workbook;
    private static List<CSVRecord> csv;

    @BeforeAll
    static void write() throws IOException {
        try (OfficeStore store = Reports.demo(folder)) {
            content = Reports.content(store);
        }
        english = tables(Locale.ENGLISH, UnitSystem.METRIC);
        workbook = workbook(english);
        StringBuilder text = new StringBuilder();
        CsvTable.write(english.zones(), text);
        csv = CSVParser.parse(text.toString(), CSVFormat.RFC4180.builder().setHeader().setSkipHeaderRecord(true).get())
                .getRecords();
    }

    private static ReportTables tables(Locale language, UnitSystem units) {
        return new ReportTables(content, Reports.options(language, units, PaperSize.A4, ReportPhotos.NONE));
    }

    private static byte[] workbook(ReportTables tables) throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        WorkbookFile.write(tables.all(), tables.dictionary(), "1.0", out);
        return out.toByteArray();
    }

    private static List<Row> rows(ReadableWorkbook book, String sheet) throws IOException {
        return book.findSheet(sheet).orElseThrow().read();
    }

    private static int column(Row head, String title) {
        for (int i = 0; i < head.getCellCount(); i++) {
            if (head.getCellText(i).equals(title)) {
                return i;
            }
        }
        throw new AssertionError("no column " + title + " in " + head);
    }

    @Test
    void everyZoneIsARowOfTypedCells() throws IOException {
        try (ReadableWorkbook book = new ReadableWorkbook(new ByteArrayInputStream(workbook))) {
            List<Row> rows = rows(book, "Loading zones");
            assertEquals(content.zones().size() + 1, rows.size());
            int tag = column(rows.get(0), "Tag");
            int drag = column(rows.get(0), "Drag of material and seals [N]");
            int at = column(rows.get(0), "Surveyed at");
            for (int i = 0; i < content.zones().size(); i++) {
                ReportZone zone = content.zones().get(i);
                Row row = rows.get(i + 1);
                assertEquals(zone.tag(), row.getCellText(tag));
                Estimate found = zone.examined().orElseThrow().assessment().get(Result.SKIRT_DRAG).orElseThrow();
                assertEquals(CellType.NUMBER, row.getCell(drag).getType());
                assertEquals(found.value(), row.getCellAsNumber(drag).orElseThrow().doubleValue(),
                        EXACT * found.value());
                LocalDateTime surveyed = zone.examined().orElseThrow().at().orElseThrow().toLocalDateTime();
                assertEquals(surveyed.withNano(0), row.getCellAsDate(at).orElseThrow().withNano(0));
            }
        }
    }

    @Test
    void noCellOfTheWorkbookIsAFormula() throws IOException {
        try (ReadableWorkbook book = new ReadableWorkbook(new ByteArrayInputStream(workbook))) {
            Set<CellType> types = new HashSet<>();
            for (Sheet sheet : book.getSheets().toList()) {
                for (Row row : sheet.read()) {
                    row.stream().filter(cell -> cell != null).map(Cell::getType).forEach(types::add);
                }
            }
            assertEquals(Set.of(CellType.STRING, CellType.NUMBER, CellType.BOOLEAN),
                    types.stream().filter(type -> type != CellType.EMPTY).collect(Collectors.toSet()));
        }
    }

    @Test
    void theDictionaryNamesEveryColumnOfEverySheet() throws IOException {
        for (Locale language : List.of(Locale.ENGLISH, Reports.SPANISH)) {
            ReportTables tables = tables(language, UnitSystem.US);
            try (ReadableWorkbook book = new ReadableWorkbook(new ByteArrayInputStream(workbook(tables)))) {
                Set<String> known = rows(book, tables.dictionary().title()).stream().skip(1)
                        .map(row -> row.getCellText(0) + "!" + row.getCellText(1)).collect(Collectors.toSet());
                int columns = 0;
                for (Table<?> table : tables.all()) {
                    Row head = rows(book, table.title()).get(0);
                    columns += head.getCellCount();
                    for (Cell cell : head) {
                        assertTrue(known.contains(table.title() + "!" + cell.getText()), cell.getText());
                    }
                }
                assertEquals(columns, known.size());
            }
        }
    }

    @Test
    void csvIsReadBackExactly() {
        List<List<String>> written = written(english.zones());
        assertEquals(written.size(), csv.size());
        for (int i = 0; i < written.size(); i++) {
            assertEquals(written.get(i), csv.get(i).stream().map(cell -> cell.startsWith("'") ? cell.substring(1)
                    : cell).toList());
        }
    }

    private static <R> List<List<String>> written(Table<R> table) {
        return table.rows().stream().map(row -> table.cells(row).stream().map(CsvCells::plain).toList()).toList();
    }

    @Test
    void csvHasTheSameNumbersInEveryLanguage() throws IOException {
        StringBuilder text = new StringBuilder();
        CsvTable.write(tables(Reports.SPANISH, UnitSystem.METRIC).zones(), text);
        List<CSVRecord> spanish = CSVParser.parse(text.toString(), CSVFormat.RFC4180.builder().setHeader()
                .setSkipHeaderRecord(true).get()).getRecords();
        for (int i = 0; i < csv.size(); i++) {
            Map<String, String> one = csv.get(i).toMap();
            Map<String, String> other = spanish.get(i).toMap();
            assertEquals(one.keySet(), other.keySet());
            one.keySet().stream().filter(key -> !key.equals("because"))
                    .forEach(key -> assertEquals(one.get(key), other.get(key), key));
            assertNotEquals(one.get("because"), other.get("because"));
        }
    }

    @Test
    void usUnitsAreTheSameNumbersConverted() throws IOException {
        StringBuilder text = new StringBuilder();
        CsvTable.write(tables(Locale.ENGLISH, UnitSystem.US).zones(), text);
        List<CSVRecord> us = CSVParser.parse(text.toString(), CSVFormat.RFC4180.builder().setHeader()
                .setSkipHeaderRecord(true).get()).getRecords();
        for (int i = 0; i < csv.size(); i++) {
            double newtons = Double.parseDouble(csv.get(i).get("skirtDrag [N]"));
            double pounds = Double.parseDouble(us.get(i).get("skirtDrag [[lbf_av]]"));
            assertEquals(newtons, pounds * 4.448_221_615_260_5, 1e-9 * newtons);
        }
    }

    @Tag("outside-tool")
    @Test
    void anOfficeSuiteReadsTheSameNumbersFromTheWorkbook() throws Exception {
        Path file = Files.write(folder.resolve("report.xlsx"), workbook);
        OutsideTool.Result result = OutsideTool.in(Map.of("HOME", folder.toString()), "soffice", "--headless",
                "-env:UserInstallation=" + folder.resolve("suite").toUri(), "--convert-to",
                "csv:Text - txt - csv (StarCalc):44,34,76,1,,0,false,false,false,false,false,1", "--outdir",
                folder.resolve("suite-out").toString(), file.toString());
        Path converted;
        try (Stream<Path> files = Files.list(folder.resolve("suite-out"))) {
            converted = files.findFirst().orElseThrow(() -> new AssertionError(result.output()));
        }
        List<CSVRecord> read = CSVParser.parse(Files.readString(converted), CSVFormat.RFC4180.builder().setHeader()
                .setSkipHeaderRecord(true).get()).getRecords();
        assertEquals(csv.size(), read.size());
        for (int i = 0; i < csv.size(); i++) {
            assertEquals(csv.get(i).get("tag"), read.get(i).get("Tag"));
            for (String[] pair : new String[][] {{"skirtDrag [N]", "Drag of material and seals [N]"},
                {"drivePower [kW]", "Power at the motor shaft [kW]"}, {"energy [kW.h/a]", "Energy a year [kW.h/a]"}}) {
                double written = Double.parseDouble(csv.get(i).get(pair[0]));
                assertEquals(written, Double.parseDouble(read.get(i).get(pair[1])), 1e-9 * written, pair[0]);
            }
        }
    }
}
