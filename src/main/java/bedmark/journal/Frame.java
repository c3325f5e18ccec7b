package bedmark.journal;

import java.nio.ByteBuffer;
import java.util.Optional;
import java.util.zip.CRC32C;

/**
 * One entry as it lies on disk, big-endian: marker (4 bytes), kind (1), form of the payload (1), zero (2), length of
 * the payload (4), sequence (8), SHA-256 of the previous entry (32), CRC32C of all this and the payload (4), payload.
 * The marker holds bytes that no UTF-8 text has, so a reader finds the next entry behind a damaged one.
 *
 * @param form     how the payload lies there; a seal's, which is empty, is plain
 * @param sequence the entry's number; of a seal, the last entry's
 * @param previous hash of the entry before it
 */
record Frame(Kind kind, Form form, long sequence, Digest previous, byte[] payload) {

    /** What a frame is. */
    enum Kind {
        /** A person's act. */
        ENTRY(1),
        /** The end of a segment that was filled. */
        SEAL(2);

        private final byte code;

        Kind(int code) {
            this.code = (byte) code;
        }
    }

    /** How a payload lies on disk; the place in the list is its code. */
    enum Form {
        /** JSON in UTF-8. */
        PLAIN,
        /** The same, sealed with the store's key. */
        SEALED
    }

    static final int HEAD = 56;
    static final int LONGEST_PAYLOAD = 32 << 20;
    static final byte FIRST_OF_MARKER = (byte) 0xFE;

    private static final int MARKER = 0xFE_42_45_FF;
    private static final int CRC_AT = 52;

    static Frame seal(long last, Digest hash) {
        return new Frame(Kind.SEAL, Form.PLAIN, last, hash, new byte[0]);
    }

    int length() {
        return HEAD + payload.length;
    }

    ByteBuffer encode() {
        ByteBuffer bytes = ByteBuffer.allocate(length());
        bytes.putInt(MARKER).put(kind.code).put((byte) form.ordinal()).putShort((short) 0).putInt(payload.length)
                .putLong(sequence).put(previous.bytes()).putInt(0).put(payload).flip();
        return bytes.putInt(CRC_AT, crc(bytes));
    }

    /**
     * The whole length of the frame that seems to begin here.
     *
     * @param head the first {@link #HEAD} bytes
     * @return nothing where no frame begins
     */
    static Optional<Integer> lengthOf(ByteBuffer head) {
        int at = head.position();
        int length = head.getInt(at + 8);
        boolean begins = head.getInt(at) == MARKER && head.getShort(at + 6) == 0 && length >= 0
                && length <= LONGEST_PAYLOAD;
        return begins ? Optional.of(HEAD + length) : Optional.empty();
    }

    /** Reads a frame of exactly these bytes; nothing where any of them is not as it was written. */
    static Optional<Frame> decode(ByteBuffer bytes) {
        int at = bytes.position();
        if (bytes.remaining() < HEAD || lengthOf(bytes).filter(length -> length == bytes.remaining()).isEmpty()
                || bytes.getInt(at + CRC_AT) != crc(bytes) || bytes.get(at + 5) < 0
                || bytes.get(at + 5) >= Form.values().length) {
            return Optional.empty();
        }
        byte[] previous = new byte[Digest.BYTES];
        bytes.get(at + 20, previous);
        byte[] payload = new byte[bytes.remaining() - HEAD];
        bytes.get(at + HEAD, payload);
        for (Kind kind : Kind.values()) {
            if (kind.code == bytes.get(at + 4)) {
                return Optional.of(new Frame(kind, Form.values()[bytes.get(at + 5)], bytes.getLong(at + 12),
                        Digest.ofBytes(previous), payload));
            }
        }
        return Optional.empty();
    }

    private static int crc(ByteBuffer bytes) {
        int at = bytes.position();
        CRC32C crc = new CRC32C();
        crc.update(bytes.duplicate().limit(at + CRC_AT));
        crc.update(bytes.duplicate().position(at + HEAD));
        return (int) crc.getValue();
    }
}
