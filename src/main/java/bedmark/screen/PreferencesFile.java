package bedmark.screen;

import java.nio.file.Path;

/** Keeps preferences beside the store. They are a convenience: losing them loses no survey and stops nothing. */
public final class PreferencesFile {
    private static final String NAME = "preferences.json";

    private final KeptFile file;

    /** @param store the store's folder */
    public PreferencesFile(Path store) {
        this.file = new KeptFile(store.resolve(NAME));
    }

    /** What was kept; a file that is missing or damaged is as good as none. */
    public Preferences read() {
        return file.read(Preferences::of).orElseGet(Preferences::standard);
    }

    /** Keeps them; returns whether that went well. */
    public boolean write(Preferences preferences) {
        return file.write(preferences.document());
    }
}
