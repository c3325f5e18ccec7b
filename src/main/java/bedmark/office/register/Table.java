package bedmark.office.register;

import java.util.List;

/**
 * A table as it was found: the first row that holds anything is its head.
 *
 * @param source file, and sheet where there are several
 * @param name   of the file without its ending, or of the sheet
 */
public record Table(String source, String name, List<Row> rows) {

    /** @param number of the row as a person sees it, from 1 */
    public record Row(int number, List<Cell> cells) {
        public Row {
            cells = List.copyOf(cells);
        }

        boolean blank() {
            return cells.stream().allMatch(cell -> cell.text().isBlank() && !cell.failed());
        }
    }

    /**
     * @param text    as it stands there, without spaces around it
     * @param failed  whether it is the error of a formula
     * @param guarded whether it is said to be a text, whatever it begins with
     */
    public record Cell(String text, boolean failed, boolean guarded) {
        static final Cell BLANK = new Cell("", false);

        Cell(String text, boolean failed) {
            this(text, failed, false);
        }
    }

    public Table {
        rows = rows.stream().filter(row -> !row.blank()).toList();
    }
}
