package bedmark.screen;

import bedmark.document.Refused;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/** Keeps preferences beside the store. They are a convenience: losing them loses no survey and stops nothing. */
public final class PreferencesFile {
    private static final String NAME = "preferences.json";

    private final Path file;

    /** @param store the store's folder */
    public PreferencesFile(Path store) {
        this.file = store.resolve(NAME);
    }

    /** What was kept; a file that is missing or damaged is as good as none. */
    public Preferences read() {
        try {
            return Files.exists(file) ? Preferences.of(JsonReader.read(Files.readAllBytes(file)).root())
                    : Preferences.standard();
        } catch (IOException | Refused e) {
            return Preferences.standard();
        }
    }

    /** Keeps them; returns whether that went well. */
    public boolean write(Preferences preferences) {
        Path next = file.resolveSibling(NAME + ".next");
        try {
            Files.write(next, JsonWriter.indented(preferences.document()));
            Files.move(next, file, StandardCopyOption.REPLACE_EXISTING);
            return true;
        } catch (IOException e) {
            return false;
        }
    }
}
