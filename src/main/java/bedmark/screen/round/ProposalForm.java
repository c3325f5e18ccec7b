package bedmark.screen.round;

import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Labels;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.screen.part.Pair;
import bedmark.screen.part.WrittenQuestion;
import bedmark.wording.Wording;
import java.util.List;
import java.util.Optional;
import javafx.geometry.Pos;
import javafx.scene.control.Label;
import javafx.scene.control.TextField;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** Proposes a transfer point that the register does not hold. */
final class ProposalForm extends VBox {
    private final Wording wording;
    private final RoundModel model;
    private final Runnable close;
    private final TextField tag = new TextField();
    private final TextField from = new TextField();
    private final TextField onto = new TextField();
    private final TextField note = new TextField();
    private final Label gap = Labels.wrapped("trouble-text", "");
    private final Label place = new Label();
    private int after;

    /** @param close goes back to the list */
    ProposalForm(Wording wording, RoundModel model, Runnable close) {
        this.wording = wording;
        this.model = model;
        this.close = close;
        getStyleClass().addAll("proposal-form", "questions");
        List<RoundRow> rows = model.rowsProperty().get();
        after = model.nextToDo("").map(row -> Math.max(0, rows.indexOf(row) - 1)).orElse(rows.size() - 1);
        gap.managedProperty().bind(gap.textProperty().isNotEmpty());
        getChildren().addAll(new SectionHeader(wording.text("walk.propose.title")),
                Labels.wrapped("words", wording.text("walk.propose.words")),
                field("propose-tag", "walk.propose.tag", tag), gap,
                new Pair(field("propose-from", "walk.propose.from", from),
                        field("propose-onto", "walk.propose.onto", onto)),
                field("propose-note", "walk.propose.note", note), placeRow(), buttons());
    }

    void begin() {
        tag.requestFocus();
    }

    private VBox field(String id, String question, TextField field) {
        return new WrittenQuestion(id, wording.text(question), field);
    }

    private HBox placeRow() {
        place.getStyleClass().add("stepped");
        place.setMaxWidth(Double.MAX_VALUE);
        HBox.setHgrow(place, Priority.ALWAYS);
        HBox row = new HBox(step("propose-earlier", "\u2212 1", -1), place, step("propose-later", "+ 1", 1));
        row.getStyleClass().add("row");
        row.setAlignment(Pos.CENTER);
        move(0);
        return row;
    }

    private ActionButton step(String id, String words, int by) {
        ActionButton button = new ActionButton(Weight.PLAIN, words, () -> move(by));
        button.setId(id);
        button.getStyleClass().add("secondary-target");
        return button;
    }

    private void move(int by) {
        List<RoundRow> rows = model.rowsProperty().get();
        after = Math.max(0, Math.min(rows.size() - 1, after + by));
        place.setText(rows.isEmpty() ? "" : wording.text("walk.propose.after", rows.get(after).tag()));
    }

    private HBox buttons() {
        ActionButton cancel = new ActionButton(Weight.PLAIN, wording.text("screen.cancel"), close);
        cancel.setId("propose-cancel");
        ActionButton send = new ActionButton(Weight.PRIMARY, wording.text("walk.propose.send"), this::send);
        send.setId("propose-send");
        HBox row = new HBox(cancel, send);
        row.getStyleClass().add("row");
        for (ActionButton button : List.of(cancel, send)) {
            button.setMaxWidth(Double.MAX_VALUE);
            button.setPrefWidth(100);
            HBox.setHgrow(button, Priority.ALWAYS);
        }
        return row;
    }

    private void send() {
        if (tag.getText().isBlank()) {
            gap.setText(wording.text("walk.propose.tag-missing"));
            tag.requestFocus();
            return;
        }
        List<RoundRow> rows = model.rowsProperty().get();
        model.propose(tag.getText(), from.getText(), onto.getText(),
                rows.isEmpty() ? Optional.empty() : Optional.of(rows.get(after).transfer()), note.getText(), close);
    }
}
