package bedmark.screen.part;

import java.util.Optional;
import javafx.scene.Node;
import javafx.scene.Scene;

/** Does work in each frame once all is laid out, before it is drawn. */
public final class AfterLayout {
    private AfterLayout() {
    }

    /** Does it in every frame of the scene that the node stands in, for as long as it stands there. */
    public static void in(Node node, Runnable work) {
        // Another listener of the same frame may have taken the node away.
        Runnable whileThere = () -> Optional.ofNullable(node.getScene()).ifPresent(scene -> work.run());
        moved(null, node.getScene(), whileThere);
        node.sceneProperty().addListener((property, before, now) -> moved(before, now, whileThere));
    }

    private static void moved(Scene before, Scene now, Runnable work) {
        Optional.ofNullable(before).ifPresent(scene -> scene.removePostLayoutPulseListener(work));
        Optional.ofNullable(now).ifPresent(scene -> scene.addPostLayoutPulseListener(work));
    }
}
