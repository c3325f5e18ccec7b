package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.office.Csv;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

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
        List<Branch> rows = new ArrayList<>();
        for (Branch row : RegisterLists.of(head, list).values()) {
            if (list.equals(Column.ROUNDS)) {
                row.branches("points").forEach(point -> rows.add(row.without("points")
                        .with("transfer", point.text("transfer").orElse(""))));
            } else if (!list.equals(Column.LIMITS) && !list.equals(Column.SEAL_RATES) || told(row, list)) {
                rows.add(row);
            }
        }
        return rows;
    }

    /** Limits and rates that say something which a table shows. */
    private static boolean told(Branch row, String list) {
        return list.equals(Column.LIMITS) ? row.has("near") || row.has("overloaded") || row.has("enabled")
                : row.has("type");
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
