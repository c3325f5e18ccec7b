package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import java.math.BigDecimal;
import java.util.function.Consumer;
import java.util.function.Supplier;

/** Before anything else: another kind of file, or a later version, is not measured by this version's schema. */
final class FormatCheck {
    private FormatCheck() {
    }

    /**
     * Reads a text of one format and version: strict JSON, the published schema, and what is asked beyond that.
     *
     * @param bytes   UTF-8
     * @param schema  compiled when it is first needed
     * @param further refuses what no schema can say
     * @throws Refused where it is none, of another version, or holds something impossible; placed in the text
     */
    static Branch read(byte[] bytes, String format, int version, Supplier<SchemaCheck> schema,
                       Consumer<Branch> further) {
        Document document = JsonReader.read(bytes);
        try {
            require(document.root(), format, version);
            schema.get().check(document).stream().findFirst().ifPresent(defect -> {
                throw new Refused(defect);
            });
            further.accept(document.root());
            return document.root();
        } catch (Refused e) {
            throw new Refused(document.placed(e.defect()), e);
        }
    }

    /** @throws Refused {@code key-absent}, {@code format-unknown}, {@code version-unknown} */
    static void require(Branch root, String wanted, int known) {
        String format = root.text("format").orElseThrow(() ->
                new Refused(Defect.at(Pointer.ROOT, "key-absent", "format")));
        if (!wanted.equals(format)) {
            throw new Refused(Defect.at(Pointer.of("format"), "format-unknown", format, wanted));
        }
        BigDecimal version = root.number("version").orElseThrow(() ->
                new Refused(Defect.at(Pointer.ROOT, "key-absent", "version")));
        if (version.compareTo(BigDecimal.valueOf(known)) != 0) {
            throw new Refused(Defect.at(Pointer.of("version"), "version-unknown", version.toPlainString(),
                    Integer.toString(known)));
        }
    }
}
