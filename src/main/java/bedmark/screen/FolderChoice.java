package bedmark.screen;

import java.nio.file.Path;
import java.util.Optional;

/** Asks the person for a folder; behind an interface, because a machine without a display has no such dialog. */
@FunctionalInterface
public interface FolderChoice {

    /**
     * Asks.
     *
     * @param title what the folder is for
     * @param start where to begin
     * @return nothing where the person thought better of it
     */
    Optional<Path> choose(String title, Optional<Path> start);
}
