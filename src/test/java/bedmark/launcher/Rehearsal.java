package bedmark.launcher;

import bedmark.command.BedmarkCommand;
import bedmark.command.Surroundings;
import bedmark.screen.BedmarkApp;
import bedmark.screen.TabletApp;
import bedmark.words.Words;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.Comparator;
import java.util.Locale;
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
        Path store = folder.resolve("store");
        Path stick = Files.createDirectory(folder.resolve("stick"));
        Optional<Path> samples = Optional.of(Path.of("sample-surveys"));
        Clock clock = Clock.systemUTC();
        begin(store, clock);
        try (TabletApp app = new TabletApp(store, samples, stick, clock, 1280, 800)) {
            app.setOutOnDemo();
            app.click("stop-TP-22");
            app.until(() -> app.has("verdict"));
            app.type("5");
            app.press(KeyCode.ENTER);
            app.click("foot-round");
            app.click("to-queue");
            app.settle();
        }
        // Once more, in the midst of the walk.
        try (TabletApp app = new TabletApp(store, samples, stick, clock, 1280, 800)) {
            app.until(() -> app.has("search"));
        }
        delete(folder);
        System.exit(0);
    }

    /** As the program begins: the command, and the toolkit that is made ready. */
    private static void begin(Path store, Clock clock) {
        StringWriter said = new StringWriter();
        BedmarkCommand.run(new Surroundings(new PrintWriter(said), new PrintWriter(said), Optional.empty(), clock,
                new Words(Locale.ENGLISH), (folder, samples, load) -> {
                    BedmarkApp.prepare(store, clock);
                    return true;
                }, file -> false));
    }

    private static void delete(Path folder) throws IOException {
        try (Stream<Path> below = Files.walk(folder)) {
            for (Path path : below.sorted(Comparator.reverseOrder()).toList()) {
                Files.delete(path);
            }
        }
    }
}
