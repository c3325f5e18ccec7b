package bedmark.command;

import bedmark.quantity.UnitSystem;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.io.PrintWriter;
import java.nio.file.Path;
import java.time.Clock;
import java.util.Optional;

/**
 * What a command finds around it.
 *
 * @param out     standard output
 * @param err     standard error
 * @param home    the folder that holds {@code field-forms/} and {@code sample-surveys/}, where one is laid out
 * @param clock   the time
 * @param words   the words of the commands
 * @param opening opens the tablet app
 * @param showing shows a file that came
 */
public record Surroundings(PrintWriter out, PrintWriter err, Optional<Path> home, Clock clock, Words words,
                           Opening opening, Showing showing) {

    /** How the person at the terminal is told things. */
    Wording wording() {
        return new Wording(words, UnitSystem.METRIC);
    }

    /** Prints a text in one line, whatever a path or a name in it holds. */
    void say(String key, Object... details) {
        out.println(Wording.plain(words.text(key, details)));
    }

    /** Opens the app and returns when it is closed. */
    @FunctionalInterface
    public interface Opening {
        /**
         * Opens the app.
         *
         * @param store   the store's folder
         * @param samples the folder of the demo plant, where it is laid out
         * @param load    whether an empty store is filled with it at once
         * @return whether a window could be opened; without a display it could not
         */
        boolean open(Path store, Optional<Path> samples, boolean load);
    }

    /** Shows a file that a tablet or an office wrote, and returns when the window is closed. */
    @FunctionalInterface
    public interface Showing {
        /**
         * Shows a file; what it is, and whether it is sound, is found out in sight of the person.
         *
         * @return whether a window could be opened; without a display it could not
         */
        boolean show(Path file);
    }
}
