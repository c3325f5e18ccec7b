package bedmark.journal;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;

/** A path that a person named, looked at before anything is read from it or written to it. */
public final class NamedPath {
    private NamedPath() {
    }

    /**
     * Refuses what can't be read as a file. A pipe is read like one.
     *
     * @throws Refused {@code file-is-folder}, {@code file-absent}, {@code file-forbidden}
     */
    public static void requireFile(Path file) {
        if (Files.isDirectory(file)) {
            throw new Refused(Defect.in(file.toString(), "file-is-folder"));
        } else if (Files.notExists(file)) {
            throw new Refused(Defect.in(file.toString(), "file-absent"));
        } else if (!Files.isReadable(file)) {
            // So is one in a folder that nobody lets us look into.
            throw new Refused(Defect.in(file.toString(), "file-forbidden"));
        }
    }

    /**
     * Refuses what is no ordinary file: a pipe may never end, and a device gives more than any disk holds.
     *
     * @throws Refused those of {@link #requireFile}, {@code file-not-plain}
     */
    public static void requirePlainFile(Path file) {
        requireFile(file);
        requirePlain(file);
    }

    /**
     * Refuses what is no folder that can be read.
     *
     * @throws Refused {@code folder-absent}, {@code folder-is-file}, {@code folder-unreadable}
     */
    public static void requireFolder(Path folder) {
        if (Files.notExists(folder)) {
            throw new Refused(Defect.in(folder.toString(), "folder-absent"));
        } else if (Files.exists(folder) && !Files.isDirectory(folder)) {
            throw new Refused(Defect.in(folder.toString(), "folder-is-file"));
        } else if (!Files.isReadable(folder)) {
            throw new Refused(Defect.in(folder.toString(), "folder-unreadable"));
        }
    }

    /**
     * Refuses what stands where a folder is to be made; one that is there already must be readable.
     *
     * @throws Refused {@code folder-is-file}, {@code folder-unreadable}
     */
    public static void requireFolderOrNothing(Path folder) {
        if (Files.exists(folder)) {
            requireFolder(folder);
        }
    }

    /**
     * Refuses what no file can take the place of: an empty folder would give way to it, and so would a device, for
     * every program of the machine.
     *
     * @throws Refused {@code file-is-folder}, {@code file-not-plain}
     */
    public static void requireTarget(Path file) {
        if (Files.isDirectory(file)) {
            throw new Refused(Defect.in(file.toString(), "file-is-folder"));
        }
        requirePlain(file);
    }

    private static void requirePlain(Path file) {
        if (Files.exists(file) && !Files.isRegularFile(file)) {
            throw new Refused(Defect.in(file.toString(), "file-not-plain"));
        }
    }

    /**
     * The bytes of a file.
     *
     * @param mostMegabytes what the file may hold (MiB), 1 to 1024
     * @throws Refused those of {@link #requireFile}, {@code file-too-large}, {@code file-unreadable}
     */
    public static byte[] read(Path file, int mostMegabytes) {
        requireFile(file);
        int most = mostMegabytes << 20;
        try (InputStream in = Files.newInputStream(file)) {
            byte[] bytes = in.readNBytes(most + 1);
            if (bytes.length > most) {
                throw new Refused(Defect.in(file.toString(), "file-too-large", Integer.toString(mostMegabytes)));
            }
            return bytes;
        } catch (IOException e) {
            throw new Refused(Defect.in(file.toString(), "file-unreadable"), e);
        }
    }
}
