package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.office.OfficeStore;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;

/** A file that the person named, read whole. */
final class InputFile {
    private InputFile() {
    }

    /** Refuses what is no readable file, in words. */
    static void requireFile(Path file) {
        if (Files.isDirectory(file)) {
            throw new Refused(Defect.in(file.toString(), "file-is-folder"));
        }
        if (!Files.exists(file)) {
            throw new Refused(Defect.in(file.toString(), "file-absent"));
        }
        if (!Files.isReadable(file)) {
            throw new Refused(Defect.in(file.toString(), "file-forbidden"));
        }
    }

    /** Refuses what is no folder, in words. */
    static void requireFolder(Path folder) {
        if (!Files.isDirectory(folder)) {
            throw new Refused(Defect.in(folder.toString(), "folder-absent"));
        }
    }

    /**
     * Refuses an office where a tablet's store is worked on: what would be done to its folder helps nobody.
     *
     * @param task the command's name; the sentence says by it what to do instead
     */
    static void requireNoOffice(Path folder, String task) {
        if (OfficeStore.isOffice(folder)) {
            throw new Refused(Defect.in(folder.toString(), "store-of-office", task));
        }
    }

    /** The bytes of a file; refused in words where it is not there, no file, or not readable. */
    static byte[] read(Path file) {
        requireFile(file);
        try {
            return Files.readAllBytes(file);
        } catch (IOException e) {
            throw new Refused(Defect.in(file.toString(), "file-unreadable"), e);
        }
    }
}
