package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Pointer;
import bedmark.screen.Scribe;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.QueueState;
import bedmark.survey.SurveyHistory;
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
     * Takes back the newest change that still counts, once everything before it is saved.
     *
     * @param undone told the place of the change
     */
    void undo(Consumer<Pointer> undone) {
        if (onTheWay > 0) {
            undoWanted = Optional.of(undone);
            return;
        }
        history.newest().filter(change -> open()).ifPresent(change ->
                save(new Act.AnswerUndone(id, change.sequence()), () -> undone.accept(change.where())));
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
