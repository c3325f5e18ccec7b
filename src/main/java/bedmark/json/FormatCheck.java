package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import java.math.BigDecimal;

/** Before anything else: another kind of file, or a later version, is not measured by this version's schema. */
final class FormatCheck {
    private FormatCheck() {
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
