package bedmark.screen;

import bedmark.index.Store;
import bedmark.screen.part.Named;
import java.nio.file.Path;
import java.time.Clock;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import javafx.application.Platform;
import javafx.scene.Node;
import javafx.scene.control.Labeled;
import javafx.scene.input.KeyCode;
import javafx.stage.Stage;
import org.testfx.api.FxRobot;
import org.testfx.api.FxToolkit;
import org.testfx.util.WaitForAsyncUtils;

/** The whole app on a store of its own, driven as a person drives it: by clicks and keys. */
public final class TabletApp implements AutoCloseable {
    private static final int PATIENCE_SECONDS = 30;

    private final Store store;
    private final FxRobot robot = new FxRobot();
    private volatile Path exportFolder;
    private Workplace workplace;
    private Shell shell;

    /**
     * Opens the app.
     *
     * @param exportFolder what the person chooses when asked for a folder
     */
    public TabletApp(Path folder, Optional<Path> samples, Path exportFolder, Clock clock,
                     double width, double height) throws Exception {
        store = Store.open(folder, BedmarkApp.options(clock));
        this.exportFolder = exportFolder;
        Stage stage = FxToolkit.registerPrimaryStage();
        Glass.on(() -> {
            workplace = new Workplace(store, clock, Platform::runLater, (title, begin) -> Optional.of(folder()),
                    samples);
            shell = new Shell(workplace, width, height);
            Glass.show(stage, shell.scene());
            return null;
        });
        settle();
    }

    private Path folder() {
        return exportFolder;
    }

    /** What the person chooses from now on when asked for a folder. */
    public void exportsTo(Path chosen) {
        exportFolder = chosen;
    }

    public Workplace workplace() {
        return workplace;
    }

    public Shell shell() {
        return shell;
    }

    public FxRobot robot() {
        return robot;
    }

    /** Waits until everything that was done is saved and drawn. */
    public void settle() throws TimeoutException {
        WaitForAsyncUtils.waitForFxEvents();
        WaitForAsyncUtils.waitFor(PATIENCE_SECONDS, TimeUnit.SECONDS,
                () -> workplace.scribe().waitingProperty().get() == 0);
        WaitForAsyncUtils.waitForFxEvents();
    }

    /** Waits until something is so. */
    public void until(Callable<Boolean> so) throws TimeoutException {
        WaitForAsyncUtils.waitFor(PATIENCE_SECONDS, TimeUnit.SECONDS, so);
        settle();
    }

    /** Loads the demo plant into the empty store, and sets out on its round. */
    public void setOutOnDemo() throws Exception {
        click("load-demo");
        until(() -> has("person"));
        click("person");
        type("A. Vale");
        click("caution-read");
        click("start-walk");
        until(() -> has("search"));
    }

    /** Clicks the node with an id; a list is first moved so far that it is in sight. */
    public void click(String id) throws Exception {
        Node node = node(id);
        Glass.on(() -> {
            Glass.reveal(node);
            return null;
        });
        settle();
        robot.clickOn(node);
        settle();
    }

    /** Types with the keyboard, wherever the focus is. */
    public void type(String text) throws TimeoutException {
        robot.write(text);
        settle();
    }

    public void press(KeyCode... keys) throws TimeoutException {
        robot.push(keys);
        settle();
    }

    /** The node with a name or an id. */
    public Node node(String id) {
        return find(id).orElseThrow(() -> new AssertionError("there is nothing called " + id));
    }

    /** Whether there is a node with that name or id. */
    public boolean has(String id) {
        return find(id).isPresent();
    }

    /** Looks on the screen's own thread, since the screen may be changing. */
    private Optional<Node> find(String id) {
        try {
            return Glass.on(() -> Named.find(shell.scene().getRoot(), id));
        } catch (Exception e) {
            throw new IllegalStateException("the screen cannot be searched", e);
        }
    }

    /** Takes a picture of the screen. */
    public void picture(Path file) throws Exception {
        settle();
        Glass.on(() -> {
            Glass.write(file, shell.scene());
            return null;
        });
    }

    /** The words of the label or button with an id. */
    public String words(String id) {
        return ((Labeled) node(id)).getText();
    }

    @Override
    public void close() {
        try {
            Glass.on(() -> {
                shell.close();
                return null;
            });
            settle();
            workplace.close();
            FxToolkit.cleanupStages();
        } catch (Exception e) {
            throw new IllegalStateException("the app did not close", e);
        }
    }
}
