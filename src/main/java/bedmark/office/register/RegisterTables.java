package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.office.Csv;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** A register as CSV tables, which an import takes back as they are. */
public final class RegisterTables {
    private RegisterTables() {
    }

    /** The tables by file name; empty lists have none. */
    public static Map<String, String> of(Branch head) {
        Map<String, String> files = new LinkedHashMap<>();
        Column.LISTS.forEach((list, columns) -> {
            List<Branch> rows = rows(head, list);
            if (!rows.isEmpty()) {
                StringBuilder text = new StringBuilder(Csv.row(columns.stream().map(Column::key).toList()));
                rows.forEach(row -> text.append(Csv.row(columns.stream().map(column -> cell(row, column.key()))
                        .toList())));
                files.put(list + ".csv", text.toString());
            }
        });
        return files;
    }

    /** The rows of a list. */
    static List<Branch> rows(Branch head, String list) {
        Branch plant = head.branch("plant").orElse(Branch.EMPTY);
        List<Branch> rows = new ArrayList<>();
        if (list.equals(Column.ROUNDS)) {
            for (Branch round : head.branches("rounds")) {
                round.branches("points").forEach(point -> rows.add(round.without("points")
                        .with("transfer", point.text("transfer").orElse(""))));
            }
        } else if (list.equals(Column.LIMITS)) {
            plant.branch("limits").orElse(Branch.EMPTY).members().forEach((rule, limit) -> {
                if (limit instanceof Branch branch && (branch.has("near") || branch.has("overloaded")
                        || branch.has("enabled"))) {
                    rows.add(branch.with("rule", rule));
                }
            });
            rows.removeIf(row -> row.text("rule").equals(Optional.of("certainty")));
        } else if (list.equals(Column.SEAL_RATES)) {
            plant.branches(list).stream().filter(row -> row.has("type")).forEach(rows::add);
        } else {
            rows.addAll(plant.branches(list));
        }
        return rows;
    }

    /** A cell as text, a quantity with its unit. */
    static String cell(Branch row, String key) {
        return row.get(key).map(node -> {
            if (node instanceof Branch quantity) {
                return quantity.asQuantity().value().toPlainString() + " " + quantity.asQuantity().unit().code();
            } else if (node instanceof Node.Decimal number) {
                return number.value().toPlainString();
            } else if (node instanceof Node.Flag flag) {
                return Boolean.toString(flag.value());
            }
            return node instanceof Node.Text text ? text.value() : "";
        }).orElse("");
    }
}
