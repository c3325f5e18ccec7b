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

    /**
     * Asks for a photo's file.
     *
     * @param title what the photo is for
     * @param start the folder to begin in
     * @return nothing where the person thought better of it, or the machine can't ask
     */
    default Optional<Path> choosePhoto(String title, Optional<Path> start) {
        return Optional.empty();
    }
}
