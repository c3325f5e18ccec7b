package bedmark.survey;

import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import java.time.OffsetDateTime;
import java.util.Comparator;
import java.util.UUID;

/**
 * The bundle that something came in.
 *
 * @param bundle    the bundle's id
 * @param createdAt by the clock of the tablet that made it, which may be wrong
 * @param device    the fingerprint of the key that signed it; empty where nobody signed
 * @param plant     identity of the register that its surveys were made with
 */
public record Origin(UUID bundle, OffsetDateTime createdAt, String device, String plant)
        implements Comparable<Origin> {
    private static final Comparator<Origin> ORDER = Comparator.comparing((Origin one) -> one.createdAt.toInstant())
            .thenComparing(Origin::bundle).thenComparing(Origin::device).thenComparing(Origin::plant)
            .thenComparing(one -> one.createdAt.getOffset());

    /** @throws Refused {@code key-absent} where the bundle has no id or time */
    static Origin of(Bundle bundle, String device) {
        return new Origin(bundle.document().uuid("id").orElseThrow(() -> absent("id")),
                bundle.document().time("createdAt").orElseThrow(() -> absent("createdAt")), device,
                Identity.of(bundle.register().document()));
    }

    private static Refused absent(String key) {
        return new Refused(Defect.at(Pointer.of(key), "key-absent", key));
    }

    /** Older ones first; at the same time by what else tells them apart, so that every order is the same order. */
    @Override
    public int compareTo(Origin other) {
        return ORDER.compare(this, other);
    }
}
