package bedmark.picture;

import bedmark.picture.ZoneSketch.Belt;
import bedmark.picture.ZoneSketch.Boards;
import bedmark.picture.ZoneSketch.Limit;
import bedmark.picture.ZoneSketch.SealSpan;
import bedmark.picture.ZoneSketch.Seals;
import bedmark.picture.ZoneSketch.Station;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.stream.IntStream;

/** Invented zones for tests. */
public final class Sketches {
    public static final Belt TROUGHED = new Belt(some(1.2), some(Math.toRadians(35)), some(0.45),
            some(Math.toRadians(20)), some(1.65));
    public static final Belt FLAT = new Belt(some(1.0), some(0), OptionalDouble.empty(), some(Math.toRadians(15)),
            some(0.3));
    public static final Seals WORN = new Seals(List.of(new SealSpan(SealShape.VERTICAL, SealState.WORN, 6.4)),
            List.of(new SealSpan(SealShape.OBLIQUE, SealState.TORN, 6.4)));

    private Sketches() {
    }

    public static OptionalDouble some(double number) {
        return OptionalDouble.of(number);
    }

    public static Captions captions() {
        return new Captions("feed", "belt 1.65 m/s", "350", "board top", "6.40 m", "150", "allowed",
                times -> "heights × " + (times == Math.rint(times) ? String.valueOf((int) times) : times),
                Optional.of("no depth yet: press here, or type one"), "780", "at 4.0 m", "seals worn, both sides");
    }

    public static Captions missing() {
        return new Captions("feed", "belt speed?", "", "board height?", "zone length?", "", "", times -> "",
                Optional.of("zone length and board height first"), "board spacing?", "cross-section",
                "trough and seals not read");
    }

    public static Station station(double position, double depth, boolean active) {
        return new Station(position, some(depth), String.format(Locale.ROOT, "%.1f m", position),
                String.valueOf(Math.round(depth * 1000)), active);
    }

    public static ZoneSketch of(List<Station> stations, double length, double height, double allowed) {
        return new ZoneSketch(new Boards(some(length), some(height), some(0.78)), TROUGHED, stations,
                Optional.of(new Limit(allowed, "bed-over-design")), WORN, FeedEnd.LEFT, captions());
    }

    /** The zone of the concept pages. */
    public static ZoneSketch gravel() {
        return of(List.of(station(0.8, 0.128, false), station(2.2, 0.205, false), station(4.0, 0.262, true),
                station(5.6, 0.238, false)), 6.4, 0.35, 0.15);
    }

    public static ZoneSketch nothingKnown() {
        OptionalDouble none = OptionalDouble.empty();
        return new ZoneSketch(new Boards(none, none, none), new Belt(none, none, none, none, none), List.of(),
                Optional.empty(), Seals.NONE_READ, FeedEnd.LEFT, missing());
    }

    public static ZoneSketch without(ZoneSketch sketch, Boards boards, Belt belt) {
        return new ZoneSketch(boards, belt, sketch.stations(), sketch.limit(), sketch.seals(), sketch.feedEnd(),
                sketch.captions());
    }

    /** A seeded zone with so many stations. */
    public static ZoneSketch random(long seed, int count) {
        Random random = new Random(seed);
        double length = 2 + 10 * random.nextDouble();
        double height = 0.2 + 0.6 * random.nextDouble();
        List<Station> stations = IntStream.range(0, count).mapToObj(i -> station(
                length * (i + random.nextDouble()) / count, 1.2 * height * random.nextDouble(), i == count / 2))
                .toList();
        return of(stations, length, height, height * random.nextDouble());
    }
}
