package bedmark.screen.zone;

import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.wording.Wording;
import java.util.List;
import javafx.scene.control.ContentDisplay;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;

/**
 * Below a line of a table: one more line behind the last one, and this line taken out. They stand below the last line
 * and below the line in hand; at a station only while its place is in hand, so that its depth stands close to the
 * depths around it.
 */
final class LineButtons extends HBox {
    private final SlotRow row;
    private final ZoneModel model;
    private final ActionButton add;
    private final ActionButton remove;

    LineButtons(SlotRow row, ZoneModel model, Wording wording) {
        this.row = row;
        this.model = model;
        getStyleClass().add("row");
        String key = row.field().key();
        int line = row.line().orElseThrow();
        add = ActionButton.with(Icon.PLUS, ContentDisplay.LEFT, Weight.PLAIN, wording.text("screen.zone.add." + key),
                () -> model.tables().addLine(row.field().where()));
        remove = ActionButton.with(Icon.CROSS, ContentDisplay.LEFT, Weight.PLAIN,
                wording.text("screen.zone.remove-line"), () -> model.tables().removeLine(row.place()));
        boolean last = row.growing().isPresent();
        add.setId(last ? "add-" + key : "add-" + key + "-" + line);
        remove.setId(last ? "remove-" + key : "remove-" + key + "-" + line);
        for (ActionButton button : List.of(add, remove)) {
            button.getStyleClass().add("secondary-target");
            button.setMaxWidth(Double.MAX_VALUE);
            HBox.setHgrow(button, Priority.ALWAYS);
        }
        getChildren().addAll(add, remove);
    }

    void update() {
        boolean last = row.growing().isPresent();
        boolean table = row.slots().size() > 2;
        boolean here = table ? row.slots().contains(model.active()) : row.slots().get(0).equals(model.active());
        boolean written = model.keptProperty().get().at(row.place()).isPresent();
        setVisible(last || here && written);
        setManaged(isVisible());
    }
}
