package bedmark.office.register;

import bedmark.document.Branch;
import java.util.ArrayList;
import java.util.List;

/**
 * One list of a register as a grid of texts.
 *
 * @param list its name
 * @param keys the columns' keys
 * @param rows the cells, each with its unit
 */
public record RegisterGrid(String list, List<String> keys, List<List<String>> rows) {

    /** The lists that there are. */
    public static List<String> lists() {
        return List.copyOf(Column.LISTS.keySet());
    }

    /** A list of what holds today. */
    public static RegisterGrid of(Branch head, String list) {
        List<String> keys = Column.LISTS.get(list).stream().map(Column::key).toList();
        return new RegisterGrid(list, keys, RegisterTables.rows(head, list).stream().map(row ->
                keys.stream().map(key -> RegisterTables.cell(row, key)).toList()).toList());
    }

    /** The table that changes one cell: the row's identity and that cell. A row after the last one is new. */
    public Table edit(int row, String key, String text) {
        List<String> heads = new ArrayList<>();
        List<Table.Cell> cells = new ArrayList<>();
        for (int i = 0; i < keys.size(); i++) {
            boolean edited = keys.get(i).equals(key);
            if (edited || Column.LISTS.get(list).get(i).required() && row < rows.size()) {
                heads.add(keys.get(i));
                cells.add(new Table.Cell(edited ? text.strip() : rows.get(row).get(i), false));
            }
        }
        return new Table(list, list, List.of(new Table.Row(1, heads.stream().map(head -> new Table.Cell(head, false))
                .toList()), new Table.Row(row + 1, cells)));
    }
}
