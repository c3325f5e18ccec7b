package bedmark.screen;

import bedmark.document.Refused;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Optional;

/**
 * Keeps preferences, beside the store where there is one. They are a convenience: losing them loses no survey and stops
 * nothing.
 */
public final class PreferencesFile {
    private static final String NAME = "preferences.json";

    private final Path file;

    /** @param store the store's folder */
    public PreferencesFile(Path store) {
        this(store, NAME);
    }

    /**
     * Preferences of a window that has no store.
     *
     * @param folder one that is there
     * @param name   of the file
     */
    public PreferencesFile(Path folder, String name) {
        this.file = folder.resolve(name);
    }

    /** What was kept; a file that is missing or damaged is as good as none. */
    public Preferences read() {
        return kept().orElseGet(Preferences::standard);
    }

    /** What was kept, where anything was. */
    public Optional<Preferences> kept() {
        try {
            return Files.exists(file) ? Optional.of(Preferences.of(JsonReader.read(Files.readAllBytes(file)).root()))
                    : Optional.empty();
        } catch (IOException | Refused e) {
            return Optional.empty();
        }
    }

    /** Keeps them; returns whether that went well. */
    public boolean write(Preferences preferences) {
        Path next = file.resolveSibling(file.getFileName() + ".next");
        try {
            Files.write(next, JsonWriter.indented(preferences.document()));
            Files.move(next, file, StandardCopyOption.REPLACE_EXISTING);
            return true;
        } catch (IOException e) {
            return false;
        }
    }
}
