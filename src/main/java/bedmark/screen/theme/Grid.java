package bedmark.screen.theme;

import javafx.scene.Node;
import javafx.scene.transform.Scale;
import javafx.scene.transform.Translate;

/** Places a drawing that was made on a grid into a box, whatever part of the grid its own bounds cover. */
final class Grid {
    private Grid() {
    }

    static void place(Node node, double scale, double left, double top) {
        node.getTransforms().setAll(new Translate(left, top), new Scale(scale, scale));
    }
}
