package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;

/**
 * Reads a ZIP file's directory so strictly that only one reading is left: entries tile the file from its first byte
 * to the central directory in the directory's order, both headers of each agree, names are safe and unlike each
 * other, and the announced sizes are within the limits. No content is read.
 */
final class ZipDirectory {
    private static final int UNIX_TYPE = 0xF000;
    private static final int UNIX_FILE = 0x8000;
    private static final int UNIX_FOLDER = 0x4000;
    private static final int UNIX_LINK = 0xA000;
    private static final int DOS_FOLDER = 0x10;

    private final ZipBytes bytes;
    private final PackLimits limits;

    private ZipDirectory(ZipBytes bytes, PackLimits limits) {
        this.bytes = bytes;
        this.limits = limits;
    }

    /**
     * The entries in the file's order.
     *
     * @throws Refused with a {@code zip-…}, {@code name-…} or {@code pack-…} code
     */
    static List<ZipSlot> read(ZipBytes bytes, PackLimits limits) throws IOException {
        ZipEnd end = ZipEnd.read(bytes, limits);
        List<ZipSlot> slots = new ZipDirectory(bytes, limits).slots(end);
        ZipTiling.check(bytes, slots, end.directory());
        ZipNames.check(slots);
        ZipSizes.check(slots, bytes.size(), limits);
        return slots;
    }

    private List<ZipSlot> slots(ZipEnd end) throws IOException {
        ByteBuffer directory = bytes.at(end.directory(), end.length());
        List<ZipSlot> slots = new ArrayList<>();
        while (directory.hasRemaining()) {
            if (directory.remaining() < Zip.CENTRAL_BYTES || directory.getInt() != Zip.CENTRAL
                    || slots.size() == limits.entries()) {
                throw new Refused(Defect.in("", "zip-directory-wrong"));
            }
            slots.add(slot(directory));
        }
        if (slots.size() != end.entries()) {
            throw new Refused(Defect.in("", "zip-directory-wrong"));
        }
        return slots;
    }

    /** The first field, the system that made the entry, says nothing about its content and is not judged. */
    private ZipSlot slot(ByteBuffer directory) throws IOException {
        directory.getShort();
        ZipHeader common = ZipHeader.read(directory);
        int nameLength = ZipBytes.u16(directory);
        int extraLength = ZipBytes.u16(directory);
        int commentLength = ZipBytes.u16(directory);
        int disk = ZipBytes.u16(directory);
        directory.getShort();
        int attributes = directory.getInt();
        long place = ZipBytes.u32(directory);
        if (nameLength == 0 || nameLength + extraLength + commentLength > directory.remaining()) {
            throw new Refused(Defect.in("", "zip-directory-wrong"));
        }
        ZipHeader central = common.named(ZipBytes.next(directory, nameLength));
        String name = name(central);
        String shown = EntryName.shown(name);
        ZipHeader.checkExtras(ByteBuffer.wrap(ZipBytes.next(directory, extraLength)).order(directory.order()), shown);
        if (commentLength != 0) {
            throw new Refused(Defect.in(shown, "zip-comment"));
        } else if (disk != 0) {
            throw new Refused(Defect.in(shown, "zip-feature-unknown", "disks"));
        }
        central.checkFeatures(shown);
        boolean folder = name.endsWith("/");
        checkKind(central, folder, attributes, shown);
        return placed(central, folder ? name.substring(0, name.length() - 1) : name, folder, place);
    }

    private static String name(ZipHeader central) {
        String latin = new String(central.rawName(), StandardCharsets.ISO_8859_1);
        boolean ascii = latin.chars().allMatch(character -> character < 0x80);
        String name = EntryName.decoded(central.rawName())
                .filter(text -> ascii || (central.flags() & Zip.FLAG_UTF8) != 0)
                .orElseThrow(() -> new Refused(Defect.in(EntryName.shown(latin), "name-not-utf8")));
        EntryName.safe(name.endsWith("/") && name.length() > 1 ? name.substring(0, name.length() - 1) : name);
        return name;
    }

    private static void checkKind(ZipHeader central, boolean folder, int attributes, String shown) {
        int type = attributes >>> 16 & UNIX_TYPE;
        if (type == UNIX_LINK) {
            throw new Refused(Defect.in(shown, "zip-link"));
        }
        boolean dosFolder = (attributes & DOS_FOLDER) != 0;
        boolean fits = folder ? type == 0 || type == UNIX_FOLDER : (type == 0 || type == UNIX_FILE) && !dosFolder;
        if (!fits || folder && (central.size() != 0 || central.packed() != 0 || central.crc() != 0)) {
            throw new Refused(Defect.in(shown, "zip-kind-wrong"));
        }
    }

    private ZipSlot placed(ZipHeader central, String name, boolean folder, long place) throws IOException {
        String shown = EntryName.shown(name);
        ByteBuffer header = bytes.at(place, Zip.LOCAL_BYTES);
        if (header.getInt() != Zip.LOCAL) {
            throw new Refused(Defect.in(shown, "zip-headers-differ", "place"));
        }
        ZipHeader common = ZipHeader.read(header);
        int nameLength = ZipBytes.u16(header);
        int extraLength = ZipBytes.u16(header);
        ByteBuffer rest = bytes.at(place + Zip.LOCAL_BYTES, nameLength + extraLength);
        central.checkLocal(common.named(ZipBytes.next(rest, nameLength)), shown);
        ZipHeader.checkExtras(rest, shown);
        long data = place + Zip.LOCAL_BYTES + nameLength + extraLength;
        long end = data + central.packed();
        return new ZipSlot(name, folder, central.method(), central.crc(), central.packed(), central.size(), place,
                data, central.hasDescriptor() ? end + descriptor(central, end, shown) : end);
    }

    /** The length of the data descriptor, which must repeat the central header; its signature is optional. */
    private int descriptor(ZipHeader central, long place, String shown) throws IOException {
        boolean signed = bytes.has(Zip.DESCRIPTOR, place);
        ByteBuffer descriptor = bytes.at(place + (signed ? 4 : 0), 12);
        if (ZipBytes.u32(descriptor) != central.crc() || ZipBytes.u32(descriptor) != central.packed()
                || ZipBytes.u32(descriptor) != central.size()) {
            throw new Refused(Defect.in(shown, "zip-headers-differ", "descriptor"));
        }
        return signed ? 16 : 12;
    }
}
