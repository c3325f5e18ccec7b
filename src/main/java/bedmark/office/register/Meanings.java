package bedmark.office.register;

import bedmark.quantity.Unit;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What tables and their columns hold where their names don't say so.
 *
 * @param heads   by a column's head, in whatever table: {@code beltWidth}, or {@code beltWidth [mm]}
 * @param columns by one column; empty where it is not taken in
 * @param lists   by a table's source; empty where it is not taken in
 */
public record Meanings(Map<String, String> heads, Map<Head, String> columns, Map<String, String> lists) {
    /** Everything is what its name says. */
    public static final Meanings AS_NAMED = new Meanings(Map.of(), Map.of(), Map.of());

    /** One column of one table. */
    public record Head(String source, String text) {
    }

    public Meanings {
        heads = Map.copyOf(heads);
        columns = Map.copyOf(columns);
        lists = Map.copyOf(lists);
    }

    /**
     * A column of a table holds something else.
     *
     * @param unit its unit; nothing where each cell names its own, or none is needed
     */
    public Meanings with(Head head, String key, Optional<Unit> unit) {
        Map<Head, String> more = new LinkedHashMap<>(columns);
        more.put(head, key + unit.map(one -> " [" + one.code() + "]").orElse(""));
        return new Meanings(heads, more, lists);
    }

    /** A table holds another list; none where that is empty. */
    public Meanings holding(String source, String list) {
        Map<String, String> more = new LinkedHashMap<>(lists);
        more.put(source, list);
        return new Meanings(heads, columns, more);
    }

    String of(String source, String head) {
        return columns.getOrDefault(new Head(source, head), heads.getOrDefault(head, head));
    }

    /** What a column of a list can be. */
    public static List<String> keys(String list) {
        return Column.LISTS.get(list).stream().map(Column::key).toList();
    }

    /** The units that a column can have; none where it is no measured one. */
    public static List<Unit> units(String list, String key) {
        List<Unit> units = new ArrayList<>();
        Column.LISTS.get(list).stream().filter(column -> column.key().equals(key)).forEach(column -> {
            if (column.kind() instanceof Kind.Measured measured) {
                units.addAll(Unit.of(measured.dimension()));
                measured.other().map(Unit::of).ifPresent(units::addAll);
            }
        });
        return units;
    }
}
