package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;

/**
 * Where the bag lies in an archive, and that all its necessary files are there; judged by names alone.
 *
 * @param base       what stands before every name: nothing, or one folder with its slash
 * @param algorithms of the payload manifests, as in their names; SHA-256 is among them
 */
record BagShape(String base, Set<String> algorithms) {
    private static final Set<String> WEAK = Set.of("md5", "sha1");

    /**
     * @throws Refused {@code bag-fetch}, {@code bag-digest-unknown}, {@code bag-digest-weak},
     *                 {@code bag-file-missing}, {@code bag-file-unlisted}, {@code pack-unsigned}
     */
    static BagShape of(List<ZipSlot> slots) {
        String base = base(slots);
        Set<String> names = new HashSet<>();
        Set<String> algorithms = new TreeSet<>();
        for (ZipSlot slot : slots) {
            if (!slot.folder()) {
                String name = slot.name().substring(base.length());
                names.add(name);
                if (Bag.isManifest(name)) {
                    algorithms.add(algorithm(name));
                }
            }
        }
        checkFiles(names, algorithms);
        checkFolders(slots);
        return new BagShape(base, algorithms);
    }

    /** The name within the bag. */
    String inBag(ZipSlot slot) {
        return slot.folder() ? slot.name() : slot.name().substring(base.length());
    }

    /** A bag lies at the top or in one folder that holds everything; {@code bagit.txt} shows where. */
    private static String base(List<ZipSlot> slots) {
        return slots.stream().filter(slot -> !slot.folder()).findFirst().map(ZipSlot::name)
                .filter(first -> first.indexOf('/') > 0)
                .map(first -> first.substring(0, first.indexOf('/') + 1))
                .filter(folder -> slots.stream().anyMatch(slot -> slot.name().equals(folder + Bag.DECLARATION)))
                .filter(folder -> slots.stream().allMatch(slot -> slot.rawName().startsWith(folder)))
                .orElse("");
    }

    private static String algorithm(String name) {
        String algorithm = name.substring(Bag.MANIFEST_START.length(), name.length() - Bag.TEXT.length());
        if (!DigestStream.ALGORITHMS.containsKey(algorithm)) {
            throw new Refused(Defect.in(EntryName.shown(name), "bag-digest-unknown"));
        }
        return algorithm;
    }

    private static void checkFiles(Set<String> names, Set<String> algorithms) {
        if (names.contains(Bag.FETCH)) {
            throw new Refused(Defect.in(Bag.FETCH, "bag-fetch"));
        }
        if (!algorithms.isEmpty() && WEAK.containsAll(algorithms)) {
            String weak = Bag.MANIFEST_START + algorithms.iterator().next() + Bag.TEXT;
            throw new Refused(Defect.in(weak, "bag-digest-weak"));
        }
        for (String needed : List.of(Bag.DECLARATION, Bag.INFO, Bag.MANIFEST, Bag.TAG_MANIFEST, Bag.BUNDLE)) {
            if (!names.contains(needed)) {
                throw new Refused(Defect.in(needed, "bag-file-missing"));
            }
        }
        for (String needed : List.of(Bag.SIGNATURE, Bag.KEY)) {
            if (!names.contains(needed)) {
                throw new Refused(Defect.in(needed, "pack-unsigned"));
            }
        }
    }

    /** A bag lists files only; a folder entry is let in where it merely announces the folder of a file. */
    private static void checkFolders(List<ZipSlot> slots) {
        Set<String> needed = new HashSet<>();
        for (ZipSlot slot : slots) {
            for (int i = slot.folder() ? -1 : slot.name().indexOf('/'); i > 0; i = slot.name().indexOf('/', i + 1)) {
                needed.add(slot.name().substring(0, i));
            }
        }
        for (ZipSlot slot : slots) {
            if (slot.folder() && !needed.contains(slot.name())) {
                throw new Refused(Defect.in(EntryName.shown(slot.name()), "bag-file-unlisted"));
            }
        }
    }
}
