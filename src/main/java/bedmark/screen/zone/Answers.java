package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Puts one cell's answer into a survey: an answer inside a list sets the whole list. */
final class Answers {
    /** Lines of a table, more than anybody enters. */
    private static final int MOST_LINES = 10_000;

    private Answers() {
    }

    /** What is to be saved for a change of one cell. */
    record Change(Pointer where, Optional<Node> answer) {

        /** The survey with the change in it. */
        Branch in(Branch survey) {
            return answer.map(node -> survey.with(where, node)).orElseGet(() -> survey.without(where));
        }
    }

    /**
     * The change that sets or clears the cell at a place.
     *
     * @param where leads through at most one list
     */
    static Change change(Branch survey, Pointer where, Optional<Node> answer) {
        for (int length = 1; length < where.tokens().size(); length++) {
            int line = Pointer.index(where.tokens().get(length));
            Pointer outer = new Pointer(where.tokens().subList(0, length));
            Optional<Node> there = survey.at(outer);
            if (line >= 0 && line < MOST_LINES && there.map(Node.Series.class::isInstance).orElse(true)) {
                List<Node> items = new ArrayList<>(items(there));
                Pointer inner = new Pointer(where.tokens().subList(length + 1, where.tokens().size()));
                while (items.size() <= line) {
                    items.add(Branch.EMPTY);
                }
                Branch row = items.get(line) instanceof Branch branch ? branch : Branch.EMPTY;
                items.set(line, answer.map(node -> row.with(inner, node)).orElseGet(() -> row.without(inner)));
                return new Change(outer, Optional.of(new Node.Series(items)));
            }
        }
        return new Change(where, answer);
    }

    /** The change that takes a line out of a table. */
    static Change withoutLine(Branch survey, Pointer line) {
        Pointer table = new Pointer(line.tokens().subList(0, line.tokens().size() - 1));
        List<Node> items = new ArrayList<>(items(survey.at(table)));
        int index = Integer.parseInt(line.last());
        if (index < items.size()) {
            items.remove(index);
        }
        return new Change(table, items.isEmpty() ? Optional.empty() : Optional.of(new Node.Series(items)));
    }

    /** The change that adds a line to a table, behind its last one. */
    static Change withLine(Branch survey, Pointer table, Branch row) {
        List<Node> items = new ArrayList<>(items(survey.at(table)));
        items.add(row);
        return new Change(table, Optional.of(new Node.Series(items)));
    }

    private static List<Node> items(Optional<Node> there) {
        return there.filter(Node.Series.class::isInstance).map(node -> ((Node.Series) node).items())
                .orElse(List.of());
    }
}
