package bedmark.pack;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.zip.CRC32;
import java.util.zip.Deflater;
import java.util.zip.DeflaterOutputStream;

/** One entry of a forged archive: sound when made, every field open to lies. */
final class ForgedEntry {
    byte[] localName;
    byte[] centralName;
    byte[] data;
    byte[] descriptor = {};
    byte[] localExtra = {};
    byte[] centralExtra = {};
    byte[] comment = {};
    byte[] gapBefore = {};
    int version = 20;
    int madeBy = 0x0314;
    int flags;
    int localFlags;
    int method;
    int localMethod;
    int localTime;
    long crc;
    long size;
    long packed;
    long localCrc;
    long localSize;
    long localPacked;
    int attributes = 0x81A4_0000;
    int disk;
    /** Added to the place that the directory tells. */
    int shift;
    /** Whether only the directory knows the entry; it then points to where the one before begins. */
    boolean centralOnly;
    /** Whether the directory does not know the entry. */
    boolean localOnly;

    static ForgedEntry stored(String name, byte[] content) {
        ForgedEntry entry = new ForgedEntry();
        entry.named(name);
        entry.data = content;
        entry.sizes(content, content.length);
        return entry;
    }

    static ForgedEntry deflated(String name, byte[] content) {
        ForgedEntry entry = stored(name, content);
        entry.data = deflate(content);
        entry.method = 8;
        entry.localMethod = 8;
        entry.sizes(content, entry.data.length);
        return entry;
    }

    void named(String name) {
        localName = name.getBytes(StandardCharsets.UTF_8);
        centralName = localName;
        if (name.length() != localName.length) {
            flags |= 0x0800;
            localFlags |= 0x0800;
        }
    }

    private void sizes(byte[] content, int packedLength) {
        CRC32 sum = new CRC32();
        sum.update(content);
        crc = sum.getValue();
        localCrc = crc;
        size = content.length;
        localSize = size;
        packed = packedLength;
        localPacked = packed;
    }

    static byte[] deflate(byte[] content) {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (DeflaterOutputStream out = new DeflaterOutputStream(bytes, new Deflater(9, true))) {
            out.write(content);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return bytes.toByteArray();
    }
}
