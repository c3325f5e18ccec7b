package bedmark.pack;

import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Map;

/** Builds archives byte by byte, honest ones and others. */
final class ZipForge {
    final List<ForgedEntry> entries = new ArrayList<>();
    byte[] before = {};
    byte[] beforeDirectory = {};
    byte[] beforeEnd = {};
    byte[] comment = {};
    byte[] after = {};
    /** Added to the number of entries that the end tells. */
    int countShift;
    int disk;
    /** Added to all places that the directory and the end tell. */
    int shift;
    /** The order of the directory, where it is not that of the file. */
    boolean directoryReversed;

    static ZipForge of(Map<String, byte[]> files) {
        ZipForge forge = new ZipForge();
        files.forEach((name, content) -> forge.entries.add(ForgedEntry.stored(name, content)));
        return forge;
    }

    ForgedEntry entry(String name) {
        return entries.stream()
                .filter(entry -> Arrays.equals(entry.centralName, name.getBytes(StandardCharsets.UTF_8)))
                .findFirst().orElseThrow();
    }

    ZipForge and(ForgedEntry entry) {
        entries.add(entry);
        return this;
    }

    byte[] build() {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        out.writeBytes(before);
        List<byte[]> directory = new ArrayList<>();
        int previous = 0;
        for (ForgedEntry entry : entries) {
            if (!entry.centralOnly) {
                out.writeBytes(entry.gapBefore);
                previous = out.size();
                out.writeBytes(local(entry));
                out.writeBytes(entry.data);
                out.writeBytes(entry.descriptor);
            }
            if (!entry.localOnly) {
                directory.add(central(entry, previous + entry.shift + shift));
            }
        }
        if (directoryReversed) {
            Collections.reverse(directory);
        }
        out.writeBytes(beforeDirectory);
        int start = out.size();
        directory.forEach(out::writeBytes);
        int length = out.size() - start;
        out.writeBytes(beforeEnd);
        int count = directory.size() + countShift;
        out.writeBytes(buffer(22).putInt(0x06054b50).putShort((short) disk).putShort((short) disk)
                .putShort((short) count).putShort((short) count).putInt(length).putInt(start + shift)
                .putShort((short) comment.length).array());
        out.writeBytes(comment);
        out.writeBytes(after);
        return out.toByteArray();
    }

    private static byte[] local(ForgedEntry entry) {
        return buffer(30 + entry.localName.length + entry.localExtra.length).putInt(0x04034b50)
                .putShort((short) entry.version).putShort((short) entry.localFlags)
                .putShort((short) entry.localMethod).putShort((short) entry.localTime).putShort((short) 0x21)
                .putInt((int) entry.localCrc).putInt((int) entry.localPacked).putInt((int) entry.localSize)
                .putShort((short) entry.localName.length).putShort((short) entry.localExtra.length)
                .put(entry.localName).put(entry.localExtra).array();
    }

    private static byte[] central(ForgedEntry entry, int place) {
        return buffer(46 + entry.centralName.length + entry.centralExtra.length + entry.comment.length)
                .putInt(0x02014b50).putShort((short) entry.madeBy).putShort((short) entry.version)
                .putShort((short) entry.flags).putShort((short) entry.method).putShort((short) 0)
                .putShort((short) 0x21).putInt((int) entry.crc).putInt((int) entry.packed).putInt((int) entry.size)
                .putShort((short) entry.centralName.length).putShort((short) entry.centralExtra.length)
                .putShort((short) entry.comment.length).putShort((short) entry.disk).putShort((short) 0)
                .putInt(entry.attributes).putInt(place).put(entry.centralName).put(entry.centralExtra)
                .put(entry.comment).array();
    }

    static ByteBuffer buffer(int length) {
        return ByteBuffer.allocate(length).order(ByteOrder.LITTLE_ENDIAN);
    }
}
