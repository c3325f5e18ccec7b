package bedmark.screen;

import bedmark.diary.Diary;
import bedmark.diary.Happening;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.screen.round.RoundModel;
import bedmark.screen.start.LonePage;
import bedmark.screen.start.UnlockModel;
import bedmark.screen.start.UnlockView;
import bedmark.screen.theme.Density;
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
import java.time.LocalTime;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import javafx.application.Application;
import javafx.application.Platform;
import javafx.scene.Scene;
import javafx.stage.Stage;

/** The window of the tablet app. */
public final class BedmarkApp extends Application {
    /** By then a person has begun to walk, and the start is not held up. */
    private static final Duration PROOF_DELAY = Duration.ofSeconds(20);

    /** By then the first screen is in sight, and nobody can have opened a stop yet. */
    private static final int FRAMES_BEFORE_THE_REST = 4;

    /** What the launcher hands over; the toolkit makes the application itself and takes no arguments but texts. */
    private static volatile Optional<Launch> launch = Optional.empty();
    /** Starts the toolkit; ended once that runs. */
    private static Optional<Thread> preparing = Optional.empty();
    /** Made by the screen while the store was being opened. */
    private static Optional<FirstScene> ready = Optional.empty();

    private Optional<Workplace> workplace = Optional.empty();
    private Optional<Shell> shell = Optional.empty();
    private Optional<Diary> diary = Optional.empty();
    private Optional<AfterFrames> rest = Optional.empty();

    /**
     * What the window begins with.
     *
     * @param begun   what is there already; nothing where the store takes a passphrase
     * @param folder  the store's
     * @param opening opens it with one
     * @param samples the folder with the demo plant
     * @param load    whether to load it at once
     */
    private record Launch(Optional<Begun> begun, Path folder, Function<Passphrase, Store> opening, Clock clock,
                          Optional<Path> samples, boolean load) {
    }

    /** The workplace of an open store, how it asks for folders, and the round that goes on there. */
    private record Begun(Workplace workplace, StageChoice choice, Optional<RoundModel> walked) {

        static Begun at(Store store, Clock clock, Optional<Path> samples) {
            StageChoice choice = new StageChoice();
            Workplace workplace = new Workplace(store, clock, Platform::runLater, choice, samples);
            return new Begun(workplace, choice, Shell.goingOn(workplace));
        }
    }

    /** The options that the app opens a store with. */
    public static StoreOptions options(Clock clock) {
        String name = Optional.ofNullable(System.getenv("HOSTNAME")).filter(host -> !host.isBlank()).orElse("tablet");
        return StoreOptions.of(name, clock).withLevels(new LevelWord()::of);
    }

    /**
     * Starts the toolkit and lets it read the typeface and the style sheets while the caller opens a store, since
     * neither needs the other. Where there is no display, {@link #open} says so.
     *
     * @param folder the store's; how the person likes the tablet lies there
     */
    public static void prepare(Path folder, Clock clock) {
        Thread thread = new Thread(() -> {
            ToolkitNotes.hush();
            try {
                Platform.startup(Typeface::load);
            } catch (UnsupportedOperationException e) {
                // Said again, and told to the person, when the window is to be opened.
                return;
            }
            Preferences preferences = new PreferencesFile(folder).read();
            Light light = preferences.lighting().at(LocalTime.now(clock));
            Density density = Shell.density(preferences);
            Theme.writeOut(light, density);
            untilLaunched(() -> ready = Optional.of(FirstScene.dressed(light, density, Windows.WIDTH, Windows.HEIGHT)));
            FirstScene.PARTS.forEach(part -> untilLaunched(() -> ready.ifPresent(first -> first.tryOn(part.get()))));
        }, "prepare-toolkit");
        thread.setDaemon(true);
        preparing = Optional.of(thread);
        thread.start();
    }

    /** Waits for the toolkit that {@link #prepare} starts, for who needs it though no store could be opened. */
    public static void awaitToolkit() {
        try {
            if (preparing.isPresent()) {
                preparing.get().join();
            }
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    /** What is done while the store is being opened must not keep the first screen waiting once it is open. */
    private static void untilLaunched(Runnable made) {
        Platform.runLater(() -> {
            if (launch.isEmpty()) {
                made.run();
            }
        });
    }

    /**
     * Opens the window and returns when it is closed.
     *
     * @return false where there is no display to open a window on
     */
    public static boolean open(Store store, Clock clock, Optional<Path> samples, boolean load) {
        return launch(new Launch(Optional.of(Begun.at(store, clock, samples)), store.folder(), passphrase -> store,
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
        return launch(new Launch(Optional.empty(), folder, opening, clock, samples, false));
    }

    private static boolean launch(Launch begin) {
        launch = Optional.of(begin);
        return Windows.launch(BedmarkApp.class);
    }

    @Override
    public void start(Stage stage) {
        Launch given = launch.orElseThrow();
        stage.setTitle(Windows.TITLE);
        given.begun().ifPresentOrElse(begun -> work(stage, given, begun), () -> ask(stage, given));
        stage.show();
    }

    /** An encrypted store is opened first; how the person likes the tablet lies beside it and can be read. */
    private void ask(Stage stage, Launch given) {
        Preferences preferences = new PreferencesFile(given.folder()).read();
        UnlockView view = new UnlockView(new Wording(new Words(preferences.locale()), preferences.units()),
                new UnlockModel(given.opening(), Platform::runLater),
                store -> work(stage, given, Begun.at(store, given.clock(), given.samples())));
        show(stage, view, preferences, given.clock());
    }

    /** Shows a page that stands without a store as the person likes the screen. */
    static void show(Stage stage, LonePage page, Preferences preferences, Clock clock) {
        ToolkitLanguage.set(preferences.locale());
        Scene scene = new Scene(page, Windows.WIDTH, Windows.HEIGHT);
        Theme.apply(scene, preferences.lighting().at(LocalTime.now(clock)), Shell.density(preferences));
        stage.setScene(scene);
        page.focus();
    }

    private void work(Stage stage, Launch given, Begun begun) {
        Workplace here = begun.workplace();
        begun.choice().over(stage);
        here.proveAfter(PROOF_DELAY);
        Shell opened = new Shell(here, ready.orElseGet(() -> FirstScene.plain(Windows.WIDTH, Windows.HEIGHT)),
                begun.walked());
        workplace = Optional.of(here);
        shell = Optional.of(opened);
        Diary noted = new Diary(given.folder(), given.clock());
        noted.note(Happening.STORE_OPENED, Map.of());
        diary = Optional.of(noted);
        Thread.setDefaultUncaughtExceptionHandler((thread, failure) -> noted.note(failure));
        // Whatever goes wrong on the screen: what was typed is saved first, and the person goes on.
        Thread.currentThread().setUncaughtExceptionHandler((thread, failure) -> {
            noted.note(failure);
            opened.failed(failure);
        });
        stage.setScene(opened.scene());
        rest = Optional.of(AfterFrames.run(FRAMES_BEFORE_THE_REST, here::readWhole));
        if (given.load()) {
            opened.loadDemo();
        }
    }

    @Override
    public void stop() {
        rest.ifPresent(AfterFrames::stop);
        shell.ifPresent(Shell::close);
        workplace.ifPresent(Workplace::close);
        diary.ifPresent(noted -> noted.note(Happening.STORE_CLOSED, Map.of()));
    }
}
