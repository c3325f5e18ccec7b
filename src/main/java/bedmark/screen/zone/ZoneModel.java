package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.engine.Assessment;
import bedmark.form.Field;
import bedmark.form.Judgement;
import bedmark.form.Measure;
import bedmark.form.SpeedField;
import bedmark.form.StationsField;
import bedmark.quantity.BeltState;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.quantity.TypedNumber;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.function.UnaryOperator;
import java.util.stream.Stream;
import javafx.beans.binding.BooleanBinding;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleObjectProperty;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;
import javafx.beans.value.ObservableValue;

/**
 * A transfer point under survey: which cell is active, what is typed into it, what the survey then says. What is typed
 * counts at once for the result; it is saved when the cell is left. Nothing that is typed is ever refused a place in
 * the survey; only completing is.
 */
public final class ZoneModel {
    private final ZoneSetting setting;
    private final Map<SpeedField, SpeedField.Way> ways = new HashMap<>();
    private final Map<Pointer, Unit> chosenUnits = new HashMap<>();
    private final Set<Pointer> believed = new HashSet<>();
    private final SurveyInWork work;
    private UnaryOperator<Unit> liked = UnaryOperator.identity();
    private final BooleanBinding undoable;
    private final ReadOnlyObjectWrapper<Branch> survey;
    private final ReadOnlyObjectWrapper<List<SlotRow>> rows;
    private final ReadOnlyObjectWrapper<InHand> inHand = new ReadOnlyObjectWrapper<>();
    private final ReadOnlyObjectWrapper<Outcome> outcome;
    private final ReadOnlyObjectWrapper<Optional<Note>> note = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final StringProperty typed = new SimpleStringProperty("");
    private final ObjectProperty<UnitSystem> units = new SimpleObjectProperty<>(UnitSystem.METRIC);
    private final ObjectProperty<Locale> locale = new SimpleObjectProperty<>(Locale.ENGLISH);
    private final ObjectProperty<Optional<BeltState>> beltState = new SimpleObjectProperty<>(Optional.empty());

    /**
     * The cell that is filled in now.
     *
     * @param unit the unit in which it is typed, where it has one
     */
    public record InHand(Slot slot, Optional<Unit> unit) {
    }

    /** Something to say below the active cell. */
    public sealed interface Note {
        /** What is wrong or doubtful about an answer. */
        record Judged(Judgement judgement, Field field) implements Note {
        }

        /** Why the typing is no number. */
        record NoNumber(TypedNumber.Reason reason) implements Note {
        }

        /** The field must be answered before the survey can be completed. */
        record Gap(Field field) implements Note {
        }

        /** A depth can be measured on an isolated belt only. */
        record IsolateFirst() implements Note {
        }
    }

    /**
     * Opens a survey.
     *
     * @param units  the unit system in which numbers are asked first
     * @param locale the number format that is typed
     */
    public ZoneModel(ZoneSetting setting, UnitSystem units, Locale locale) {
        this.setting = setting;
        this.work = new SurveyInWork(setting.history(), setting.scribe(), setting.person());
        this.units.set(units);
        this.locale.set(locale);
        this.survey = new ReadOnlyObjectWrapper<>(document());
        this.rows = new ReadOnlyObjectWrapper<>(layOut());
        this.outcome = new ReadOnlyObjectWrapper<>(judge(document()));
        work.documentProperty().addListener((property, before, now) -> refresh());
        typed.addListener((property, before, now) -> preview());
        this.undoable = typed.isNotEmpty().or(work.undoableProperty());
        this.units.addListener((property, before, now) -> unitChanged());
        this.locale.addListener((property, before, now) -> preview());
        activate(firstToAnswer());
    }

    /** The survey as it is saved, or on its way to be. */
    private Branch document() {
        return work.documentProperty().get();
    }

    /** Where work begins: the first gap, or the first cell where there is none. */
    private Slot firstToAnswer() {
        return setting.form().gaps(document()).stream().filter(gap -> open())
                .flatMap(gap -> slots().stream().filter(slot -> slot.field().equals(gap))).findFirst()
                .orElseGet(() -> slots().get(0));
    }

    /** What the survey comes to: an assessment, or why there can be none. */
    public record Outcome(Optional<Assessment> assessment, Optional<Refused> impossible) {
    }

    public ZoneSetting setting() {
        return setting;
    }

