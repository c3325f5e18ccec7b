package bedmark.screen.part;

import javafx.beans.property.StringProperty;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;

/** Opens a section: what it is, at the right how far it is, a hairline under both. */
public final class SectionHeader extends HBox {
    private final Label title;
    private final Label aside = Labels.label("aside");

    public SectionHeader(String title) {
        getStyleClass().add("section-header");
        this.title = Labels.label("title", title);
        Region between = new Region();
        HBox.setHgrow(between, Priority.ALWAYS);
        getChildren().addAll(this.title, between, aside);
    }

    public StringProperty titleProperty() {
        return title.textProperty();
    }

    public StringProperty asideProperty() {
        return aside.textProperty();
    }
}
