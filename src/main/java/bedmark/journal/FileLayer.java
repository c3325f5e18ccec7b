package bedmark.journal;

import java.io.Closeable;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/**
 * What the program does with files that must survive. Everything that counts as saved goes through here, so that a
 * test can make any single step fail or cut the power after it.
 */
public interface FileLayer {

    /** The real disk. */
    static FileLayer disk() {
        return new DiskLayer();
    }

    /** A file that is written at its end. */
    interface Output extends Closeable {

        /** Writes all remaining bytes at the end; after a failure any part of them may be there. */
        void write(ByteBuffer bytes) throws IOException;

        /** Returns only when all written bytes and the length are on the medium. */
        void force() throws IOException;

        /** The length in bytes. */
        long size() throws IOException;

        /** What writes to this file, a buffer for each call; closing it closes the file. */
        default OutputStream stream() {
            return new OutputStream() {
                @Override
                public void write(int single) throws IOException {
                    Output.this.write(ByteBuffer.wrap(new byte[] {(byte) single}));
                }

                @Override
                public void write(byte[] bytes, int from, int length) throws IOException {
                    Output.this.write(ByteBuffer.wrap(bytes, from, length));
                }

                @Override
                public void close() throws IOException {
                    Output.this.close();
                }
            };
        }
    }

    /** A file that is read at any place, by any thread; an interrupted thread does not close it. */
    interface Input extends Closeable {

        /** The length in bytes. */
        long size() throws IOException;

        /**
         * Reads at a place until the buffer or the file ends.
         *
         * @return the number of bytes read, 0 at or after the end
         */
        int read(long position, ByteBuffer into) throws IOException;
    }

    /** Makes a folder and those above it, and forces their entries; nothing happens where it is there. */
    void createFolder(Path folder) throws IOException;

    boolean exists(Path file);

    /** The files of a folder, sorted by name. */
    List<Path> list(Path folder) throws IOException;

    Input read(Path file) throws IOException;

    /** Makes a new, empty file; fails where one of that name is there. */
    Output create(Path file) throws IOException;

    /** The same, but nobody other than the file's owner may read it, where the system knows such rights. */
    Output createPrivate(Path file) throws IOException;

    /** Opens an existing file to write on at its end. */
    Output append(Path file) throws IOException;

    /** Cuts a file off at a length and forces it. */
    void truncate(Path file, long length) throws IOException;

    /** Renames in one step, over an older file of that name; {@link #forceFolder(Path)} makes it last. */
    void move(Path from, Path to) throws IOException;

    void delete(Path file) throws IOException;

    /** Makes new, renamed and deleted names of a folder last. Where the system knows no such thing, nothing happens. */
    void forceFolder(Path folder) throws IOException;

    /** Bytes that can still be written to the volume that holds the folder. */
    long usableSpace(Path folder) throws IOException;

    /** Whether this program may write into the folder. */
    boolean writable(Path folder);

    /**
     * Takes the lock that a file stands for, and holds it until it is closed or the process ends.
     *
     * @return nothing where it is taken, by this process or by another
     */
    Optional<Closeable> lock(Path file) throws IOException;
}
