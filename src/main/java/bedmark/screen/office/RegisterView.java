package bedmark.screen.office;

import bedmark.office.register.Draft;
import bedmark.office.register.RegisterGrid;
import bedmark.screen.Listening;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import bedmark.wording.Wording;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import javafx.scene.Node;
import javafx.scene.Scene;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** The register: its lists as tables whose cells are edited in place, import with its mapping, export, next round. */
final class RegisterView extends VBox {
    private final OfficeDesk desk;
    private final RegisterModel model;
    private final ImportModel importing;
    private final Wording wording;
    private final BorderPane middle = new BorderPane();
    private final ScrollPane drafted = new ScrollPane();

    RegisterView(OfficeDesk desk, RegisterModel model, Listening listening) {
        this.desk = desk;
        this.model = model;
        this.importing = model.importing();
        this.wording = desk.wording();
        getStyleClass().add("room");
        HBox plants = new HBox();
        FlowPane lists = new FlowPane();
        lists.getStyleClass().add("filters");
        plants.managedProperty().bind(plants.visibleProperty());
        plants.getStyleClass().add("filters");
        VBox.setVgrow(middle, Priority.ALWAYS);
        Label written = Texts.wrapped("");
        written.getStyleClass().add("soft");
        listening.to(model.writtenProperty(), path -> {
            written.setText(path.map(one -> wording.text("office.register.saved", one)).orElse(""));
            written.setManaged(path.isPresent());
        });
        RegisterTable table = new RegisterTable(model, wording,
                new Density(desk.preferences().dpi(), Hand.BARE), listening);
        getChildren().addAll(plants, lists, new RegisterRowTools(model, table, wording, buttons(), listening), written,
                middle);
        listening.to(model.gridProperty(), grid -> {
            table.show(grid);
            show(table);
        });
        listening.onChange(importing.draftProperty(), draft -> show(table));
        listening.to(model.plantsProperty(), known -> {
            plants.setVisible(known.size() > 1);
            plants.getChildren().setAll(plants(known));
        });
        for (String list : RegisterGrid.lists()) {
            ToggleButton button = new ToggleButton(RegisterWords.list(wording, list));
            button.setId("list-" + list);
            listening.to(model.listProperty(), shown -> button.setSelected(shown.equals(list)));
            button.setOnAction(event -> {
                button.setSelected(true);
                model.listProperty().set(list);
            });
            lists.getChildren().add(button);
        }
    }

    private List<Node> plants(List<String> known) {
        if (known.size() < 2) {
            return List.of();
        }
        ComboBox<String> plants = new ComboBox<>();
        plants.getItems().setAll(known);
        plants.setValue(model.plantProperty().get().orElse(null));
        plants.setAccessibleText(wording.text("office.register.plant"));
        plants.valueProperty().addListener((property, before, now) -> model.plantProperty().set(Optional.of(now)));
        return List.of(plants);
    }

    private List<Node> buttons() {
        return List.of(button("import", "office.register.import", importing::read),
                button("export", "office.register.export", model::write),
                button("send-round", "office.register.send", model::send));
    }

    private ActionButton button(String id, String key, Consumer<Path> action) {
        ActionButton button = new ActionButton(Weight.PLAIN, wording.text(key), () ->
                desk.folders().choose(wording.text(key), Optional.empty()).ifPresent(action));
        button.setId(id);
        return button;
    }

    private void show(RegisterTable table) {
        Node shown = importing.draftProperty().get().map(this::draft).orElseGet(() ->
                model.gridProperty().get().isPresent() ? table : new Label(wording.text("office.register.none")));
        if (middle.getCenter() != shown) {
            middle.setCenter(shown);
        }
    }

    private Node draft(Draft draft) {
        VBox box = new VBox();
        box.getStyleClass().add("section");
        box.getChildren().add(Texts.wrapped(wording.text(draft.sound() ? "office.import.would"
                : "office.register.unsound", draft.sound() ? draft.added() : draft.defects().size(), draft.changed(),
                draft.same())));
        FlowPane decide = new FlowPane();
        decide.getStyleClass().add("buttons");
        if (draft.sound()) {
            ActionButton take = new ActionButton(Weight.PRIMARY, wording.text("office.register.take"), importing::take);
            take.setId("take-draft");
            decide.getChildren().add(take);
        }
        ActionButton leave = new ActionButton(Weight.PLAIN, wording.text("office.register.leave"), importing::leave);
        leave.setId("leave-draft");
        decide.getChildren().add(leave);
        box.getChildren().add(decide);
        draft.defects().forEach(defect -> box.getChildren().add(Texts.trouble(wording.sentence(defect))));
        box.getChildren().add(new RegisterMapping(importing, draft, wording));
        showDraft(box);
        return drafted;
    }

    /** What is chosen anew stays where it is, with the keys on it. */
    private void showDraft(Node box) {
        Optional<String> held = Optional.ofNullable(getScene()).map(Scene::getFocusOwner).map(Node::getId);
        drafted.setFitToWidth(true);
        drafted.setContent(box);
        box.applyCss();
        held.map(id -> box.lookup("#" + id)).ifPresent(Node::requestFocus);
    }
}
