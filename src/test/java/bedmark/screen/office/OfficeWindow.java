package bedmark.screen.office;

import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.screen.Glass;
import java.nio.file.Path;
import java.time.Clock;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import javafx.application.Platform;
import javafx.scene.Node;
import javafx.stage.Stage;
import org.testfx.api.FxRobot;
import org.testfx.api.FxToolkit;
import org.testfx.util.WaitForAsyncUtils;

/** The office's window on a store of its own, driven as a person drives it. */
final class OfficeWindow implements AutoCloseable {
    private static final int PATIENCE_SECONDS = 30;

    private final FxRobot robot = new FxRobot();
    private final OfficeDesk desk;
    private OfficeShell shell;
    private volatile Path chosen;

    OfficeWindow(Path folder, double width, double height) throws Exception {
        this(folder, Offices.NOW, width, height);
    }

    OfficeWindow(Path folder, Clock clock, double width, double height) throws Exception {
        OfficeStore store = OfficeStore.open(folder, OfficeOptions.of(clock));
        chosen = folder;
        desk = Glass.on(() -> new OfficeDesk(store, clock, Platform::runLater, (title, begin) ->
                Optional.of(chosen)));
        Stage stage = FxToolkit.registerPrimaryStage();
        Glass.on(() -> {
            desk.preferencesProperty().set(desk.preferences().withPerson("Ida Marsh"));
            shell = new OfficeShell(desk, width, height);
            Glass.show(stage, shell.scene());
            return null;
        });
        settle();
    }

    OfficeDesk desk() {
        return desk;
    }

    OfficeShell shell() {
        return shell;
    }

    /** What the person chooses from now on when asked for a folder. */
    void chooses(Path folder) {
        chosen = folder;
    }

    /** Waits until the work under way is done and drawn. */
    void settle() throws TimeoutException {
        WaitForAsyncUtils.waitForFxEvents();
        WaitForAsyncUtils.waitFor(PATIENCE_SECONDS, TimeUnit.SECONDS, () -> desk.progressProperty().get() < 0);
        WaitForAsyncUtils.waitForFxEvents();
    }

    void until(Callable<Boolean> so) throws TimeoutException {
        WaitForAsyncUtils.waitFor(PATIENCE_SECONDS, TimeUnit.SECONDS, so);
        settle();
    }

    Node node(String id) throws TimeoutException {
        until(() -> shell.scene().lookup("#" + id) != null);
        return shell.scene().lookup("#" + id);
    }

    void click(String id) throws Exception {
        Node node = node(id);
        Glass.on(() -> {
            Glass.reveal(node);
            return null;
        });
        settle();
        robot.clickOn(node);
        settle();
    }

    void type(String text) throws TimeoutException {
        robot.write(text);
        settle();
    }

    /** Lets the window look at its clock. */
    void ticks() throws Exception {
        Glass.on(() -> {
            shell.followClock();
            return null;
        });
    }

    FxRobot robot() {
        return robot;
    }

    /** Everything that is written on the screen. */
    String words() throws Exception {
        return Glass.on(() -> Glass.words(shell.scene().getRoot()));
    }

    void picture(String name) throws Exception {
        settle();
        Glass.on(() -> {
            Glass.write(Path.of("target", "pictures", name + ".png"), shell.scene());
            return null;
        });
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
