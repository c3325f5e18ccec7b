package bedmark.vault;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Optional;

/**
 * The framing of a sealed file, the STREAM construction (Hoang, Reyhanitabar, Rogaway and Vizár, 2015): a head of magic
 * (8 bytes), salt (32) and nonce prefix (7), then pieces of {@link #PIECE} bytes, each sealed with AES-256-GCM under a
 * nonce of prefix, piece number (4 bytes, big-endian) and 1 for the last piece, else 0. So no piece can be left out,
 * put elsewhere, cut off or brought in from another file, whose salt gives it another key.
 */
final class SealedFrame {
    static final int PIECE = 64 << 10;
    static final int HEAD = 47;

    private static final byte[] MAGIC = "BEDMARKS".getBytes(StandardCharsets.US_ASCII);
    private static final int SALT = 32;
    private static final int PREFIX = 7;

    private final byte[] key;
    private final byte[] head;
    private int number;

    private SealedFrame(DataKey key, byte[] head) {
        this.head = head;
        this.key = key.fileKey(Arrays.copyOfRange(head, MAGIC.length, MAGIC.length + SALT));
    }

    static SealedFrame begin(DataKey key) {
        byte[] random = Gcm.random(SALT + PREFIX);
        return new SealedFrame(key, ByteBuffer.allocate(HEAD).put(MAGIC).put(random).array());
    }

    /** @return nothing where this is no head of a sealed file */
    static Optional<SealedFrame> read(DataKey key, byte[] head) {
        boolean sealed = head.length == HEAD && Arrays.equals(MAGIC, Arrays.copyOf(head, MAGIC.length));
        return sealed ? Optional.of(new SealedFrame(key, head)) : Optional.empty();
    }

    byte[] head() {
        return head.clone();
    }

    /** Bytes of the content of a sealed file; negative where no content gives a file of that length. */
    static long plainLength(long sealed) {
        long pieces = sealed - HEAD;
        long full = PIECE + Gcm.TAG;
        long rest = pieces % full == 0 ? full : pieces % full;
        return pieces < Gcm.TAG || rest < Gcm.TAG ? -1 : (pieces - rest) / full * PIECE + rest - Gcm.TAG;
    }

    byte[] seal(byte[] piece, int length, boolean last) {
        return Gcm.seal(key, nonce(last), head, piece, length);
    }

    Optional<byte[]> open(byte[] sealed, int length, boolean last) {
        return Gcm.open(key, nonce(last), head, sealed, 0, length);
    }

    private byte[] nonce(boolean last) {
        if (number < 0) {
            throw new IllegalStateException("a sealed file has no more than 2^31 pieces");
        }
        return ByteBuffer.allocate(Gcm.NONCE).put(head, MAGIC.length + SALT, PREFIX).putInt(number++)
                .put((byte) (last ? 1 : 0)).array();
    }
}
