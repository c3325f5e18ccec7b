package bedmark.screen.arrival;

import bedmark.pack.FileKind;
import bedmark.screen.StageChoice;
import bedmark.screen.Windows;
import bedmark.screen.office.OfficeApp;
import bedmark.screen.office.OfficeShell;
import java.nio.file.Path;
import java.time.Clock;
import java.util.Optional;
import javafx.application.Application;
import javafx.application.Platform;
import javafx.stage.Stage;

/** The window that opens when a person opens a pack, a round file or a receipt. */
public final class ArrivalApp extends Application {
    /** What the launcher hands over; the toolkit makes the application itself and takes no arguments but texts. */
    private static Optional<Launch> launch = Optional.empty();

    private ArrivalModel model;
    private ArrivalShell shell;
    private Optional<OfficeShell> office = Optional.empty();

    private record Launch(Path file, FileKind kind, Path home, Clock clock) {
    }

    /**
     * Opens the window and returns when it is closed.
     *
     * @param home the person's, where the way to their office is remembered
     * @return false where there is no display to open a window on
     */
    public static boolean open(Path file, FileKind kind, Path home, Clock clock) {
        launch = Optional.of(new Launch(file, kind, home, clock));
        return Windows.launch(ArrivalApp.class);
    }

    @Override
    public void start(Stage stage) {
        Launch given = launch.orElseThrow();
        model = new ArrivalModel(given.file(), given.kind(), given.home(), given.clock(), Platform::runLater,
                new StageChoice(stage));
        shell = new ArrivalShell(model, Windows.WIDTH, Windows.HEIGHT, stage::close, () -> toOffice(stage));
        stage.setTitle(Windows.TITLE + " – " + given.file().getFileName());
        stage.setScene(shell.scene());
        stage.show();
    }

    private void toOffice(Stage stage) {
        model.handOver().ifPresent(desk -> {
            office = Optional.of(OfficeApp.show(stage, desk));
            stage.setTitle(Windows.TITLE);
        });
    }

    @Override
    public void stop() {
        office.ifPresent(OfficeShell::close);
        shell.close();
    }
}
