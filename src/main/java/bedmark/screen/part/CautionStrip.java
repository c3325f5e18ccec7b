package bedmark.screen.part;

import javafx.beans.property.StringProperty;
import javafx.geometry.Pos;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;

/** The caution that stands beside every depth, seal and speed reading: a bar and a sentence. */
public final class CautionStrip extends HBox {
    private final Label text;

    public CautionStrip(String caution) {
        getStyleClass().add("caution");
        setAlignment(Pos.CENTER_LEFT);
        Region bar = new Region();
        bar.getStyleClass().add("bar");
        text = Labels.wrapped("words", caution);
        HBox.setHgrow(text, Priority.ALWAYS);
        getChildren().addAll(bar, text);
    }

    public StringProperty textProperty() {
        return text.textProperty();
    }
}
