package bedmark.screen.office;

import bedmark.office.OfficeStore;
import java.io.File;
import java.nio.file.Path;
import java.time.Clock;
import java.util.Optional;
import javafx.application.Application;
import javafx.application.Platform;
import javafx.stage.DirectoryChooser;
import javafx.stage.Stage;

/** The window of the office. */
public final class OfficeApp extends Application {
    private static final double WIDTH = 1280;
    private static final double HEIGHT = 800;

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
        try {
            Application.launch(OfficeApp.class);
            return true;
        } catch (UnsupportedOperationException e) {
            store.close();
            return false;
        }
    }

    @Override
    public void start(Stage stage) {
        Launch given = launch.orElseThrow();
        OfficeDesk desk = new OfficeDesk(given.store(), given.clock(), Platform::runLater,
                (title, begin) -> choose(stage, title, begin));
        shell = new OfficeShell(desk, WIDTH, HEIGHT);
        stage.setTitle("Bedmark");
        stage.setScene(shell.scene());
        stage.show();
    }

    private static Optional<Path> choose(Stage stage, String title, Optional<Path> begin) {
        DirectoryChooser chooser = new DirectoryChooser();
        chooser.setTitle(title);
        begin.map(Path::toFile).filter(File::isDirectory).ifPresent(chooser::setInitialDirectory);
        return Optional.ofNullable(chooser.showDialog(stage)).map(File::toPath);
    }

    @Override
    public void stop() {
        shell.close();
    }
}
