package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.form.Measure;
import bedmark.form.SpeedField;
import bedmark.quantity.BeltState;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.quantity.TypedNumber;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.survey.Assessor;
import bedmark.survey.SurveyHistory;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.function.UnaryOperator;
import javafx.beans.binding.BooleanBinding;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.StringProperty;
import javafx.beans.value.ObservableValue;

/**
 * A transfer point under survey: which cell is active, what is typed into it, what the survey then says. What is typed
 * counts at once for the result; it is saved when the cell is left. Nothing that is typed is ever refused a place in
 * the survey; only completing is.
 */
public final class ZoneModel {
    private final ZoneSetting setting;
    private final List<Assessor.Seen> companions;
    private final SpeedWays ways = new SpeedWays();
    private final CellInHand hand;
    private final Set<Pointer> believed = new HashSet<>();
    private final Judging judging;
    private final Slots layout;
    private final SurveyInWork work;
    private final Tables tables;
    private final BooleanBinding undoable;
    private final ReadOnlyObjectWrapper<Branch> survey;
    private final ReadOnlyObjectWrapper<List<SlotRow>> rows;
    private final ReadOnlyObjectWrapper<Outcome> outcome;
    private final ReadOnlyObjectWrapper<Optional<Note>> note = new ReadOnlyObjectWrapper<>(Optional.empty());

    /**
     * The cell that is filled in now.
     *
     * @param unit the unit in which it is typed, where it has one
     */
    public record InHand(Slot slot, Optional<Unit> unit) {
    }

    /**
     * Opens a survey.
     *
     * @param units  the unit system in which numbers are asked first
     * @param locale the number format that is typed
     */
    public ZoneModel(ZoneSetting setting, UnitSystem units, Locale locale) {
        this.setting = setting;
        this.companions = setting.assessor().seen(setting.companions());
        this.judging = new Judging(setting);
        this.layout = new Slots(setting.form());
        this.work = new SurveyInWork(setting.history(), setting.scribe(), setting.person());
        this.tables = new Tables(this, work, setting.last());
        this.hand = new CellInHand(setting.clock(), units, locale);
        this.survey = new ReadOnlyObjectWrapper<>(document());
        this.rows = new ReadOnlyObjectWrapper<>(layOut());
        this.outcome = new ReadOnlyObjectWrapper<>(judge(document()));
        work.documentProperty().addListener((property, before, now) -> refresh());
        hand.typedProperty().addListener((property, before, now) -> preview());
        hand.beltStateProperty().addListener((property, before, now) -> preview());
        this.undoable = hand.typedProperty().isNotEmpty().or(work.undoableProperty());
        hand.unitsProperty().addListener((property, before, now) -> hand.followUnits(document()));
        hand.localeProperty().addListener((property, before, now) -> {
            hand.translate(before);
            preview();
        });
        activateFirst();
    }

    /** The survey as it is saved, or on its way to be. */
    private Branch document() {
        return work.documentProperty().get();
    }

    /** The survey as it is saved, or on its way to be: without what is being typed. */
    public ReadOnlyObjectProperty<Branch> keptProperty() {
        return work.documentProperty();
    }

    /** Makes the cell active where work begins. */
    void activateFirst() {
        activate(firstToAnswer());
    }

    /** Where work begins: the first gap, or the first cell where there is none. */
    private Slot firstToAnswer() {
        return setting.form().gaps(document()).stream().filter(gap -> open())
                .flatMap(gap -> slots().stream().filter(slot -> slot.field().equals(gap))).findFirst()
                .orElseGet(() -> slots().get(0));
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
        return hand.property();
    }

    /** The active cell. */
    public Slot active() {
        return hand.slot();
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
        return hand.typedProperty();
    }

    public ObjectProperty<UnitSystem> unitsProperty() {
        return hand.unitsProperty();
    }

    public ObjectProperty<Locale> localeProperty() {
        return hand.localeProperty();
    }

