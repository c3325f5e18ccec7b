package bedmark.screen;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.Store;
import bedmark.survey.Act;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Duration;
import java.util.Optional;
import java.util.concurrent.Executor;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleObjectProperty;

/** What all screens share: the store, who works here and how, and where work is done that takes time. */
public final class Workplace implements AutoCloseable {
    /** The code of a failure of the program itself, which leaves everything saved. */
    static final String FAILED = "screen-failed";

    private final Store store;
    private final Clock clock;
    private final Executor screen;
    private final FolderChoice folderChoice;
    private final Optional<Path> samples;
    private final Scribe scribe;
    private final PreferencesFile preferencesFile;
    private final WalkMemory walkMemory;
    private Optional<BackgroundProof> proof = Optional.empty();
    private final ExecutorService longWork = Executors.newSingleThreadExecutor(run -> {
        Thread thread = new Thread(run, "long-work");
        thread.setDaemon(true);
        return thread;
    });
    private final ObjectProperty<Preferences> preferences;
    private final ReadOnlyObjectWrapper<Wording> wording = new ReadOnlyObjectWrapper<>();
    private final ReadOnlyObjectWrapper<Optional<Site>> site;

    /**
     * A workplace at one store.
     *
     * @param screen       runs what touches the screen
     * @param folderChoice asks for a folder
     * @param samples      the folder with the demo plant, where there is one
     */
    public Workplace(Store store, Clock clock, Executor screen, FolderChoice folderChoice, Optional<Path> samples) {
        this.store = store;
        this.clock = clock;
        this.screen = screen;
        this.folderChoice = folderChoice;
        this.samples = samples;
        this.scribe = new Scribe(store, screen);
        this.preferencesFile = new PreferencesFile(store.folder());
        this.walkMemory = new WalkMemory(store, clock);
        this.preferences = new SimpleObjectProperty<>(preferencesFile.read());
        this.site = new ReadOnlyObjectWrapper<>(store.register().map(Site::of));
        preferences.addListener((property, before, now) -> {
            preferencesFile.write(now);
            wording.set(wording(now));
        });
        wording.set(wording(preferences.get()));
    }

    private static Wording wording(Preferences preferences) {
        return new Wording(new Words(preferences.locale()), preferences.units(), preferences.chosenUnits());
    }

    /** Takes a register in. Runs beside the screen. */
    public void adopt(Act register) {
        store.append(preferences.get().person(), register);
        reread();
    }

    /** Reads the plant anew, where it may have changed. Runs beside the screen. */
    public void reread() {
        Optional<Site> read = store.register().map(Site::of);
        read.ifPresent(Site::readWhole);
        screen.execute(() -> site.set(read));
    }

    public Store store() {
        return store;
    }

    public Clock clock() {
        return clock;
    }

    public Scribe scribe() {
        return scribe;
    }

    /** Which walk a program that starts anew goes on with. */
    public WalkMemory walkMemory() {
        return walkMemory;
    }

    public FolderChoice folderChoice() {
        return folderChoice;
    }

    /** The folder with the demo plant. */
    public Optional<Path> samples() {
        return samples;
    }

    public ObjectProperty<Preferences> preferencesProperty() {
        return preferences;
    }

    public Preferences preferences() {
        return preferences.get();
    }

    /** The language, number format and units of the person. */
    public ReadOnlyObjectProperty<Wording> wordingProperty() {
        return wording.getReadOnlyProperty();
    }

    public Wording wording() {
        return wording.get();
    }

    /** The plant; nothing on a store without a register. */
    public ReadOnlyObjectProperty<Optional<Site>> siteProperty() {
        return site.getReadOnlyProperty();
    }

    /**
     * The plant.
     *
     * @throws Refused {@code register-absent} on a store without one
     */
    public Site site() {
        return site.get().orElseThrow(() ->
                new Refused(Defect.in("", "register-absent")));
    }

    /** Shows a failure of the program itself in the head of the screen, in words. */
    void report(Throwable failure) {
        scribe.report(Defect.in("", FAILED, failure.getClass().getSimpleName()));
    }

    /** Reads beside the screen what a stop is surveyed with, and says in the head where it can't be read. */
    void readWhole() {
        site.get().ifPresent(plant -> longWork.execute(() -> {
            try {
                plant.readWhole();
            } catch (Refused e) {
                screen.execute(() -> scribe.report(e.defect()));
            }
        }));
    }

    /** Proves the store behind everything else, and says in the head of the screen where something is wrong. */
    void proveAfter(Duration delay) {
        proof = Optional.of(new BackgroundProof(store, delay, check -> screen.execute(() -> scribe.report(
                Defect.in("", "proof-unsound", Integer.toString(check.defects().size()))))));
    }

    /** Runs work that takes time beside the screen, one after the other. */
    public Executor longWork() {
        return longWork;
    }

    /** Runs what touches the screen. */
    public Executor screen() {
        return screen;
    }

    /** Ends the long work, saves what waits, and closes the store. */
    @Override
    public void close() {
        proof.ifPresent(BackgroundProof::close);
        longWork.shutdownNow();
        scribe.close();
        store.close();
    }
}
