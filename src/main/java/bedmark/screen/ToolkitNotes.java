package bedmark.screen;

import java.util.logging.Level;
import java.util.logging.Logger;

/**
 * What the toolkit writes to the standard streams: it warns at each start that it is not in a module. The first use
 * looks through all libraries for somebody who takes notes, so it is made beside the opening of a store.
 */
public final class ToolkitNotes {
    /** Held here, since loggers are kept weakly. */
    private static final Logger TOOLKIT = Logger.getLogger("javafx");

    private ToolkitNotes() {
    }

    /** Lets the toolkit write of nothing but failures. */
    public static void hush() {
        TOOLKIT.setLevel(Level.SEVERE);
    }
}
