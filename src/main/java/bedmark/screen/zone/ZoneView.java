package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.engine.Assessment;
import bedmark.engine.verdict.Level;
import bedmark.form.StationsField;
import bedmark.picture.Snap;
import bedmark.picture.ZoneSketch;
import bedmark.quantity.BeltState;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.screen.Heads;
import bedmark.screen.Listening;
import bedmark.screen.Navigator;
import bedmark.screen.Screen;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Figure;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.RoundTicks;
import bedmark.screen.part.Verdict;
import bedmark.screen.part.VerdictBlock;
import bedmark.screen.part.Weight;
import bedmark.screen.round.RoundModel;
import bedmark.screen.round.RoundRow;
import bedmark.screen.round.Ticks;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.LevelShape;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.wording.Telling;
import bedmark.wording.Told;
import bedmark.wording.Wording;
import bedmark.wording.ZoneSketcher;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
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
    private final ZonePictureView picture;
    private final VerdictBlock verdict;
    private final VBox work = new VBox();
    private final VBox result = new VBox();
    private final BorderPane body = new BorderPane();
    private final VBox head;
    private final javafx.scene.Node foot;
    private final boolean large;
    private boolean portrait;
    private Optional<Branch> pulled = Optional.empty();

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
        this.form = new FormPane(model, wording, listening, large);
        this.history = new HistoryPopOver(model, wording);
        this.entry = new EntryPane(model, wording, listening, this::showHistory);
        this.picture = new ZonePictureView(sketch(model.surveyProperty().get()), density, new BedPull());
        this.verdict = new VerdictBlock(Optional.of(judgedButton()));
        this.head = Heads.head(workplace, listening, tag(), title(), beltButton());
        this.foot = footBar();
        compose();
        listening.onChange(model.surveyProperty(), survey -> refresh());
        listening.onChange(model.inHandProperty(), inHand -> refresh());
        listening.onChange(model.outcomeProperty(), outcome -> refresh());
        refresh();
    }

    private void compose() {
        work.getStyleClass().add("work");
        work.getChildren().add(form);
        work.getChildren().add(model.open() ? entry : completedNote());
        VBox.setVgrow(form, Priority.ALWAYS);
        result.getStyleClass().add("result");
        result.getChildren().addAll(picture, verdict);
        VBox.setVgrow(picture, Priority.ALWAYS);
        entry.listenIn(work);
        body.getStyleClass().add("zone-body");
        picture.setId("zone-picture");
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

    private void showRules() {
        model.outcomeProperty().get().assessment().ifPresent(found -> showInstead(new RulesPane(found, wording,
                model.setting().form(), this::showWorking, this::hideRules)));
    }

    private void showWorking() {
        model.outcomeProperty().get().assessment().ifPresent(found -> showInstead(new WorkingPane(model.setting(),
                new Survey(model.surveyProperty().get()), found, wording, this::showRules)));
    }

    private void showInstead(Region pane) {
        result.getChildren().setAll(form.elsewhere());
        result.getChildren().add(pane);
        VBox.setVgrow(pane, Priority.ALWAYS);
    }

    private void hideRules() {
        result.getChildren().setAll(form.elsewhere());
        result.getChildren().addAll(picture, verdict);
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

    private ZoneSketch sketch(Branch document) {
        return new ZoneSketcher(model.setting().assessor(), wording).sketch(document,
                model.outcomeProperty().get().assessment(), activeLine());
    }

    private Optional<Integer> activeLine() {
        Slot slot = model.active();
        return slot.field() instanceof StationsField && slot.where().tokens().size() > 3
                ? Optional.of(Integer.parseInt(slot.where().tokens().get(2))) : Optional.empty();
    }

    private void refresh() {
        if (pulled.isEmpty()) {
            picture.show(sketch(model.surveyProperty().get()), snap());
        }
        ZoneModel.Outcome outcome = model.outcomeProperty().get();
        Verdict shown = outcome.assessment().map(this::verdict).orElseGet(() -> impossible(outcome));
        verdict.show(shown);
        picture.setAccessibleText(tag() + ". " + shown.sentence());
    }

    private Snap snap() {
        return wording.units() == UnitSystem.US ? Snap.INCH : Snap.METRIC;
    }

    private Verdict verdict(Assessment found) {
        Told told = new Telling(wording, model.setting().form()).tell(found);
        List<String> advice = new ArrayList<>();
        if (found.level() == Level.INCOMPLETE && !found.missingRequired().isEmpty()) {
            advice.add(wording.text("screen.zone.still-to-read", found.missingRequired().stream()
                    .map(name -> wording.reading(name, model.setting().form())).collect(Collectors.joining(" \u00B7 "))));
        }
        told.repeat().ifPresent(advice::add);
        told.action().ifPresent(advice::add);
        told.atDesign().ifPresent(advice::add);
        return new Verdict(LevelShape.valueOf(found.level().name()),
                wording.text("verdict.level." + found.level().code()), told.sentence(), told.sure().orElse(""),
                told.figures().stream().map(figure -> new Figure(figure.label(), figure.number(), figure.rest()))
                        .toList(),
                advice.isEmpty() ? Optional.empty() : Optional.of(String.join(" ", advice)));
    }

    /** A defect with the field by its name, where it has one: the place in the document means nothing to a person. */
    private Defect named(Defect defect) {
        return Optional.of(defect.where()).filter(where -> where.startsWith("/"))
                .flatMap(where -> model.setting().form().fieldAt(Pointer.parse(where)))
                .map(field -> new Defect(defect.code(), field.head().label().in(wording.words().language()),
                        defect.details())).orElse(defect);
    }

    private Verdict impossible(ZoneModel.Outcome outcome) {
        String why = outcome.impossible().map(refused -> wording.sentence(named(refused.defect()))).orElse("");
        return new Verdict(LevelShape.INCOMPLETE, wording.text("verdict.level.incomplete"),
                wording.text("verdict.impossible", why), "", List.of(), Optional.empty());
    }

    /** A finger on the bed: the depth follows it, and is entered when it lets go. */
    private final class BedPull implements PullListener {
        @Override
        public void touched(int station) {
            List<Integer> lines = ZoneSketcher.lines(model.surveyProperty().get());
            if (station < lines.size()) {
                model.activate(depthPlace(lines.get(station)));
            }
        }

        @Override
        public void pulled(Grip grip, Snap.Stepped depth, Phase phase) {
            if (!model.open()) {
                return;
            }
            List<Integer> lines = ZoneSketcher.lines(model.surveyProperty().get());
            int line = grip instanceof Grip.OfStation station ? lines.get(station.index()) : rowCount();
            Quantity position = grip instanceof Grip.AtPlace place ? quantity(place.position())
                    : Quantity.of(BigDecimal.ZERO, Unit.METRE);
            if (phase == Phase.RELEASED) {
                pulled = Optional.empty();
                model.tables().pull(line, position, quantity(depth));
                return;
            }
            Branch seen = model.tables().previewPull(line, position, quantity(depth));
            pulled = Optional.of(seen);
            picture.show(new ZoneSketcher(model.setting().assessor(), wording).sketch(seen,
                    model.outcomeProperty().get().assessment(), Optional.of(line)), snap());
        }

        private Pointer depthPlace(int line) {
            return Survey.READINGS.child(StationsField.KEY).child(line).child("depth");
        }

        private int rowCount() {
            return model.surveyProperty().get().at(Survey.READINGS.child(StationsField.KEY))
                    .filter(Node.Series.class::isInstance).map(node -> ((Node.Series) node).items().size()).orElse(0);
        }

        /** Whole steps as an exact decimal of the person's own unit. */
        private Quantity quantity(Snap.Stepped stepped) {
            boolean us = wording.units() == UnitSystem.US;
            BigDecimal step = us ? new BigDecimal(stepped.step() > 0.01 ? "2" : "0.25")
                    : new BigDecimal(stepped.step() > 0.01 ? "50" : "5");
            return Quantity.of(step.multiply(BigDecimal.valueOf(stepped.steps())), us ? Unit.INCH : Unit.MILLIMETRE);
        }
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
        result.getStyleClass().setAll("result", portrait ? "portrait" : "landscape");
        if (portrait) {
            body.setTop(result);
            body.setCenter(work);
        } else {
            body.setLeft(work);
            body.setCenter(result);
        }
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
        history.hide();
        model.keep();
        listening.end();
    }
}
