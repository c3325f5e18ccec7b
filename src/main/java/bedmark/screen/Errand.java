package bedmark.screen;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import java.util.Optional;
import java.util.concurrent.Executor;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Consumer;
import javafx.beans.property.DoubleProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleDoubleProperty;

/** Work that takes time: done beside the screen, one at a time, with its progress, a way to stop it, its trouble. */
public final class Errand {
    private final Executor beside;
    private final Executor screen;
    private final DoubleProperty progress = new SimpleDoubleProperty(-1);
    private final ReadOnlyObjectWrapper<Optional<Defect>> trouble = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final AtomicBoolean cancelled = new AtomicBoolean();

    /** The work itself. */
    @FunctionalInterface
    public interface Work<T> {
        T run(Progress progress);
    }

    /** Work at a tablet's workplace. */
    public Errand(Workplace workplace) {
        this(workplace.longWork(), workplace.screen());
    }

    /**
     * Work of any window.
     *
     * @param beside does it
     * @param screen runs what touches the screen
     */
    public Errand(Executor beside, Executor screen) {
        this.beside = beside;
        this.screen = screen;
    }

    /** How far it is, 0 to 1; negative while nothing runs. */
    public DoubleProperty progressProperty() {
        return progress;
    }

    /** Why the last one came to nothing. */
    public ReadOnlyObjectProperty<Optional<Defect>> troubleProperty() {
        return trouble.getReadOnlyProperty();
    }

    public boolean running() {
        return progress.get() >= 0;
    }

    /** Stops it as soon as it can be; nothing half-done stays behind. */
    public void cancel() {
        cancelled.set(true);
    }

    /**
     * Does work, where none runs already. Called by the screen.
     *
     * @param done told by the screen's executor what came out
     */
    public <T> void run(Work<T> work, Consumer<T> done) {
        if (running()) {
            return;
        }
        cancelled.set(false);
        progress.set(0);
        trouble.set(Optional.empty());
        beside.execute(() -> {
            try {
                T result = work.run(told());
                screen.execute(() -> {
                    progress.set(-1);
                    done.accept(result);
                });
            } catch (Refused e) {
                failed(e.defect());
            } catch (NotSaved e) {
                failed(e.defect());
            } catch (RuntimeException e) {
                failed(Defect.in("", "screen-failed", e.getClass().getSimpleName()));
            }
        });
    }

    private void failed(Defect defect) {
        screen.execute(() -> {
            progress.set(-1);
            trouble.set(Optional.of(defect));
        });
    }

    /** The screen hears of whole hundredths only, so that it keeps up with work that goes fast. */
    private Progress told() {
        return new Progress() {
            private int shown;

            @Override
            public void at(long done, long total) {
                double share = total == 0 ? 0 : (double) done / total;
                int hundredths = (int) (share * 100);
                if (hundredths != shown) {
                    shown = hundredths;
                    screen.execute(() -> progress.set(progress.get() < 0 ? -1 : share));
                }
            }

            @Override
            public boolean cancelled() {
                return cancelled.get();
            }
        };
    }
}
