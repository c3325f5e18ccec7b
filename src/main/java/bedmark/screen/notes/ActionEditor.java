package bedmark.screen.notes;

import bedmark.screen.pad.NumericPad;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.ChoiceRow;
import bedmark.screen.part.Labels;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.survey.PlannedAction;
import bedmark.screen.part.Pair;
import bedmark.screen.part.WrittenQuestion;
import bedmark.wording.Wording;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import javafx.geometry.Pos;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Control;
import javafx.scene.control.Label;
import javafx.scene.control.TextField;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** Writes one action: what, who, by when, which seal to order, under which number. */
final class ActionEditor extends VBox {
    private static final List<String> PHRASES = List.of("renew-seal", "adjust-boards", "clear", "mend-guard");
    private static final List<String> SEALS = List.of("vertical", "perpendicular", "oblique", "parallel",
            "contactless");

    private final Wording wording;
    private final PlannedAction before;
    private final LocalDate today;
    private final TextField what = new TextField();
    private final TextField who = new TextField();
    private final TextField workOrder = new TextField();
    private final Label day = new Label();
    private final Label gap = Labels.wrapped("trouble-text", "");
    private final HBox seals = new HBox();
    private final Consumer<Optional<NumericPad>> keys;
    private final Consumer<Optional<PlannedAction>> done;
    private Optional<LocalDate> by;
    private Optional<String> sealType;
    private Optional<SealBoxes> boxes = Optional.empty();

    /**
     * @param keys shows the pad beside, or takes it away
     * @param done gets the action, or nothing where the person thought better of it
     */
    ActionEditor(Wording wording, PlannedAction before, LocalDate today, Consumer<Optional<NumericPad>> keys,
                 Consumer<Optional<PlannedAction>> done) {
        this.wording = wording;
        this.before = before;
        this.today = today;
        this.keys = keys;
        this.done = done;
        this.by = before.by();
        this.sealType = before.seal().flatMap(PlannedAction.SealOrder::type);
        getStyleClass().addAll("questions", "action-editor");
        SectionHeader header = new SectionHeader(wording.text("notes.action"));
        header.asideProperty().set(before.assetId().isEmpty() ? "" : wording.text("notes.asset", before.assetId()));
        gap.managedProperty().bind(gap.textProperty().isNotEmpty());
        getChildren().addAll(header, field("action-what", "notes.what", what, before.what()), gap, phrases(),
                new Pair(field("action-who", "notes.who", who, before.who()),
                        field("action-order", "notes.work-order", workOrder, before.workOrder())),
                days(), sealRow(), seals);
        seals.managedProperty().bind(seals.visibleProperty());
        seals.setVisible(false);
        if (before.seal().isPresent()) {
            orderSeal();
        }
    }

    /** Puts the focus where writing begins. */
    void begin() {
        what.requestFocus();
        what.end();
    }

    private VBox field(String id, String question, TextField field, String text) {
        field.setText(text);
        return new WrittenQuestion(id, wording.text(question), field);
    }

    /** What is done most, in one press; more can be written behind it. */
    private HBox phrases() {
        HBox row = new HBox();
        row.getStyleClass().add("row");
        for (String phrase : PHRASES) {
            String words = wording.text("notes.phrase." + phrase);
            ActionButton button = secondary("phrase-" + phrase, words, () -> {
                what.setText(words);
                gap.setText("");
                what.requestFocus();
                what.end();
            });
            button.setMinWidth(0);
            grow(button);
            row.getChildren().add(button);
        }
        return row;
    }

    private VBox days() {
        day.getStyleClass().add("stepped");
        day.setId("action-by");
        grow(day);
        HBox row = new HBox(step("by-day-less", "notes.day-less", -1), day, step("by-day", "notes.day-more", 1),
                step("by-week", "notes.week-more", 7), step("by-month", "notes.month-more", 30),
                secondary("by-none", wording.text("notes.no-day"), () -> setBy(Optional.empty())));
        row.getStyleClass().add("row");
        row.setAlignment(Pos.CENTER);
        setBy(by);
        VBox box = new VBox(new Label(wording.text("notes.by-when")), row);
        box.getStyleClass().add("question");
        return box;
    }

