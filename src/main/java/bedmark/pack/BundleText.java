package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;

/** Keeps a bundle's text within what can be held in memory as a document. */
final class BundleText {
    /** For each byte, how many values it lets a text have more at most. */
    private static final byte[] MORE = new byte[256];

    static {
        MORE[','] = 1;
        MORE['['] = 1;
        MORE['{'] = 1;
    }

    private BundleText() {
    }

    /**
     * A list or object that is not empty holds one value more than it has commas, so that commas and opening
     * brackets together bound the values from above, wherever they stand.
     *
     * @throws Refused {@code pack-bundle-too-large}, {@code pack-bundle-too-full}
     */
    static byte[] bounded(byte[] text, PackLimits limits) {
        if (text.length > limits.bundleBytes()) {
            throw new Refused(Defect.in(Bag.BUNDLE, "pack-bundle-too-large", Long.toString(limits.bundleBytes())));
        }
        int values = 1;
        for (byte character : text) {
            values += MORE[Byte.toUnsignedInt(character)];
        }
        if (values > limits.bundleValues()) {
            throw new Refused(Defect.in(Bag.BUNDLE, "pack-bundle-too-full", Integer.toString(limits.bundleValues())));
        }
        return text;
    }
}
