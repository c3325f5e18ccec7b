package bedmark.report.table;

import bedmark.office.Csv;
import java.io.IOException;
import java.time.format.DateTimeFormatter;

/**
 * A table as CSV (RFC 4180): plain numbers with a decimal point, times as in RFC 3339, keys and UCUM units in the head,
 * whatever the language.
 */
public final class CsvTable {
    private CsvTable() {
    }

    public static <R> void write(Table<R> table, Appendable out) throws IOException {
        out.append(Csv.row(table.columns().stream().map(Column::code).toList()));
        for (R row : table.rows()) {
            out.append(Csv.row(table.cells(row).stream().map(CsvTable::plain).toList()));
        }
    }

    /** What stands in the file, before it is guarded and quoted. */
    static String plain(Cell cell) {
        if (cell instanceof Cell.Text text) {
            return text.value();
        } else if (cell instanceof Cell.Number number) {
            return number.value().toPlainString();
        } else if (cell instanceof Cell.Flag flag) {
            return Boolean.toString(flag.value());
        } else if (cell instanceof Cell.Moment moment) {
            return DateTimeFormatter.ISO_OFFSET_DATE_TIME.format(moment.value());
        }
        return "";
    }
}
