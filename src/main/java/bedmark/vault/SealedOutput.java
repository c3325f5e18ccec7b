package bedmark.vault;

import java.io.IOException;
import java.io.OutputStream;

/** Seals what is written to it; {@link #finish()} makes it whole. The stream below stays open. */
public final class SealedOutput extends OutputStream {
    private final OutputStream below;
    private final SealedFrame frame;
    private final byte[] piece = new byte[SealedFrame.PIECE];
    private int filled;
    private boolean begun;

    public SealedOutput(OutputStream below, DataKey key) {
        this.below = below;
        this.frame = SealedFrame.begin(key);
    }

    @Override
    public void write(int single) throws IOException {
        write(new byte[] {(byte) single}, 0, 1);
    }

    @Override
    public void write(byte[] bytes, int from, int length) throws IOException {
        int at = from;
        while (at < from + length) {
            if (filled == piece.length) {
                put(false);
            }
            int count = Math.min(piece.length - filled, from + length - at);
            System.arraycopy(bytes, at, piece, filled, count);
            filled += count;
            at += count;
        }
    }

    /** Writes the last piece; a file without it is refused. */
    public void finish() throws IOException {
        put(true);
    }

    private void put(boolean last) throws IOException {
        if (!begun) {
            below.write(frame.head());
            begun = true;
        }
        below.write(frame.seal(piece, filled, last));
        filled = 0;
    }
}
