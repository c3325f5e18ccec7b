package bedmark.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NamedPath;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.stream.Stream;

/** A folder that packs are put into. Looked at again and again, it gives each pack out once it is whole. */
public final class PackFolder {
    private static final String ENDING = ".zip";

    private final Path folder;
    private Map<Path, Look> before = new HashMap<>();
    private final Set<Look> given = new HashSet<>();

    /** A file as it was when it was looked at. */
    private record Look(Path file, long bytes, FileTime changed) {
    }

    public PackFolder(Path folder) {
        this.folder = folder;
    }

    public Path folder() {
        return folder;
    }

    /**
     * The packs that a folder holds now, by name.
     *
     * @throws Refused {@code folder-absent}, {@code folder-is-file}, {@code folder-unreadable}
     */
    public static List<Path> packs(Path folder) {
        NamedPath.requireFolder(folder);
        try (Stream<Path> files = Files.list(folder)) {
            return files.filter(file -> file.getFileName().toString().toLowerCase(Locale.ROOT).endsWith(ENDING)
                    && Files.isRegularFile(file)).sorted().toList();
        } catch (IOException | UncheckedIOException e) {
            throw new Refused(Defect.in(folder.toString(), "folder-unreadable"), e);
        }
    }

    /**
     * The packs that came or changed since they were given out, and are no longer being written: those that look the
     * same as when they were last looked at.
     *
     * @throws Refused as {@link #packs}
     */
    public synchronized List<Path> look() {
        Map<Path, Look> now = new HashMap<>();
        List<Path> whole = new ArrayList<>();
        for (Path file : packs(folder)) {
            try {
                Look look = new Look(file, Files.size(file), Files.getLastModifiedTime(file));
                now.put(file, look);
                if (look.equals(before.get(file)) && given.add(look)) {
                    whole.add(file);
                }
            } catch (IOException e) {
                // It was taken away while it was looked at.
                continue;
            }
        }
        before = now;
        return whole;
    }
}
