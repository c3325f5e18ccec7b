package bedmark.launcher;

import bedmark.screen.TabletApp;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.Comparator;
import java.util.Optional;
import java.util.stream.Stream;
import javafx.scene.input.KeyCode;

/**
 * Walks through the screens that a shift uses, so that the virtual machine can note which classes they load: packaging
 * puts those into the archive that makes the start quick. Nothing is checked here.
 */
public final class Rehearsal {
    private Rehearsal() {
    }

    public static void main(String... arguments) throws Exception {
        Path folder = Files.createTempDirectory("bedmark-rehearsal");
        try (TabletApp app = new TabletApp(folder.resolve("store"), Optional.of(Path.of("sample-surveys")),
                Files.createDirectory(folder.resolve("stick")), Clock.systemUTC(), 1280, 800)) {
            app.click("load-demo");
            app.until(() -> app.has("person"));
            app.click("person");
            app.type("A. Vale");
            app.click("caution-read");
            app.click("start-walk");
            app.until(() -> app.has("search"));
            app.click("stop-TP-22");
            app.until(() -> app.has("verdict"));
            app.type("5");
            app.press(KeyCode.ENTER);
            app.click("foot-round");
            app.click("to-queue");
            app.settle();
        } finally {
            delete(folder);
        }
        System.exit(0);
    }

    private static void delete(Path folder) throws IOException {
        try (Stream<Path> below = Files.walk(folder)) {
            for (Path path : below.sorted(Comparator.reverseOrder()).toList()) {
                Files.delete(path);
            }
        }
    }
}
