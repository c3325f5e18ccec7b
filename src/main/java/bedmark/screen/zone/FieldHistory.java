package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.survey.SurveyHistory;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;

/** What happened to one cell: who set it, when, and what stood there before. */
final class FieldHistory {
    private FieldHistory() {
    }

    /**
     * One change of a cell.
     *
     * @param before what stood there
     * @param after  what was put there; nothing where it was cleared
     * @param undone whether it was taken back
     */
    record Step(OffsetDateTime at, String person, Optional<Node> before, Optional<Node> after, boolean undone) {
    }

    /** The changes of the cell at a place, newest first; a change of a whole table counts where it changed the cell. */
    static List<Step> of(SurveyHistory history, Pointer where) {
        List<Step> steps = new ArrayList<>();
        for (SurveyHistory.Change change : history.changes()) {
            Optional<Node> before = inside(change.where(), where, change.before());
            Optional<Node> after = inside(change.where(), where, change.after());
            if (!before.equals(after)) {
                steps.add(new Step(change.at(), change.person(), before, after, change.undone()));
            }
        }
        Collections.reverse(steps);
        return steps;
    }

    /** The part of a changed value that belongs to the cell; nothing where the change lies elsewhere. */
    private static Optional<Node> inside(Pointer changed, Pointer where, Optional<Node> value) {
        if (!changed.holds(where)) {
            return Optional.empty();
        }
        Pointer rest = new Pointer(where.tokens().subList(changed.tokens().size(), where.tokens().size()));
        return rest.isRoot() ? value : value.flatMap(node ->
                Branch.EMPTY.with("value", node).at(new Pointer(withHead(rest))));
    }

    private static List<String> withHead(Pointer rest) {
        List<String> tokens = new ArrayList<>(List.of("value"));
        tokens.addAll(rest.tokens());
        return tokens;
    }
}
