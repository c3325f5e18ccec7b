package bedmark.pack;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Path;

/** What writing a file safely asks of the disk. A seam, so that a test can make every single step fail. */
interface Disk {

    /** A new file; fails where one of that name is there. */
    Output create(Path file, boolean ownerOnly) throws IOException;

    /** Replaces what stands under the new name in one step. */
    void move(Path from, Path to) throws IOException;

    /** Makes new names in a folder last; where the system can't do that for folders, it is left out. */
    void forceFolder(Path folder) throws IOException;

    /** Removes a file if it is there. */
    void delete(Path file) throws IOException;

    /** Bytes that can still be written in a folder. */
    long free(Path folder) throws IOException;

    /** A file being written. */
    abstract class Output extends OutputStream {

        /** Returns when all that was written is on the medium. */
        abstract void force() throws IOException;
    }
}