    private ActionButton step(String id, String key, int days) {
        return secondary(id, wording.text(key), () -> setBy(Optional.of(by.orElse(today).plusDays(days))));
    }

    private void setBy(Optional<LocalDate> wanted) {
        by = wanted;
        day.setText(by.map(wording::day).orElse(wording.text("notes.no-day")));
    }

    private HBox sealRow() {
        ActionButton order = secondary("order-seal", wording.text("notes.order-seal"), this::orderSeal);
        HBox row = new HBox(order);
        row.getStyleClass().add("row");
        grow(order);
        row.visibleProperty().bind(seals.visibleProperty().not());
        row.managedProperty().bind(row.visibleProperty());
        return row;
    }

    private void orderSeal() {
        SealBoxes sizes = new SealBoxes(wording, before.seal().orElse(PlannedAction.SealOrder.NONE),
                workOrder::requestFocus);
        boxes = Optional.of(sizes);
        List<ChoiceRow.Option> types = new ArrayList<>();
        for (String type : SEALS) {
            types.add(new ChoiceRow.Option("seal-type-" + type, wording.text("notes.seal." + type),
                    sealType.equals(Optional.of(type)), () -> chooseType(type)));
        }
        ActionButton none = secondary("no-seal", wording.text("notes.no-seal"), () -> {
            boxes = Optional.empty();
            sealType = Optional.empty();
            seals.setVisible(false);
            keys.accept(Optional.empty());
        });
        ChoiceRow kinds = new ChoiceRow(wording.text("notes.seal-to-order"), types);
        kinds.getStyleClass().add("many");
        VBox all = new VBox(kinds, sizes, none);
        none.setMaxWidth(Double.MAX_VALUE);
        all.getStyleClass().add("question");
        HBox.setHgrow(all, Priority.ALWAYS);
        seals.getChildren().setAll(all);
        seals.setVisible(true);
        keys.accept(Optional.of(sizes.keys()));
        sizes.begin();
    }

    private void chooseType(String type) {
        sealType = Optional.of(type);
        seals.lookupAll(".toggle-button").forEach(node -> ((ToggleButton) node)
                .setSelected(("seal-type-" + type).equals(node.getId())));
    }

    /** To keep the action or to think better of it; they stand below and do not scroll away. */
    HBox buttons() {
        ActionButton keep = ActionButton.with(Icon.CHECK, ContentDisplay.LEFT, Weight.PRIMARY,
                wording.text("notes.keep"), this::keep);
        keep.setId("action-keep");
        ActionButton cancel = new ActionButton(Weight.PLAIN, wording.text("screen.cancel"),
                () -> done.accept(Optional.empty()));
        cancel.setId("action-cancel");
        HBox row = new HBox(cancel, keep);
        row.getStyleClass().addAll("row", "editor-buttons");
        grow(cancel);
        grow(keep);
        return row;
    }

    private void keep() {
        if (what.getText().isBlank()) {
            gap.setText(wording.text("notes.what-missing"));
            what.requestFocus();
            return;
        }
        done.accept(written());
    }

    /** The action as it stands; nothing as long as it is not said what is to be done. */
    Optional<PlannedAction> written() {
        if (what.getText().isBlank()) {
            return Optional.empty();
        }
        PlannedAction written = before.with("what", what.getText()).with("who", who.getText())
                .with("workOrder", workOrder.getText());
        PlannedAction dated = by.equals(before.by()) ? written : written.withBy(by);
        return Optional.of(dated.withSeal(boxes.map(sizes -> sizes.order(sealType))
                .orElse(PlannedAction.SealOrder.NONE)));
    }

    private static ActionButton secondary(String id, String text, Runnable action) {
        ActionButton button = new ActionButton(Weight.PLAIN, text, action);
        button.setId(id);
        button.getStyleClass().add("secondary-target");
        return button;
    }

    private static void grow(Control control) {
        control.setMaxWidth(Double.MAX_VALUE);
        control.setPrefWidth(100);
        HBox.setHgrow(control, Priority.ALWAYS);
    }
}
