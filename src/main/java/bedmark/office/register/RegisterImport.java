package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.office.register.Draft.Mapped;
import bedmark.quantity.Unit;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Makes a draft of a register from tables. Rows are added to what is there or change it, by their ids; what a table
 * does not name stays, and so does what an empty cell stands for. A round's points are replaced by the rows of that
 * round. A change made on the screen is taken in likewise, but there an empty cell empties what it stands for.
 */
public final class RegisterImport {
    private static final Pattern HEAD = Pattern.compile("(.*?)\\s*[\\[(]\\s*(.+?)\\s*[\\])]?\\s*");

    private final Meanings meanings;
    private final boolean emptying;
    private final List<Mapped> mapping = new ArrayList<>();
    private final List<Defect> defects = new ArrayList<>();
    private final RegisterRows rows;

    /** A column that is taken in. */
    private record Taken(int index, Column column, Optional<Unit> unit, String head) {
    }

    /** @param emptying whether an empty cell empties what it stands for */
    private RegisterImport(Branch before, Meanings meanings, boolean emptying) {
        this.meanings = meanings;
        this.emptying = emptying;
        this.rows = new RegisterRows(before, defects);
    }

    /**
     * Makes a draft.
     *
     * @param head    {@code plant}, {@code forms} and {@code rounds} as they are
     * @param tables  each named after the list that it holds: {@code plant}, {@code areas}, {@code materials},
     *                {@code conveyors}, {@code transfers}, {@code rounds}, {@code limits}, {@code sealRates},
     *                {@code instruments}
     * @param renamed what columns hold whose heads don't say so, by head: {@code beltWidth}, or {@code beltWidth [mm]}
     */
    public static Draft draft(Branch head, List<Table> tables, Map<String, String> renamed) {
        return draft(head, tables, new Meanings(renamed, Map.of(), Map.of()));
    }

    /**
     * Makes a draft.
     *
     * @param head     {@code plant}, {@code forms} and {@code rounds} as they are
     * @param meanings what tables and columns hold whose names don't say so
     */
    public static Draft draft(Branch head, List<Table> tables, Meanings meanings) {
        RegisterImport work = new RegisterImport(head, meanings, false);
        // What is referred to comes first, in whatever order the tables came.
        for (String list : Column.LISTS.keySet()) {
            tables.stream().filter(table -> work.list(table).equals(list)).forEach(table -> work.take(table, list));
        }
        tables.stream().filter(table -> !meanings.lists().containsKey(table.source()) && work.list(table).isEmpty())
                .forEach(table -> work.defects.add(Defect.in(table.source(), "table-unknown", table.name(),
                        String.join(", ", Column.LISTS.keySet()))));
        work.requireUsed(tables);
        return work.rows.draft(work.mapping);
    }

    /** A name for a column that no table has, or of nothing that a table can hold, was mistyped. */
    private void requireUsed(List<Table> tables) {
        Set<String> heads = new TreeSet<>();
        Set<String> keys = new TreeSet<>();
        for (Table table : tables) {
            Optional.ofNullable(Column.LISTS.get(list(table))).ifPresent(columns -> {
                table.rows().stream().limit(1).forEach(row -> row.cells().forEach(cell -> heads.add(cell.text())));
                columns.forEach(column -> keys.add(column.key()));
            });
        }
        meanings.heads().forEach((head, named) -> {
            if (!heads.contains(head)) {
                defects.add(Defect.in(head, "map-head-unknown", String.join(", ", heads)));
            } else if (mapping.stream().noneMatch(one -> one.head().equals(head) && !one.key().isEmpty())) {
                defects.add(Defect.in(head, "map-key-unknown", named, String.join(", ", keys)));
            }
        });
    }

    /**
     * Makes a draft of one change that a person made on the screen.
     *
     * @throws Refused {@code register-changed-since} where the row is not there any more
     */
    public static Draft changed(Branch head, RegisterChange change) {
        String list = change.list();
        RegisterGrid grid = RegisterGrid.of(head, list);
        RegisterImport work = new RegisterImport(head, Meanings.AS_NAMED, true);
        Optional<Integer> row = change.row().flatMap(grid::row);
        if (row.isEmpty() && change.row().isPresent()) {
            throw new Refused(Defect.in("", "register-changed-since"));
        }
        if (change.removal()) {
            work.rows.remove(list, row.map(grid::identity).orElseThrow());
            return work.rows.draft(work.mapping);
        }
        if (!list.equals(Column.ROUNDS)) {
            work.rows.reserve(grid, row);
        }
        Table table = grid.edit(row.orElse(grid.rows().size()), change.cells());
        if (list.equals(Column.SEAL_RATES)) {
            row.ifPresent(work.rows::release);
        }
        work.take(table, list);
        return work.rows.draft(work.mapping);
    }

    /** The list that a table holds; empty where it holds none. */
    private String list(Table table) {
        String plain = plain(table.name());
        return Optional.ofNullable(meanings.lists().get(table.source())).orElseGet(() ->
                Column.LISTS.keySet().stream().filter(list -> plain(list).equals(plain)).findFirst().orElse(""));
    }