    /** The survey with what is being typed. */
    public ReadOnlyObjectProperty<Branch> surveyProperty() {
        return survey.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<List<SlotRow>> rowsProperty() {
        return rows.getReadOnlyProperty();
    }

    /** The cell that is filled in now; there always is one. */
    public ReadOnlyObjectProperty<InHand> inHandProperty() {
        return inHand.getReadOnlyProperty();
    }

    /** The active cell. */
    public Slot active() {
        return inHand.get().slot();
    }

    public ReadOnlyObjectProperty<Outcome> outcomeProperty() {
        return outcome.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<Optional<Note>> noteProperty() {
        return note.getReadOnlyProperty();
    }

    /** Whether there is something that {@link #undo} takes back. */
    public ObservableValue<Boolean> undoableProperty() {
        return undoable;
    }

    /** What is typed into the active cell; empty where nothing was typed since it became active. */
    public StringProperty typedProperty() {
        return typed;
    }

    public ObjectProperty<UnitSystem> unitsProperty() {
        return units;
    }

    public ObjectProperty<Locale> localeProperty() {
        return locale;
    }

    /** What the belt does now, as the person says. */
    public ReadOnlyObjectProperty<Optional<BeltState>> beltStateProperty() {
        return beltState;
    }

    public SurveyHistory history() {
        return work.history();
    }

    /** All cells in form order. */
    public List<Slot> slots() {
        return rows.get().stream().flatMap(row -> row.slots().stream()).toList();
    }

    /** What the survey holds for a cell. */
    public Optional<Node> answer(Slot slot) {
        return slot instanceof Slot.WaySlot way
                ? Optional.of(Node.text(wayOf(way.field()).key())) : survey.get().at(slot.where());
    }

    /** What the last survey held for a cell. */
    public Optional<Node> lastAnswer(Slot slot) {
        return setting.last().flatMap(last -> last.at(slot.where()));
    }

    /** Makes a cell active; what was typed into the one before is saved first, and stays in hand where it cannot. */
    public void activate(Slot slot) {
        show(keep() ? slot : active());
    }

    private void show(Slot slot) {
        if (inHand.get() != null && slot.equals(active()) && !typed.get().isEmpty()) {
            // A number that is not finished keeps its cell in hand, with the note that says why.
            inHand.set(new InHand(slot, inHand.get().unit()));
            return;
        }
        typed.set("");
        inHand.set(new InHand(slot, unitOf(slot)));
        note.set(firstJudgement(slot));
    }

    /** Makes the cell at a place active, where there is one. */
    public void activate(Pointer where) {
        slots().stream().filter(slot -> slot.where().equals(where)).findFirst()
                .or(() -> slots().stream().filter(slot -> where.holds(slot.where())).findFirst())
                .ifPresent(this::activate);
    }

    /** Saves the active cell and goes on; an implausible number is questioned once before that. */
    public void next() {
        move(1);
    }

    /** Saves the active cell and goes back. */
    public void back() {
        move(-1);
    }

    private void move(int step) {
        Slot here = active();
        if (!keep()) {
            return;
        }
        Optional<Note> question = firstJudgement(here).filter(ZoneModel::isDoubt);
        if (question.isPresent() && believed.add(here.where())) {
            show(here);
            note.set(question);
            return;
        }
        List<Slot> slots = slots();
        int index = indexOf(slots, here.where());
        show(slots.get(Math.max(0, Math.min(slots.size() - 1, index + step))));
    }

    private static boolean isDoubt(Note note) {
        return note instanceof Note.Judged judged && judged.judgement() instanceof Judgement.Doubt;
    }

    private static int indexOf(List<Slot> slots, Pointer where) {
        for (int i = 0; i < slots.size(); i++) {
            if (slots.get(i).where().equals(where)) {
                return i;
            }
        }
        return 0;
    }

    /** Whether the active cell is the last of the form. */
    public boolean atEnd() {
        List<Slot> slots = slots();
        return indexOf(slots, active().where()) == slots.size() - 1;
    }

    /**
     * Saves what is typed.
     *
     * @return false where the typing is no number; it then stays in the pad and the note says why
     */
    public boolean keep() {
        if (typed.get().isEmpty() || !open()) {
            return true;
        }
        Typing.Read read = read();
        if (read.answer().isEmpty()) {
            note.set(read.rejected().map(Note.NoNumber::new));
            return false;
        }
        String was = typed.get();
        set(active().where(), read.answer());
        if (typed.get().equals(was)) {
            typed.set("");
        }
        return true;
    }

    /** Sets or clears the answer of a cell at once: a choice, a flag, a text. */
    public void set(Slot slot, Optional<Node> answer) {
        if (slot instanceof Slot.WaySlot way) {
            chooseWay(way.field(), answer);
        } else {
            set(slot.where(), answer);
        }
        note.set(firstJudgement(slot));
    }

    /** What stands in the active cell, as the pad edits it: the locale's decimal sign, no other signs. */
    public String editable() {
        return typed.get().isEmpty() ? typing().editable(answer(active()), inHand.get().unit()) : typed.get();
    }

    /** Changes the number in the active cell by one step of its unit. */
    public void step(int direction) {
        typing().stepped(inHand.get(), editable(), direction).ifPresent(typed::set);
    }

    private Typing typing() {
        return new Typing(locale.get(), setting.clock(), beltState.get());
    }

    /** Goes on to the next unit that the active cell can be typed in; what is typed is not converted. */
    public void switchUnit() {
        if (active() instanceof Slot.MeasureSlot measured) {
            List<Unit> offered = measured.measure().units();
            chooseUnit(offered.get((offered.indexOf(unit()) + 1) % offered.size()));
        }
    }

    /** Clears the active cell. */
    public void clear() {
        typed.set("");
        if (!(active() instanceof Slot.WaySlot)) {
            set(active(), Optional.empty());
        }
    }

    private void set(Pointer where, Optional<Node> answer) {
        believed.remove(where);
        work.change(Answers.change(document(), where, answer));
    }

    /** Whether the survey still takes answers; a completed one is corrected by a new revision. */
    public boolean open() {
        return work.open();
    }

    /** Takes back the typing, or else the newest change that still counts. */
    public void undo() {
        if (!typed.get().isEmpty()) {
            typed.set("");
        } else {
            work.undo(this::activate);
        }
    }

    /** Adds a station or a segment behind the last one of a table and makes it active. */
    public void addLine(Pointer table) {
        keep();
        int lines = document().at(table).filter(Node.Series.class::isInstance)
                .map(node -> ((Node.Series) node).items().size()).orElse(0);
        work.change(Answers.withLine(document(), table, Branch.EMPTY));
        activate(table.child(lines));
    }

    /** Takes a line out of a table. */
    public void removeLine(Pointer line) {
        typed.set("");
        work.change(Answers.withoutLine(document(), line));
        activate(new Pointer(line.tokens().subList(0, line.tokens().size() - 1)));
    }

    /**
     * Sets the depth of a station as pulled on the picture: it starts as estimated.
     *
     * @param line     the station's index; the number of stations for a new one
     * @param position from the start of the zone, for a new station
     */
    public void pull(int line, Quantity position, Quantity depth) {
        Pointer table = Survey.READINGS.child(StationsField.KEY);
        typed.set("");
        work.change(pulled(line, position, depth));
        activate(table.child(line).child("depth"));
    }

    /** The survey as it would be with the bed pulled to a depth; nothing is saved. */
    public Branch previewPull(int line, Quantity position, Quantity depth) {
        return pulled(line, position, depth).in(document());
    }

    private Answers.Change pulled(int line, Quantity position, Quantity depth) {
        Pointer table = Survey.READINGS.child(StationsField.KEY);
        Branch seen = Branch.write(typing().stamped(depth).withQuality(Quality.ESTIMATED));
        return document().at(table.child(line)).isPresent()
                ? Answers.change(document(), table.child(line).child("depth"), Optional.of(seen))
                : Answers.withLine(document(), table, Branch.EMPTY.with("position", position).with("depth", seen));
    }

    private void chooseWay(SpeedField field, Optional<Node> answer) {
        Optional<SpeedField.Way> chosen = answer.flatMap(node -> Stream.of(SpeedField.Way.values())
                .filter(way -> node.equals(Node.text(way.key()))).findFirst());
        chosen.ifPresent(way -> {
            ways.put(field, way);
            for (SpeedField.Way other : SpeedField.Way.values()) {
                if (other != way && document().at(other.where()).isPresent()) {
                    work.change(new Answers.Change(other.where(), Optional.empty()));
                }
            }
            refresh();
        });
    }

    private SpeedField.Way wayOf(SpeedField field) {
        return field.ways(survey.get()).stream().findFirst()
                .orElseGet(() -> ways.getOrDefault(field, SpeedField.Way.DIRECT));
    }

    /** Says what the belt does now; readings from here on carry it. */
    public void sayBeltState(BeltState state) {
        beltState.set(Optional.of(state));
        preview();
    }

    /** Marks the active reading. A depth is measured on an isolated belt only. */
    public void mark(Quality quality) {
        Slot slot = active();
        keep();
        Optional<Quantity> reading = quantity(document(), slot.where());
        boolean running = beltState.get().or(() -> reading.flatMap(Quantity::beltState))
                .map(BeltState::running).orElse(true);
        if (Typing.isDepth(slot) && quality == Quality.MEASURED && running) {
            note.set(Optional.of(new Note.IsolateFirst()));
            return;
        }
        reading.ifPresent(read -> {
            Quantity marked = read.withQuality(quality);
            set(slot.where(), Optional.of(Branch.write(beltState.get().map(marked::withBeltState).orElse(marked))));
        });
    }

    /** Types on in another unit; what stands in the cell keeps the unit that it was entered in. */
    public void chooseUnit(Unit chosen) {
        chosenUnits.put(active().where(), chosen);
        inHand.set(new InHand(active(), Optional.of(chosen)));
        preview();
    }

    private void unitChanged() {
        if (typed.get().isEmpty()) {
            inHand.set(new InHand(active(), unitOf(active())));
        }
    }

    private Optional<Unit> unitOf(Slot slot) {
        if (!(slot instanceof Slot.MeasureSlot measured)) {
            return Optional.empty();
        }
        return Optional.ofNullable(chosenUnits.get(slot.where()))
                .or(() -> quantity(document(), slot.where()).map(Quantity::unit)
                        .filter(measured.measure().units()::contains))
                .or(() -> Optional.of(offered(measured.measure())));
    }

    /** The unit that a number is asked in first: the one that the person likes, where the form has it. */
    Unit offered(Measure measure) {
        Unit usual = measure.unit(units.get());
        return Optional.of(liked.apply(usual)).filter(measure.units()::contains).orElse(usual);
    }

    /** Asks first in the unit that the person likes better than a usual one. */
    void likeUnits(UnaryOperator<Unit> better) {
        liked = better;
        unitChanged();
    }

    /** The unit in which the active cell is typed; only where it is a number with a unit. */
    private Unit unit() {
        return inHand.get().unit().orElseThrow();
    }

    private void refresh() {
        rows.set(layOut());
        preview();
    }

    private List<SlotRow> layOut() {
        return Slots.rows(setting.form(), document(), field -> field.ways(document()).stream().findFirst()
                .orElseGet(() -> ways.getOrDefault(field, SpeedField.Way.DIRECT)));
    }

    private void preview() {
        Typing.Read read = read();
        note.set(read.rejected().filter(reason -> reason != TypedNumber.Reason.UNFINISHED)
                .<Note>map(Note.NoNumber::new).or(() -> typed.get().isEmpty() ? note.get() : Optional.empty()));
        Branch now = read.answer().map(answer -> Answers.change(document(), active().where(), Optional.of(answer))
                .in(document())).orElseGet(this::document);
        if (!Objects.equals(survey.get(), now)) {
            survey.set(now);
            outcome.set(judge(now));
        }
    }

    /** What the typing comes to; nothing while nothing is typed. */
    private Typing.Read read() {
        return typed.get().isEmpty() ? Typing.Read.NOTHING
                : typing().read(inHand.get(), typed.get(), quantity(document(), active().where()));
    }

    private Outcome judge(Branch document) {
        try {
            return new Outcome(Optional.of(setting.assessor().assess(new Survey(document), setting.companions())),
                    Optional.empty());
        } catch (Refused e) {
            return new Outcome(Optional.empty(), Optional.of(e));
        }
    }

    private static Optional<Quantity> quantity(Branch document, Pointer where) {
        try {
            return document.at(where).filter(Branch.class::isInstance).map(node -> ((Branch) node).asQuantity());
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    /** What is impossible about the answer of a cell, active or not: it stands until it is mended. */
    public Optional<Note> impossible(Slot slot) {
        return firstJudgement(slot).filter(note -> !isDoubt(note));
    }

    /** What there is to say about the answer of a cell, as it is saved: an impossibility before a doubt. */
    private Optional<Note> firstJudgement(Slot slot) {
        return slot.field().judge(document(), setting.last().orElse(Branch.EMPTY)).stream()
                .filter(judgement -> judgement.where().holds(slot.where()) || slot.where().holds(judgement.where()))
                .min(Comparator.comparing(judgement -> judgement instanceof Judgement.Doubt))
                .map(judgement -> new Note.Judged(judgement, slot.field()));
    }

    /**
     * Completes the survey, or leads to the first gap.
     *
     * @param signedOffBy the person who answers for it
     * @return whether it was completed
     */
    public boolean complete(String signedOffBy) {
        if (!keep()) {
            return false;
        }
        List<Judgement.Refusal> refusals = setting.form().refusals(document());
        if (!refusals.isEmpty()) {
            activate(refusals.get(0).where());
            setting.form().fieldAt(refusals.get(0).where()).ifPresent(field ->
                    note.set(Optional.of(new Note.Judged(refusals.get(0), field))));
            return false;
        }
        Optional<Field> gap = setting.form().gaps(document()).stream().findFirst().or(this::engineGap);
        if (gap.isPresent()) {
            activate(gap.get().where());
            note.set(Optional.of(new Note.Gap(gap.get())));
            return false;
        }
        work.complete(signedOffBy);
        return true;
    }

    /** A reading that the verdict waits for; what the register lacks the person here cannot give. */
    private Optional<Field> engineGap() {
        return outcome.get().assessment().stream().flatMap(found -> found.missingRequired().stream())
                .flatMap(name -> setting.form().fieldAt(Pointer.parse(name)).stream()).findFirst();
    }
}
