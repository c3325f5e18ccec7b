package bedmark.pack;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.json.JsonWriter;
import bedmark.survey.Survey;
import java.util.Map;
import java.util.TreeMap;

/** What makes two surveys the same: everything that people entered, wherever the keys stand in the file. */
public final class SurveyContent {
    private SurveyContent() {
    }

    /**
     * The digest of a survey's content: SHA-256 over its JSON without {@code assessment} (which anyone computes anew
     * from the readings), without spaces, keys sorted by their UTF-16 units at every depth, numbers as they were
     * entered with their trailing zeros, UTF-8.
     *
     * @return 64 lower-case hexadecimal digits
     */
    public static String sha256(Survey survey) {
        return Sha256.hex(JsonWriter.compact(sorted(survey.document().without("assessment"))));
    }

    private static Node sorted(Node node) {
        if (node instanceof Branch branch) {
            Branch sorted = Branch.EMPTY;
            for (Map.Entry<String, Node> member : new TreeMap<>(branch.members()).entrySet()) {
                sorted = sorted.with(member.getKey(), sorted(member.getValue()));
            }
            return sorted;
        }
        return node instanceof Node.Series series
                ? new Node.Series(series.items().stream().map(SurveyContent::sorted).toList()) : node;
    }
}
