package bedmark.screen.zone;

import bedmark.document.Node;
import bedmark.form.Choice;
import bedmark.form.Count;
import bedmark.form.Texts;
import bedmark.quantity.BeltState;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.screen.Listening;
import bedmark.screen.pad.NumericPad;
import bedmark.screen.pad.PadCommand;
import bedmark.screen.pad.PadKeyboard;
import bedmark.screen.pad.PadModel;
import bedmark.screen.pad.PadSetup;
import bedmark.screen.pad.PadWords;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.wording.Wording;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import javafx.scene.Parent;
import javafx.scene.control.Button;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.TextArea;
import javafx.scene.control.TextInputControl;
import javafx.scene.input.KeyCode;
import javafx.scene.input.KeyEvent;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Pane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.StackPane;
import javafx.scene.layout.VBox;

/** Where the active cell is filled in: the pad for numbers, buttons for choices, the keyboard for words. */
final class EntryPane extends StackPane {
    private static final int LONGEST_FACE = 7;
    private static final BigDecimal QUARTER = new BigDecimal("0.25");

    private final ZoneModel model;
    private final Wording wording;
    private final PadModel pad = new PadModel(this::command);
    private final NumericPad numericPad;
    private final Runnable history;
    private boolean editing;
    private boolean portrait;
    /** Builds what is shown anew for the other way of holding the tablet; what is in the middle of being typed stays. */
    private Runnable turn = () -> { };

    /** @param history shows what happened to the active cell */
    EntryPane(ZoneModel model, Wording wording, Listening listening, Runnable history) {
        this.model = model;
        this.wording = wording;
        this.history = history;
        this.numericPad = new NumericPad(pad, words(wording), model.undoableProperty());
        getStyleClass().add("entry-pane");
        listening.to(model.inHandProperty(), inHand -> show(inHand.slot()));
        listening.onChange(model.typedProperty(), typed -> taken());
        listening.onChange(model.surveyProperty(), survey -> chosen());
    }

    /** Lets a keyboard do what the pad does, wherever the focus is in that part of the screen. */
    void listenIn(Parent part) {
        PadKeyboard.listen(part, pad);
        part.addEventHandler(KeyEvent.KEY_PRESSED, this::pressed);
        part.addEventHandler(KeyEvent.KEY_TYPED, this::typed);
    }

    /** Where no number is typed, Enter goes on and Shift-Enter back. */
    private void pressed(KeyEvent event) {
        if (event.getCode() == KeyCode.ENTER && isFree(event)) {
            move(event.isShiftDown());
            event.consume();
        }
    }

    /** Where no number is typed, a digit takes the choice of that place. */
    private void typed(KeyEvent event) {
        int digit = event.getCharacter().length() == 1 ? Character.digit(event.getCharacter().charAt(0), 10) : 0;
        if (digit > 0 && isFree(event)) {
            lookupAll(".choice").stream().skip(digit - 1L).findFirst()
                    .ifPresent(choice -> ((Button) choice).fire());
            event.consume();
        }
    }

    /** The pad may have used the key and led on to a cell that has no pad: all handlers of one node hear of a key. */
    private boolean isFree(KeyEvent event) {
        return !event.isConsumed() && pad.setupProperty().get().isEmpty() && !(event.getTarget() instanceof TextInputControl)
                && !(event.getTarget() instanceof Button);
    }

    private void move(boolean back) {
        if (back) {
            model.back();
        } else {
            model.next();
        }
    }

    private static PadWords words(Wording wording) {
        return new PadWords(wording.text("screen.pad.back"), wording.text("screen.pad.next"),
                wording.text("zone.history"), wording.text("screen.pad.undo"), wording.text("screen.pad.backspace"),
                wording.text("screen.pad.decimal"), wording.text("screen.pad.fraction"),
                wording.text("screen.pad.sign"), note -> wording.text("screen.pad.note." + note.code()));
    }

    private void show(Slot slot) {
        turn = () -> { };
        if (!model.open()) {
            pad.close();
            getChildren().clear();
        } else if (slot instanceof Slot.MeasureSlot || slot instanceof Slot.CountSlot) {
            if (!getChildren().equals(List.of(numericPad))) {
                getChildren().setAll(numericPad);
            }
            pad.open(setup(slot), model.editable(), model.typedProperty().get().isEmpty());
        } else if (slot instanceof Slot.TextSlot text && !SlotWords.isMaterial(slot)) {
            pad.close();
            getChildren().setAll(textPane(text));
            focusText();
        } else {
            pad.close();
            getChildren().setAll(choicePane(slot));
            turn = () -> show(slot);
        }
    }

