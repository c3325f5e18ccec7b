package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Pointer;
import bedmark.screen.Scribe;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import java.util.function.Consumer;
import javafx.beans.property.ReadOnlyBooleanProperty;
import javafx.beans.property.ReadOnlyBooleanWrapper;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/**
 * A survey that is being answered: each change shows at once and is saved in the order in which it was made. As soon
 * as nothing is on its way to the store, what shows is exactly what the journal says.
 */
final class SurveyInWork {
    private final UUID id;
    private final Scribe scribe;
    private final String person;
    private final ReadOnlyObjectWrapper<Branch> document;
    private final ReadOnlyBooleanWrapper undoable = new ReadOnlyBooleanWrapper();
    private SurveyHistory history;
    private int onTheWay;
    private Optional<Consumer<Pointer>> undoWanted = Optional.empty();

    SurveyInWork(SurveyHistory history, Scribe scribe, String person) {
        this.history = history;
        this.id = history.survey().id();
        this.scribe = scribe;
        this.person = person;
        this.document = new ReadOnlyObjectWrapper<>(history.survey().document());
        undoableChanged();
    }

    /** Whether there is a change that can be taken back. */
    ReadOnlyBooleanProperty undoableProperty() {
        return undoable.getReadOnlyProperty();
    }

    private void undoableChanged() {
        undoable.set(open() && (onTheWay > 0 || history.newest().isPresent()));
    }

    /** The survey with all changes, saved or on their way. */
    ReadOnlyObjectProperty<Branch> documentProperty() {
        return document.getReadOnlyProperty();
    }

    /** The survey as the journal has it. */
    SurveyHistory history() {
        return history;
    }

    /** Whether the survey still takes answers. */
    boolean open() {
        return history.state() == QueueState.OPEN;
    }

    /** Makes a change; one that changes nothing is not saved. */
    void change(Answers.Change change) {
        if (open() && !document.get().at(change.where()).equals(change.answer())) {
            document.set(change.in(document.get()));
            save(new Act.AnswerSet(id, change.where(), change.answer()), () -> { });
        }
    }

    /**
     * Takes back the newest change that still counts, once everything before it is saved; the marks of what is carried
     * over go with the readings that they were changed for.
     *
     * @param undone told the place of the change
     */
    void undo(Consumer<Pointer> undone) {
        if (onTheWay > 0) {
            undoWanted = Optional.of(undone);
            return;
        }
        List<SurveyHistory.Change> counting = open() ? newest() : List.of();
        for (int i = 0; i < counting.size(); i++) {
            boolean last = i == counting.size() - 1;
            save(new Act.AnswerUndone(id, counting.get(i).sequence()), () -> {
                if (last) {
                    undone.accept(place(counting));
                }
            });
        }
    }

    /**
     * The newest change, and the one before where the two are one act: marks are set before what is carried over, and
     * taken off after what was read anew.
     */
    private List<SurveyHistory.Change> newest() {
        List<SurveyHistory.Change> counting = history.changes().stream().filter(change -> !change.undone()).toList();
        int size = counting.size();
        if (size < 2) {
            return counting;
        }
        SurveyHistory.Change last = counting.get(size - 1);
        SurveyHistory.Change before = counting.get(size - 2);
        boolean pair = last.where().equals(CarriedOver.MARKS)
                || last.where().equals(Survey.READINGS) && before.where().equals(CarriedOver.MARKS);
        return pair ? List.of(last, before) : List.of(last);
    }

    private static Pointer place(List<SurveyHistory.Change> act) {
        return act.stream().map(SurveyHistory.Change::where).filter(where -> !where.equals(CarriedOver.MARKS))
                .findFirst().orElse(CarriedOver.MARKS);
    }

    /** Completes the survey. */
    void complete(String signedOffBy) {
        save(new Act.SurveyCompleted(id, signedOffBy), () -> { });
    }

    private void save(Act act, Runnable then) {
        onTheWay++;
        undoableChanged();
        scribe.save(person, act, entry -> saved(entry, then), this::arrived);
    }

    private void saved(Entry entry, Runnable then) {
        history = SurveyHistory.after(Optional.of(history), entry).orElseThrow();
        arrived();
        then.run();
    }

    private void arrived() {
        onTheWay--;
        undoableChanged();
        if (onTheWay > 0) {
            return;
        }
        if (open() && !document.get().equals(history.survey().document())) {
            document.set(history.survey().document());
        }
        Optional<Consumer<Pointer>> wanted = undoWanted;
        undoWanted = Optional.empty();
        wanted.ifPresent(this::undo);
    }
}
