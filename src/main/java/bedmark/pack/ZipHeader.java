package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.nio.ByteBuffer;
import java.util.Arrays;
import java.util.Set;

/**
 * What the central and the local header of an entry both say.
 *
 * @param version the version needed to unpack
 * @param time    DOS time and date together
 */
record ZipHeader(int version, int flags, int method, long time, long crc, long packed, long size, byte[] rawName) {

    /** Universal time, Unix owner (old and new), NTFS times: harmless notes of common archivers. */
    private static final Set<Integer> EXTRAS = Set.of(0x5455, 0x5855, 0x7855, 0x7875, 0x000a);
    private static final int NEWEST_VERSION = 20;

    /** Reads the fields that stand in both headers in the same order, from the version needed to the sizes. */
    static ZipHeader read(ByteBuffer buffer) {
        return new ZipHeader(ZipBytes.u16(buffer), ZipBytes.u16(buffer), ZipBytes.u16(buffer),
                ZipBytes.u32(buffer), ZipBytes.u32(buffer), ZipBytes.u32(buffer), ZipBytes.u32(buffer), new byte[0]);
    }

    ZipHeader named(byte[] raw) {
        return new ZipHeader(version, flags, method, time, crc, packed, size, raw);
    }

    boolean hasDescriptor() {
        return (flags & Zip.FLAG_DESCRIPTOR) != 0;
    }

    /** Refuses what packs don't use; the central header is asked. */
    void checkFeatures(String shown) {
        if ((flags & Zip.FLAGS_ENCRYPTED) != 0) {
            throw new Refused(Defect.in(shown, "zip-encrypted"));
        } else if ((flags & ~Zip.FLAGS_KNOWN) != 0) {
            throw unknown(shown, "flags " + Integer.toHexString(flags));
        } else if (method != Zip.STORED && method != Zip.DEFLATED) {
            throw unknown(shown, "method " + method);
        } else if (version > NEWEST_VERSION) {
            throw unknown(shown, "version " + version);
        } else if (method == Zip.STORED && hasDescriptor()) {
            throw unknown(shown, "descriptor");
        } else if (method == Zip.STORED && packed != size) {
            throw new Refused(Defect.in(shown, "zip-size-wrong"));
        }
    }

    /** Extra fields can say names and sizes once more; only those that can't are let in. */
    static void checkExtras(ByteBuffer extras, String shown) {
        while (extras.remaining() >= 4) {
            int kind = ZipBytes.u16(extras);
            int length = ZipBytes.u16(extras);
            if (!EXTRAS.contains(kind) || length > extras.remaining()) {
                throw unknown(shown, "extra " + Integer.toHexString(kind));
            }
            extras.position(extras.position() + length);
        }
        if (extras.hasRemaining()) {
            throw unknown(shown, "extra");
        }
    }

    /** Refuses a local header that says anything else than this central one. */
    void checkLocal(ZipHeader local, String shown) {
        differ(shown, "name", !Arrays.equals(rawName, local.rawName));
        differ(shown, "version", version != local.version);
        differ(shown, "flags", flags != local.flags);
        differ(shown, "method", method != local.method);
        differ(shown, "time", time != local.time);
        boolean later = hasDescriptor() && local.crc == 0 && local.packed == 0 && local.size == 0;
        differ(shown, "crc", !later && crc != local.crc);
        differ(shown, "size", !later && (packed != local.packed || size != local.size));
    }

    private static void differ(String shown, String field, boolean differs) {
        if (differs) {
            throw new Refused(Defect.in(shown, "zip-headers-differ", field));
        }
    }

    private static Refused unknown(String shown, String feature) {
        return new Refused(Defect.in(shown, "zip-feature-unknown", feature));
    }
}
