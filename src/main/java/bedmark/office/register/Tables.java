package bedmark.office.register;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.office.Csv;
import bedmark.office.register.Table.Cell;
import bedmark.office.register.Table.Row;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.StringReader;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.math.MathContext;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.dhatim.fastexcel.reader.CellType;
import org.dhatim.fastexcel.reader.ReadableWorkbook;
import org.dhatim.fastexcel.reader.Sheet;

/** Reads tables: CSV with commas, semicolons or tabs, and workbooks. */
public final class Tables {
    private static final int LARGEST = 64 << 20;
    private static final MathContext WORKBOOK_DIGITS = new MathContext(15);
    private static final Pattern LONG_FRACTION = Pattern.compile("-?[0-9]*\\.[0-9]{10,}(?:E[+-]?[0-9]{1,3})?");

    private Tables() {
    }

    /**
     * The tables of a file.
     *
     * @throws Refused {@code table-…} where it can't be read as what its name says
     */
    public static List<Table> read(Path file) {
        String name = file.getFileName().toString();
        byte[] bytes = bytes(file, name);
        try {
            return name.toLowerCase(Locale.ROOT).endsWith(".xlsx") ? workbook(bytes, name)
                    : List.of(csv(bytes, name));
        } catch (IOException | UncheckedIOException e) {
            throw new Refused(Defect.in(name, "table-unreadable"), e);
        }
    }

    private static byte[] bytes(Path file, String name) {
        try (InputStream input = Files.newInputStream(file)) {
            byte[] bytes = input.readNBytes(LARGEST + 1);
            if (bytes.length > LARGEST) {
                throw new Refused(Defect.in(name, "table-too-large", Integer.toString(LARGEST >> 20)));
            }
            return bytes;
        } catch (IOException e) {
            throw new Refused(Defect.in(name, "table-unreadable"), e);
        }
    }

    private static String stem(String name) {
        return name.contains(".") ? name.substring(0, name.lastIndexOf('.')) : name;
    }

    static Table csv(byte[] bytes, String name) throws IOException {
        String text;
        try {
            text = StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes)).toString();
        } catch (CharacterCodingException e) {
            throw new Refused(Defect.in(name, "table-not-utf8"), e);
        }
        String body = text.startsWith("\uFEFF") ? text.substring(1) : text;
        CSVFormat format = CSVFormat.RFC4180.builder().setDelimiter(delimiter(body)).get();
        List<Row> rows = new ArrayList<>();
        try (CSVParser parser = format.parse(new StringReader(body))) {
            int line = 1;
            for (CSVRecord record : parser) {
                rows.add(new Row(line, Stream.of(record.values()).map(Tables::text).toList()));
                line = (int) parser.getCurrentLineNumber() + 1;
            }
        } catch (UncheckedIOException | IllegalStateException e) {
            throw new Refused(Defect.in(name, "table-quotes-wrong", Integer.toString(rows.size() + 1)), e);
        }
        return new Table(name, stem(name), rows);
    }

    /** A text without the apostrophe that an export put before it. */
    private static Cell text(String cell) {
        boolean guarded = Csv.guarded(cell);
        return new Cell((guarded ? cell.substring(1) : cell).strip(), false, guarded);
    }

    /** What stands most often in the first line, outside of quotes. */
    private static char delimiter(String text) {
        String head = text.lines().filter(line -> !line.isBlank()).findFirst().orElse("").replaceAll("\"[^\"]*\"", "");
        char best = ',';
        for (char candidate : new char[] {';', '\t'}) {
            if (head.chars().filter(c -> c == candidate).count() > head.chars().filter(c -> c == ',').count()) {
                best = candidate;
            }
        }
        return best;
    }

    private static List<Table> workbook(byte[] bytes, String name) {
        List<Table> tables = new ArrayList<>();
        try (InputStream input = new ByteArrayInputStream(bytes);
                ReadableWorkbook workbook = new ReadableWorkbook(input)) {
            for (Sheet sheet : workbook.getSheets().toList()) {
                List<Row> rows = new ArrayList<>();
                try (Stream<org.dhatim.fastexcel.reader.Row> read = sheet.openStream()) {
                    read.forEach(row -> rows.add(new Row(row.getRowNum(), row.stream().map(Tables::cell).toList())));
                }
                tables.add(new Table(name + " / " + sheet.getName(), sheet.getName(), filled(rows)));
            }
        } catch (IOException | RuntimeException e) {
            // The library fails in ways of its own on what is no workbook, or on the half of one.
            throw new Refused(Defect.in(name, "table-no-workbook"), e);
        }
        return tables;
    }

    /** A workbook does not keep the empty cells at the end of a row. */
    private static List<Row> filled(List<Row> rows) {
        int width = rows.stream().filter(row -> !row.blank()).findFirst().map(row -> row.cells().size()).orElse(0);
        return rows.stream().map(row -> new Row(row.number(), Stream.concat(row.cells().stream(),
                Stream.generate(() -> Cell.BLANK).limit(Math.max(0, width - row.cells().size()))).toList())).toList();
    }

    private static Cell cell(org.dhatim.fastexcel.reader.Cell cell) {
        if (cell == null || cell.getType() == CellType.EMPTY) {
            return new Cell("", false);
        }
        if (cell.getType() == CellType.ERROR) {
            return new Cell(String.valueOf(cell.getRawValue()), true);
        }
        if (cell.getValue() instanceof BigDecimal number) {
            return new Cell(shortest(number), false);
        }
        String raw = cell.getRawValue() == null ? "" : cell.getRawValue().strip();
        boolean failed = cell.getType() == CellType.FORMULA && raw.startsWith("#");
        if (cell.getType() == CellType.FORMULA && LONG_FRACTION.matcher(raw).matches()) {
            return new Cell(shortest(new BigDecimal(raw)), false);
        }
        return failed ? new Cell(raw, true) : text(cell.getType() == CellType.STRING ? cell.asString() : raw);
    }

    /** A workbook holds binary numbers: what stands behind their fifteenth digit is noise of the conversion. */
    private static String shortest(BigDecimal number) {
        BigDecimal rounded = number.round(WORKBOOK_DIGITS);
        return (rounded.signum() == 0 ? BigDecimal.ZERO : rounded.stripTrailingZeros()).toPlainString();
    }
}