    private static String plain(String text) {
        return text.toLowerCase(Locale.ROOT).replaceAll("[^\\p{L}\\p{N}]", "");
    }

    private void take(Table table, String list) {
        if (table.rows().isEmpty()) {
            defects.add(Defect.in(table.source(), "table-empty"));
            return;
        }
        List<Taken> columns = columns(table, list);
        for (Column column : Column.LISTS.get(list)) {
            if (column.required() && columns.stream().noneMatch(taken -> taken.column().equals(column))) {
                defects.add(Defect.in(table.source(), "table-column-absent", column.key()));
                return;
            }
        }
        int width = table.rows().get(0).cells().size();
        for (Table.Row row : table.rows().subList(1, table.rows().size())) {
            if (row.cells().stream().skip(width).anyMatch(cell -> !cell.text().isEmpty())) {
                defects.add(Defect.in(place(table, row), "row-too-long", Integer.toString(row.cells().size()),
                        Integer.toString(width)));
            } else if (row.cells().size() < width) {
                defects.add(Defect.in(place(table, row), "row-too-short", Integer.toString(row.cells().size()),
                        Integer.toString(width)));
            } else {
                take(table, list, row, columns);
            }
        }
    }

    private List<Taken> columns(Table table, String list) {
        List<Taken> taken = new ArrayList<>();
        List<Table.Cell> heads = table.rows().get(0).cells();
        for (int i = 0; i < heads.size(); i++) {
            String head = heads.get(i).text();
            String meant = meanings.of(table.source(), head);
            Matcher matcher = HEAD.matcher(meant);
            boolean united = matcher.matches();
            String name = united ? matcher.group(1) : meant;
            Optional<Column> column = Column.LISTS.get(list).stream()
                    .filter(one -> plain(one.key()).equals(plain(name))).findFirst();
            Optional<Unit> unit = united ? CellReader.unit(matcher.group(2)) : Optional.empty();
            boolean measured = column.filter(one -> one.kind() instanceof Kind.Measured).isPresent();
            if (measured && united && unit.isEmpty()) {
                defects.add(Defect.in(table.source() + " " + head, "cell-unit-unknown", matcher.group(2)));
            }
            if (column.isPresent() && taken.stream().anyMatch(one -> one.column().equals(column.get()))) {
                defects.add(Defect.in(table.source() + " " + head, "table-column-twice", column.get().key()));
            }
            mapping.add(new Mapped(table.source(), head, list, column.map(Column::key).orElse(""),
                    measured ? unit.map(Unit::code).orElse("") : ""));
            if (column.isPresent()) {
                taken.add(new Taken(i, column.get(), unit, head));
            }
        }
        return taken;
    }

    private static String place(Table table, Table.Row row) {
        return table.source() + ":" + row.number();
    }

    private void take(Table table, String list, Table.Row row, List<Taken> columns) {
        int bad = defects.size();
        Branch old = old(list, row, columns);
        Branch read = Branch.EMPTY;
        Set<String> emptied = new LinkedHashSet<>();
        for (Taken taken : columns) {
            Table.Cell cell = row.cells().get(taken.index());
            String where = place(table, row) + " " + taken.head();
            if (cell.failed()) {
                defects.add(Defect.in(where, "cell-formula-error", cell.text()));
            } else if (!cell.text().isBlank()) {
                read = read(read, old, cell, taken, where);
            } else if (taken.column().required()) {
                defects.add(Defect.in(where, "cell-absent"));
            } else if (emptying) {
                emptied.add(taken.column().key());
            }
        }
        if (defects.size() == bad) {
            rows.put(list, read, emptied, place(table, row));
        }
    }

    /** The row that is there already under the id that a table's row has. */
    private Branch old(String list, Table.Row row, List<Taken> columns) {
        Branch named = Branch.EMPTY;
        for (Taken taken : columns) {
            named = named.with(taken.column().key(), row.cells().get(taken.index()).text());
        }
        return rows.before(list, RegisterLists.id(list, named));
    }

    private Branch read(Branch row, Branch old, Table.Cell cell, Taken taken, String where) {
        Column column = taken.column();
        String text = cell.text();
        if (old.has(column.key()) && RegisterTables.cell(old, column.key()).strip().equals(text)) {
            // What holds already may hold on, whoever let it in.
            return row.with(column.key(), old.get(column.key()).orElseThrow());
        }
        try {
            Node value = CellReader.read(cell, column.kind(), taken.unit());
            if (column.kind() instanceof Kind.Reference reference && !rows.has(reference.list(), text)) {
                throw new CellReader.Unfit("cell-reference-unknown", text, reference.list());
            }
            return row.with(column.key(), value);
        } catch (CellReader.Unfit e) {
            defects.add(new Defect(e.code(), where, e.details()));
            return row;
        }
    }
}
