package bedmark.screen;

import bedmark.diary.Diary;
import bedmark.diary.Happening;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.screen.start.UnlockModel;
import bedmark.screen.start.UnlockView;
import bedmark.screen.theme.Light;
import bedmark.screen.theme.Theme;
import bedmark.screen.theme.Typeface;
import bedmark.survey.LevelWord;
import bedmark.vault.Passphrase;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Duration;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import javafx.application.Application;
import javafx.application.Platform;
import javafx.scene.Scene;
import javafx.stage.Stage;

/** The window of the tablet app. */
public final class BedmarkApp extends Application {
    private static final double WIDTH = 1280;
    private static final double HEIGHT = 800;
    /** By then a person has begun to walk, and the start is not held up. */
    private static final Duration PROOF_DELAY = Duration.ofSeconds(20);

    /** What the launcher hands over; the toolkit makes the application itself and takes no arguments but texts. */
    private static Optional<Launch> launch = Optional.empty();

    private Optional<Workplace> workplace = Optional.empty();
    private Optional<Shell> shell = Optional.empty();
    private Optional<Diary> diary = Optional.empty();

    /**
     * What the window begins with.
     *
     * @param store   opened already; nothing where it takes a passphrase
     * @param site    the plant of that store
     * @param folder  the store's
     * @param opening opens it with one
     * @param samples the folder with the demo plant
     * @param load    whether to load it at once
     */
    private record Launch(Optional<Store> store, Optional<Site> site, Path folder,
                          Function<Passphrase, Store> opening, Clock clock, Optional<Path> samples, boolean load) {
    }

    /** The options that the app opens a store with. */
    public static StoreOptions options(Clock clock) {
        String name = Optional.ofNullable(System.getenv("HOSTNAME")).filter(host -> !host.isBlank()).orElse("tablet");
        return StoreOptions.of(name).withClock(clock).withLevels(new LevelWord()::of);
    }

    /**
     * Starts the toolkit and lets it read the typeface while the caller opens a store, since neither needs the other.
     * Where there is no display, {@link #open} says so.
     */
    public static void prepare() {
        Thread preparing = new Thread(() -> {
            try {
                Platform.startup(Typeface::load);
            } catch (UnsupportedOperationException e) {
                // Said again, and told to the person, when the window is to be opened.
                return;
            }
        }, "prepare-toolkit");
        preparing.setDaemon(true);
        preparing.start();
    }

    /**
     * Opens the window and returns when it is closed.
     *
     * @return false where there is no display to open a window on
     */
    public static boolean open(Store store, Clock clock, Optional<Path> samples, boolean load) {
        return launch(new Launch(Optional.of(store), Workplace.readSite(store), store.folder(), passphrase -> store,
                clock, samples, load));
    }

    /**
     * Opens the window, which asks for the passphrase of a store first, and returns when it is closed.
     *
     * @param opening opens the store, or refuses
     * @return false where there is no display to open a window on
     */
    public static boolean unlock(Path folder, Function<Passphrase, Store> opening, Clock clock,
                                 Optional<Path> samples) {
        return launch(new Launch(Optional.empty(), Optional.empty(), folder, opening, clock, samples, false));
    }

    private static boolean launch(Launch begin) {
        launch = Optional.of(begin);
        try {
            Application.launch(BedmarkApp.class);
            return true;
        } catch (UnsupportedOperationException e) {
            return false;
        }
    }

    @Override
    public void start(Stage stage) {
        Launch given = launch.orElseThrow();
        stage.setTitle("Bedmark");
        given.store().ifPresentOrElse(store -> work(stage, given, store, given.site()), () -> ask(stage, given));
        stage.show();
    }

    /** An encrypted store is opened first; how the person likes the tablet lies beside it and can be read. */
    private void ask(Stage stage, Launch given) {
        Preferences preferences = new PreferencesFile(given.folder()).read();
        UnlockView view = new UnlockView(new Wording(new Words(preferences.locale()), preferences.units()),
                new UnlockModel(given.opening(), Platform::runLater), store -> work(stage, given, store, Workplace.readSite(store)));
        Scene scene = new Scene(view, WIDTH, HEIGHT);
        Theme.apply(scene, preferences.night() ? Light.NIGHT : Light.DAY, Shell.density(preferences));
        stage.setScene(scene);
        view.focus();
    }

    private void work(Stage stage, Launch given, Store store, Optional<Site> site) {
        Workplace here = new Workplace(store, site, given.clock(), Platform::runLater, new StageChoice(stage),
                given.samples());
        here.proveAfter(PROOF_DELAY);
        Shell opened = new Shell(here, WIDTH, HEIGHT);
        workplace = Optional.of(here);
        shell = Optional.of(opened);
        Diary noted = new Diary(store.folder(), given.clock());
        noted.note(Happening.STORE_OPENED, Map.of());
        diary = Optional.of(noted);
        Thread.setDefaultUncaughtExceptionHandler((thread, failure) -> noted.note(failure));
        // Whatever goes wrong on the screen: what was typed is saved first, and the person goes on.
        Thread.currentThread().setUncaughtExceptionHandler((thread, failure) -> {
            noted.note(failure);
            opened.failed(failure);
        });
        stage.setScene(opened.scene());
        if (given.load()) {
            opened.loadDemo();
        }
    }

    @Override
    public void stop() {
        shell.ifPresent(Shell::close);
        workplace.ifPresent(Workplace::close);
        diary.ifPresent(noted -> noted.note(Happening.STORE_CLOSED, Map.of()));
    }
}
