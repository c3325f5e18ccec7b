package bedmark.index;

import bedmark.journal.FileLayer;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;

/** A file of the layer as a stream from its beginning. */
final class LayerStream extends InputStream {
    private final FileLayer.Input input;
    private long at;

    LayerStream(FileLayer.Input input) {
        this.input = input;
    }

    @Override
    public int read() throws IOException {
        byte[] single = new byte[1];
        return read(single, 0, 1) < 0 ? -1 : Byte.toUnsignedInt(single[0]);
    }

    @Override
    public int read(byte[] into, int from, int length) throws IOException {
        if (length == 0) {
            return 0;
        }
        int count = input.read(at, ByteBuffer.wrap(into, from, length));
        at += count;
        return count == 0 ? -1 : count;
    }

    @Override
    public void close() throws IOException {
        input.close();
    }
}
