package bedmark.pack;

import bedmark.journal.FileLayer;
import bedmark.journal.ForwardingLayer;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Supplier;

/** A disk whose nth step fails, and with it, if it is gone for good, every later one but deleting. */
final class FailingDisk extends ForwardingLayer {
    private final int failing;
    private final boolean forGood;
    private final Supplier<IOException> failure;
    final List<String> steps = new ArrayList<>();
    long free = 1L << 40;

    FailingDisk(int failing, boolean forGood, Supplier<IOException> failure) {
        super(FileLayer.disk());
        this.failing = failing;
        this.forGood = forGood;
        this.failure = failure;
    }

    private void step(String name) throws IOException {
        steps.add(name);
        if (steps.size() == failing || forGood && steps.size() > failing) {
            throw failure.get();
        }
    }

    @Override
    public Output create(Path file) throws IOException {
        step("create");
        return new FailingOutput(super.create(file));
    }

    @Override
    public Output createPrivate(Path file) throws IOException {
        step("create");
        return new FailingOutput(super.createPrivate(file));
    }

    @Override
    public void move(Path from, Path to) throws IOException {
        step("move");
        super.move(from, to);
    }

    @Override
    public void forceFolder(Path folder) throws IOException {
        step("force folder");
        super.forceFolder(folder);
    }

    @Override
    public long usableSpace(Path folder) {
        return free;
    }

    private final class FailingOutput extends ForwardingOutput {
        FailingOutput(Output output) {
            super(output);
        }

        /** A failing write still leaves half of the bytes. */
        @Override
        public void write(ByteBuffer bytes) throws IOException {
            try {
                step("write");
            } catch (IOException e) {
                super.write(bytes.duplicate().limit(bytes.position() + bytes.remaining() / 2));
                throw e;
            }
            super.write(bytes);
        }

        @Override
        public void force() throws IOException {
            step("force");
            super.force();
        }

        @Override
        public void close() throws IOException {
            super.close();
            step("close");
        }
    }
}
