package bedmark.picture;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.stream.IntStream;

/**
 * What is known of a loading zone, for its picture. SI throughout; everything may be unknown, and a number that no zone
 * can have (not finite, or not positive where it must be) is drawn as unknown.
 *
 * @param boards   the skirtboards
 * @param belt     the belt and its trough
 * @param stations where depths were read, in any order; the index of a handle is the index in this list
 * @param limit    the depth that is allowed
 * @param seals    the seals of both sides
 * @param feedEnd  where the material comes on
 * @param captions the words and the formatted numbers
 * @param asIf     the bed as it would lie under other conditions, drawn over the one that does
 */
public record ZoneSketch(Boards boards, Belt belt, List<Station> stations, Optional<Limit> limit, Seals seals,
                         FeedEnd feedEnd, Captions captions, Optional<BedCurve> asIf) {

    /** A zone as it is. */
    public ZoneSketch(Boards boards, Belt belt, List<Station> stations, Optional<Limit> limit, Seals seals,
                      FeedEnd feedEnd, Captions captions) {
        this(boards, belt, stations, limit, seals, feedEnd, captions, Optional.empty());
    }

    /** The same zone, over it the bed that it would have at another belt speed, in words beside the arrow. */
    public ZoneSketch asIf(BedCurve bed, String speed) {
        return new ZoneSketch(boards, belt, stations, limit, seals, feedEnd, captions.withBeltSpeed(speed),
                Optional.of(bed));
    }

    /**
     * The skirtboards.
     *
     * @param length     of the zone, one side (m), positive
     * @param height     above the belt at the board (m), positive
     * @param clearWidth between the boards (m), positive
     */
    public record Boards(OptionalDouble length, OptionalDouble height, OptionalDouble clearWidth) {
        public Boards {
            length = positive(length);
            height = positive(height);
            clearWidth = positive(clearWidth);
        }
    }

    /**
     * The belt.
     *
     * @param width            (m), positive
     * @param troughAngle      of the wings (rad), 0 for a flat belt, under π/2
     * @param centreRollLength (m), positive; not needed on a flat belt
     * @param surchargeAngle   of the material on it (rad), 0 to under π/2
     * @param speed            (m/s), not negative
     */
    public record Belt(OptionalDouble width, OptionalDouble troughAngle, OptionalDouble centreRollLength,
                       OptionalDouble surchargeAngle, OptionalDouble speed) {
        public Belt {
            width = positive(width);
            troughAngle = between(troughAngle, Math.PI / 2);
            centreRollLength = positive(centreRollLength);
            surchargeAngle = between(surchargeAngle, Math.PI / 2);
            speed = between(speed, Double.POSITIVE_INFINITY);
        }
    }

    /**
     * A place along the zone where the depth is read.
     *
     * @param position      from the start of the zone (m), not negative
     * @param depth         in contact with the board (m), not negative; empty while it has not been read
     * @param positionLabel the position in words
     * @param depthLabel    the depth in words
     * @param active        whether the person has this station in hand
     */
    public record Station(double position, OptionalDouble depth, String positionLabel, String depthLabel,
                          boolean active) {
        public Station {
            if (!(position >= 0 && position < Double.POSITIVE_INFINITY)) {
                throw new IllegalArgumentException("a station lies in the zone");
            }
            depth = between(depth, Double.POSITIVE_INFINITY);
            Objects.requireNonNull(positionLabel);
            Objects.requireNonNull(depthLabel);
        }
    }

    /**
     * The allowed depth.
     *
     * @param depth (m), not negative
     * @param rule  code of the rule that it comes from, for who words the caption
     */
    public record Limit(double depth, String rule) {
        public Limit {
            if (!(depth >= 0 && depth < Double.POSITIVE_INFINITY)) {
                throw new IllegalArgumentException("an allowed depth is a number");
            }
            Objects.requireNonNull(rule);
        }
    }

    /** The segments of either side, from the start of the zone on; left and right as seen along the belt's travel. */
    public record Seals(List<SealSpan> left, List<SealSpan> right) {
        public static final Seals NONE_READ = new Seals(List.of(), List.of());

        public Seals {
            left = List.copyOf(left);
            right = List.copyOf(right);
        }
    }

    /**
     * A stretch of one kind of seal.
     *
     * @param length along the belt (m)
     */
    public record SealSpan(SealShape shape, SealState state, double length) {
        public SealSpan {
            Objects.requireNonNull(shape);
            Objects.requireNonNull(state);
        }
    }

    public ZoneSketch {
        Objects.requireNonNull(boards);
        Objects.requireNonNull(belt);
        stations = List.copyOf(stations);
        Objects.requireNonNull(limit);
        Objects.requireNonNull(seals);
        Objects.requireNonNull(feedEnd);
        Objects.requireNonNull(captions);
        Objects.requireNonNull(asIf);
    }

    /** The station whose cross-section is shown: the active one, else the deepest, else none. */
    public static OptionalInt shown(List<Station> stations) {
        OptionalInt active = IntStream.range(0, stations.size()).filter(i -> stations.get(i).active()).findFirst();
        return active.isPresent() ? active : IntStream.range(0, stations.size())
                .filter(i -> stations.get(i).depth().isPresent())
                .reduce((a, b) ->
                        stations.get(b).depth().getAsDouble() > stations.get(a).depth().getAsDouble() ? b : a);
    }

    private static OptionalDouble positive(OptionalDouble number) {
        return number.isPresent() && number.getAsDouble() > 0 ? between(number, Double.POSITIVE_INFINITY)
                : OptionalDouble.empty();
    }

    private static OptionalDouble between(OptionalDouble number, double end) {
        return number.isPresent() && number.getAsDouble() >= 0 && number.getAsDouble() < end ? number
                : OptionalDouble.empty();
    }
}
