package bedmark.screen.part;

import javafx.css.PseudoClass;
import javafx.scene.Node;

/** How a value was judged when its field was left. */
public enum Judgement {
    /** Fine, or not judged. */
    NONE,
    /** Unlikely: asked about once, then believed. */
    QUESTIONED,
    /** Impossible: it holds up completing, never saving. */
    WRONG;

    private static final PseudoClass QUESTIONED_LOOK = PseudoClass.getPseudoClass("questioned");
    private static final PseudoClass WRONG_LOOK = PseudoClass.getPseudoClass("wrong");

    /** Gives a node the look of this judgement, by pseudo-classes: other style classes would be matched all anew. */
    public void dress(Node node) {
        node.pseudoClassStateChanged(QUESTIONED_LOOK, this == QUESTIONED);
        node.pseudoClassStateChanged(WRONG_LOOK, this == WRONG);
    }
}
