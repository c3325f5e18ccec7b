package bedmark.screen.part;

import javafx.css.PseudoClass;
import javafx.geometry.Pos;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;
import javafx.scene.layout.VBox;

/** Shows a figure: its caption, below it the number and, smaller, what belongs to the number. */
public final class FigureBlock extends VBox {
    private static final PseudoClass WORD = PseudoClass.getPseudoClass("word");

    private final Label caption = Labels.label("caption");
    private final Label value = Labels.label("value");
    private final Label detail = Labels.label("detail");

    public FigureBlock() {
        getStyleClass().add("figure");
        HBox row = new HBox(value, detail);
        row.getStyleClass().add("row");
        row.setAlignment(Pos.BASELINE_LEFT);
        value.setMinWidth(USE_PREF_SIZE);
        getChildren().addAll(caption, row);
        setAccessibleText("");
    }

    public void show(Figure figure) {
        caption.setText(figure.caption());
        value.setText(figure.value());
        value.pseudoClassStateChanged(WORD, figure.value().chars().noneMatch(Character::isDigit));
        detail.setText(figure.detail());
        setAccessibleText(figure.caption() + " " + figure.value() + " " + figure.detail());
    }
}
