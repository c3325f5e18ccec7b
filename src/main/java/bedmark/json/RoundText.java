package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.survey.Bundle;
import java.util.List;

/** Reads the text of an office's round file: strict JSON, the published schema, and all that a bundle's reader proves. */
public final class RoundText {

    /** The format's name. */
    public static final String FORMAT = "bedmark.round";
    /** The version that this program writes. */
    public static final int VERSION = 1;

    private RoundText() {
    }

    private static final class Compiled {
        private static final SchemaCheck SCHEMA = new SchemaCheck("round.schema.json");
    }

    /**
     * Reads a round file.
     *
     * @param bytes UTF-8
     * @throws Refused where it is none, of another version, or holds something impossible
     */
    public static Branch read(byte[] bytes) {
        return FormatCheck.read(bytes, FORMAT, VERSION, () -> Compiled.SCHEMA,
                round -> requireNotes(round, content(round)));
    }

    /** What the file holds as a bundle's reader proves it. */
    private static Bundle content(Branch root) {
        try {
            return BundleReader.read(JsonWriter.compact(Branch.EMPTY.with("format", Bundle.FORMAT)
                    .with("version", Node.number(Bundle.VERSION))
                    .with("plant", root.get("plant").orElseThrow()).with("forms", root.get("forms").orElseThrow())
                    .with("rounds", root.get("rounds").orElseThrow())
                    .with("surveys", new Node.Series(root.series("lastResults")))));
        } catch (Refused e) {
            // Its line and column are those of the text that was put together here.
            String where = e.defect().where().replaceFirst(" ?\\([0-9]+:[0-9]+\\)$", "")
                    .replaceFirst("^/surveys", "/lastResults");
            throw new Refused(new Defect(e.defect().code(), where, e.defect().details()), e);
        }
    }

    private static void requireNotes(Branch root, Bundle content) {
        List<Branch> notes = root.branches("notes");
        for (int i = 0; i < notes.size(); i++) {
            String transfer = notes.get(i).text("transfer").orElse("");
            if (content.register().transfer(transfer).isEmpty()) {
                throw new Refused(Defect.at(Pointer.of("notes").child(i).child("transfer"), "transfer-unknown",
                        transfer));
            }
        }
    }
}
