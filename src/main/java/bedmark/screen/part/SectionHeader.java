package bedmark.screen.part;

import java.util.Optional;
import javafx.beans.property.StringProperty;
import javafx.scene.control.Label;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;

/** Opens a section: what it is, at the right how far it is, a hairline under both. */
public final class SectionHeader extends HBox {
    private final Label title;
    private Optional<Label> aside = Optional.empty();

    public SectionHeader(String title) {
        getStyleClass().add("section-header");
        this.title = Labels.label("title", title);
        getChildren().add(this.title);
    }

    public StringProperty titleProperty() {
        return title.textProperty();
    }

    /** How far it is; most sections say nothing of it. */
    public StringProperty asideProperty() {
        Label right = aside.orElseGet(() -> {
            Region between = new Region();
            HBox.setHgrow(between, Priority.ALWAYS);
            Label made = Labels.label("aside");
            getChildren().addAll(between, made);
            return made;
        });
        aside = Optional.of(right);
        return right.textProperty();
    }
}
