package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Refused;

/** Reads the text of an office's receipt: strict JSON, the published schema. What it proves is another question. */
public final class ReceiptText {

    /** The format's name. */
    public static final String FORMAT = "bedmark.receipt";
    /** The version that this program writes. */
    public static final int VERSION = 1;

    private ReceiptText() {
    }

    private static final class Compiled {
        private static final SchemaCheck SCHEMA = new SchemaCheck("receipt.schema.json");
    }

    /**
     * Reads a receipt.
     *
     * @param bytes UTF-8
     * @throws Refused where it is none, of another version, or holds something impossible
     */
    public static Branch read(byte[] bytes) {
        return FormatCheck.read(bytes, FORMAT, VERSION, () -> Compiled.SCHEMA, receipt -> { });
    }
}
