package bedmark.screen;

import javafx.scene.Node;

/** One screen of the app: a head, a body and a foot. */
public interface Screen {

    Node head();

    Node body();

    Node foot();

    /** Told when the screen is on the stage; puts the focus where work begins. */
    default void shown() {
    }

    /** Told when the tablet is turned, and once before the screen is shown. */
    default void turned(boolean portrait) {
    }

    /** Told when the screen leaves the stage: what was typed is saved, and nothing listens on. */
    default void left() {
    }

    /** Told when the same work is shown anew in other words or another light: what is being typed goes on. */
    default void replaced() {
        left();
    }
}
