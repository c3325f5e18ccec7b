package bedmark.pack;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;

/**
 * Writes a ZIP file whose entries are stored as they are: photos don't shrink, and what is not deflated is the same
 * byte for byte on every machine. Everything about the file is known before its first byte is written.
 */
final class StoredZip {
    private static final int VERSION_NEEDED = 10;
    /** Unix, so that the rights below count; format version 2.0. */
    private static final int MADE_BY = 0x0314;
    /** A regular file that its owner may write and all may read. */
    private static final int ATTRIBUTES = 0x81A4_0000;

    private final List<ZipSlot> slots = new ArrayList<>();
    private long end;

    /** Plans the next entry. */
    void add(String name, long size, long crc) {
        long data = end + Zip.LOCAL_BYTES + raw(name).length;
        slots.add(new ZipSlot(name, false, Zip.STORED, crc, size, size, end, data, data + size));
        end = data + size;
    }

    List<ZipSlot> slots() {
        return List.copyOf(slots);
    }

    /** The size of the whole file. */
    long size() {
        return end + directorySize() + Zip.END_BYTES;
    }

    /** What writes the content of an entry, exactly as many bytes as planned. */
    interface Content {
        void write(ZipSlot slot, OutputStream out) throws IOException;
    }

    void write(OutputStream out, Content content) throws IOException {
        for (ZipSlot slot : slots) {
            out.write(local(slot));
            content.write(slot, out);
        }
        for (ZipSlot slot : slots) {
            out.write(central(slot));
        }
        out.write(buffer(Zip.END_BYTES).putInt(Zip.END).putInt(0)
                .putShort((short) slots.size()).putShort((short) slots.size())
                .putInt((int) directorySize()).putInt((int) end).putShort((short) 0).array());
    }

    private long directorySize() {
        return slots.stream().mapToLong(slot -> Zip.CENTRAL_BYTES + raw(slot.name()).length).sum();
    }

    private static byte[] local(ZipSlot slot) {
        byte[] name = raw(slot.name());
        ByteBuffer header = buffer(Zip.LOCAL_BYTES + name.length).putInt(Zip.LOCAL);
        return common(header, slot).putShort((short) name.length).putShort((short) 0).put(name).array();
    }

    private static byte[] central(ZipSlot slot) {
        byte[] name = raw(slot.name());
        ByteBuffer header = buffer(Zip.CENTRAL_BYTES + name.length).putInt(Zip.CENTRAL).putShort((short) MADE_BY);
        return common(header, slot).putShort((short) name.length).putShort((short) 0).putShort((short) 0)
                .putShort((short) 0).putShort((short) 0).putInt(ATTRIBUTES).putInt((int) slot.header())
                .put(name).array();
    }

    private static ByteBuffer common(ByteBuffer header, ZipSlot slot) {
        boolean ascii = slot.name().chars().allMatch(character -> character < 0x80);
        return header.putShort((short) VERSION_NEEDED).putShort((short) (ascii ? 0 : Zip.FLAG_UTF8))
                .putShort((short) slot.method()).putShort((short) 0).putShort((short) Zip.FIRST_DAY)
                .putInt((int) slot.crc()).putInt((int) slot.packed()).putInt((int) slot.size());
    }

    private static ByteBuffer buffer(int length) {
        return ByteBuffer.allocate(length).order(ByteOrder.LITTLE_ENDIAN);
    }

    private static byte[] raw(String name) {
        return name.getBytes(StandardCharsets.UTF_8);
    }
}
