package bedmark.screen;

import bedmark.diary.Diary;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.survey.LevelWord;
import java.nio.file.Path;
import java.time.Clock;
import java.util.Optional;
import javafx.application.Application;
import javafx.application.Platform;
import javafx.stage.Stage;

/** The window of the tablet app. */
public final class BedmarkApp extends Application {
    private static final double WIDTH = 1280;
    private static final double HEIGHT = 800;

    /** What the launcher hands over; the toolkit makes the application itself and takes no arguments but texts. */
    private static Optional<Launch> launch = Optional.empty();

    private Workplace workplace;
    private Shell shell;

    /** A store that is open already, the folder with the demo plant, and whether to load it at once. */
    private record Launch(Store store, Diary diary, Clock clock, Optional<Path> samples, boolean load) {
    }

    /** The options that the app opens a store with. */
    public static StoreOptions options(Clock clock) {
        String name = Optional.ofNullable(System.getenv("HOSTNAME")).filter(host -> !host.isBlank()).orElse("tablet");
        return StoreOptions.of(name).withClock(clock).withLevels(new LevelWord()::of);
    }

    /**
     * Opens the window and returns when it is closed.
     *
     * @return false where there is no display to open a window on
     */
    public static boolean open(Store store, Diary diary, Clock clock, Optional<Path> samples, boolean load) {
        launch = Optional.of(new Launch(store, diary, clock, samples, load));
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
        workplace = new Workplace(given.store(), given.clock(), Platform::runLater,
                new StageChoice(stage), given.samples());
        shell = new Shell(workplace, WIDTH, HEIGHT);
        // Whatever goes wrong on the screen: what was typed is saved first, and the person goes on.
        Thread.currentThread().setUncaughtExceptionHandler((thread, failure) -> {
            given.diary().note(failure);
            shell.failed(failure);
        });
        stage.setTitle("Bedmark");
        stage.setScene(shell.scene());
        stage.show();
        if (given.load()) {
            shell.loadDemo();
        }
    }

    @Override
    public void stop() {
        shell.close();
        workplace.close();
    }
}
