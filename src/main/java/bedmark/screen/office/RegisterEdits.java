package bedmark.screen.office;

import bedmark.document.Defect;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What was typed into the register's tables and does not hold yet: kept until it holds or the person takes it back.
 * What waits in one row is tried together, so that two cells that only fit each other can both be mended.
 */
final class RegisterEdits {
    private final Map<Cell, Waiting> waiting = new LinkedHashMap<>();

    /** @param row what the row is known by; nothing for a new one */
    record Cell(String plant, String list, Optional<List<String>> row, String key) {
    }

    /** @param why what is wrong with it; nothing while it is being tried */
    record Waiting(Cell cell, String text, Optional<Defect> why) {
    }

    void typed(Cell cell, String text) {
        waiting.put(cell, new Waiting(cell, text, Optional.empty()));
    }

    Optional<String> text(Cell cell) {
        return Optional.ofNullable(waiting.get(cell)).map(Waiting::text);
    }

    /** What waits in one row, by key. */
    Map<String, String> row(Cell of) {
        Map<String, String> texts = new LinkedHashMap<>();
        waiting.values().stream().filter(one -> sameRow(one.cell(), of)).forEach(one ->
                texts.put(one.cell().key(), one.text()));
        return texts;
    }

    /** The texts of a row hold now; what was typed meanwhile waits on. */
    void hold(Cell of, Map<String, String> tried) {
        waiting.values().removeIf(one -> sameRow(one.cell(), of) && one.text().equals(tried.get(one.cell().key())));
    }

    /** A row was refused: each reason stands at its cell, and what is nobody's own at the cell that was typed last. */
    void refuse(Cell last, Map<String, String> tried, List<Defect> why) {
        List<Waiting> row = waiting.values().stream().filter(one -> sameRow(one.cell(), last)
                && one.text().equals(tried.get(one.cell().key()))).toList();
        List<Defect> left = new ArrayList<>(why);
        for (Waiting one : row) {
            Optional<Defect> own = why.stream().filter(defect -> defect.where().endsWith(" " + one.cell().key()))
                    .findFirst();
            own.ifPresent(left::remove);
            waiting.put(one.cell(), new Waiting(one.cell(), one.text(), own));
        }
        if (!left.isEmpty()) {
            waiting.computeIfPresent(last, (cell, one) -> one.why().isPresent() ? one
                    : new Waiting(cell, one.text(), Optional.of(left.get(0))));
        }
    }

    void forget(Cell cell) {
        waiting.remove(cell);
    }

    void forgetRow(Cell of) {
        waiting.values().removeIf(one -> sameRow(one.cell(), of));
    }

    /** What was refused and waits in one list of one plant. */
    List<Waiting> refused(String plant, String list) {
        return waiting.values().stream().filter(one -> one.why().isPresent()
                && one.cell().plant().equals(plant) && one.cell().list().equals(list)).toList();
    }

    private static boolean sameRow(Cell one, Cell other) {
        return one.plant().equals(other.plant()) && one.list().equals(other.list()) && one.row().equals(other.row());
    }
}
