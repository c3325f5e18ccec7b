package bedmark.office.register;

import bedmark.document.Branch;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;

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

    /** The keys of a list that every row must have. */
    private static List<String> required(String list) {
        return Column.LISTS.get(list).stream().filter(Column::required).map(Column::key).toList();
    }

    /** What a row is known by among the others. */
    public List<String> identity(int row) {
        List<String> named = Column.identity(list);
        return IntStream.range(0, keys.size()).filter(i -> named.contains(keys.get(i)))
                .mapToObj(i -> rows.get(row).get(i)).toList();
    }

    /** The row that is known by that. */
    Optional<Integer> row(List<String> identity) {
        return IntStream.range(0, rows.size()).filter(row -> identity(row).equals(identity)).boxed().findFirst();
    }

    /**
     * The table that changes cells of one row: what the row must have, and these cells. A row after the last one is
     * new. Since a round is replaced by its rows, all of them stand there.
     *
     * @param cells texts by key
     */
    Table edit(int row, Map<String, String> cells) {
        boolean fresh = row >= rows.size();
        List<Integer> taken = IntStream.range(0, keys.size()).filter(i -> cells.containsKey(keys.get(i))
                || list.equals(Column.ROUNDS) || !fresh && required(list).contains(keys.get(i))).boxed().toList();
        List<Table.Row> made = new ArrayList<>();
        made.add(new Table.Row(1, taken.stream().map(i -> new Table.Cell(keys.get(i), false)).toList()));
        List<String> edited = IntStream.range(0, keys.size()).mapToObj(i -> cells.getOrDefault(keys.get(i),
                fresh ? "" : rows.get(row).get(i)).strip()).toList();
        if (list.equals(Column.ROUNDS)) {
            IntStream.range(0, rows.size()).filter(i -> i != row && rows.get(i).get(0).equals(edited.get(0)))
                    .forEach(i -> made.add(new Table.Row(i + 1, cells(renamed(rows.get(i), edited, cells), taken))));
            made.add(fresh ? made.size() : place(row, edited), new Table.Row(row + 1, cells(edited, taken)));
        } else {
            made.add(new Table.Row(row + 1, cells(edited, taken)));
        }
        return new Table(list, list, made);
    }

    /** Where the edited row stands among those of its round, after the head. */
    private int place(int row, List<String> edited) {
        return 1 + (int) rows.subList(0, row).stream().filter(one -> one.get(0).equals(edited.get(0))).count();
    }

    /** A round has one name, which is written in each of its rows. */
    private List<String> renamed(List<String> other, List<String> edited, Map<String, String> cells) {
        int name = keys.indexOf("name");
        return IntStream.range(0, keys.size()).mapToObj(i -> i == name && cells.containsKey("name")
                ? edited.get(i) : other.get(i)).toList();
    }

    private static List<Table.Cell> cells(List<String> row, List<Integer> taken) {
        return taken.stream().map(i -> new Table.Cell(row.get(i), false)).toList();
    }
}