    /** Told when the tablet is turned: there is less height for the keys and more width. */
    void turned(boolean upright) {
        if (portrait != upright) {
            portrait = upright;
            numericPad.turned(upright);
            turn.run();
        }
    }

    /** Puts the focus into the text, where the active cell takes one. */
    void focusText() {
        Optional.ofNullable(lookup("#text-entry")).ifPresent(javafx.scene.Node::requestFocus);
    }

    /** Asks what the belt does, in place of the pad. */
    void askBeltState() {
        VBox pane = new VBox(new SectionHeader(wording.text("screen.belt.ask")));
        pane.getStyleClass().add("choice-pane");
        Pane states = portrait ? new HBox() : new VBox();
        states.getStyleClass().add("moves");
        pane.getChildren().add(states);
        for (BeltState state : BeltState.values()) {
            boolean said = model.beltStateProperty().get().equals(Optional.of(state));
            ActionButton button = new ActionButton(said ? Weight.PRIMARY : Weight.PLAIN,
                    wording.text("screen.belt." + state.code()), () -> {
                        model.sayBeltState(state);
                        show(model.active());
                    });
            button.setId("belt-" + state.code());
            button.setMinWidth(0);
            button.setPrefWidth(100);
            button.setMaxWidth(Double.MAX_VALUE);
            HBox.setHgrow(button, Priority.ALWAYS);
            states.getChildren().add(button);
        }
        pad.close();
        getChildren().setAll(pane);
        turn = this::askBeltState;
    }

    private PadSetup setup(Slot slot) {
        char sign = wording.format().decimalSign();
        if (slot instanceof Slot.MeasureSlot measured) {
            Unit unit = model.inHandProperty().get().unit().orElseThrow();
            BigDecimal size = measured.measure().step(unit);
            String step = unit == Unit.INCH && size.compareTo(QUARTER) == 0 ? "\u00BC" : wording.format().exact(size);
            List<Unit> units = measured.measure().units();
            boolean negative = canBeNegative(measured.measure().possible().low().map(Quantity::value));
            return new PadSetup(sign, negative, unit == Unit.INCH && !negative, steps(step),
                    units.size() < 2 ? Optional.empty() : Optional.of(unitFace(units, unit)));
        }
        Count count = ((Slot.CountSlot) slot).count();
        return new PadSetup(sign, canBeNegative(count.possible().low()), false,
                steps(wording.format().exact(count.step())), Optional.empty());
    }

    private static boolean canBeNegative(Optional<BigDecimal> least) {
        return least.map(number -> number.signum() < 0).orElse(true);
    }

    private static Optional<PadSetup.Steps> steps(String step) {
        return Optional.of(new PadSetup.Steps("\u2212" + step, "+" + step));
    }

    /** All units where they fit on the key, else the one that it goes on to. */
    private String unitFace(List<Unit> units, Unit now) {
        String all = units.stream().map(wording::symbol).collect(Collectors.joining(" | "));
        return all.length() <= LONGEST_FACE ? all
                : "\u2192 " + wording.symbol(units.get((units.indexOf(now) + 1) % units.size()));
    }

    private void command(PadCommand command) {
        if (command instanceof PadCommand.Typed typed) {
            editing = true;
            model.typedProperty().set(typed.text());
            editing = false;
            if (typed.text().isEmpty()) {
                model.clear();
            }
        } else if (command instanceof PadCommand.Stepped stepped) {
            model.step(stepped.direction());
        } else if (command instanceof PadCommand.UnitSwitched) {
            model.switchUnit();
        } else if (command instanceof PadCommand.HistoryAsked) {
            history.run();
        } else if (command instanceof PadCommand.Undone) {
            model.undo();
        } else if (command instanceof PadCommand.WentBack) {
            model.back();
        } else {
            model.next();
        }
    }

    /** A number that came from elsewhere: a step, an undo, the picture. */
    private void taken() {
        if (!editing && pad.setupProperty().get().isPresent()) {
            pad.take(model.editable());
        }
    }

    private void chosen() {
        Slot slot = model.active();
        if (!(slot instanceof Slot.MeasureSlot || slot instanceof Slot.CountSlot || slot instanceof Slot.TextSlot)) {
            show(slot);
        } else if (!editing && pad.setupProperty().get().isPresent() && model.typedProperty().get().isEmpty()) {
            pad.take(model.editable());
        }
    }

