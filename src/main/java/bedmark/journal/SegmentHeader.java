package bedmark.journal;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.Optional;
import java.util.UUID;
import java.util.zip.CRC32C;

/**
 * The first bytes of a segment, big-endian: {@code BEDMARKJ} (8 bytes), version (4), how it follows (4), the journal's
 * identity (16), the segment's number (4), first sequence (8), hash of the entry before it (32), CRC32C (4).
 *
 * @param form     how the payloads lie in it; sealed ones make it version 2, so that an earlier program does not take
 *                 them for damage
 * @param first    sequence of the first entry that may stand here; what earlier segments hold from there on never
 *                 counted as saved
 * @param previous hash of the entry before the first
 */
record SegmentHeader(Frame.Form form, Follows follows, UUID journal, int number, long first, Digest previous) {

    /** How a segment follows the one before it; the place in the list is its code on disk. */
    enum Follows {
        /** There is none before it. */
        NOTHING,
        /** The one before it was filled and sealed. */
        SEALED,
        /** A write or a force failed in the one before it, or it was damaged; bytes may be left over at its end. */
        ABANDONED
    }

    static final int LENGTH = 80;
    private static final long MAGIC = ByteBuffer.wrap("BEDMARKJ".getBytes(StandardCharsets.US_ASCII)).getLong();
    private static final int VERSION = Frame.Form.values().length;
    private static final int CRC_AT = LENGTH - 4;

    ByteBuffer encode() {
        ByteBuffer bytes = ByteBuffer.allocate(LENGTH);
        bytes.putLong(MAGIC).putInt(form.ordinal() + 1).putInt(follows.ordinal())
                .putLong(journal.getMostSignificantBits()).putLong(journal.getLeastSignificantBits()).putInt(number).putLong(first).put(previous.bytes());
        return bytes.putInt(crc(bytes.array())).flip();
    }

    /**
     * Nothing where the bytes are no sound header.
     *
     * @throws Refused {@code journal-version-unknown} where a sound header is of a later version
     */
    static Optional<SegmentHeader> decode(byte[] header, String file) {
        ByteBuffer bytes = ByteBuffer.wrap(header);
        if (header.length < LENGTH || bytes.getInt(CRC_AT) != crc(header) || bytes.getLong() != MAGIC) {
            return Optional.empty();
        }
        int version = bytes.getInt();
        if (version < 1 || version > VERSION) {
            throw new Refused(Defect.in(file, "journal-version-unknown", Integer.toString(version),
                    Integer.toString(VERSION)));
        }
        int follows = bytes.getInt();
        UUID journal = new UUID(bytes.getLong(), bytes.getLong());
        int number = bytes.getInt();
        long first = bytes.getLong();
        byte[] previous = new byte[Digest.BYTES];
        bytes.get(previous);
        return follows < 0 || follows >= Follows.values().length ? Optional.empty()
                : Optional.of(new SegmentHeader(Frame.Form.values()[version - 1], Follows.values()[follows], journal,
                        number, first, Digest.ofBytes(previous)));
    }

    private static int crc(byte[] header) {
        CRC32C crc = new CRC32C();
        crc.update(header, 0, CRC_AT);
        return (int) crc.getValue();
    }
}
