package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.util.List;

/** Proves that the announced sizes are within the limits, before a byte is unpacked. */
final class ZipSizes {
    private ZipSizes() {
    }

    static void check(List<ZipSlot> slots, long fileSize, PackLimits limits) {
        long total = 0;
        for (ZipSlot slot : slots) {
            if (slot.size() > limits.entryBytes()) {
                throw new Refused(Defect.in(EntryName.shown(slot.name()), "zip-entry-too-large",
                        Long.toString(limits.entryBytes())));
            }
            checkRatio(slot.size(), slot.packed(), limits, EntryName.shown(slot.name()));
            total += slot.size();
        }
        if (total > limits.totalBytes()) {
            throw new Refused(Defect.in("", "zip-total-too-large", Long.toString(limits.totalBytes())));
        }
        checkRatio(total, fileSize, limits, "");
    }

    private static void checkRatio(long size, long packed, PackLimits limits, String shown) {
        if (size > PackLimits.RATIO_FLOOR && size / limits.ratio() > packed) {
            throw new Refused(Defect.in(shown, "zip-ratio-too-high", Integer.toString(limits.ratio())));
        }
    }
}