    /** What the belt does now, as the person says. */
    public ReadOnlyObjectProperty<Optional<BeltState>> beltStateProperty() {
        return hand.beltStateProperty();
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
                ? Optional.of(Node.text(ways.of(way.field(), survey.get()).key())) : survey.get().at(slot.where());
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
        if (hand.isTypedInto(slot)) {
            // A number that is not finished keeps its cell in hand, with the note that says why.
            hand.hold();
            return;
        }
        hand.take(slot, document());
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
        Optional<Note> question = firstJudgement(here).filter(Note::isDoubt);
        if (question.isPresent() && believed.add(here.where())) {
            show(here);
            note.set(question);
            return;
        }
        List<Slot> slots = slots();
        int index = indexOf(slots, here.where());
        show(slots.get(Math.max(0, Math.min(slots.size() - 1, index + step))));
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
        if (hand.untouched() || !open()) {
            return true;
        }
        Typing.Read read = read();
        if (read.answer().isEmpty()) {
            note.set(read.rejected().map(Note.NoNumber::new));
            return false;
        }
        String was = hand.typedProperty().get();
        set(active().where(), read.answer());
        if (hand.typedProperty().get().equals(was)) {
            hand.clear();
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
        return hand.editable(answer(active()));
    }

    /** Changes the number in the active cell by one step of its unit. */
    public void step(int direction) {
        hand.step(direction, answer(active()));
    }

    Typing typing() {
        return hand.typing();
    }

    /** Goes on to the next unit that the active cell can be typed in; what is typed is not converted. */
    public void switchUnit() {
        hand.nextUnit().ifPresent(this::chooseUnit);
    }

    /** Clears the active cell. */
    public void clear() {
        hand.clear();
        if (!(active() instanceof Slot.WaySlot)) {
            set(active(), Optional.empty());
        }
    }

    /** What is set anew was read anew, and is carried over no longer. */
    private void set(Pointer where, Optional<Node> answer) {
        believed.remove(where);
        work.change(Answers.change(document(), where, answer));
        CarriedOver.readAnew(document(), where).ifPresent(work::change);
    }

    /** What is done to the tables as a whole. */
    public Tables tables() {
        return tables;
    }

    /** Whether the answer of a cell was taken over from the last survey and not read since. */
    public boolean carriedOver(Slot slot) {
        return CarriedOver.holds(document(), slot.where());
    }

    /** What happened to a cell, newest first. */
    List<FieldHistory.Step> historyOf(Slot slot) {
        return FieldHistory.of(history(), slot.where());
    }

    /** Whether the survey still takes answers; a completed one is corrected by a new revision. */
    public boolean open() {
        return work.open();
    }

    /** Takes back the typing, or else the newest change that still counts. */
    public void undo() {
        if (!hand.untouched()) {
            hand.clear();
        } else {
            work.undo(this::activate);
        }
    }

    private void chooseWay(SpeedField field, Optional<Node> answer) {
        ways.choose(field, answer, document()).ifPresent(cleared -> {
            cleared.forEach(work::change);
            refresh();
        });
    }

    /** Says what the belt does now; readings from here on carry it. */
    public void sayBeltState(BeltState state) {
        hand.beltStateProperty().set(Optional.of(state));
    }

    /** Marks the active reading. A depth is measured on an isolated belt only. */
    public void mark(Quality quality) {
        Slot slot = active();
        keep();
        Optional<Quantity> reading = quantity(document(), slot.where());
        Optional<BeltState> said = hand.beltStateProperty().get();
        boolean running = said.or(() -> reading.flatMap(Quantity::beltState))
                .map(BeltState::running).orElse(true);
        if (Typing.isDepth(slot) && quality == Quality.MEASURED && running) {
            note.set(Optional.of(new Note.IsolateFirst()));
            return;
        }
        reading.ifPresent(read -> {
            Quantity marked = read.withQuality(quality);
            set(slot.where(), Optional.of(Branch.write(said.map(marked::withBeltState).orElse(marked))));
        });
    }

    /** Types on in another unit; what stands in the cell keeps the unit that it was entered in. */
    public void chooseUnit(Unit chosen) {
        hand.choose(chosen);
        preview();
    }

    /** The unit that a number is asked in first: the one that the person likes, where the form has it. */
    Unit offered(Measure measure) {
        return hand.offered(measure);
    }

    /** Asks first in the unit that the person likes better than a usual one. */
    void likeUnits(UnaryOperator<Unit> better) {
        hand.like(better);
        hand.followUnits(document());
    }

    private void refresh() {
        rows.set(layOut());
        preview();
    }

    private List<SlotRow> layOut() {
        return layout.rows(document(), field -> ways.of(field, document()));
    }

    private void preview() {
        Typing.Read read = read();
        note.set(read.rejected().filter(reason -> reason != TypedNumber.Reason.UNFINISHED)
                .<Note>map(Note.NoNumber::new).or(() -> hand.untouched() ? note.get() : Optional.empty()));
        Branch now = read.answer().map(answer -> Answers.change(document(), active().where(), Optional.of(answer))
                .in(document())).orElseGet(this::document);
        if (!Objects.equals(survey.get(), now)) {
            // Who draws the survey looks at what it comes to as well.
            outcome.set(judge(now));
            survey.set(now);
        }
    }

    /** What the typing comes to; nothing while nothing is typed. */
    private Typing.Read read() {
        return hand.read(quantity(document(), active().where()).flatMap(Quantity::quality)
                .filter(Quality.SUSPECT::equals).isPresent());
    }

    private Outcome judge(Branch document) {
        return Outcome.of(document, setting.assessor(), companions);
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
        return judging.impossible(document(), slot);
    }

    private Optional<Note> firstJudgement(Slot slot) {
        return judging.first(document(), slot);
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
        Optional<Judging.Obstacle> obstacle = judging.obstacle(document(), outcome.get().assessment());
        obstacle.ifPresent(found -> {
            activate(found.where());
            note.set(Optional.of(found.note()));
        });
        if (obstacle.isEmpty()) {
            work.complete(signedOffBy);
        }
        return obstacle.isEmpty();
    }
}
