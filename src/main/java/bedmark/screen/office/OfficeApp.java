package bedmark.screen.office;

import bedmark.office.OfficeStore;
import bedmark.screen.StageChoice;
import bedmark.screen.Windows;
import java.time.Clock;
import java.util.Optional;
import javafx.application.Application;
import javafx.application.Platform;
import javafx.stage.Stage;

/** The window of the office. */
public final class OfficeApp extends Application {
    /** What the launcher hands over; the toolkit makes the application itself and takes no arguments but texts. */
    private static Optional<Launch> launch = Optional.empty();

    private OfficeShell shell;

    private record Launch(OfficeStore store, Clock clock) {
    }

    /**
     * Opens the window and returns when it is closed; the store is closed then too.
     *
     * @return false where there is no display to open a window on
     */
    public static boolean open(OfficeStore store, Clock clock) {
        launch = Optional.of(new Launch(store, clock));
        boolean opened = Windows.launch(OfficeApp.class);
        if (!opened) {
            store.close();
        }
        return opened;
    }

    @Override
    public void start(Stage stage) {
        Launch given = launch.orElseThrow();
        shell = show(stage, new OfficeDesk(given.store(), given.clock(), Platform::runLater, new StageChoice(stage)));
        stage.setTitle(Windows.TITLE);
        stage.show();
    }

    /**
     * Shows an office in a window that is there.
     *
     * @param desk closed together with the shell
     * @return what the window must close when it is closed itself
     */
    public static OfficeShell show(Stage stage, OfficeDesk desk) {
        Thread.setDefaultUncaughtExceptionHandler((thread, failure) -> desk.failed(failure));
        Thread.currentThread().setUncaughtExceptionHandler((thread, failure) -> desk.failed(failure));
        boolean sized = stage.getScene() != null;
        OfficeShell shell = new OfficeShell(desk, sized ? stage.getScene().getWidth() : Windows.WIDTH,
                sized ? stage.getScene().getHeight() : Windows.HEIGHT);
        stage.setScene(shell.scene());
        return shell;
    }

    @Override
    public void stop() {
        shell.close();
    }
}
