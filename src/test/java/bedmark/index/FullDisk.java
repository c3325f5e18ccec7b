package bedmark.index;

import bedmark.journal.ForwardingLayer;
import bedmark.journal.QuickLayer;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.concurrent.atomic.AtomicLong;

/** A disk that holds so many bytes and no more, until somebody makes room. */
final class FullDisk extends ForwardingLayer {
    private final AtomicLong room;

    FullDisk(long bytes) {
        super(new QuickLayer());
        this.room = new AtomicLong(bytes);
    }

    void free(long bytes) {
        room.addAndGet(bytes);
    }

    @Override
    public Output create(Path file) throws IOException {
        return new FullOutput(super.create(file));
    }

    @Override
    public Output createPrivate(Path file) throws IOException {
        return new FullOutput(super.createPrivate(file));
    }

    @Override
    public Output append(Path file) throws IOException {
        return new FullOutput(super.append(file));
    }

    @Override
    public long usableSpace(Path folder) {
        return Math.max(0, room.get());
    }

    /** As a real disk, it takes what still fits before it says so. */
    private final class FullOutput extends ForwardingOutput {
        FullOutput(Output output) {
            super(output);
        }

        @Override
        public void write(ByteBuffer bytes) throws IOException {
            int fits = (int) Math.max(0, Math.min(bytes.remaining(), room.get()));
            boolean all = fits == bytes.remaining();
            room.addAndGet(-fits);
            super.write(bytes.duplicate().limit(bytes.position() + fits));
            bytes.position(bytes.limit());
            if (!all) {
                throw new IOException("No space left on device");
            }
        }
    }
}
