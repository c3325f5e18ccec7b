package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NamedPath;
import bedmark.office.OfficeStore;
import java.nio.file.Path;

/** A file that the person named, read whole. */
final class InputFile {
    /** Far more than a bundle of a plant's whole history holds, and less than memory does (MiB). */
    private static final int MOST = 256;

    private InputFile() {
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

    /** The bytes of a file; refused in words where it is not there, no file, too large, or not readable. */
    static byte[] read(Path file) {
        return NamedPath.read(file, MOST);
    }
}
