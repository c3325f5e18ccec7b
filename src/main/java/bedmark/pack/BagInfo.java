package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.survey.Bundle;
import java.nio.charset.StandardCharsets;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.util.UUID;

/** What {@code bag-info.txt} says: reserved elements of RFC 8493, all taken from the bundle and none from a clock. */
final class BagInfo {
    private BagInfo() {
    }

    /**
     * @throws Refused {@code key-absent} where the bundle has no id or creation time
     */
    static byte[] write(Bundle bundle, long payloadBytes, long payloadFiles) {
        UUID id = bundle.document().uuid("id").orElseThrow(() -> absent("id"));
        LocalDate day = bundle.document().time("createdAt").map(OffsetDateTime::toLocalDate)
                .orElseThrow(() -> absent("createdAt"));
        String text = "Bag-Software-Agent: Bedmark\n"
                + "Bagging-Date: " + day + "\n"
                + "External-Identifier: " + id + "\n"
                + oxum(payloadBytes, payloadFiles) + "\n";
        return text.getBytes(StandardCharsets.UTF_8);
    }

    static String oxum(long bytes, long files) {
        return "Payload-Oxum: " + bytes + "." + files;
    }

    private static Refused absent(String key) {
        return new Refused(Defect.at(Pointer.of(key), "key-absent", key));
    }
}
