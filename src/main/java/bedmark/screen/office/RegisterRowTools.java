package bedmark.screen.office;

import bedmark.document.Defect;
import bedmark.screen.Listening;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** What is done with rows of the register: a new one begun, one taken away, a refused cell taken back. */
final class RegisterRowTools extends VBox {
    /** More than these would leave the table no room; the others follow as these are mended. */
    private static final int REFUSED_SHOWN = 3;

    private final RegisterModel model;
    private final RegisterTable table;
    private final Wording wording;
    private final List<Node> others;
    private final FlowPane buttons = new FlowPane();
    private final HBox asked = new HBox();
    private final VBox refused = new VBox();
    private Optional<List<String>> leaving = Optional.empty();

    /** @param others what else is done with the register, and is always at hand */
    RegisterRowTools(RegisterModel model, RegisterTable table, Wording wording, List<Node> others,
                     Listening listening) {
        this.model = model;
        this.table = table;
        this.wording = wording;
        this.others = others;
        getStyleClass().add("row-tools");
        buttons.getStyleClass().add("buttons");
        asked.getStyleClass().add("asked");
        asked.managedProperty().bind(asked.visibleProperty());
        refused.managedProperty().bind(refused.visibleProperty());
        getChildren().addAll(buttons, asked, refused);
        listening.onChange(model.freshProperty(), fresh -> show());
        listening.onChange(model.importing().draftProperty(), draft -> {
            leaving = Optional.empty();
            show();
        });
        listening.onChange(model.gridProperty(), grid -> {
            leave(Optional.empty());
            show();
        });
        listening.onChange(table.getSelectionModel().selectedItemProperty(), line -> {
            leave(Optional.empty());
            show();
        });
        listening.onChange(model.staysProperty(), stays -> tell());
        listening.to(model.refusedProperty(), waiting -> tell());
        show();
    }

    private void show() {
        List<Node> shown = new ArrayList<>(others);
        if (model.gridProperty().get().isPresent() && model.importing().draftProperty().get().isEmpty()) {
            shown.addAll(rowTools());
        }
        buttons.getChildren().setAll(shown);
        asked.getChildren().setAll(leaving.map(this::question).orElse(List.of()));
        asked.setVisible(leaving.isPresent());
    }

    private List<Node> question(List<String> row) {
        Label sure = Texts.wrapped(wording.text("office.register.remove-sure", String.join(" ", row)));
        sure.setMaxWidth(Double.MAX_VALUE);
        HBox.setHgrow(sure, Priority.ALWAYS);
        return List.of(sure, button(Weight.PRIMARY, "remove-yes", () -> {
            leave(Optional.empty());
            model.remove(row);
        }), button(Weight.PLAIN, "remove-no", () -> leave(Optional.empty())));
    }

    private void tell() {
        List<Node> told = new ArrayList<>();
        model.staysProperty().get().ifPresent(defect -> told.add(line(defect)));
        model.refusedProperty().get().stream().limit(REFUSED_SHOWN).forEach(waiting -> {
            HBox line = line(RegisterWords.of(wording, waiting.cell(), waiting.why().orElseThrow()));
            line.getChildren().add(button(Weight.PLAIN, "revert", () -> model.revert(waiting.cell())));
            told.add(line);
        });
        refused.getChildren().setAll(told);
        refused.setVisible(!told.isEmpty());
    }

    private List<Node> rowTools() {
        if (model.freshProperty().get()) {
            return List.of(button(Weight.PRIMARY, "add-take", model::takeRow),
                    button(Weight.PLAIN, "leave", () -> {
                        model.leaveRow();
                        table.requestFocus();
                    }));
        }
        boolean plant = model.listProperty().get().equals("plant");
        ActionButton add = button(Weight.PLAIN, "add", () -> {
            model.begin();
            table.begin();
        });
        add.setDisable(plant);
        ActionButton remove = button(Weight.PLAIN, "remove", () -> leave(table.chosen()));
        remove.setDisable(plant || table.chosen().isEmpty());
        return List.of(add, remove);
    }

    private void leave(Optional<List<String>> row) {
        if (!leaving.equals(row)) {
            leaving = row;
            show();
            // The button that was pressed is gone; the keys stay with the question, on the answer that does nothing.
            (row.isPresent() ? asked.getChildren().get(2) : table).requestFocus();
        }
    }

    private ActionButton button(Weight weight, String key, Runnable action) {
        ActionButton button = new ActionButton(weight, wording.text("office.register." + key), action);
        button.setId("row-" + key);
        return button;
    }

    private HBox line(Defect defect) {
        Label sentence = Texts.trouble(wording.sentence(defect));
        sentence.setMaxWidth(Double.MAX_VALUE);
        HBox.setHgrow(sentence, Priority.ALWAYS);
        HBox line = new HBox(sentence);
        line.getStyleClass().add("trouble");
        line.setAlignment(Pos.CENTER_LEFT);
        return line;
    }
}
