package bedmark.journal;

import java.io.Closeable;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.Optional;

/** Reads a segment's frames one after the other, and finds its way again behind damaged bytes. */
final class SegmentReader implements Closeable {
    private static final int AHEAD = 128 << 10;

    private final FileLayer.Input input;
    private final long end;
    private ByteBuffer window = ByteBuffer.allocate(0);
    private long windowAt;
    private long position;

    /**
     * @param from where a frame begins
     * @param end  how far to read, in bytes; what lies behind it is not looked at
     */
    SegmentReader(FileLayer files, Path file, long from, long end) throws IOException {
        this.input = files.read(file);
        this.position = from;
        this.end = end;
    }

    /** The next stretch; nothing at the end. */
    Optional<Found> next() throws IOException {
        if (position >= end) {
            return Optional.empty();
        }
        Optional<Found.Good> here = frameAt(position);
        if (here.isPresent()) {
            position += here.get().length();
            return Optional.of(here.get());
        }
        long start = position;
        position = nextFrame(start + 1);
        return Optional.of(new Found.Bad(start, position - start));
    }

    private long nextFrame(long from) throws IOException {
        for (long at = from; at < end; at++) {
            at = markerFrom(at);
            if (at < end && frameAt(at).isPresent()) {
                return at;
            }
        }
        return end;
    }

    private long markerFrom(long from) throws IOException {
        for (long at = from; at < end; at++) {
            if (bytes(at, 1).get() == Frame.FIRST_OF_MARKER) {
                return at;
            }
        }
        return end;
    }

    private Optional<Found.Good> frameAt(long at) throws IOException {
        if (at + Frame.HEAD > end) {
            return Optional.empty();
        }
        Optional<Integer> length = Frame.lengthOf(bytes(at, Frame.HEAD)).filter(whole -> at + whole <= end);
        if (length.isEmpty()) {
            return Optional.empty();
        }
        ByteBuffer whole = bytes(at, length.get());
        return Frame.decode(whole).map(frame -> new Found.Good(frame, at, Digest.of(whole)));
    }

    /** Bytes of the file that are known to lie before the end. */
    private ByteBuffer bytes(long at, int length) throws IOException {
        if (at < windowAt || at + length > windowAt + window.limit()) {
            ByteBuffer fresh = ByteBuffer.allocate((int) Math.min(Math.max(length, AHEAD), end - at));
            if (input.read(at, fresh) < length) {
                throw new IOException("the file became shorter while it was read");
            }
            window = fresh.flip();
            windowAt = at;
        }
        return window.slice((int) (at - windowAt), length);
    }

    @Override
    public void close() throws IOException {
        input.close();
    }
}
