package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;

/** Keeps a bundle's text within what can be held in memory as a document. */
final class BundleText {
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
            if (character == ',' || character == '[' || character == '{') {
                values++;
            }
        }
        if (values > limits.bundleValues()) {
            throw new Refused(Defect.in(Bag.BUNDLE, "pack-bundle-too-full", Integer.toString(limits.bundleValues())));
        }
        return text;
    }
}
