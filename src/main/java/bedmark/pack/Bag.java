package bedmark.pack;

import java.util.Set;

/** Names of the files in a pack's bag (RFC 8493), and what the signature covers. */
final class Bag {
    static final String DECLARATION = "bagit.txt";
    static final String INFO = "bag-info.txt";
    static final String MANIFEST = "manifest-sha256.txt";
    static final String TAG_MANIFEST = "tagmanifest-sha256.txt";
    static final String SIGNATURE = "signature-ed25519.txt";
    static final String KEY = "device-key.txt";
    static final String FETCH = "fetch.txt";

    static final String PAYLOAD = "data/";
    static final String BUNDLE = PAYLOAD + "bundle.json";
    static final String PHOTOS = PAYLOAD + "photos/";

    static final String DECLARATION_TEXT = "BagIt-Version: 1.0\nTag-File-Character-Encoding: UTF-8\n";

    static final String MANIFEST_START = "manifest-";
    static final String TEXT = ".txt";

    /** The tag manifest can't list itself; signature and key lie beside it, since the signature is over it. */
    static final Set<String> BESIDE = Set.of(TAG_MANIFEST, SIGNATURE, KEY);

    private Bag() {
    }

    static boolean isManifest(String name) {
        return name.startsWith(MANIFEST_START) && name.endsWith(TEXT);
    }

    static boolean isPayload(String name) {
        return name.startsWith(PAYLOAD);
    }

    static boolean isPhoto(String name) {
        return name.startsWith(PHOTOS);
    }
}
