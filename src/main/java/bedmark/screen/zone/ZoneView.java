package bedmark.screen.zone;

import bedmark.document.Node;
import bedmark.quantity.BeltState;
import bedmark.screen.Heads;
import bedmark.screen.Listening;
import bedmark.screen.Navigator;
import bedmark.screen.Screen;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.Island;
import bedmark.screen.part.RoundTicks;
import bedmark.screen.part.Steady;
import bedmark.screen.part.Verdict;
import bedmark.screen.part.VerdictBlock;
import bedmark.screen.part.Weight;
import bedmark.screen.round.RoundModel;
import bedmark.screen.round.RoundRow;
import bedmark.screen.round.Ticks;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import bedmark.screen.theme.Icon;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.wording.Wording;
import java.util.List;
import java.util.Optional;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** A transfer point: the form and its pad on one side, the zone picture and the verdict on the other. */
public final class ZoneView implements Screen {
    private final Workplace workplace;
    private final ZoneModel model;
    private final RoundModel round;
    private final Navigator navigator;
    private final Wording wording;
    private final Listening listening = new Listening();
    private final FormPane form;
    private final HistoryPopOver history;
    private final EntryPane entry;
    private final PicturePane picture;
    private final VerdictWords verdictWords;
    private final VerdictBlock verdict;
    /** A key changes what the verdict says, and seldom how high it is. */
    private final Steady steady;
    private final VBox work = new VBox();
    private final VBox result = new VBox();
    /** What it comes to takes the room that the form leaves, however much there is to say. */
    private final Island besides = new Island(result);
    private final BorderPane body = new BorderPane();
    private final VBox head;
    private final javafx.scene.Node foot;
    private final boolean large;
    private boolean portrait;

    public ZoneView(Workplace workplace, ZoneModel model, RoundModel round, Navigator navigator, Density density) {
        this.workplace = workplace;
        this.model = model;
        this.round = round;
        this.navigator = navigator;
        this.large = density.hand() == Hand.GLOVED;
        this.wording = workplace.wording();
        model.unitsProperty().set(wording.units());
        model.localeProperty().set(wording.words().locale());
        model.likeUnits(wording::liked);
        this.form = new FormPane(model, wording, listening, large && model.open());
        this.history = new HistoryPopOver(model, wording);
        this.entry = new EntryPane(model, wording, listening, this::showHistory);
        this.picture = new PicturePane(model, wording, density);
        this.verdictWords = new VerdictWords(model.setting().form(), wording);
        this.verdict = new VerdictBlock(List.of(judgedButton(), workingButton()));
        this.steady = new Steady(verdict);
        this.head = Heads.head(workplace, listening, tag(), title(), beltButton());
        this.foot = footBar();
        compose();
        listening.onChange(model.surveyProperty(), survey -> picture.refresh());
        listening.onChange(model.inHandProperty(), inHand -> picture.refresh());
        listening.to(model.outcomeProperty(), this::judged);
        picture.refresh();
    }

    private void compose() {
        work.getStyleClass().add("work");
        work.getChildren().add(form);
        work.getChildren().add(model.open() ? entry : completedNote());
        VBox.setVgrow(form, Priority.ALWAYS);
        result.getStyleClass().add("result");
        result.getChildren().addAll(picture, steady);
        VBox.setVgrow(picture, Priority.ALWAYS);
        entry.listenIn(work);
        body.getStyleClass().add("zone-body");
        verdict.setId("verdict");
    }

    private String tag() {
        return model.setting().transfer().tag();
    }

    private String title() {
        Register register = model.setting().register();
        Register.Transfer transfer = model.setting().transfer();
        String conveyor = register.conveyorOf(transfer).tag();
        String way = transfer.from().map(from -> from + " \u2192 " + conveyor).orElse(conveyor);
        return model.setting().assessor().material(new Survey(model.surveyProperty().get()))
                .map(material -> way + " \u00B7 " + material.name()).orElse(way);
    }

    /** What the belt does now: it decides how far a depth can be trusted, and which caution stands here. */
    private ActionButton beltButton() {
        ActionButton button = new ActionButton(Weight.PLAIN, "", entry::askBeltState);
        button.setId("belt-state");
        button.getStyleClass().add("secondary-target");
        button.setDisable(!model.open());
        listening.to(model.beltStateProperty(), state -> {
            String words = wording.text("screen.belt." + state.map(BeltState::code).orElse("unsaid"));
            button.setText(words);
            button.setAccessibleText(words);
        });
        return button;
    }

    private VBox completedNote() {
        Label note = new Label(wording.text("screen.zone.completed"));
        note.setWrapText(true);
        note.setMinHeight(Region.USE_PREF_SIZE);
        ActionButton correct = new ActionButton(Weight.PLAIN, wording.text("screen.zone.correct"), () ->
                round.correct(model.history().survey().id(), wording.text("screen.zone.correct-why"),
                        row -> navigator.toZone(round, row)));
        correct.setId("correct");
        correct.setMaxWidth(Double.MAX_VALUE);
        VBox box = new VBox(note, correct);
        box.getStyleClass().add("choice-pane");
        return box;
    }

