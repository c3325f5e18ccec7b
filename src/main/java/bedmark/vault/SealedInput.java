package bedmark.vault;

import java.io.IOException;
import java.io.InputStream;
import java.util.Arrays;

/** Opens a sealed file piece by piece; no byte is handed out that was not proved. */
public final class SealedInput extends InputStream {
    private final InputStream below;
    private final SealedFrame frame;
    private byte[] ahead;
    private byte[] piece = new byte[0];
    private int at;
    private boolean ended;

    /** A sealed file is not as it was written, or was sealed with another key. */
    public static final class Damaged extends IOException {
        Damaged() {
            super("the sealed file is damaged");
        }
    }

    /** @throws Damaged where it is no sealed file */
    public SealedInput(InputStream below, DataKey key) throws IOException {
        this.below = below;
        this.frame = SealedFrame.read(key, below.readNBytes(SealedFrame.HEAD)).orElseThrow(Damaged::new);
        this.ahead = below.readNBytes(SealedFrame.PIECE + Gcm.TAG);
    }

    /** The length of the content of a sealed file, told from the file's own; negative where it is none. */
    public static long plainLength(long sealed) {
        return SealedFrame.plainLength(sealed);
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
        while (at == piece.length) {
            if (ended) {
                return -1;
            }
            next();
        }
        int count = Math.min(length, piece.length - at);
        System.arraycopy(piece, at, into, from, count);
        at += count;
        return count;
    }

    private void next() throws IOException {
        byte[] sealed = ahead;
        ahead = sealed.length < SealedFrame.PIECE + Gcm.TAG ? new byte[0]
                : below.readNBytes(SealedFrame.PIECE + Gcm.TAG);
        ended = ahead.length == 0;
        if (sealed.length < Gcm.TAG) {
            throw new Damaged();
        }
        piece = frame.open(sealed, sealed.length, ended).orElseThrow(Damaged::new);
        at = 0;
    }

    @Override
    public void close() throws IOException {
        Arrays.fill(piece, (byte) 0);
        below.close();
    }
}
