package bedmark.screen;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.Store;
import bedmark.journal.NotSaved;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import java.time.OffsetDateTime;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.Optional;
import java.util.concurrent.Executor;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.TimeUnit;
import java.util.function.Consumer;
import javafx.beans.property.ReadOnlyIntegerProperty;
import javafx.beans.property.ReadOnlyIntegerWrapper;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/**
 * Writes acts into the store away from the screen, in the order in which they were done. An act that could not be
 * saved stays at the head of the line and is tried again with the next one, or when asked; nothing overtakes it.
 */
public final class Scribe implements AutoCloseable {

    /** One act that waits. */
    private record Job(long number, String person, Act act, Consumer<Entry> saved, Runnable refused) {
    }

    private final Store store;
    private final Executor screen;
    private final ExecutorService pen = Executors.newSingleThreadExecutor(run -> new Thread(run, "scribe"));
    private final Deque<Job> line = new ArrayDeque<>();
    private final ReadOnlyObjectWrapper<Optional<OffsetDateTime>> savedAt;
    private final ReadOnlyObjectWrapper<Optional<Defect>> trouble = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyIntegerWrapper waiting = new ReadOnlyIntegerWrapper(0);
    /** How many acts were given to save so far, and how many of them before the trouble that shows. */
    private long given;
    private long reportedAfter;

    /**
     * A scribe for one store.
     *
     * @param screen runs what touches the screen's properties, in order
     */
    public Scribe(Store store, Executor screen) {
        this.store = store;
        this.screen = screen;
        this.savedAt = new ReadOnlyObjectWrapper<>(store.savedAt());
    }

    /**
     * Saves an act. Called by the screen.
     *
     * @param saved told by the screen's executor once the act is on the medium
     */
    public void save(String person, Act act, Consumer<Entry> saved) {
        save(person, act, saved, () -> { });
    }

    /**
     * Saves an act. Called by the screen.
     *
     * @param saved   told by the screen's executor once the act is on the medium
     * @param refused told in the same way where the act is impossible as things stand, and given up
     */
    public void save(String person, Act act, Consumer<Entry> saved, Runnable refused) {
        waiting.set(waiting.get() + 1);
        long number = ++given;
        pen.execute(() -> {
            line.addLast(new Job(number, person, act, saved, refused));
            writeAll();
        });
    }

    /** Runs on the screen once all that was given to save before is saved, or could not be. */
    public void afterwards(Runnable then) {
        pen.execute(() -> screen.execute(then));
    }

    /** Shows trouble that came from elsewhere, until an act is saved that the person does after it. */
    void report(Defect defect) {
        reportedAfter = given;
        trouble.set(Optional.of(defect));
    }

    /** Tries once more to save what waits. */
    public void retry() {
        pen.execute(this::writeAll);
    }

    private void writeAll() {
        while (!line.isEmpty()) {
            Job job = line.peekFirst();
            try {
                Entry entry = store.append(job.person(), job.act());
                line.removeFirst();
                screen.execute(() -> {
                    waiting.set(waiting.get() - 1);
                    savedAt.set(Optional.of(entry.at()));
                    if (job.number() > reportedAfter) {
                        trouble.set(Optional.empty());
                    }
                    job.saved().accept(entry);
                });
            } catch (NotSaved e) {
                screen.execute(() -> {
                    reportedAfter = 0;
                    trouble.set(Optional.of(e.defect()));
                });
                return;
            } catch (Refused e) {
                // The act itself is impossible as things stand; trying it again would stop all others for ever.
                line.removeFirst();
                screen.execute(() -> {
                    waiting.set(waiting.get() - 1);
                    trouble.set(Optional.of(e.defect()));
                    job.refused().run();
                });
            }
        }
    }

    /** When something was last saved. */
    public ReadOnlyObjectProperty<Optional<OffsetDateTime>> savedAtProperty() {
        return savedAt.getReadOnlyProperty();
    }

    /** Why the head of the line is not saved. */
    public ReadOnlyObjectProperty<Optional<Defect>> troubleProperty() {
        return trouble.getReadOnlyProperty();
    }

    /** How many acts are not saved yet. */
    public ReadOnlyIntegerProperty waitingProperty() {
        return waiting.getReadOnlyProperty();
    }

    /** Writes what waits and ends. */
    @Override
    public void close() {
        pen.execute(this::writeAll);
        pen.shutdown();
        try {
            if (!pen.awaitTermination(30, TimeUnit.SECONDS)) {
                pen.shutdownNow();
            }
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }
}
