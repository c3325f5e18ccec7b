package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.nio.ByteBuffer;

/**
 * The end of a ZIP file: where its central directory lies. It is taken only from the last 22 bytes; a file whose
 * end could be found in two ways is refused.
 *
 * @param entries   how many entries the directory holds
 * @param directory where the directory begins
 * @param length    bytes of the directory, up to the end record
 */
record ZipEnd(int entries, long directory, int length) {
    private static final int LONGEST_COMMENT = 0xFFFF;
    /** Room for a header with the longest name and extra fields that a pack can hold. */
    private static final int LARGEST_HEADER = 1024;

    static ZipEnd read(ZipBytes bytes, PackLimits limits) throws IOException {
        if (!bytes.has(Zip.LOCAL, 0) && !bytes.has(Zip.END, bytes.size() - Zip.END_BYTES)) {
            throw new Refused(Defect.in("", "pack-not-zip"));
        }
        long place = bytes.size() - Zip.END_BYTES;
        if (!bytes.has(Zip.END, place) || bytes.at(place + 20, 2).getShort() != 0) {
            throw new Refused(Defect.in("", whyNotLast(bytes)));
        }
        ByteBuffer record = bytes.at(place + 4, Zip.END_BYTES - 4);
        int disk = ZipBytes.u16(record);
        int directoryDisk = ZipBytes.u16(record);
        int entriesHere = ZipBytes.u16(record);
        int entries = ZipBytes.u16(record);
        long length = ZipBytes.u32(record);
        long directory = ZipBytes.u32(record);
        if (Math.max(entries, entriesHere) > limits.entries()) {
            throw new Refused(Defect.in("", "zip-entries-too-many", Integer.toString(limits.entries())));
        } else if (bytes.has(Zip.ZIP64_LOCATOR, place - Zip.ZIP64_LOCATOR_BYTES)) {
            throw new Refused(Defect.in("", "zip-feature-unknown", "ZIP64"));
        } else if (disk != 0 || directoryDisk != 0) {
            throw new Refused(Defect.in("", "zip-feature-unknown", "disks"));
        } else if (directory + length != place) {
            throw new Refused(Defect.in("", whyShifted(bytes, directory, place - directory - length)));
        } else if (entriesHere != entries || length > (long) entries * LARGEST_HEADER) {
            throw new Refused(Defect.in("", "zip-directory-wrong"));
        }
        return new ZipEnd(entries, directory, (int) length);
    }

    /** Looks for the end record further ahead, only to say what is wrong. */
    private static String whyNotLast(ZipBytes bytes) throws IOException {
        long first = Math.max(0, bytes.size() - Zip.END_BYTES - LONGEST_COMMENT);
        ByteBuffer tail = bytes.at(first, (int) (bytes.size() - first));
        for (int i = tail.limit() - Zip.END_BYTES; i >= 0; i--) {
            if (tail.getInt(i) == Zip.END) {
                int comment = Short.toUnsignedInt(tail.getShort(i + 20));
                long end = first + i + Zip.END_BYTES + comment;
                long directoryEnd = Integer.toUnsignedLong(tail.getInt(i + 12))
                        + Integer.toUnsignedLong(tail.getInt(i + 16));
                if (end == bytes.size()) {
                    return "zip-comment";
                } else if (end < bytes.size() && directoryEnd == first + i) {
                    return "zip-junk-after";
                }
            }
        }
        return "zip-truncated";
    }

    private static String whyShifted(ZipBytes bytes, long directory, long shift) throws IOException {
        if (shift > 0 && bytes.has(Zip.CENTRAL, directory + shift)) {
            return bytes.has(Zip.LOCAL, 0) && bytes.has(Zip.LOCAL, shift) ? "zip-two-archives" : "zip-junk-before";
        }
        return shift > 0 && bytes.has(Zip.CENTRAL, directory) ? "zip-gap" : "zip-directory-wrong";
    }
}
