package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** Proves that no two entries would be one file on any system, and that no file is also a folder. */
final class ZipNames {
    private ZipNames() {
    }

    static void check(List<ZipSlot> slots) {
        Map<String, ZipSlot> byFold = new HashMap<>();
        Set<String> files = new HashSet<>();
        for (ZipSlot slot : slots) {
            String fold = EntryName.folded(slot.name());
            ZipSlot earlier = byFold.put(fold, slot);
            if (earlier != null) {
                boolean same = earlier.name().equals(slot.name());
                throw new Refused(Defect.in(EntryName.shown(slot.name()), same ? "zip-name-twice" : "zip-name-clash",
                        EntryName.shown(earlier.name())));
            }
            if (!slot.folder()) {
                files.add(fold);
            }
        }
        for (String fold : byFold.keySet()) {
            for (int slash = fold.indexOf('/'); slash > 0; slash = fold.indexOf('/', slash + 1)) {
                if (files.contains(fold.substring(0, slash))) {
                    throw new Refused(Defect.in(EntryName.shown(byFold.get(fold).name()), "zip-name-clash",
                            EntryName.shown(byFold.get(fold.substring(0, slash)).name())));
                }
            }
        }
    }
}
