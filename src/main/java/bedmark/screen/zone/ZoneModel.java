package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.engine.Assessment;
import bedmark.form.Field;
import bedmark.form.Judgement;
import bedmark.form.SpeedField;
import bedmark.form.StationsField;
import bedmark.quantity.BeltState;
import bedmark.quantity.NumberEntry;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.quantity.QuantityFormat;
import bedmark.quantity.TypedNumber;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.math.BigDecimal;
import java.math.MathContext;
import java.time.OffsetDateTime;
import java.time.temporal.ChronoUnit;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;
import java.util.stream.Stream;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyBooleanProperty;
import javafx.beans.property.ReadOnlyBooleanWrapper;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleObjectProperty;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;

/**
 * A transfer point under survey: which cell is active, what is typed into it, what the survey then says. What is typed
 * counts at once for the result; it is saved when the cell is left. Nothing that is typed is ever refused a place in
 * the survey; only completing is.
 */
public final class ZoneModel {
    private final ZoneSetting setting;
    private final UUID id;
    private final Map<SpeedField, SpeedField.Way> ways = new HashMap<>();
    private final Map<Pointer, Unit> chosenUnits = new HashMap<>();
    private final Set<Pointer> believed = new HashSet<>();
    private int pending;
    private boolean undoWhenSaved;

