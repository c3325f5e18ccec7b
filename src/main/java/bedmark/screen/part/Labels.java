package bedmark.screen.part;

import javafx.scene.control.Label;

/** Makes labels by the class that the style sheet knows them by. */
public final class Labels {
    private Labels() {
    }

    public static Label label(String styleClass) {
        Label label = new Label();
        label.getStyleClass().add(styleClass);
        return label;
    }

    public static Label label(String styleClass, String text) {
        Label label = label(styleClass);
        label.setText(text);
        return label;
    }

    /** A label that takes as many lines as its text needs. */
    public static Label wrapped(String styleClass, String text) {
        Label label = label(styleClass, text);
        label.setWrapText(true);
        label.setMinHeight(Label.USE_PREF_SIZE);
        return label;
    }
}
