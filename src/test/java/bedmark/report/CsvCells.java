package bedmark.report;

import bedmark.report.table.Cell;
import java.time.format.DateTimeFormatter;

/** What a reader is to find in a cell of CSV, written down once more for the tests. */
final class CsvCells {
    private CsvCells() {
    }

    static String plain(Cell cell) {
        if (cell instanceof Cell.Text text) {
            return text.value();
        } else if (cell instanceof Cell.Number number) {
            return number.value().toPlainString();
        } else if (cell instanceof Cell.Flag flag) {
            return Boolean.toString(flag.value());
        } else if (cell instanceof Cell.Moment moment) {
            return moment.value().format(DateTimeFormatter.ISO_OFFSET_DATE_TIME);
        }
        return "";
    }
}
