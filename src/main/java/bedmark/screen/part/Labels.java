package bedmark.screen.part;

import javafx.scene.control.Label;

/** Makes labels by the class that the style sheet knows them by. */
final class Labels {
    private Labels() {
    }

    static Label label(String styleClass) {
        Label label = new Label();
        label.getStyleClass().add(styleClass);
        return label;
    }

    static Label label(String styleClass, String text) {
        Label label = label(styleClass);
        label.setText(text);
        return label;
    }

    static Label wrapped(String styleClass, String text) {
        Label label = label(styleClass, text);
        label.setWrapText(true);
        label.setMinHeight(Label.USE_PREF_SIZE);
        return label;
    }
}