    private VBox choicePane(Slot slot) {
        GridPane grid = new GridPane();
        grid.getStyleClass().add("choices");
        int columns = portrait ? 4 : 2;
        for (int i = 0; i < columns; i++) {
            ColumnConstraints column = new ColumnConstraints();
            column.setPercentWidth(100.0 / columns);
            grid.getColumnConstraints().add(column);
        }
        List<Choice> choices = choices(slot);
        Optional<Node> answer = model.answer(slot);
        for (int i = 0; i < choices.size(); i++) {
            Choice choice = choices.get(i);
            Node node = node(slot, choice.code());
            boolean chosen = answer.equals(Optional.of(node));
            ActionButton button = new ActionButton(chosen ? Weight.PRIMARY : Weight.PLAIN,
                    choice.label().in(wording.words().language()), () -> {
                        model.set(slot, Optional.of(node));
                        model.next();
                    });
            button.setId("choice-" + choice.code());
            button.getStyleClass().add("choice");
            button.setMinWidth(0);
            button.setMaxWidth(Double.MAX_VALUE);
            grid.add(button, i % columns, i / columns);
        }
        ScrollPane scroll = new ScrollPane(grid);
        scroll.setFitToWidth(true);
        scroll.setHbarPolicy(ScrollPane.ScrollBarPolicy.NEVER);
        scroll.getStyleClass().add("form-scroll");
        VBox.setVgrow(scroll, Priority.ALWAYS);
        VBox pane = new VBox(scroll, moves());
        pane.getStyleClass().add("choice-pane");
        return pane;
    }

    private List<Choice> choices(Slot slot) {
        if (slot instanceof Slot.FlagSlot) {
            return List.of(new Choice("yes", texts("screen.yes")), new Choice("no", texts("screen.no")));
        }
        if (SlotWords.isMaterial(slot)) {
            List<Choice> materials = new ArrayList<>();
            model.setting().register().materials().forEach((id, material) ->
                    materials.add(new Choice(id, Texts.of(material.name(), material.name()))));
            return materials;
        }
        return SlotWords.choices(slot);
    }

    private Texts texts(String key) {
        return Texts.of(wording.text(key), wording.text(key));
    }

    private static Node node(Slot slot, String code) {
        return slot instanceof Slot.FlagSlot ? Node.flag(code.equals("yes")) : Node.text(code);
    }

    private VBox textPane(Slot.TextSlot slot) {
        TextArea area = new TextArea(model.editable());
        area.setId("text-entry");
        area.positionCaret(area.getLength());
        area.setWrapText(true);
        area.setAccessibleText(slot.label().in(wording.words().language()));
        area.textProperty().addListener((property, before, now) -> {
            editing = true;
            if (now.isEmpty()) {
                model.clear();
            } else {
                model.typedProperty().set(now);
            }
            editing = false;
        });
        // A text of one line ends with Enter; in one of several lines Enter is a line end, and Tab leads on.
        area.addEventFilter(KeyEvent.KEY_PRESSED, event -> {
            boolean on = event.getCode() == KeyCode.TAB || event.getCode() == KeyCode.ENTER && !slot.field().lines();
            if (on && event.getCode() == KeyCode.TAB && !event.isShiftDown() && model.atEnd()) {
                // Behind the last cell Tab leads out of the form: a keyboard must never be caught in a text.
                Optional.ofNullable(lookup("#entry-back")).ifPresent(javafx.scene.Node::requestFocus);
                event.consume();
            } else if (on) {
                move(event.isShiftDown());
                event.consume();
            }
        });
        VBox.setVgrow(area, Priority.ALWAYS);
        VBox pane = new VBox(area, moves());
        pane.getStyleClass().add("choice-pane");
        return pane;
    }

    /** Back, clear, history, undo and next, as on the pad. */
    private HBox moves() {
        ActionButton next = new ActionButton(Weight.PRIMARY, wording.text("screen.pad.next"), model::next);
        next.setId("entry-next");
        ActionButton undo = new ActionButton(Weight.PLAIN, wording.text("screen.pad.undo"), model::undo);
        undo.setId("entry-undo");
        ActionButton back = new ActionButton(Weight.PLAIN, wording.text("screen.pad.back"), model::back);
        back.setId("entry-back");
        ActionButton clear = new ActionButton(Weight.PLAIN, wording.text("screen.pad.clear"), model::clear);
        clear.setId("entry-clear");
        ActionButton past = ActionButton.of(Icon.HISTORY, Weight.PLAIN, wording.text("zone.history"), history);
        past.setId("entry-history");
        HBox moves = new HBox(back, clear, past, undo, next);
        moves.getStyleClass().add("moves");
        for (Button button : List.of(back, clear, undo, next)) {
            button.setMaxWidth(Double.MAX_VALUE);
            button.setPrefWidth(100);
            button.setMinWidth(0);
            HBox.setHgrow(button, Priority.ALWAYS);
        }
        return moves;
    }
}
