package bedmark.screen.zone;

import bedmark.screen.part.FieldBox;
import java.util.ArrayList;
import java.util.List;
import javafx.scene.Parent;
import javafx.scene.control.Labeled;

/** What a row shows, as something that can be compared. */
final class RowSeen {
    private RowSeen() {
    }

    /** All that a row shows, but for the focus, and for what a label is made of once it was laid out. */
    static List<String> in(RowView row) {
        List<String> seen = new ArrayList<>();
        seen.add(row.said().toString());
        look(row, seen);
        return seen;
    }

    private static void look(javafx.scene.Node node, List<String> seen) {
        if (!node.isVisible()) {
            return;
        }
        seen.add(node.getClass().getSimpleName() + " " + node.isManaged()
                + node.getPseudoClassStates().stream().map(Object::toString).filter(state -> !state.contains("focus"))
                        .sorted().toList()
                + (node instanceof Labeled labeled ? " " + labeled.getText() : ""));
        if (node instanceof FieldBox box) {
            seen.add(box.activeProperty().get() + " " + box.freshProperty().get() + " " + box.carriedProperty().get()
                    + " " + box.judgementProperty().get());
        }
        if (node instanceof Parent parent && !(node instanceof Labeled)) {
            parent.getChildrenUnmodifiable().forEach(child -> look(child, seen));
        }
    }
}
