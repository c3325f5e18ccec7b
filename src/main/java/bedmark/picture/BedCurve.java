package bedmark.picture;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * The bed's surface along the zone: linear between stations, constant before the first and after the last. Points are
 * (position, depth) in metres, from 0 to the end of the zone.
 */
public record BedCurve(List<Knot> knots) {

    /** A point of the surface: position along the zone (m), depth at the board (m). */
    public record Knot(double position, double depth) {
    }

    public BedCurve {
        knots = List.copyOf(knots);
        if (knots.size() < 2) {
            throw new IllegalArgumentException("a surface has two ends");
        }
    }

    /**
     * The surface through the stations that have a depth and lie in the zone; nothing where there is none.
     *
     * @param length of the zone (m), positive
     */
    public static Optional<BedCurve> through(List<ZoneSketch.Station> stations, double length) {
        List<Knot> read = stations.stream()
                .filter(station -> station.depth().isPresent() && station.position() <= length)
                .map(station -> new Knot(station.position(), station.depth().getAsDouble()))
                .sorted(Comparator.comparingDouble(Knot::position)).toList();
        if (read.isEmpty()) {
            return Optional.empty();
        }
        List<Knot> knots = new ArrayList<>();
        if (read.get(0).position() > 0) {
            knots.add(new Knot(0, read.get(0).depth()));
        }
        knots.addAll(read);
        Knot last = read.get(read.size() - 1);
        if (last.position() < length || knots.size() < 2) {
            knots.add(new Knot(length, last.depth()));
        }
        return Optional.of(new BedCurve(knots));
    }

    /** The depth (m) at a position (m) of the zone. */
    public double depthAt(double position) {
        Knot before = knots.get(0);
        for (Knot knot : knots) {
            if (knot.position() >= position) {
                double apart = knot.position() - before.position();
                double share = apart > 0 ? (position - before.position()) / apart : 0;
                return before.depth() + share * (knot.depth() - before.depth());
            }
            before = knot;
        }
        return before.depth();
    }

    /** The greatest depth (m). */
    public double deepest() {
        return knots.stream().mapToDouble(Knot::depth).max().orElseThrow();
    }

    /** The surface cut off at a depth: the upper edge of what lies within the limit. */
    public BedCurve under(double limit) {
        return new BedCurve(crossed(limit).stream()
                .map(knot -> new Knot(knot.position(), Math.min(knot.depth(), limit))).toList());
    }

    /**
     * The parts of the surface that rise over a depth, each from the point where it crosses the limit to the point
     * where it comes back (or to an end of the zone).
     */
    public List<BedCurve> over(double limit) {
        List<BedCurve> parts = new ArrayList<>();
        List<Knot> part = new ArrayList<>();
        for (Knot knot : crossed(limit)) {
            if (knot.depth() >= limit) {
                part.add(knot);
            }
            if (knot.depth() <= limit) {
                close(part, limit, parts);
                if (knot.depth() == limit) {
                    part.add(knot);
                }
            }
        }
        close(part, limit, parts);
        return parts;
    }

    private static void close(List<Knot> part, double limit, List<BedCurve> parts) {
        if (part.stream().anyMatch(knot -> knot.depth() > limit)) {
            parts.add(new BedCurve(part));
        }
        part.clear();
    }

    /** The same surface with a knot wherever it crosses the limit. */
    private List<Knot> crossed(double limit) {
        List<Knot> all = new ArrayList<>();
        for (int i = 0; i < knots.size(); i++) {
            Knot next = knots.get(i);
            if (i > 0) {
                Knot before = knots.get(i - 1);
                if ((before.depth() - limit) * (next.depth() - limit) < 0) {
                    double share = (limit - before.depth()) / (next.depth() - before.depth());
                    all.add(new Knot(before.position() + share * (next.position() - before.position()), limit));
                }
            }
            all.add(next);
        }
        return all;
    }
}
