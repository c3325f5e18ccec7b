package bedmark.screen.part;

import java.util.Optional;
import javafx.scene.Node;
import javafx.scene.Parent;

/**
 * Names of nodes that are as many as a plant has transfer points. As ids of the toolkit each of them, and everything
 * within it, would be given resolved styles of its own, which are kept for as long as the program runs.
 */
public final class Named {
    private Named() {
    }

    /** Names a node. */
    public static void as(Node node, String name) {
        node.getProperties().put(Named.class, name);
    }

    /** Whether a node goes by a name, or by an id. */
    public static boolean is(Node node, String name) {
        return name.equals(node.getId()) || node.hasProperties() && name.equals(node.getProperties().get(Named.class));
    }

    /** The first node at or below another that goes by a name, or by an id. */
    public static Optional<Node> find(Node root, String name) {
        if (is(root, name)) {
            return Optional.of(root);
        }
        if (root instanceof Parent parent) {
            for (Node child : parent.getChildrenUnmodifiable()) {
                Optional<Node> found = find(child, name);
                if (found.isPresent()) {
                    return found;
                }
            }
        }
        return Optional.empty();
    }
}
