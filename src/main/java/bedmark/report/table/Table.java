package bedmark.report.table;

import java.util.List;

/**
 * A table.
 *
 * @param title   in words
 * @param columns at least one
 * @param rows    what each row is about
 * @param <R>     what a row is about
 */
public record Table<R>(String title, List<Column<R>> columns, List<R> rows) {
    public Table {
        columns = List.copyOf(columns);
        rows = List.copyOf(rows);
    }

    /** The cells of a row, in the order of the columns. */
    public List<Cell> cells(R row) {
        return columns.stream().map(column -> column.cell().apply(row)).toList();
    }
}
