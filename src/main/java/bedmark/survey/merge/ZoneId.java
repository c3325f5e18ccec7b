package bedmark.survey.merge;

import bedmark.document.Pointer;
import java.util.Comparator;
import java.util.List;
import java.util.Objects;

/**
 * One loading zone of one plant.
 *
 * @param plant    the plant's id; empty where its register names none
 * @param transfer the transfer point's id in that register
 */
public record ZoneId(String plant, String transfer) implements Comparable<ZoneId> {
    private static final Comparator<ZoneId> ORDER =
            Comparator.comparing(ZoneId::plant).thenComparing(ZoneId::transfer);

    public ZoneId {
        Objects.requireNonNull(plant);
        Objects.requireNonNull(transfer);
    }

    /** One text for both, which no other zone has. */
    public String key() {
        return Pointer.of(plant, transfer).toString();
    }

    /** The zone of a {@link #key()}. */
    public static ZoneId ofKey(String key) {
        List<String> tokens = Pointer.parse(key).tokens();
        if (tokens.size() != 2) {
            throw new IllegalArgumentException("no zone: " + key);
        }
        return new ZoneId(tokens.get(0), tokens.get(1));
    }

    @Override
    public int compareTo(ZoneId other) {
        return ORDER.compare(this, other);
    }
}
