package bedmark.screen.office;

import bedmark.document.Branch;
import bedmark.json.SurveyForm;
import bedmark.office.Conflict;
import bedmark.office.Difference;
import bedmark.report.ConflictTelling;
import bedmark.report.SideTelling;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.util.List;
import java.util.function.Consumer;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** The sides of a conflict beside each other: who recorded each, what it comes to, and where they differ. */
final class ConflictView extends VBox {
    /** What differs beyond these is counted: a person decides by the first of them. */
    private static final int SHOWN = 12;

    private final GridPane grid = new GridPane();

    /** @param settle decides for the side of that digest */
    ConflictView(Conflict conflict, List<Branch> forms, Wording wording, Consumer<String> settle) {
        getStyleClass().add("conflict");
        ConflictTelling telling = new ConflictTelling(wording, SurveyForm.of(conflict.sides().get(0).survey(), forms));
        SideTelling sides = new SideTelling(wording);
        Label kind = Texts.wrapped(sides.kind(conflict));
        grid.getStyleClass().add("sides");
        columns(conflict.sides().size());
        List<Difference> differences = conflict.differences();
        int row = 0;
        for (Difference difference : differences.subList(0, Math.min(SHOWN, differences.size()))) {
            row++;
            Label name = Texts.wrapped(telling.name(difference));
            name.getStyleClass().add("soft");
            grid.add(name, 0, row);
            for (int i = 0; i < difference.values().size(); i++) {
                grid.add(Texts.wrapped(telling.value(difference, i)), i + 1, row);
            }
        }
        for (int i = 0; i < conflict.sides().size(); i++) {
            Conflict.Side side = conflict.sides().get(i);
            VBox card = new VBox();
            card.getStyleClass().add("side-card");
            sides.side(side).forEach(line -> card.getChildren().add(Texts.wrapped(line)));
            grid.add(card, i + 1, 0);
            grid.add(button(side, wording, settle), i + 1, row + 1);
        }
        getChildren().addAll(kind, grid);
        if (differences.size() > SHOWN) {
            getChildren().add(Texts.wrapped(wording.text("office.side.more", differences.size() - SHOWN)));
        } else if (differences.isEmpty()) {
            getChildren().add(Texts.wrapped(wording.text("office.side.same")));
        }
    }

    private void columns(int sides) {
        for (int i = 0; i <= sides; i++) {
            ColumnConstraints column = new ColumnConstraints();
            column.setPercentWidth(100.0 / (sides + 1));
            column.setHgrow(Priority.ALWAYS);
            grid.getColumnConstraints().add(column);
        }
    }

    private static Node button(Conflict.Side side, Wording wording, Consumer<String> settle) {
        ActionButton button = new ActionButton(Weight.PLAIN, wording.text("office.story.counts"), () ->
                settle.accept(side.copy().digest()));
        button.setId("settle-" + side.copy().digest().substring(0, 12));
        return button;
    }
}