    private SurveyHistory history;
    private final ReadOnlyObjectWrapper<Branch> saved;
    private final ReadOnlyObjectWrapper<Branch> survey;
    private final ReadOnlyObjectWrapper<List<SlotRow>> rows;
    private final ReadOnlyObjectWrapper<InHand> inHand = new ReadOnlyObjectWrapper<>();
    private final ReadOnlyObjectWrapper<Outcome> outcome;
    private final ReadOnlyObjectWrapper<Optional<Note>> note = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyBooleanWrapper undoable = new ReadOnlyBooleanWrapper();
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
        this.history = setting.history();
        this.id = history.survey().id();
        this.units.set(units);
        this.locale.set(locale);
        this.saved = new ReadOnlyObjectWrapper<>(history.survey().document());
        this.survey = new ReadOnlyObjectWrapper<>(saved.get());
        this.rows = new ReadOnlyObjectWrapper<>(layOut());
        this.outcome = new ReadOnlyObjectWrapper<>(judge(saved.get()));
        typed.addListener((property, before, now) -> preview());
        typed.addListener((property, before, now) -> undoableChanged());
        undoableChanged();
        this.units.addListener((property, before, now) -> unitChanged());
        this.locale.addListener((property, before, now) -> preview());
        activate(firstToAnswer());
    }

    /** Where work begins: the first gap, or the first cell where there is none. */
    private Slot firstToAnswer() {
        return setting.form().gaps(saved.get()).stream().filter(gap -> open())
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
    public ReadOnlyBooleanProperty undoableProperty() {
        return undoable.getReadOnlyProperty();
    }

    private void undoableChanged() {
        undoable.set(open() && (!typed.get().isEmpty() || pending > 0 || history.newest().isPresent()));
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
        return history;
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

    /** Makes a cell active; what was typed into the one before is saved first. */
    public void activate(Slot slot) {
        keep();
        show(slot);
    }

    private void show(Slot slot) {
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
        Slot slot = active();
        Optional<Node> answer = typedAnswer(slot);
        if (answer.isEmpty()) {
            return false;
        }
        String was = typed.get();
        set(slot.where(), answer);
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
        if (!typed.get().isEmpty()) {
            return typed.get();
        }
        char sign = new QuantityFormat(locale.get()).decimalSign();
        return answer(active()).map(node -> {
            if (node instanceof Branch) {
                return quantity(saved.get(), active().where()).map(read -> inUnit(read, sign)).orElse("");
            }
            return node instanceof Node.Decimal number ? number.value().toPlainString().replace('.', sign)
                    : node instanceof Node.Text text ? text.value() : "";
        }).orElse("");
    }

    private String inUnit(Quantity read, char sign) {
        if (read.unit() == unit()) {
            return read.entered().orElseGet(() -> read.value().toPlainString().replace('.', sign));
        }
        return unit().convert(read.value(), read.unit()).round(new MathContext(4)).stripTrailingZeros()
                .toPlainString().replace('.', sign);
    }

    /** Changes the number in the active cell by one step of its unit. */
    public void step(int direction) {
        Slot slot = active();
        BigDecimal step = slot instanceof Slot.MeasureSlot measured ? measured.measure().step(unit())
                : slot instanceof Slot.CountSlot counted ? counted.count().step() : BigDecimal.ZERO;
        String now = editable();
        TypedNumber number = new NumberEntry(locale.get()).read(now.isEmpty() ? "0" : now);
        if (number instanceof TypedNumber.Accepted accepted) {
            BigDecimal stepped = accepted.value().add(step.multiply(BigDecimal.valueOf(direction)))
                    .max(BigDecimal.ZERO);
            char sign = new QuantityFormat(locale.get()).decimalSign();
            typed.set(stepped.toPlainString().replace('.', sign));
        }
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
        save(Answers.change(saved.get(), where, answer));
    }

    private void save(Answers.Change change) {
        if (!open() || saved.get().at(change.where()).equals(change.answer())) {
            return;
        }
        saved.set(change.in(saved.get()));
        act(new Act.AnswerSet(id, change.where(), change.answer()));
        refresh();
    }

    /** Whether the survey still takes answers; a completed one is corrected by a new revision. */
    public boolean open() {
        return history.state() == QueueState.OPEN;
    }

    private void act(Act act) {
        pending++;
        undoableChanged();
        setting.scribe().save(setting.person(), act, this::noted);
    }

    private void noted(Entry entry) {
        history = SurveyHistory.after(Optional.of(history), entry).orElseThrow();
        pending--;
        undoableChanged();
        if (pending == 0 && undoWhenSaved) {
            undoWhenSaved = false;
            undo();
        }
    }

    /** Takes back the typing, or else the newest change that still counts. */
    public void undo() {
        if (!typed.get().isEmpty()) {
            typed.set("");
            return;
        }
        if (pending > 0) {
            undoWhenSaved = true;
            return;
        }
        history.newest().ifPresent(change -> {
            pending++;
            setting.scribe().save(setting.person(), new Act.AnswerUndone(id, change.sequence()), entry -> {
                noted(entry);
                saved.set(history.survey().document());
                refresh();
                activate(change.where());
            });
        });
    }

    /** Adds a station or a segment behind the last one of a table and makes it active. */
    public void addLine(Pointer table) {
        keep();
        int lines = saved.get().at(table).filter(Node.Series.class::isInstance)
                .map(node -> ((Node.Series) node).items().size()).orElse(0);
        save(Answers.withLine(saved.get(), table, Branch.EMPTY));
        activate(table.child(lines));
    }

    /** Takes a line out of a table. */
    public void removeLine(Pointer line) {
        typed.set("");
        save(Answers.withoutLine(saved.get(), line));
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
        save(pulled(line, position, depth));
        activate(table.child(line).child("depth"));
    }

    /** The survey as it would be with the bed pulled to a depth; nothing is saved. */
    public Branch previewPull(int line, Quantity position, Quantity depth) {
        return pulled(line, position, depth).in(saved.get());
    }

    private Answers.Change pulled(int line, Quantity position, Quantity depth) {
        Pointer table = Survey.READINGS.child(StationsField.KEY);
        Branch seen = Branch.write(stamped(depth).withQuality(Quality.ESTIMATED));
        return saved.get().at(table.child(line)).isPresent()
                ? Answers.change(saved.get(), table.child(line).child("depth"), Optional.of(seen))
                : Answers.withLine(saved.get(), table, Branch.EMPTY.with("position", position).with("depth", seen));
    }

    private void chooseWay(SpeedField field, Optional<Node> answer) {
        Optional<SpeedField.Way> chosen = answer.flatMap(node -> Stream.of(SpeedField.Way.values())
                .filter(way -> node.equals(Node.text(way.key()))).findFirst());
        chosen.ifPresent(way -> {
            ways.put(field, way);
            for (SpeedField.Way other : SpeedField.Way.values()) {
                if (other != way && saved.get().at(other.where()).isPresent()) {
                    save(new Answers.Change(other.where(), Optional.empty()));
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
        Optional<Quantity> reading = quantity(saved.get(), slot.where());
        boolean running = beltState.get().or(() -> reading.flatMap(Quantity::beltState))
                .map(BeltState::running).orElse(true);
        if (isDepth(slot) && quality == Quality.MEASURED && running) {
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
                .or(() -> quantity(saved.get(), slot.where()).map(Quantity::unit)
                        .filter(measured.measure().units()::contains))
                .or(() -> Optional.of(measured.measure().unit(units.get())));
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
        return Slots.rows(setting.form(), saved.get(), field -> field.ways(saved.get()).stream().findFirst()
                .orElseGet(() -> ways.getOrDefault(field, SpeedField.Way.DIRECT)));
    }

    private void preview() {
        Branch now = typed.get().isEmpty() ? saved.get()
                : typedAnswer(active()).map(answer -> Answers.change(saved.get(), active().where(), Optional.of(answer))
                        .in(saved.get())).orElse(saved.get());
        if (!Objects.equals(survey.get(), now)) {
            survey.set(now);
            outcome.set(judge(now));
        }
    }

    private Outcome judge(Branch document) {
        try {
            return new Outcome(Optional.of(setting.assessor().assess(new Survey(document), setting.companions())),
                    Optional.empty());
        } catch (Refused e) {
            return new Outcome(Optional.empty(), Optional.of(e));
        }
    }

    private Optional<Node> typedAnswer(Slot slot) {
        if (slot instanceof Slot.TextSlot) {
            return Optional.of(Node.text(typed.get()));
        }
        NumberEntry entry = new NumberEntry(locale.get());
        TypedNumber number = slot instanceof Slot.MeasureSlot ? entry.read(typed.get(), unit())
                : entry.read(typed.get());
        if (number instanceof TypedNumber.Rejected rejected) {
            boolean halfway = rejected.reason() == TypedNumber.Reason.UNFINISHED;
            note.set(halfway ? Optional.empty() : Optional.of(new Note.NoNumber(rejected.reason())));
            return Optional.empty();
        }
        note.set(Optional.empty());
        TypedNumber.Accepted accepted = (TypedNumber.Accepted) number;
        if (slot instanceof Slot.MeasureSlot measured) {
            Quantity quantity = accepted.in(unit());
            return Optional.of(Branch.write(measured.markable() ? marked(slot, stamped(quantity)) : quantity));
        }
        return Optional.of(Node.number(accepted.value()));
    }

    private Quantity stamped(Quantity quantity) {
        Quantity timed = quantity.readAt(OffsetDateTime.now(setting.clock()).truncatedTo(ChronoUnit.SECONDS));
        return beltState.get().map(timed::withBeltState).orElse(timed);
    }

    /** A depth starts as estimated unless the belt is isolated; other readings start as measured. */
    private Quantity marked(Slot slot, Quantity quantity) {
        boolean isolated = beltState.get().filter(state -> !state.running()).isPresent();
        Quality start = isDepth(slot) && !isolated ? Quality.ESTIMATED : Quality.MEASURED;
        Quality kept = quantity(saved.get(), slot.where()).flatMap(Quantity::quality)
                .filter(quality -> quality == Quality.SUSPECT).orElse(start);
        return quantity.withQuality(kept);
    }

    private static boolean isDepth(Slot slot) {
        return slot.field() instanceof StationsField && slot.where().last().equals("depth");
    }

    private static Optional<Quantity> quantity(Branch document, Pointer where) {
        try {
            return document.at(where).filter(Branch.class::isInstance).map(node -> ((Branch) node).asQuantity());
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    /** What there is to say about the answer of a cell, as it is saved: an impossibility before a doubt. */
    private Optional<Note> firstJudgement(Slot slot) {
        return slot.field().judge(saved.get(), setting.last().orElse(Branch.EMPTY)).stream()
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
        List<Judgement.Refusal> refusals = setting.form().refusals(saved.get());
        if (!refusals.isEmpty()) {
            activate(refusals.get(0).where());
            setting.form().fieldAt(refusals.get(0).where()).ifPresent(field ->
                    note.set(Optional.of(new Note.Judged(refusals.get(0), field))));
            return false;
        }
        Optional<Field> gap = setting.form().gaps(saved.get()).stream().findFirst().or(this::engineGap);
        if (gap.isPresent()) {
            activate(gap.get().where());
            note.set(Optional.of(new Note.Gap(gap.get())));
            return false;
        }
        act(new Act.SurveyCompleted(id, signedOffBy));
        return true;
    }

    /** A reading that the verdict waits for; what the register lacks the person here cannot give. */
    private Optional<Field> engineGap() {
        return outcome.get().assessment().stream().flatMap(found -> found.missingRequired().stream())
                .flatMap(name -> setting.form().fieldAt(Pointer.parse(name)).stream()).findFirst();
    }
}
