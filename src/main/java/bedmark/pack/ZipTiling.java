package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.util.Comparator;
import java.util.List;

/**
 * Proves that entries fill a file without gap or overlap. Bytes that belong to no entry are where a second archive
 * hides that another program would read instead.
 */
final class ZipTiling {
    private ZipTiling() {
    }

    static void check(ZipBytes bytes, List<ZipSlot> slots, long directory) throws IOException {
        List<ZipSlot> placed = slots.stream().sorted(Comparator.comparingLong(ZipSlot::header)).toList();
        long here = 0;
        for (ZipSlot slot : placed) {
            if (slot.header() > here) {
                throw new Refused(Defect.in("", here > 0 ? "zip-gap"
                        : bytes.has(Zip.LOCAL, 0) ? "zip-two-archives" : "zip-junk-before"));
            } else if (slot.header() < here) {
                throw new Refused(Defect.in(EntryName.shown(slot.name()), "zip-overlap"));
            }
            here = slot.end();
        }
        if (here != directory) {
            throw new Refused(Defect.in("", here < directory ? "zip-gap" : "zip-overlap"));
        }
        if (!placed.equals(slots)) {
            throw new Refused(Defect.in("", "zip-headers-differ", "order"));
        }
    }
}
