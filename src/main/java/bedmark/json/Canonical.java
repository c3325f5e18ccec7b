package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Node;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.TreeMap;

/** One text for all documents that say the same: keys sorted, no spaces. Numbers stay as they were entered. */
public final class Canonical {
    private Canonical() {
    }

    public static byte[] bytes(Node node) {
        return JsonWriter.compact(sorted(node));
    }

    private static Node sorted(Node node) {
        if (node instanceof Branch branch) {
            Map<String, Node> members = new LinkedHashMap<>();
            new TreeMap<>(branch.members()).forEach((key, value) -> members.put(key, sorted(value)));
            return new Branch(members);
        }
        return node instanceof Node.Series series
                ? new Node.Series(series.items().stream().map(Canonical::sorted).toList()) : node;
    }
}
