package bedmark.json;

import bedmark.document.Node;

/** One text for all documents that say the same: keys sorted, no spaces. Numbers stay as they were entered. */
public final class Canonical {
    private Canonical() {
    }

    public static byte[] bytes(Node node) {
        return JsonWriter.sorted(node);
    }
}
