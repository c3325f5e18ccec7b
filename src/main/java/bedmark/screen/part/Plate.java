package bedmark.screen.part;

import javafx.scene.control.Label;

/** A small plate with a word on it. */
public final class Plate extends Label {

    /** What the plate says about its word. */
    public enum Tone {
        PLAIN("plain"),
        /** What is too much or wrong. */
        OVER("over"),
        /** What is not known or not done. */
        FAINT("faint");

        private final String styleClass;

        Tone(String styleClass) {
            this.styleClass = styleClass;
        }
    }

    public Plate(Tone tone, String text) {
        super(text);
        getStyleClass().addAll("plate", tone.styleClass);
        setMinWidth(USE_PREF_SIZE);
    }
}
