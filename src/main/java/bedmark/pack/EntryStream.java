package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.util.zip.CRC32;
import java.util.zip.DataFormatException;
import java.util.zip.Inflater;

/**
 * The unpacked bytes of one entry, never more than its headers announce. The end is reached only where size, packed
 * size and CRC are all true; otherwise reading refuses with {@code zip-size-wrong}, {@code zip-crc-wrong} or
 * {@code zip-data-damaged}.
 */
final class EntryStream extends InputStream {
    private static final int PIECE = 1 << 16;

    private final ZipBytes bytes;
    private final ZipSlot slot;
    private final Inflater inflater = new Inflater(true);
    private final CRC32 crc = new CRC32();
    private long fed;
    private long given;
    private boolean ended;

    EntryStream(ZipBytes bytes, ZipSlot slot) {
        this.bytes = bytes;
        this.slot = slot;
    }

    @Override
    public int read() throws IOException {
        byte[] single = new byte[1];
        return read(single, 0, 1) < 0 ? -1 : Byte.toUnsignedInt(single[0]);
    }

    @Override
    public int read(byte[] target, int from, int length) throws IOException {
        if (ended || length == 0) {
            return ended ? -1 : 0;
        }
        int count = slot.method() == Zip.STORED ? copy(target, from, length) : inflate(target, from, length);
        if (count < 0) {
            ended = true;
            checkEnd();
            return -1;
        }
        given += count;
        if (given > slot.size()) {
            throw refused("zip-size-wrong");
        }
        crc.update(target, from, count);
        return count;
    }

    private int copy(byte[] target, int from, int length) throws IOException {
        int count = (int) Math.min(Math.min(length, PIECE), slot.packed() - fed);
        if (count == 0) {
            return -1;
        }
        bytes.at(slot.data() + fed, target, from, count);
        fed += count;
        return count;
    }

    private int inflate(byte[] target, int from, int length) throws IOException {
        try {
            while (true) {
                int count = inflater.inflate(target, from, length);
                if (count > 0) {
                    return count;
                } else if (inflater.finished()) {
                    return -1;
                } else if (!inflater.needsInput() || fed == slot.packed()) {
                    throw refused("zip-data-damaged");
                }
                ByteBuffer piece = bytes.at(slot.data() + fed, (int) Math.min(PIECE, slot.packed() - fed));
                fed += piece.remaining();
                inflater.setInput(piece);
            }
        } catch (DataFormatException e) {
            throw new Refused(Defect.in(EntryName.shown(slot.name()), "zip-data-damaged"), e);
        }
    }

    private void checkEnd() {
        long used = slot.method() == Zip.STORED ? fed : inflater.getBytesRead();
        if (given != slot.size() || used != slot.packed()) {
            throw refused("zip-size-wrong");
        } else if (crc.getValue() != slot.crc()) {
            throw refused("zip-crc-wrong");
        }
    }

    private Refused refused(String code) {
        return new Refused(Defect.in(EntryName.shown(slot.name()), code));
    }

    @Override
    public void close() {
        inflater.end();
    }
}
