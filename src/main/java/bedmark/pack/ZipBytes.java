package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;

/** Reads pieces of a file at given places. */
record ZipBytes(FileChannel file, long size) {

    /**
     * The bytes at a place.
     *
     * @throws Refused {@code zip-truncated} where the file ends before
     */
    ByteBuffer at(long place, int length) throws IOException {
        if (place < 0 || place + length > size) {
            throw truncated();
        }
        ByteBuffer buffer = ByteBuffer.allocate(length).order(ByteOrder.LITTLE_ENDIAN);
        fill(place, buffer);
        return buffer.flip();
    }

    /**
     * Reads the bytes at a place into an array.
     *
     * @throws Refused {@code zip-truncated} where the file ends before
     */
    void at(long place, byte[] target, int from, int length) throws IOException {
        if (place < 0 || place + length > size) {
            throw truncated();
        }
        fill(place, ByteBuffer.wrap(target, from, length).slice());
    }

    private void fill(long place, ByteBuffer buffer) throws IOException {
        while (buffer.hasRemaining()) {
            if (file.read(buffer, place + buffer.position()) < 0) {
                throw truncated();
            }
        }
    }

    private static Refused truncated() {
        return new Refused(Defect.in("", "zip-truncated"));
    }

    /** Whether a signature stands at a place. */
    boolean has(int signature, long place) throws IOException {
        return place >= 0 && place + 4 <= size && at(place, 4).getInt() == signature;
    }

    static int u16(ByteBuffer buffer) {
        return Short.toUnsignedInt(buffer.getShort());
    }

    static long u32(ByteBuffer buffer) {
        return Integer.toUnsignedLong(buffer.getInt());
    }

    static byte[] next(ByteBuffer buffer, int length) {
        byte[] bytes = new byte[length];
        buffer.get(bytes);
        return bytes;
    }
}
