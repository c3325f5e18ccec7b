package bedmark.journal;

import java.io.Closeable;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/** A disk whose Nth operation fails, once or with all that come after it. A failing write leaves half its bytes. */
public final class FailingLayer implements FileLayer {
    private final FileLayer disk = new QuickLayer();
    private final long failing;
    private final boolean forGood;
    private final String message;
    private long done;

    /**
     * @param failing the first operation that fails, counted from 1; 0 for none
     * @param forGood whether all later ones fail too
     */
    public FailingLayer(long failing, boolean forGood, String message) {
        this.failing = failing;
        this.forGood = forGood;
        this.message = message;
    }

    /** How many operations there were. */
    public synchronized long operations() {
        return done;
    }

    private synchronized boolean fails() {
        done++;
        return failing > 0 && (done == failing || forGood && done > failing);
    }

    private void step() throws IOException {
        if (fails()) {
            throw new IOException(message);
        }
    }

    @Override
    public void createFolder(Path folder) throws IOException {
        step();
        disk.createFolder(folder);
    }

    @Override
    public boolean exists(Path file) {
        return disk.exists(file);
    }

    @Override
    public List<Path> list(Path folder) throws IOException {
        step();
        return disk.list(folder);
    }

    @Override
    public Input read(Path file) throws IOException {
        step();
        return disk.read(file);
    }

    @Override
    public Output create(Path file) throws IOException {
        step();
        return new FailingOutput(disk.create(file));
    }

    @Override
    public Output append(Path file) throws IOException {
        step();
        return new FailingOutput(disk.append(file));
    }

    @Override
    public void truncate(Path file, long length) throws IOException {
        step();
        disk.truncate(file, length);
    }

    @Override
    public void move(Path from, Path to) throws IOException {
        step();
        disk.move(from, to);
    }

    @Override
    public void delete(Path file) throws IOException {
        step();
        disk.delete(file);
    }

    @Override
    public void forceFolder(Path folder) throws IOException {
        step();
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

    private final class FailingOutput implements Output {
        private final Output output;

        FailingOutput(Output output) {
            this.output = output;
        }

        @Override
        public void write(ByteBuffer bytes) throws IOException {
            if (fails()) {
                output.write(bytes.duplicate().limit(bytes.position() + bytes.remaining() / 2));
                throw new IOException(message);
            }
            output.write(bytes);
        }

        @Override
        public void force() throws IOException {
            step();
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
