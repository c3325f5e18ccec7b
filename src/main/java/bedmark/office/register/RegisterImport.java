package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.json.BundleReader;
import bedmark.json.Canonical;
import bedmark.office.register.Draft.Mapped;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Makes a draft of a register from tables. Rows are added to what is there or change it, by their ids; what a table
 * does not name stays. A round's points are replaced by the rows of that round.
 */
public final class RegisterImport {
    private static final Pattern HEAD = Pattern.compile("(.*?)\\s*[\\[(]\\s*(.+?)\\s*[\\])]?\\s*");

    private final Map<String, String> renamed;
    private final Map<String, Map<String, Branch>> lists = new LinkedHashMap<>();
    private final Map<String, Map<String, String>> places = new HashMap<>();
    private final List<Mapped> mapping = new ArrayList<>();
    private final List<Defect> defects = new ArrayList<>();
    private final Set<String> roundsBegun = new HashSet<>();
    private final Branch before;
    private int added;
    private int changed;
    private int same;

    /** A column that is taken in. */
    private record Taken(int index, Column column, Optional<Unit> unit, String head) {
    }

    private RegisterImport(Branch before, Map<String, String> renamed) {
        this.before = before;
        this.renamed = renamed;
        Branch plant = before.branch("plant").orElse(Branch.EMPTY);
        for (String list : Column.LISTS.keySet()) {
            Map<String, Branch> rows = new LinkedHashMap<>();
            held(plant, list).forEach(row -> rows.put(id(list, row), row));
            lists.put(list, rows);
            places.put(list, new HashMap<>());
        }
    }

    private List<Branch> held(Branch plant, String list) {
        if (list.equals(Column.ROUNDS)) {
            return before.branches("rounds");
        } else if (list.equals(Column.LIMITS)) {
            List<Branch> rows = new ArrayList<>();
            plant.branch("limits").orElse(Branch.EMPTY).members().forEach((rule, limit) -> {
                if (limit instanceof Branch branch && isRule(rule)) {
                    rows.add(branch.with("rule", rule));
                }
            });
            return rows;
        }
        return plant.branches(list);
    }

    private static boolean isRule(String key) {
        return Column.LISTS.get(Column.LIMITS).get(0).kind() instanceof Kind.Word word && word.words().contains(key);
    }

    private static String id(String list, Branch row) {
        return switch (list) {
            case Column.LIMITS -> row.text("rule").orElse("");
            case Column.SEAL_RATES -> row.text("type").orElse("") + " " + row.text("condition").orElse("");
            default -> row.text("id").orElse("");
        };
    }

    /**
     * Makes a draft.
     *
     * @param head    {@code plant}, {@code forms} and {@code rounds} as they are
     * @param tables  each named after the list that it holds: {@code areas}, {@code materials}, {@code conveyors},
     *                {@code transfers}, {@code rounds}, {@code limits}, {@code sealRates}
     * @param renamed what columns hold whose heads don't say so, by head: {@code beltWidth}, or {@code beltWidth [mm]}
     */
    public static Draft draft(Branch head, List<Table> tables, Map<String, String> renamed) {
        RegisterImport work = new RegisterImport(head, renamed);
        // What is referred to comes first, in whatever order the tables came.
        for (String list : Column.LISTS.keySet()) {
            tables.stream().filter(table -> list(table.name()).equals(Optional.of(list)))
                    .forEach(table -> work.take(table, list));
        }
        tables.stream().filter(table -> list(table.name()).isEmpty()).forEach(table -> work.defects.add(
                Defect.in(table.source(), "table-unknown", table.name(),
                        String.join(", ", Column.LISTS.keySet()))));
        Branch made = work.made();
        if (work.defects.isEmpty()) {
            work.proveWhole(made);
        }
        return new Draft(made, work.mapping, work.defects, work.added, work.changed, work.same);
    }

    private static Optional<String> list(String name) {
        String plain = plain(name);
        return Column.LISTS.keySet().stream().filter(list -> plain(list).equals(plain)).findFirst();
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
            String meant = renamed.getOrDefault(head, head);
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
        Branch read = Branch.EMPTY;
        for (Taken taken : columns) {
            Table.Cell cell = taken.index() < row.cells().size() ? row.cells().get(taken.index())
                    : new Table.Cell("", false);
            String where = place(table, row) + " " + taken.head();
            if (cell.failed()) {
                defects.add(Defect.in(where, "cell-formula-error", cell.text()));
            } else if (cell.text().isBlank()) {
                if (taken.column().required()) {
                    defects.add(Defect.in(where, "cell-absent"));
                }
            } else {
                read = read(read, cell.text(), taken, where);
            }
        }
        if (defects.size() == bad) {
            put(list, read, place(table, row));
        }
    }

    private Branch read(Branch row, String text, Taken taken, String where) {
        try {
            Node value = CellReader.read(text, taken.column().kind(), taken.unit());
            if (taken.column().kind() instanceof Kind.Reference reference
                    && !lists.get(reference.list()).containsKey(text)) {
                throw new CellReader.Unfit("cell-reference-unknown", text, reference.list());
            }
            return row.with(taken.column().key(), value);
        } catch (CellReader.Unfit e) {
            defects.add(new Defect(e.code(), where, e.details()));
            return row;
        }
    }

