package bedmark.screen.arrival;

import bedmark.office.Offices;
import bedmark.pack.FileKind;
import bedmark.screen.FolderChoice;
import bedmark.screen.Glass;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import javafx.application.Platform;
import javafx.scene.Node;
import javafx.scene.Scene;
import javafx.scene.input.KeyCode;
import javafx.stage.Stage;
import org.testfx.api.FxRobot;
import org.testfx.api.FxToolkit;
import org.testfx.util.WaitForAsyncUtils;

/** The window of a file that came, driven as a person drives it. */
public final class ArrivalWindow implements AutoCloseable {
    private static final int PATIENCE_SECONDS = 30;

    private final FxRobot robot = new FxRobot();
    private volatile Optional<Path> chosen = Optional.empty();
    private volatile int asked;
    private volatile int closings;
    private volatile int toOffice;
    private ArrivalModel model;
    private ArrivalShell shell;

    /** @param home a person's home, in which nothing but their preferences is written */
    public ArrivalWindow(Path file, Path home, double width, double height) throws Exception {
        FolderChoice choice = (title, begin) -> {
            asked++;
            return chosen;
        };
        Stage stage = FxToolkit.registerPrimaryStage();
        Glass.on(() -> {
            model = new ArrivalModel(file, FileKind.of(file), home, Offices.NOW, Platform::runLater, choice);
            shell = new ArrivalShell(model, width, height, () -> closings++, () -> toOffice++);
            Glass.show(stage, shell.scene());
            return null;
        });
        settle();
    }

    /** What the person chooses from now on when asked for a folder. */
    public void chooses(Path folder) {
        chosen = Optional.of(folder);
    }

    /** How often the person was asked for a folder. */
    int asked() {
        return asked;
    }

    /** How often the window was to be closed. */
    int closings() {
        return closings;
    }

    /** How often the person wanted to go on in the office's window. */
    int toOffice() {
        return toOffice;
    }

    ArrivalModel model() {
        return model;
    }

    public Scene scene() {
        return shell.scene();
    }

    /** Shows the window in another light and language. */
    public void prefer(boolean night, Locale language) {
        model.preferencesProperty().set(model.preferences().withNight(night).withLocale(language));
    }

    /** As it is shown on a glass of some density, lying or upright. */
    public void prefer(boolean night, Locale language, double dpi, boolean portrait) {
        prefer(night, language);
        model.preferencesProperty().set(model.preferences().withDpi(dpi));
        shell.view().turned(portrait);
    }

    /** Waits until the work under way is done and drawn. */
    public void settle() throws TimeoutException {
        until(() -> !model.errand().running() && model.receptionProperty().get()
                .filter(open -> open.desk().progressProperty().get() >= 0).isEmpty());
    }

    private void until(Callable<Boolean> so) throws TimeoutException {
        WaitForAsyncUtils.waitForFxEvents();
        WaitForAsyncUtils.waitFor(PATIENCE_SECONDS, TimeUnit.SECONDS, () -> Glass.on(so));
        WaitForAsyncUtils.waitForFxEvents();
    }

    /** The node with an id, once it is there. */
    public Node node(String id) throws TimeoutException {
        until(() -> shell.scene().lookup("#" + id) != null);
        return shell.scene().lookup("#" + id);
    }

    boolean has(String id) throws Exception {
        return Glass.on(() -> shell.scene().lookup("#" + id) != null);
    }

    public void click(String id) throws Exception {
        robot.clickOn(node(id));
        settle();
    }

    void press(KeyCode key) throws Exception {
        robot.push(key);
        settle();
    }

    /** Everything that is written on the screen. */
    String words() throws Exception {
        return Glass.on(() -> Glass.words(shell.scene().getRoot()));
    }

    @Override
    public void close() {
        try {
            Glass.on(() -> {
                shell.close();
                return null;
            });
        } catch (Exception e) {
            throw new IllegalStateException(e);
        }
    }
}
