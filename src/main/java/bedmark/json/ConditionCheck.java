package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import java.util.List;
import java.util.Map;

/** Finds conditions that could never mean anything: on fields that are not there, on answers that can't be given. */
final class ConditionCheck {
    private final Map<String, Branch> fields;
    private final List<Defect> found;

    ConditionCheck(Map<String, Branch> fields, List<Defect> found) {
        this.fields = fields;
        this.found = found;
    }

    /** Checks the condition of the field with a key. */
    void check(String owner, Branch condition, Pointer where) {
        for (String key : List.of("all", "any")) {
            List<Branch> inner = condition.branches(key);
            for (int i = 0; i < inner.size(); i++) {
                check(owner, inner.get(i), where.child(key).child(i));
            }
        }
        condition.branch("not").ifPresent(inner -> check(owner, inner, where.child("not")));
        condition.text("field").ifPresent(key -> {
            if (key.equals(owner)) {
                found.add(Defect.at(where.child("field"), "condition-on-itself", key));
            } else if (!fields.containsKey(key)) {
                found.add(Defect.at(where.child("field"), "condition-field-unknown", key));
            } else {
                values(fields.get(key), key, condition, where);
            }
        });
    }

    private void values(Branch field, String key, Branch condition, Pointer where) {
        condition.get("is").filter(value -> !isAnswer(field, value))
                .ifPresent(value -> found.add(Defect.at(where.child("is"), "condition-value-wrong", key)));
        List<Node> values = condition.series("isOneOf");
        for (int i = 0; i < values.size(); i++) {
            if (!isAnswer(field, values.get(i))) {
                found.add(Defect.at(where.child("isOneOf").child(i), "condition-value-wrong", key));
            }
        }
    }

    /** Whether the field could be answered with the value. Quantities and tables are only present or absent. */
    private static boolean isAnswer(Branch field, Node value) {
        return switch (field.text("kind").orElseThrow()) {
            case "text" -> value instanceof Node.Text;
            case "number" -> value instanceof Node.Decimal;
            case "flag" -> value instanceof Node.Flag;
            case "choice" -> field.branches("choices").stream()
                    .anyMatch(choice -> choice.get("code").filter(value::equals).isPresent());
            default -> false;
        };
    }
}
