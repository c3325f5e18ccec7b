package bedmark.screen;

import java.nio.file.Path;
import java.util.Optional;

/**
 * Keeps preferences, beside the store where there is one. They are a convenience: losing them loses no survey and stops
 * nothing.
 */
public final class PreferencesFile {
    private static final String NAME = "preferences.json";

    private final KeptFile file;

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
        this.file = new KeptFile(folder.resolve(name));
    }

    /** What was kept; a file that is missing or damaged is as good as none. */
    public Preferences read() {
        return kept().orElseGet(Preferences::standard);
    }

    /** What was kept, where anything was. */
    public Optional<Preferences> kept() {
        return file.read(Preferences::of);
    }

    /** Keeps them; returns whether that went well. */
    public boolean write(Preferences preferences) {
        return file.write(preferences.document());
    }
}
