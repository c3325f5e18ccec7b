package bedmark.screen.part;

import javafx.scene.control.Label;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** Texts that take as many lines as they need. */
public final class Texts {
    private Texts() {
    }

    public static Label wrapped(String text) {
        Label label = new Label(text);
        label.setWrapText(true);
        label.setMinHeight(Region.USE_PREF_SIZE);
        return label;
    }

    /** Something that went wrong. */
    public static Label trouble(String text) {
        Label trouble = wrapped(text);
        trouble.getStyleClass().add("trouble-text");
        return trouble;
    }

    /** A value under its name. */
    public static VBox named(String name, String value) {
        Label caption = new Label(name);
        caption.getStyleClass().add("caption");
        return new VBox(caption, wrapped(value));
    }
}
