package bedmark.screen.office;

import bedmark.diary.Diary;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import bedmark.office.OfficeStore;
import bedmark.screen.FolderChoice;
import bedmark.screen.Preferences;
import bedmark.screen.PreferencesFile;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.time.Clock;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.ConcurrentHashMap;
import java.util.concurrent.Executor;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Consumer;
import java.util.function.Function;
import javafx.beans.property.DoubleProperty;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyIntegerProperty;
import javafx.beans.property.ReadOnlyIntegerWrapper;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleDoubleProperty;
import javafx.beans.property.SimpleObjectProperty;

/** What all screens of the office share: the store, who works here, and where work is done that takes time. */
public final class OfficeDesk implements AutoCloseable {
    private final OfficeStore store;
    private final Clock clock;
    private final Executor screen;
    private final FolderChoice folders;
    private final PreferencesFile file;
    private final Diary diary;
    private final ObjectProperty<Preferences> preferences;
    private final DoubleProperty progress = new SimpleDoubleProperty(-1);
    private final ReadOnlyObjectWrapper<Optional<Defect>> trouble = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyObjectWrapper<List<Defect>> found;
    private final ReadOnlyIntegerWrapper changes = new ReadOnlyIntegerWrapper();
    /** The work under way and what waits for it. */
    private final Set<Telling> under = ConcurrentHashMap.newKeySet();
    private final AtomicBoolean closed = new AtomicBoolean();
    private final ExecutorService work = Executors.newSingleThreadExecutor(run -> {
        Thread thread = new Thread(run, "office-work");
        thread.setDaemon(true);
        return thread;
    });

    /**
     * A desk at one store.
     *
     * @param screen  runs what touches the screen
     * @param folders asks for a folder
     */
    public OfficeDesk(OfficeStore store, Clock clock, Executor screen, FolderChoice folders) {
        this.store = store;
        this.clock = clock;
        this.screen = screen;
        this.folders = folders;
        this.found = new ReadOnlyObjectWrapper<>(store.found());
        this.file = new PreferencesFile(store.folder());
        this.diary = new Diary(store.folder(), clock);
        this.preferences = new SimpleObjectProperty<>(file.read());
        preferences.addListener((property, before, now) -> file.write(now));
    }

    public OfficeStore store() {
        return store;
    }

    public Clock clock() {
        return clock;
    }

    public FolderChoice folders() {
        return folders;
    }

    public ObjectProperty<Preferences> preferencesProperty() {
        return preferences;
    }

    public Preferences preferences() {
        return preferences.get();
    }

    public Wording wording() {
        return new Wording(new Words(preferences().locale()), preferences().units());
    }

    /** Who decides, for the office's records. */
    public String person() {
        return preferences().person();
    }

    /** How far the work under way is, 0 to 1; negative while there is none. */
    public DoubleProperty progressProperty() {
        return progress;
    }

    /** What went wrong last, until something goes well. */
    public ReadOnlyObjectProperty<Optional<Defect>> troubleProperty() {
        return trouble.getReadOnlyProperty();
    }

    /** What was not as it was written when the store was opened, until somebody has read it. */
    public ReadOnlyObjectProperty<List<Defect>> foundProperty() {
        return found.getReadOnlyProperty();
    }

    /** Somebody has read what was found. */
    public void seen() {
        found.set(List.of());
    }

    /** Counts the changes of the store that were made here. */
    public ReadOnlyIntegerProperty changesProperty() {
        return changes.getReadOnlyProperty();
    }

    /** Stops the work under way, and what waits for it, as soon as it can stop, leaving nothing half done. */
    public void cancel() {
        under.forEach(one -> one.stop.set(true));
    }

    /** Does something on the screen's thread as soon as that is free. */
    void onScreen(Runnable action) {
        screen.execute(action);
    }

    /** Asks the store beside the screen, and shows the answer. */
    public <T> void ask(Function<Progress, T> question, Consumer<T> answer) {
        run(question, answer, false);
    }

    /** Changes the store beside the screen; whoever shows it then looks anew. */
    public <T> void change(Function<Progress, T> change, Consumer<T> then) {
        run(change, then, true);
    }

    private <T> void run(Function<Progress, T> task, Consumer<T> then, boolean changing) {
        if (closed.get()) {
            return;
        }
        progress.set(0);
        Telling telling = new Telling();
        under.add(telling);
        work.execute(() -> {
            if (closed.get()) {
                return;
            }
            try {
                T result = task.apply(telling);
                screen.execute(() -> {
                    progress.set(-1);
                    trouble.set(Optional.empty());
                    then.accept(result);
                    if (changing) {
                        changes.set(changes.get() + 1);
                    }
                });
            } catch (Refused e) {
                failed(e.defect());
            } catch (NotSaved e) {
                failed(e.defect());
            } catch (RuntimeException | Error e) {
                failed(e);
            } finally {
                under.remove(telling);
            }
        });
    }

    /** Says what went wrong; called on the screen's thread. */
    void tell(Defect defect) {
        trouble.set(Optional.of(defect));
    }

    /** Notes in the diary what nobody expected to fail, and says so. */
    void failed(Throwable failure) {
        diary.note(failure);
        failed(Defect.in("", "office-work-failed", failure.getClass().getSimpleName()));
    }

    private void failed(Defect defect) {
        screen.execute(() -> {
            progress.set(-1);
            tell(defect);
        });
    }

    /** Tells the screen how far work is, at most once for every hundredth. */
    private final class Telling implements Progress {
        private final AtomicBoolean stop = new AtomicBoolean();
        private long last = -1;

        @Override
        public void at(long done, long total) {
            long step = total <= 0 ? 0 : 100 * done / total;
            if (step != last) {
                last = step;
                screen.execute(() -> progress.set(step / 100.0));
            }
        }

        @Override
        public boolean cancelled() {
            return stop.get();
        }
    }

    /** Stops the work under way, drops what waits for it, and closes the store once nobody asks it any more. */
    @Override
    public void close() {
        if (closed.getAndSet(true)) {
            return;
        }
        cancel();
        CompletableFuture<Void> done = CompletableFuture.runAsync(store::close, work);
        work.shutdown();
        done.join();
    }
}
