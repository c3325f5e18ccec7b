package bedmark.journal;

import java.io.Closeable;
import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;

/** A lock of this process on a file. */
final class ProcessLock implements Closeable {
    /**
     * The files that this process holds. The system's lock belongs to the process as a whole, and closing any second
     * channel on the file gives it up; so a second attempt must be turned away before it opens one.
     */
    private static final Set<Path> HELD = ConcurrentHashMap.newKeySet();

    private final Path file;
    private final FileChannel channel;

    private ProcessLock(Path file, FileChannel channel) {
        this.file = file;
        this.channel = channel;
    }

    static Optional<Closeable> take(Path path) throws IOException {
        Path file = path.toAbsolutePath().getParent().toRealPath().resolve(path.getFileName());
        if (!HELD.add(file)) {
            return Optional.empty();
        }
        Optional<Closeable> taken = Optional.empty();
        try {
            taken = lock(file);
        } finally {
            if (taken.isEmpty()) {
                HELD.remove(file);
            }
        }
        return taken;
    }

    private static Optional<Closeable> lock(Path file) throws IOException {
        FileChannel channel = FileChannel.open(file, StandardOpenOption.CREATE, StandardOpenOption.WRITE);
        FileLock lock = null;
        try {
            lock = channel.tryLock();
        } finally {
            if (lock == null) {
                channel.close();
            }
        }
        return lock == null ? Optional.empty() : Optional.of(new ProcessLock(file, channel));
    }

    @Override
    public void close() throws IOException {
        try {
            channel.close();
        } finally {
            HELD.remove(file);
        }
    }
}
