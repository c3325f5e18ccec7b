package bedmark.journal;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.List;

/** A disk whose Nth operation fails, once or with all that come after it. A failing write leaves half its bytes. */
public final class FailingLayer extends ForwardingLayer {
    private final long failing;
    private final boolean forGood;
    private final String message;
    private long done;

    /**
     * @param failing the first operation that fails, counted from 1; 0 for none
     * @param forGood whether all later ones fail too
     */
    public FailingLayer(long failing, boolean forGood, String message) {
        super(new QuickLayer());
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
        super.createFolder(folder);
    }

    @Override
    public List<Path> list(Path folder) throws IOException {
        step();
        return super.list(folder);
    }

    @Override
    public Input read(Path file) throws IOException {
        step();
        return super.read(file);
    }

    @Override
    public Output create(Path file) throws IOException {
        step();
        return new FailingOutput(super.create(file));
    }

    @Override
    public Output createPrivate(Path file) throws IOException {
        return create(file);
    }

    @Override
    public Output append(Path file) throws IOException {
        step();
        return new FailingOutput(super.append(file));
    }

    @Override
    public void truncate(Path file, long length) throws IOException {
        step();
        super.truncate(file, length);
    }

    @Override
    public void move(Path from, Path to) throws IOException {
        step();
        super.move(from, to);
    }

    @Override
    public void delete(Path file) throws IOException {
        step();
        super.delete(file);
    }

    @Override
    public void forceFolder(Path folder) throws IOException {
        step();
        super.forceFolder(folder);
    }

    private final class FailingOutput extends ForwardingOutput {
        FailingOutput(Output output) {
            super(output);
        }

        @Override
        public void write(ByteBuffer bytes) throws IOException {
            if (fails()) {
                super.write(bytes.duplicate().limit(bytes.position() + bytes.remaining() / 2));
                throw new IOException(message);
            }
            super.write(bytes);
        }

        @Override
        public void force() throws IOException {
            step();
            super.force();
        }
    }
}
