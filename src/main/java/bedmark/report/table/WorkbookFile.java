package bedmark.report.table;

import java.io.IOException;
import java.io.OutputStream;
import java.util.List;
import org.dhatim.fastexcel.Workbook;
import org.dhatim.fastexcel.Worksheet;

/**
 * Tables as a workbook (Office Open XML): a sheet each with typed cells, and one that says what each column is. Texts
 * are cells of text whatever they begin with, so that none can become a formula.
 */
public final class WorkbookFile {
    /** What one cell holds at most. */
    private static final int LONGEST = 32_767;
    private static final String MOMENT = "yyyy-mm-dd hh:mm";
    private static final String HEAD = "F7F5EF";
    private static final int WIDE = 48;
    private static final int NARROW = 9;

    private WorkbookFile() {
    }

    /**
     * Writes a workbook.
     *
     * @param dictionary what each column of the tables is
     * @param version    of the program, as a workbook keeps it: digits and points
     */
    public static void write(List<Table<?>> tables, Table<?> dictionary, String version, OutputStream out)
            throws IOException {
        try (Workbook workbook = new Workbook(out, "Bedmark", version)) {
            for (Table<?> table : tables) {
                sheet(table, workbook);
            }
            sheet(dictionary, workbook);
        }
    }

    private static <R> void sheet(Table<R> table, Workbook workbook) throws IOException {
        Worksheet sheet = workbook.newWorksheet(table.title());
        int[] widths = new int[table.columns().size()];
        for (int column = 0; column < widths.length; column++) {
            String head = table.columns().get(column).head();
            sheet.value(0, column, clean(head));
            widths[column] = Math.min(WIDE / 2, head.length());
        }
        sheet.range(0, 0, 0, widths.length - 1).style().bold().wrapText(true).verticalAlignment("top").fillColor(HEAD)
                .set();
        int line = 1;
        for (R row : table.rows()) {
            List<Cell> cells = table.cells(row);
            for (int column = 0; column < widths.length; column++) {
                widths[column] = Math.max(widths[column], put(cells.get(column), sheet, line, column));
            }
            line++;
        }
        for (int column = 0; column < widths.length; column++) {
            sheet.width(column, Math.max(NARROW, Math.min(WIDE, widths[column] + 2)));
        }
        sheet.freezePane(0, 1);
        if (line > 1) {
            sheet.setAutoFilter(0, 0, line - 1, widths.length - 1);
        }
        sheet.finish();
    }

    /** @return how many characters wide it is */
    private static int put(Cell cell, Worksheet sheet, int line, int column) {
        if (cell instanceof Cell.Text text) {
            String clean = clean(text.value());
            sheet.value(line, column, clean);
            return clean.length();
        } else if (cell instanceof Cell.Number number) {
            sheet.value(line, column, number.value());
            return NARROW;
        } else if (cell instanceof Cell.Flag flag) {
            sheet.value(line, column, flag.value());
        } else if (cell instanceof Cell.Moment moment) {
            sheet.value(line, column, moment.value().toLocalDateTime());
            sheet.style(line, column).format(MOMENT).set();
            return MOMENT.length();
        }
        return 0;
    }

    /** What no XML may hold becomes a replacement sign; what is longer than a cell is cut. */
    private static String clean(String text) {
        String clean = text.replaceAll("[\\p{Cntrl}&&[^\\t\\n\\r]]|[\\uFFFE\\uFFFF]|\\p{Cs}", "\uFFFD");
        return clean.length() > LONGEST ? clean.substring(0, LONGEST - 1) + "…" : clean;
    }
}
