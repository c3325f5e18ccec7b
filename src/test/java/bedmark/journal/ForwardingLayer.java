package bedmark.journal;

import java.io.Closeable;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/** A disk that does all that another one does; what a test wants otherwise it says itself. */
public class ForwardingLayer implements FileLayer {
    private final FileLayer disk;

    protected ForwardingLayer(FileLayer disk) {
        this.disk = disk;
    }

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
        return disk.create(file);
    }

    @Override
    public Output createPrivate(Path file) throws IOException {
        return disk.createPrivate(file);
    }

    @Override
    public Output append(Path file) throws IOException {
        return disk.append(file);
    }

    @Override
    public void truncate(Path file, long length) throws IOException {
        disk.truncate(file, length);
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
    public void forceFolder(Path folder) throws IOException {
        disk.forceFolder(folder);
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

    /** A file that is written as another one is. */
    protected static class ForwardingOutput implements Output {
        private final Output output;

        protected ForwardingOutput(Output output) {
            this.output = output;
        }

        @Override
        public void write(ByteBuffer bytes) throws IOException {
            output.write(bytes);
        }

        @Override
        public void force() throws IOException {
            output.force();
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
