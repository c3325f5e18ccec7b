package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.json.JsonScan;

/** Keeps a bundle's text within what can be held in memory as a document. */
final class BundleText {
    private BundleText() {
    }

    /**
     * The text, where it keeps within the limits.
     *
     * @throws Refused {@code pack-bundle-too-large}, {@code pack-bundle-too-full}
     */
    static byte[] bounded(byte[] text, PackLimits limits) {
        if (text.length > limits.bundleBytes()) {
            throw new Refused(Defect.in(Bag.BUNDLE, "pack-bundle-too-large", Long.toString(limits.bundleBytes())));
        }
        if (JsonScan.mostValues(text) > limits.bundleValues()) {
            throw new Refused(Defect.in(Bag.BUNDLE, "pack-bundle-too-full", Integer.toString(limits.bundleValues())));
        }
        return text;
    }
}
