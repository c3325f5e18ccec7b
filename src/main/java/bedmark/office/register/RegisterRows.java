package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.json.BundleReader;
import bedmark.json.Canonical;
import bedmark.office.register.Draft.Mapped;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** The rows of a register while others are put among them: each is proved, and counted by what it changed. */
final class RegisterRows {
    private final Branch before;
    private final List<Defect> defects;
    private final Map<String, Map<String, Branch>> held = new LinkedHashMap<>();
    private final Map<String, Map<String, Branch>> lists = new LinkedHashMap<>();
    private final RegisterProof proof;
    private final Map<String, Map<String, String>> places = new HashMap<>();
    private final Set<String> roundsBegun = new LinkedHashSet<>();
    private Optional<String> released = Optional.empty();
    private int added;
    private int changed;
    private int same;

    /**
     * The rows of a register as it is.
     *
     * @param defects takes what is wrong with what is put in
     */
    RegisterRows(Branch before, List<Defect> defects) {
        this.before = before;
        this.defects = defects;
        this.proof = new RegisterProof(held, lists, before.branch("plant").orElse(Branch.EMPTY)
                .branches("siteFactors"));
        for (String list : Column.LISTS.keySet()) {
            Map<String, Branch> rows = RegisterLists.of(before, list);
            held.put(list, Map.copyOf(rows));
            lists.put(list, rows);
            places.put(list, new HashMap<>());
        }
    }

    /** The row that was there already; empty where there was none. */
    Branch before(String list, String id) {
        return held.get(list).getOrDefault(id, Branch.EMPTY);
    }

    /** Whether there is such a row now. */
    boolean has(String list, String id) {
        return lists.get(list).containsKey(id);
    }

    /** What a change makes of a row must not be another row. */
    void reserve(RegisterGrid grid, Optional<Integer> but) {
        for (int i = 0; i < grid.rows().size(); i++) {
            if (!but.equals(Optional.of(i))) {
                places.get(grid.list()).put(String.join(" ", grid.identity(i)), grid.list() + ":" + (i + 1));
            }
        }
    }

    void remove(String list, List<String> identity) {
        String id = list.equals(Column.ROUNDS) ? identity.get(0) : String.join(" ", identity);
        String where = list + " " + String.join(" ", identity);
        Map<String, Branch> rows = lists.get(list);
        if (list.equals(Column.PLANT)) {
            defects.add(Defect.in(where, "row-plant-stays"));
            return;
        }
        Branch row = rows.remove(id);
        if (list.equals(Column.ROUNDS)) {
            List<Node> left = row.branches("points").stream().filter(point -> !point.text("transfer")
                    .equals(Optional.of(identity.get(1)))).map(Node.class::cast).toList();
            if (!left.isEmpty()) {
                place(rows, id, row.with("points", new Node.Series(left)));
            }
        }
        changed++;
        proof.used(list, id, where).ifPresent(defects::add);
    }

    /** Takes a rate away before it comes back under another name, at the same place among the others. */
    void release(int row) {
        Map<String, Branch> rates = lists.get(Column.SEAL_RATES);
        List<Branch> typed = rates.values().stream().filter(rate -> rate.has("type")).toList();
        released = Optional.of(RegisterLists.id(Column.SEAL_RATES, typed.get(row)));
    }

