package bedmark.journal;

import java.io.Closeable;
import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.ByteBuffer;
import java.nio.channels.ClosedByInterruptException;
import java.nio.channels.FileChannel;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.nio.file.attribute.FileAttribute;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** The real disk. */
final class DiskLayer implements FileLayer {
    private static final boolean WINDOWS =
            System.getProperty("os.name", "").toLowerCase(Locale.ROOT).startsWith("windows");

    @Override
    public void createFolder(Path folder) throws IOException {
        if (Files.isDirectory(folder)) {
            return;
        }
        Path parent = folder.toAbsolutePath().getParent();
        if (parent != null) {
            createFolder(parent);
        }
        Files.createDirectories(folder);
        if (parent != null) {
            forceFolder(parent);
        }
    }

    @Override
    public boolean exists(Path file) {
        return Files.exists(file);
    }

    @Override
    public List<Path> list(Path folder) throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.filter(Files::isRegularFile).sorted().toList();
        }
    }

    @Override
    public Input read(Path file) throws IOException {
        return new DiskInput(file);
    }

    @Override
    public Output create(Path file) throws IOException {
        return created(file);
    }

    @Override
    public Output createPrivate(Path file) throws IOException {
        boolean posix = file.getFileSystem().supportedFileAttributeViews().contains("posix");
        return created(file, posix ? new FileAttribute<?>[] {
            PosixFilePermissions.asFileAttribute(PosixFilePermissions.fromString("rw-------"))
        } : new FileAttribute<?>[0]);
    }

    private static Output created(Path file, FileAttribute<?>... rights) throws IOException {
        FileChannel.open(file, Set.of(StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE), rights).close();
        return new DiskOutput(file);
    }

    @Override
    public Output append(Path file) throws IOException {
        if (!Files.exists(file)) {
            throw new NoSuchFileException(file.toString());
        }
        return new DiskOutput(file);
    }

    @Override
    public void truncate(Path file, long length) throws IOException {
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
            channel.truncate(length);
            channel.force(true);
        }
    }

    @Override
    public void move(Path from, Path to) throws IOException {
        // A device such as /dev/null would be replaced by a file, for every program of the machine.
        if (Files.exists(to) && !Files.isRegularFile(to) && !Files.isDirectory(to)) {
            throw new FileSystemException(to.toString(), null, "a device, not a file");
        }
        Files.move(from, to, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    }

    @Override
    public void delete(Path file) throws IOException {
        Files.deleteIfExists(file);
    }

    @Override
    public void forceFolder(Path folder) throws IOException {
        if (WINDOWS) {
            // A folder cannot be opened there; the file system journals its names itself.
            return;
        }
        boolean interrupted = false;
        try {
            while (!forced(folder)) {
                interrupted |= Thread.interrupted();
            }
        } finally {
            if (interrupted) {
                Thread.currentThread().interrupt();
            }
        }
    }

    /** Nothing is forced where the thread is interrupted, since that closes the channel; then it is done again. */
    private static boolean forced(Path folder) throws IOException {
        try (FileChannel channel = FileChannel.open(folder, StandardOpenOption.READ)) {
            force(channel);
            return true;
        } catch (ClosedByInterruptException e) {
            return false;
        }
    }

    /** Some file systems, of sticks and networks, know no forcing of a folder and say that the request is invalid. */
    private static void force(FileChannel folder) throws IOException {
        try {
            folder.force(true);
        } catch (IOException e) {
            if (!String.valueOf(e.getMessage()).contains("Invalid argument")) {
                throw e;
            }
        }
    }

    @Override
    public long usableSpace(Path folder) throws IOException {
        return Files.getFileStore(folder).getUsableSpace();
    }

    @Override
    public boolean writable(Path folder) {
        return Files.isWritable(folder);
    }

    @Override
    public Optional<Closeable> lock(Path file) throws IOException {
        return ProcessLock.take(file);
    }

    /** Writes without a channel, for the same reason as below: who saves may be interrupted at any time. */
    private static final class DiskOutput implements Output {
        private final RandomAccessFile file;

        DiskOutput(Path path) throws IOException {
            file = new RandomAccessFile(path.toFile(), "rw");
            file.seek(file.length());
        }

        @Override
        public void write(ByteBuffer bytes) throws IOException {
            if (bytes.hasArray()) {
                file.write(bytes.array(), bytes.arrayOffset() + bytes.position(), bytes.remaining());
                bytes.position(bytes.limit());
            } else {
                byte[] copy = new byte[bytes.remaining()];
                bytes.get(copy);
                file.write(copy);
            }
        }

        @Override
        public void force() throws IOException {
            file.getFD().sync();
        }

        @Override
        public long size() throws IOException {
            return file.length();
        }

        @Override
        public void close() throws IOException {
            file.close();
        }
    }

    /** Reads without a channel, since a channel closes for everybody when one reading thread is interrupted. */
    private static final class DiskInput implements Input {
        private final RandomAccessFile file;

        DiskInput(Path path) throws IOException {
            file = new RandomAccessFile(path.toFile(), "r");
        }

        @Override
        public synchronized long size() throws IOException {
            return file.length();
        }

        @Override
        public synchronized int read(long position, ByteBuffer into) throws IOException {
            byte[] bytes = new byte[into.remaining()];
            file.seek(position);
            int count = 0;
            while (count < bytes.length) {
                int more = file.read(bytes, count, bytes.length - count);
                if (more < 0) {
                    break;
                }
                count += more;
            }
            into.put(bytes, 0, count);
            return count;
        }

        @Override
        public void close() throws IOException {
            file.close();
        }
    }
}
