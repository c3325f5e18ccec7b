package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.io.IOException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/**
 * Everything in a pack, read once through our own view: the digests of all files, and the few files that are small
 * and needed whole.
 *
 * @param all   every entry in the file's order, folders too
 * @param files the files by their names in the bag, in the same order
 * @param kept  the bytes of bundle, manifests and the other known tag files
 */
record PackContent(List<PackEntry> all, Map<String, PackEntry> files, Map<String, byte[]> kept) {
    private static final Set<String> KNOWN_TAG_FILES = Set.of(Bag.DECLARATION, Bag.INFO, Bag.TAG_MANIFEST,
            Bag.SIGNATURE, Bag.KEY);

    /**
     * Reads all entries.
     *
     * @throws Refused {@code zip-…} where content and headers disagree
     */
    static PackContent read(ZipBytes bytes, List<ZipSlot> slots, BagShape shape, PackLimits limits, Work work)
            throws IOException {
        List<PackEntry> all = new ArrayList<>();
        Map<String, PackEntry> files = new LinkedHashMap<>();
        Map<String, byte[]> kept = new HashMap<>();
        for (ZipSlot slot : slots) {
            String name = shape.inBag(slot);
            Set<String> algorithms = new TreeSet<>(Bag.isPayload(name) ? shape.algorithms() : Set.of());
            algorithms.add(Sha256.BAG_NAME);
            try (DigestStream content = new DigestStream(new EntryStream(bytes, slot), algorithms, work)) {
                Optional<Defect> doubt = Optional.empty();
                if (isKept(slot, name, limits)) {
                    kept.put(name, whole(content, slot));
                } else if (!slot.folder()) {
                    doubt = PhotoHeader.doubt(EntryName.shown(name), content, limits)
                            .filter(defect -> Bag.isPhoto(name) || defect.code().equals("zip-nested-archive"));
                }
                PackEntry entry = new PackEntry(slot, name, content.finish(), doubt);
                all.add(entry);
                if (!slot.folder()) {
                    files.put(name, entry);
                }
            }
        }
        return new PackContent(all, files, kept);
    }

    /** As long as it is announced to be; the stream refuses whatever is shorter or longer. */
    private static byte[] whole(DigestStream content, ZipSlot slot) throws IOException {
        byte[] bytes = new byte[(int) slot.size()];
        content.readNBytes(bytes, 0, bytes.length);
        return bytes;
    }

    private static boolean isKept(ZipSlot slot, String name, PackLimits limits) {
        long limit = name.equals(Bag.BUNDLE) ? limits.bundleBytes() : limits.tagFileBytes();
        boolean kept = name.equals(Bag.BUNDLE) || KNOWN_TAG_FILES.contains(name) || Bag.isManifest(name);
        if (kept && slot.size() > limit) {
            throw new Refused(Defect.in(name, "zip-entry-too-large", Long.toString(limit)));
        }
        return kept;
    }
}