    /** Puts a row where its id stands, or in addition; what it does not name stays, what is emptied goes. */
    void put(String list, Branch row, Set<String> emptied, String where) {
        String id = RegisterLists.id(list, row);
        if (list.equals(Column.ROUNDS)) {
            point(id, row, emptied, where);
            return;
        }
        if (list.equals(Column.PLANT) && !lists.get(list).containsKey(id)) {
            defects.add(Defect.in(where, "row-other-plant", id, String.join(", ", lists.get(list).keySet())));
            return;
        }
        String twice = places.get(list).putIfAbsent(id, where);
        if (twice != null) {
            defects.add(Defect.in(where, "row-twice", id, twice));
            return;
        }
        Branch old = released.map(before -> lists.get(list).get(before))
                .orElseGet(() -> lists.get(list).getOrDefault(id, Branch.EMPTY));
        Branch merged = old;
        for (Map.Entry<String, Node> member : row.members().entrySet()) {
            merged = saysTheSame(old, row, member.getKey()) ? merged
                    : merged.with(member.getKey(), member.getValue());
        }
        for (String key : emptied) {
            merged = merged.without(key);
        }
        count(old, merged);
        List<Defect> wrong = merged.equals(old) ? List.of() : proof.row(list, merged, where);
        defects.addAll(wrong);
        if (wrong.isEmpty()) {
            place(lists.get(list), id, merged);
        }
    }

    private void place(Map<String, Branch> rows, String id, Branch row) {
        if (released.isEmpty() || released.get().equals(id)) {
            rows.put(id, row);
            return;
        }
        Map<String, Branch> all = new LinkedHashMap<>(rows);
        rows.clear();
        all.forEach((key, other) -> rows.put(key.equals(released.get()) ? id : key,
                key.equals(released.get()) ? row : other));
    }

    /** What is written the same keeps what else is known of it, such as how it was typed. */
    private static boolean saysTheSame(Branch old, Branch row, String key) {
        return old.has(key) && RegisterTables.cell(old, key).equals(RegisterTables.cell(row, key));
    }

    private void count(Branch old, Branch merged) {
        if (old.equals(Branch.EMPTY)) {
            added++;
        } else if (old.equals(merged)) {
            same++;
        } else {
            changed++;
        }
    }

    private void point(String id, Branch row, Set<String> emptied, String where) {
        Branch old = lists.get(Column.ROUNDS).getOrDefault(id, Branch.EMPTY.with("id", id));
        Branch round = roundsBegun.add(id) ? old.with("points", new Node.Series(List.of())) : old;
        List<Node> points = new ArrayList<>(round.series("points"));
        String transfer = row.text("transfer").orElseThrow();
        if (round.branches("points").stream().anyMatch(point -> point.text("transfer").equals(Optional.of(transfer)))) {
            defects.add(Defect.in(where, "row-point-twice", transfer, id));
            return;
        }
        points.add(pointBefore(id, transfer).orElse(Branch.EMPTY.with("transfer", transfer)));
        Branch longer = round.with("points", new Node.Series(points));
        for (String key : emptied) {
            longer = longer.without(key);
        }
        lists.get(Column.ROUNDS).put(id, row.has("name")
                ? longer.with("name", row.get("name").orElseThrow()) : longer);
    }

    /** A point that the round has already, with what else is known of it. */
    private Optional<Branch> pointBefore(String round, String transfer) {
        return before(Column.ROUNDS, round).branches("points").stream()
                .filter(point -> point.text("transfer").equals(Optional.of(transfer))).findFirst();
    }

    /** Rows of rounds are counted once their rounds are whole. */
    private void countRounds() {
        for (String id : roundsBegun) {
            Branch old = before(Column.ROUNDS, id);
            Branch round = lists.get(Column.ROUNDS).getOrDefault(id, old);
            List<Node> kept = round.series("points").stream().filter(old.series("points")::contains).toList();
            added += round.series("points").size() - kept.size();
            if (kept.equals(old.series("points")) && round.without("points").equals(old.without("points"))) {
                same += kept.size();
            } else {
                changed += kept.size();
            }
        }
    }

    /** What has been made, proved as a whole. */
    Draft draft(List<Mapped> mapping) {
        if (defects.isEmpty()) {
            defects.addAll(proof.whole(places));
        }
        countRounds();
        Branch made = RegisterLists.into(before, lists);
        if (defects.isEmpty()) {
            proveWhole(made);
        }
        return new Draft(before, made, mapping, defects, added, changed, same);
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
