package bedmark.screen.notes;

import bedmark.screen.Heads;
import bedmark.screen.Navigator;
import bedmark.screen.SidedScreen;
import bedmark.screen.Workplace;
import bedmark.screen.pad.NumericPad;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.CautionStrip;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.Labels;
import bedmark.screen.part.RoundTicks;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.screen.round.RoundModel;
import bedmark.screen.round.RoundRow;
import bedmark.screen.round.Ticks;
import bedmark.screen.theme.Icon;
import bedmark.survey.PlannedAction;
import bedmark.wording.Wording;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** Beside the readings of a transfer point: what is to be done, what was photographed, what the office says. */
public final class NotesView extends SidedScreen {
    private final NotesModel model;
    private final Wording wording;
    private final ActionWords words;
    private final PhotoPane photos;
    private final VBox list = new VBox();
    private final ScrollPane scroll = new ScrollPane(list);
    /** Keeps an action that is being written when the screen is left. */
    private Optional<Runnable> unfinished = Optional.empty();

    public NotesView(Workplace workplace, NotesModel model, RoundModel round, RoundRow row, Navigator navigator) {
        super("summary");
        this.model = model;
        this.wording = workplace.wording();
        this.words = new ActionWords(wording);
        this.photos = new PhotoPane(workplace, model, listening, this::edit, this::showList);
        ActionButton back = ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.PRIMARY,
                wording.text("notes.back", row.tag()), () -> workplace.scribe().afterwards(
                        () -> navigator.toZone(round, row)));
        back.setId("to-readings");
        ActionButton all = ActionButton.with(Icon.LIST, ContentDisplay.LEFT, Weight.QUIET,
                wording.text("screen.round.title"), () -> navigator.toRound(round));
        all.setId("foot-round");
        RoundTicks ticks = new RoundTicks();
        Ticks.show(ticks, round.rowsProperty().get(), row.transfer(), wording);
        frame(Heads.head(workplace, listening, row.tag(), wording.text("notes.title")),
                new FootBar(Optional.of(all), Optional.of(ticks), Optional.of(back)));
        list.getStyleClass().add("questions");
        side.getStyleClass().add("summary");
        scroll.setFitToWidth(true);
        scroll.setFocusTraversable(false);
        scroll.getStyleClass().add("form-scroll");
        body.getStyleClass().add("notes-body");
        side.getChildren().add(photos);
        VBox.setVgrow(photos, Priority.ALWAYS);
        listening.onChange(model.historyProperty(), history -> showList());
        showList();
    }

    /** Shows the actions; the person goes on where they stood. */
    private void showList() {
        photos.takeKeysAway();
        list.getChildren().clear();
        List<NotesModel.OfficeNote> notes = model.officeNotes();
        if (!notes.isEmpty()) {
            list.getChildren().add(new SectionHeader(wording.text("notes.office")));
            notes.forEach(note -> list.getChildren().add(officeNote(note)));
        }
        List<PlannedAction> actions = model.actions();
        SectionHeader header = new SectionHeader(wording.text("notes.actions"));
        header.asideProperty().set(wording.format().computed(actions.size(), 0));
        list.getChildren().add(header);
        for (int i = 0; i < actions.size(); i++) {
            list.getChildren().add(action(i, actions.get(i)));
        }
        if (!model.open()) {
            list.getChildren().add(Labels.wrapped("words", wording.text("notes.completed")));
        } else {
            ActionButton add = ActionButton.with(Icon.PLUS, ContentDisplay.LEFT, Weight.PLAIN,
                    wording.text("notes.add"), () -> write(OptionalInt.empty(), model.fresh()));
            add.setId("action-add");
            add.setMaxWidth(Double.MAX_VALUE);
            list.getChildren().add(add);
        }
        List<PlannedAction> before = model.openBefore();
        if (!before.isEmpty()) {
            list.getChildren().add(new SectionHeader(wording.text("notes.before")));
            for (int i = 0; i < before.size(); i++) {
                list.getChildren().add(openBefore(i, before.get(i)));
            }
        }
        list.getChildren().add(new CautionStrip(wording.text("screen.caution.always")));
        scroll.setContent(list);
        body.setCenter(scroll);
    }

    private VBox officeNote(NotesModel.OfficeNote note) {
        Label text = Labels.wrapped("office-words", note.text());
        VBox box = new VBox(text);
        box.getStyleClass().add("office-note");
        String from = String.join(" \u00B7 ", List.of(note.by(), note.at()).stream().filter(part -> !part.isEmpty())
                .toList());
        if (!from.isEmpty()) {
            box.getChildren().add(Labels.wrapped("what", from));
        }
        return box;
    }

    private HBox action(int place, PlannedAction action) {
        HBox row = row(action, action.done() ? Optional.of(wording.text("notes.done")) : Optional.empty());
        if (model.open()) {
            row.getChildren().add(small("action-" + place, wording.text("notes.change"), action,
                    () -> write(OptionalInt.of(place), action)));
            row.getChildren().add(small("action-remove-" + place, wording.text("notes.remove"), action,
                    () -> model.remove(place)));
        }
        return row;
    }

    private HBox openBefore(int place, PlannedAction action) {
        HBox row = row(action, Optional.empty());
        if (model.open()) {
            row.getChildren().add(small("before-done-" + place, wording.text("notes.is-done"), action,
                    () -> model.put(OptionalInt.empty(), action.asDone())));
            row.getChildren().add(small("before-take-" + place, wording.text("notes.take-over"), action,
                    () -> model.put(OptionalInt.empty(), action)));
        }
        return row;
    }

    private HBox row(PlannedAction action, Optional<String> state) {
        Label what = Labels.wrapped("rule-name", action.what());
        VBox texts = new VBox(what);
        String details = words.details(action);
        String below = state.map(done -> details.isEmpty() ? done : done + " \u00B7 " + details).orElse(details);
        if (!below.isEmpty()) {
            texts.getChildren().add(Labels.wrapped("what", below));
        }
        HBox.setHgrow(texts, Priority.ALWAYS);
        texts.setMinWidth(0);
        HBox row = new HBox(texts);
        row.getStyleClass().addAll("rule-row", "planned");
        row.setAlignment(Pos.CENTER_LEFT);
        return row;
    }

    private ActionButton small(String id, String text, PlannedAction action, Runnable press) {
        ActionButton button = new ActionButton(Weight.PLAIN, text, press);
        button.setId(id);
        button.setAccessibleText(text + ": " + action.what());
        button.getStyleClass().add("secondary-target");
        return button;
    }

    private void write(OptionalInt place, PlannedAction action) {
        ActionEditor editor = new ActionEditor(wording, action, model.today(), this::showKeys, written -> {
            unfinished = Optional.empty();
            written.ifPresent(done -> model.put(place, done));
            showList();
            focus("action-add");
        });
        unfinished = Optional.of(() -> editor.written().filter(now -> !now.equals(action))
                .ifPresent(now -> model.put(place, now)));
        edit(editor);
        VBox work = new VBox(scroll, editor.buttons());
        VBox.setVgrow(scroll, Priority.ALWAYS);
        scroll.setMinHeight(0);
        body.setCenter(work);
        editor.begin();
    }

    /** Shows the pad, and what it types into, which is the end of the editor. */
    private void showKeys(Optional<NumericPad> keys) {
        photos.showKeys(keys);
        keys.ifPresent(pad -> {
            body.applyCss();
            body.layout();
            scroll.setVvalue(1);
        });
    }

    /** Puts an editor in the place of the list. */
    private void edit(Node editor) {
        scroll.setContent(editor);
        scroll.setVvalue(0);
    }

    private void focus(String id) {
        Optional.ofNullable(list.lookup("#" + id)).ifPresent(Node::requestFocus);
    }

    @Override
    public void turned(boolean portrait) {
        super.turned(portrait);
        photos.turned(portrait);
    }

    @Override
    public void shown() {
        photos.watch();
        super.shown();
    }

    @Override
    public void left() {
        photos.leave();
        unfinished.ifPresent(Runnable::run);
        unfinished = Optional.empty();
        super.left();
    }
}
