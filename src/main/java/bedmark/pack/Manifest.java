package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import java.nio.charset.StandardCharsets;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.SortedMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A manifest of a bag: digests by path. Packs hold no name that a manifest would have to write otherwise, so that
 * {@code sha256sum -c} reads the same lines.
 *
 * @param digests lower-case hexadecimal, by path, in the order of the lines
 */
record Manifest(Map<String, String> digests) {
    private static final Pattern LINE = Pattern.compile("([0-9A-Fa-f]+)[ \\t]+(\\S.*)");

    /**
     * Reads a manifest.
     *
     * @param name      the manifest's own name, for refusals
     * @param hexDigits the length of its digests
     * @param ofPayload whether it lists payload, or tag files
     * @param longest   lines allowed
     * @throws Refused {@code bag-manifest-line}, {@code bag-manifest-twice}, {@code bag-path-outside}
     */
    static Manifest read(byte[] bytes, String name, int hexDigits, boolean ofPayload, int longest) {
        Map<String, String> digests = new LinkedHashMap<>();
        Iterator<String> lines = EntryName.decoded(bytes)
                .orElseThrow(() -> new Refused(Defect.in(name, "name-not-utf8"))).lines().iterator();
        while (lines.hasNext()) {
            Matcher line = LINE.matcher(lines.next());
            if (!line.matches() || line.group(1).length() != hexDigits || digests.size() == longest) {
                throw new Refused(Defect.in(name, "bag-manifest-line", Integer.toString(digests.size() + 1)));
            }
            String path = line.group(2);
            if (EntryName.hazard(path).isPresent() || Bag.isPayload(path) != ofPayload) {
                throw new Refused(Defect.in(name, "bag-path-outside", EntryName.shown(path)));
            }
            if (digests.put(path, line.group(1).toLowerCase(Locale.ROOT)) != null) {
                throw new Refused(Defect.in(name, "bag-manifest-twice", EntryName.shown(path)));
            }
        }
        return new Manifest(digests);
    }

    /** The lines of a manifest in the order of the paths. */
    static byte[] write(SortedMap<String, String> digests) {
        StringBuilder text = new StringBuilder();
        digests.forEach((path, digest) -> text.append(digest).append("  ").append(path).append('\n'));
        return text.toString().getBytes(StandardCharsets.UTF_8);
    }
}
