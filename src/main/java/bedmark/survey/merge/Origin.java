package bedmark.survey.merge;

import java.util.Comparator;
import java.util.Objects;

/**
 * The bundle that a survey first left its tablet in, which says by which register it was made.
 *
 * @param createdAt when the bundle was made, by the tablet's own clock (ms since 1970)
 * @param register  digest of the plant's register in it
 * @param conveyor  the conveyor that the register has the zone on
 */
public record Origin(long createdAt, String register, String conveyor) implements Comparable<Origin> {
    private static final Comparator<Origin> ORDER = Comparator.comparingLong(Origin::createdAt)
            .thenComparing(Origin::register).thenComparing(Origin::conveyor);

    public Origin {
        Objects.requireNonNull(register);
        Objects.requireNonNull(conveyor);
    }

    /** The earlier of the two: a survey that is sent again brings a newer register along, which it was not made with. */
    public Origin or(Origin other) {
        return compareTo(other) <= 0 ? this : other;
    }

    @Override
    public int compareTo(Origin other) {
        return ORDER.compare(this, other);
    }
}
