package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.verdict.Certainty;
import java.math.BigDecimal;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * What a plant's document says of the plant as a whole, as one row of a table: its name, the drag method that the site
 * chose, what a kWh costs and emits, and how sure a verdict must be.
 */
final class PlantSheet {
    static final List<Column> COLUMNS = List.of(Column.id(), Column.text("name"),
            Column.word("method", Stream.of(DragMethod.values()).map(DragMethod::code).toList()),
            Column.number("energyPrice", false, null), Column.text("currency"),
            Column.number("co2Factor", false, null), Column.number("overloadedFrom", true, "1"),
            Column.number("undecidedFrom", true, "1"), Column.number("nearFrom", true, "1"));

    private static final List<String> OF_PLANT = List.of("id", "name", "method", "co2Factor");
    private static final Map<String, List<String>> DEEPER = Map.of("energyPrice", List.of("tariff", "energy"),
            "currency", List.of("tariff", "currency"), "overloadedFrom", List.of("limits", "certainty", "overloaded"),
            "undecidedFrom", List.of("limits", "certainty", "undecided"),
            "nearFrom", List.of("limits", "certainty", "near"));

    private PlantSheet() {
    }

    /** The row of a plant. */
    static Branch of(Branch plant) {
        Branch row = Branch.EMPTY;
        for (Column column : COLUMNS) {
            Branch holder = plant;
            List<String> path = path(column.key());
            for (String step : path.subList(0, path.size() - 1)) {
                holder = holder.branch(step).orElse(Branch.EMPTY);
            }
            Optional<Node> said = holder.get(path.get(path.size() - 1));
            row = said.isPresent() ? row.with(column.key(), said.get()) : row;
        }
        return row;
    }

    /** The plant as its row says; what the row does not know of stays. */
    static Branch into(Branch plant, Branch row) {
        Branch made = plant;
        Branch before = of(plant);
        for (Column column : COLUMNS) {
            if (!row.get(column.key()).equals(before.get(column.key()))) {
                made = with(made, path(column.key()), row.get(column.key()));
            }
        }
        return made;
    }

    private static List<String> path(String key) {
        return OF_PLANT.contains(key) ? List.of(key) : DEEPER.get(key);
    }

    private static Branch with(Branch holder, List<String> path, Optional<Node> value) {
        String step = path.get(0);
        if (path.size() > 1) {
            Branch deeper = with(holder.branch(step).orElse(Branch.EMPTY), path.subList(1, path.size()), value);
            return deeper.members().isEmpty() ? holder.without(step) : holder.with(step, deeper);
        }
        return value.map(node -> holder.with(step, node)).orElseGet(() -> holder.without(step));
    }

    /** What is wrong with a plant's row that no single cell tells. */
    static Optional<Defect> proof(Branch row, String where) {
        Certainty standard = Certainty.standard();
        BigDecimal undecided = row.number("undecidedFrom").orElse(BigDecimal.valueOf(standard.undecided()));
        BigDecimal overloaded = row.number("overloadedFrom").orElse(BigDecimal.valueOf(standard.overloaded()));
        return undecided.compareTo(overloaded) > 0 ? Optional.of(Defect.in(where, "row-certainty-crossed",
                undecided.toPlainString(), overloaded.toPlainString())) : Optional.empty();
    }
}
