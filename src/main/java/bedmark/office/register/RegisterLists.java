package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Node;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/** The lists of a register by the ids of their rows, as its document holds them. */
final class RegisterLists {
    /** The lists that a plant's document holds as they are. */
    private static final List<String> PLAIN = List.of("areas", "materials", "conveyors", "transfers",
            Column.SEAL_RATES, Column.INSTRUMENTS);

    private RegisterLists() {
    }

    /** The rows of one list, by id; a round is one of them, with all its points. */
    static Map<String, Branch> of(Branch head, String list) {
        Branch plant = head.branch("plant").orElse(Branch.EMPTY);
        Map<String, Branch> rows = new LinkedHashMap<>();
        switch (list) {
            case Column.PLANT -> rows.put(plant.text("id").orElse(""), PlantSheet.of(plant));
            case Column.ROUNDS -> head.branches("rounds").forEach(row -> rows.put(id(list, row), row));
            case Column.LIMITS -> plant.branch("limits").orElse(Branch.EMPTY).members().forEach((rule, limit) -> {
                if (limit instanceof Branch branch && isRule(rule)) {
                    rows.put(rule, branch.with("rule", rule));
                }
            });
            default -> plant.branches(list).forEach(row -> rows.put(id(list, row), row));
        }
        return rows;
    }

    private static boolean isRule(String key) {
        return Column.LISTS.get(Column.LIMITS).get(0).kind() instanceof Kind.Word word && word.words().contains(key);
    }

    /** What a row is known by in its list; of a round's rows the round is. */
    static String id(String list, Branch row) {
        List<String> keys = list.equals(Column.ROUNDS) ? List.of("id") : Column.identity(list);
        return keys.stream().map(key -> row.text(key).orElse("")).collect(Collectors.joining(" "));
    }

    /** The head with these lists in it; what is in no list stays as it was. */
    static Branch into(Branch head, Map<String, Map<String, Branch>> lists) {
        Branch plant = head.branch("plant").orElse(Branch.EMPTY);
        for (Branch row : lists.get(Column.PLANT).values()) {
            plant = PlantSheet.into(plant, row);
        }
        for (String list : PLAIN) {
            List<Node> rows = new ArrayList<>(lists.get(list).values());
            if (!rows.isEmpty() || plant.has(list)) {
                plant = plant.with(list, new Node.Series(rows));
            }
        }
        Branch limits = limits(plant.branch("limits").orElse(Branch.EMPTY), of(head, Column.LIMITS),
                lists.get(Column.LIMITS));
        if (!limits.members().isEmpty() || plant.has("limits")) {
            plant = plant.with("limits", limits);
        }
        List<Node> rounds = new ArrayList<>(lists.get(Column.ROUNDS).values());
        Branch made = head.with("plant", plant);
        return rounds.isEmpty() && !head.has("rounds") ? made : made.with("rounds", new Node.Series(rounds));
    }

    private static Branch limits(Branch held, Map<String, Branch> before, Map<String, Branch> now) {
        Branch limits = held;
        for (String rule : before.keySet()) {
            limits = now.containsKey(rule) ? limits : limits.without(rule);
        }
        for (Map.Entry<String, Branch> limit : now.entrySet()) {
            Branch said = limit.getValue().without("rule");
            if (!limit.getValue().equals(before.get(limit.getKey()))) {
                limits = said.members().isEmpty() ? limits.without(limit.getKey()) : limits.with(limit.getKey(), said);
            }
        }
        return limits;
    }
}