    private ActionButton judgedButton() {
        ActionButton button = new ActionButton(Weight.PLAIN, wording.text("screen.zone.every-rule"), this::showRules);
        button.setId("every-rule");
        return button;
    }

    private ActionButton workingButton() {
        ActionButton button = new ActionButton(Weight.PLAIN, wording.text("working.show"),
                () -> showWorking(this::hideRules));
        button.setId("verdict-working");
        return button;
    }

    private void showRules() {
        model.outcomeProperty().get().assessment().ifPresent(found -> showInstead(new RulesPane(found, wording,
                model.setting().form(), () -> showWorking(this::showRules), this::hideRules)));
    }

    private void showWorking(Runnable back) {
        model.outcomeProperty().get().assessment().ifPresent(found -> showInstead(new WorkingPane(model.setting(),
                new Survey(model.surveyProperty().get()), found, wording, back)));
    }

    private void showInstead(Region pane) {
        result.getChildren().setAll(form.elsewhere());
        result.getChildren().add(pane);
        VBox.setVgrow(pane, Priority.ALWAYS);
    }

    private void hideRules() {
        result.getChildren().setAll(form.elsewhere());
        result.getChildren().addAll(picture, steady);
    }

    private FootBar footBar() {
        RoundTicks ticks = new RoundTicks();
        String transfer = model.setting().transfer().id();
        listening.to(round.rowsProperty(), rows -> Ticks.show(ticks, rows, transfer, wording));
        ActionButton back = round.beside(transfer, -1)
                .map(row -> ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.QUIET, row.tag(),
                        () -> navigator.toZone(round, row)))
                .orElseGet(() -> ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.QUIET,
                        wording.text("screen.round.title"), () -> navigator.toRound(round)));
        back.setId("foot-back");
        ActionButton list = ActionButton.of(Icon.LIST, Weight.QUIET, wording.text("screen.round.title"),
                () -> navigator.toRound(round));
        list.setId("foot-round");
        ActionButton notes = ActionButton.of(Icon.NOTES, Weight.QUIET, wording.text("notes.title"),
                () -> round.row(transfer).ifPresent(row -> navigator.toNotes(round, row)));
        notes.setId("foot-notes");
        HBox middle = new HBox(list, notes, ticks);
        middle.getStyleClass().add("foot-middle");
        Optional<RoundRow> next = round.nextToDo(transfer);
        String words = !model.open()
                ? next.map(row -> wording.text("screen.zone.on", row.tag())).orElse(wording.text("screen.zone.to-round"))
                : next.map(row -> wording.text("screen.zone.done-on", row.tag()))
                        .orElse(wording.text("screen.zone.done"));
        ActionButton onward = ActionButton.with(Icon.NEXT, ContentDisplay.RIGHT, Weight.PRIMARY, words, () -> onward(next));
        onward.setId("foot-done");
        return new FootBar(Optional.of(back), Optional.of(middle), Optional.of(onward));
    }

    /** Puts the focus where the active cell is filled in: into its box, or into the text below it. */
    private void focusActive() {
        form.focusActive();
        entry.focusText();
    }

    private void showHistory() {
        form.activeBox().ifPresent(box -> history.show(model.active(), box, portrait));
    }

    /** Completes this survey and goes on, or stays at the first gap. */
    private void onward(Optional<RoundRow> next) {
        if (model.open() && !model.complete(workplace.preferences().person())) {
            focusActive();
            return;
        }
        next.ifPresentOrElse(row -> navigator.toZone(round, row), () -> navigator.toRound(round));
    }

    private void judged(Outcome outcome) {
        Verdict shown = verdictWords.of(outcome);
        verdict.show(shown);
        picture.describe(tag() + ". " + shown.sentence());
    }

    @Override
    public javafx.scene.Node head() {
        return head;
    }

    @Override
    public javafx.scene.Node body() {
        return body;
    }

    @Override
    public javafx.scene.Node foot() {
        return foot;
    }

    @Override
    public void turned(boolean upright) {
        portrait = upright;
        history.hide();
        body.setLeft(null);
        body.setTop(null);
        body.setCenter(null);
        work.getStyleClass().setAll("work", portrait ? "portrait" : "landscape");
        result.getStyleClass().setAll("result", portrait ? "portrait" : "landscape", large ? "gloved" : "bare");
        if (portrait) {
            body.setTop(besides);
            body.setCenter(work);
        } else {
            body.setLeft(work);
            body.setCenter(besides);
        }
        form.turned(portrait);
        entry.turned(portrait);
        hideRules();
        focusActive();
    }

    @Override
    public void shown() {
        focusActive();
    }

    @Override
    public void left() {
        model.keep();
        replaced();
    }

    @Override
    public void replaced() {
        history.hide();
        listening.end();
    }
}
