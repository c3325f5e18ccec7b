package bedmark.journal;

import java.io.Closeable;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.List;
import java.util.Optional;

/** The real disk without waiting for the medium, for looking at very many stores. */
public final class QuickLayer implements FileLayer {
    private final FileLayer disk = FileLayer.disk();

    @Override
    public void createFolder(Path folder) throws IOException {
        disk.createFolder(folder);
    }

    @Override
    public boolean exists(Path file) {
        return disk.exists(file);
    }

    @Override
    public List<Path> list(Path folder) throws IOException {
        return disk.list(folder);
    }

    @Override
    public Input read(Path file) throws IOException {
        return disk.read(file);
    }

    @Override
    public Output create(Path file) throws IOException {
        return new QuickOutput(disk.create(file));
    }

    @Override
    public Output append(Path file) throws IOException {
        return new QuickOutput(disk.append(file));
    }

    @Override
    public void truncate(Path file, long length) throws IOException {
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
            channel.truncate(length);
        }
    }

    @Override
    public void move(Path from, Path to) throws IOException {
        disk.move(from, to);
    }

    @Override
    public void delete(Path file) throws IOException {
        disk.delete(file);
    }

    @Override
    public void forceFolder(Path folder) {
        // Nothing is waited for.
    }

    @Override
    public long usableSpace(Path folder) throws IOException {
        return disk.usableSpace(folder);
    }

    @Override
    public boolean writable(Path folder) {
        return disk.writable(folder);
    }

    @Override
    public Optional<Closeable> lock(Path file) throws IOException {
        return disk.lock(file);
    }

    private record QuickOutput(Output output) implements Output {
        @Override
        public void write(ByteBuffer bytes) throws IOException {
            output.write(bytes);
        }

        @Override
        public void force() {
            // Nothing is waited for.
        }

        @Override
        public long size() throws IOException {
            return output.size();
        }

        @Override
        public void close() throws IOException {
            output.close();
        }
    }
}
