package bedmark.screen.part;

import bedmark.screen.theme.Icon;
import bedmark.screen.theme.IconView;
import javafx.scene.control.Button;
import javafx.scene.control.ContentDisplay;

/** A button of full target height, as wide as its text. Where the text is to wrap, give it a smaller minimum width. */
public final class ActionButton extends Button {

    public ActionButton(Weight weight, String text, Runnable action) {
        super(text);
        getStyleClass().addAll("action", weight.styleClass());
        setMinWidth(USE_PREF_SIZE);
        setWrapText(true);
        setAccessibleText(text);
        setOnAction(event -> action.run());
    }

    /** A button with an icon before or after its text. */
    public static ActionButton with(Icon icon, ContentDisplay where, Weight weight, String text, Runnable action) {
        ActionButton button = new ActionButton(weight, text, action);
        button.setGraphic(new IconView(icon));
        button.setContentDisplay(where);
        return button;
    }

    /** A button that shows only its icon; the text is its name for who cannot see it. */
    public static ActionButton of(Icon icon, Weight weight, String name, Runnable action) {
        ActionButton button = with(icon, ContentDisplay.GRAPHIC_ONLY, weight, name, action);
        button.getStyleClass().add("icon-only");
        return button;
    }
}