    private void put(String list, Branch row, String where) {
        String id = id(list, row);
        if (list.equals(Column.ROUNDS)) {
            point(id, row, where);
            return;
        }
        String twice = places.get(list).putIfAbsent(id, where);
        if (twice != null) {
            defects.add(Defect.in(where, "row-twice", id, twice));
            return;
        }
        Branch old = lists.get(list).getOrDefault(id, Branch.EMPTY);
        Branch merged = row.members().entrySet().stream().reduce(old, (made, member) ->
                saysTheSame(made.get(member.getKey()), member.getValue()) ? made
                        : made.with(member.getKey(), member.getValue()), (one, other) -> other);
        count(list, id, merged);
        if (plausible(list, merged, where)) {
            lists.get(list).put(id, merged);
        }
    }

    /** The same number in the same unit keeps what else is known of it, such as how it was typed. */
    private static boolean saysTheSame(Optional<Node> before, Node now) {
        return before.filter(old -> old instanceof Branch one && now instanceof Branch other
                && one.get("value").equals(other.get("value")) && one.get("unit").equals(other.get("unit")))
                .isPresent();
    }

    private void count(String list, String id, Branch merged) {
        Branch old = lists.get(list).get(id);
        if (old == null) {
            added++;
        } else if (old.equals(merged)) {
            same++;
        } else {
            changed++;
        }
    }

    private void point(String id, Branch row, String where) {
        Branch old = lists.get(Column.ROUNDS).getOrDefault(id, Branch.EMPTY.with("id", id));
        Branch round = roundsBegun.add(id) ? old.with("points", new Node.Series(List.of())) : old;
        List<Node> points = new ArrayList<>(round.series("points"));
        String transfer = row.text("transfer").orElseThrow();
        if (points.stream().anyMatch(point -> point instanceof Branch one
                && one.text("transfer").equals(Optional.of(transfer)))) {
            defects.add(Defect.in(where, "row-point-twice", transfer, id));
            return;
        }
        points.add(Branch.EMPTY.with("transfer", transfer));
        Branch longer = round.with("points", new Node.Series(points));
        added++;
        lists.get(Column.ROUNDS).put(id, row.text("name").map(name -> longer.with("name", name)).orElse(longer));
    }

    /** What no single cell tells. */
    private boolean plausible(String list, Branch row, String where) {
        int bad = defects.size();
        if (list.equals("conveyors")) {
            lessThan(row.quantity("centreRollLength"), row.quantity("beltWidth"), where, "row-roll-over-belt");
        } else if (list.equals("transfers")) {
            Branch conveyor = lists.get("conveyors").getOrDefault(row.text("conveyor").orElse(""), Branch.EMPTY);
            lessThan(row.quantity("skirtSpacing"), conveyor.quantity("beltWidth"), where, "row-boards-over-belt");
        } else if (list.equals(Column.LIMITS)) {
            limits(row, where);
        }
        for (String key : List.of("tag", "assetId")) {
            if (list.equals("conveyors") || list.equals("transfers")) {
                row.text(key).ifPresent(text -> once(list, key, text, id(list, row), where));
            }
        }
        return defects.size() == bad;
    }

    private void once(String list, String key, String text, String id, String where) {
        lists.get(list).values().stream().filter(other -> !id(list, other).equals(id)
                        && other.text(key).equals(Optional.of(text))).findFirst()
                .ifPresent(other -> defects.add(Defect.in(where, "row-name-twice", key, text, id(list, other))));
    }

    private void lessThan(Optional<Quantity> small, Optional<Quantity> large, String where, String code) {
        if (small.isPresent() && large.isPresent() && Quantity.BY_SIZE.compare(small.get(), large.get()) >= 0) {
            defects.add(Defect.in(where, code, show(small.get()), show(large.get())));
        }
    }

    private static String show(Quantity quantity) {
        return quantity.value().toPlainString() + " " + quantity.unit().code();
    }

    private void limits(Branch row, String where) {
        var near = row.number("near");
        var over = row.number("overloaded");
        if (near.isPresent() && over.isPresent() && near.get().compareTo(over.get()) > 0) {
            defects.add(Defect.in(where, "row-limits-crossed", near.get().toPlainString(),
                    over.get().toPlainString()));
        }
    }

    private Branch made() {
        Branch plant = before.branch("plant").orElse(Branch.EMPTY);
        for (String list : List.of("areas", "materials", "conveyors", "transfers", Column.SEAL_RATES)) {
            List<Node> rows = new ArrayList<>(lists.get(list).values());
            if (!rows.isEmpty() || plant.has(list)) {
                plant = plant.with(list, new Node.Series(rows));
            }
        }
        Branch limits = plant.branch("limits").orElse(Branch.EMPTY);
        for (Map.Entry<String, Branch> limit : lists.get(Column.LIMITS).entrySet()) {
            limits = limits.with(limit.getKey(), limit.getValue().without("rule"));
        }
        if (!limits.members().isEmpty()) {
            plant = plant.with("limits", limits);
        }
        return before.with("plant", plant).with("rounds",
                new Node.Series(new ArrayList<>(lists.get(Column.ROUNDS).values())));
    }

    /** The whole must be what a bundle may hold. */
    private void proveWhole(Branch head) {
        try {
            BundleReader.read(Canonical.bytes(head.with("format", "bedmark.bundle").with("version", Node.number(1))
                    .with("surveys", new Node.Series(List.of()))));
        } catch (Refused e) {
            defects.add(e.defect().below(Pointer.ROOT));
        }
    }
}
