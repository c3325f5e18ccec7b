package bedmark.picture;

import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/**
 * Draws the stations: a line up from the belt, a handle on the surface, the depth on a plate beside it. A plate goes to
 * the first place that covers no handle, no other plate and no words; where a crowd leaves none, the plate is left out
 * (the handle stays, and the table has the number).
 */
final class StationMarks {
    private static final double RADIUS = 2.3;
    private static final double ACTIVE_RADIUS = 3.1;
    private static final double LEAST_RADIUS = 1.2;
    /** Of a station that nobody pulls. */
    private static final double STILL_RADIUS = 0.7;
    private static final double PAD = 0.8;
    private static final double PLATE = 4.3;

    private final List<ZoneSketch.Station> stations;
    private final SideLayout layout;
    private final SideScale scale;
    private final Draft draft;

    StationMarks(List<ZoneSketch.Station> stations, SideLayout layout, Draft draft) {
        this.stations = stations;
        this.layout = layout;
        this.scale = layout.scale();
        this.draft = draft;
    }

    /** The one in hand first, then along the zone. */
    static Comparator<Integer> byImportance(List<ZoneSketch.Station> stations) {
        return Comparator.<Integer, Boolean>comparing(index -> !stations.get(index).active())
                .thenComparing(index -> stations.get(index).position());
    }

    void draw() {
        List<Integer> order = new ArrayList<>(visible());
        order.sort(byImportance(stations));
        order.forEach(index -> draft.take(Box.around(centre(index), 2 * radius(index), 2 * radius(index))));
        List<Placed> plates = order.stream().flatMap(index -> place(index).stream()).toList();
        Collections.reverse(order);
        order.forEach(this::stem);
        plates.stream().filter(plate -> plate.place().leader()).forEach(this::leader);
        order.forEach(this::handle);
        plates.forEach(this::plate);
    }

    List<Handle> handles() {
        double radius = draft.mm(Handle.RADIUS_MM);
        return visible().stream()
                .map(index -> new Handle(index, centre(index).x(), centre(index).y(), radius)).toList();
    }

    /** Those that lie in the zone. */
    private List<Integer> visible() {
        return IntStream.range(0, stations.size())
                .filter(index -> stations.get(index).position() <= scale.length()).boxed().toList();
    }

    private Point centre(int index) {
        ZoneSketch.Station station = stations.get(index);
        return scale.at(station.position(), station.depth().orElse(0));
    }

    private double radius(int index) {
        double apart = IntStream.range(0, stations.size()).filter(other -> other != index)
                .mapToDouble(other -> Math.abs(scale.x(stations.get(other).position()) - centre(index).x()))
                .min().orElse(Double.MAX_VALUE);
        double radius = draft.mm(draft.still() ? STILL_RADIUS : stations.get(index).active() ? ACTIVE_RADIUS : RADIUS);
        if (draft.still()) {
            return radius;
        }
        return Math.max(draft.mm(LEAST_RADIUS), Math.min(radius, 0.46 * apart));
    }

    private void stem(int index) {
        Point top = centre(index);
        draft.line(draft.pen(Ink.INK, stations.get(index).active() ? 0.42 : 0.17),
                new Point(top.x(), scale.plot().bottom()), top);
    }

    private void handle(int index) {
        boolean active = stations.get(index).active();
        boolean read = stations.get(index).depth().isPresent();
        Point centre = centre(index);
        double radius = radius(index);
        Pen edge = read || active ? draft.pen(Ink.INK, 0.34) : draft.dashes(Ink.SOFT, 0.25);
        draft.add(new Mark.Disc(centre, radius, Optional.of(active ? Ink.ACCENT : Ink.PAPER), Optional.of(edge)));
        if (draft.still()) {
            return;
        }
        Pen chevron = draft.pen(active ? Ink.GROUND : read ? Ink.INK : Ink.SOFT, 0.3);
        double wing = 0.3 * radius;
        double near = 0.22 * radius;
        draft.line(chevron, centre.plus(-wing, -near), centre.plus(0, -near - wing), centre.plus(wing, -near));
        draft.line(chevron, centre.plus(-wing, near), centre.plus(0, near + wing), centre.plus(wing, near));
    }

    /** Finds the place for a station's plate and keeps it. */
    private Optional<Placed> place(int index) {
        ZoneSketch.Station station = stations.get(index);
        if (station.depth().isEmpty() || station.depthLabel().isEmpty()) {
            return Optional.empty();
        }
        double width = draft.width(station.depthLabel(), style(index)) + 2 * draft.mm(PAD);
        double clearance = draft.mm(0.35);
        double top = layout.headerMiddle(draft) + draft.mm(Draft.ROW) / 2;
        Box bounds = new Box(layout.view().x(), top, layout.view().width(), scale.plot().bottom() - top);
        Optional<Place> found = places(index, width, draft.mm(PLATE)).filter(place -> bounds.holds(place.box()))
                .filter(place -> draft.isFree(place.box().grown(clearance))).findFirst();
        found.ifPresent(place -> draft.take(place.box()));
        return found.map(place -> new Placed(index, place));
    }

    private void leader(Placed plate) {
        Point centre = centre(plate.index());
        Box box = plate.place().box();
        draft.line(draft.pen(Ink.SOFT, 0.17), centre, new Point(box.centre().x(), box.bottom()));
    }

    private void plate(Placed plate) {
        Ink edge = stations.get(plate.index()).active() ? Ink.INK : Ink.LINE;
        draft.write(stations.get(plate.index()).depthLabel(), style(plate.index()), plate.place().box(), draft.mm(PAD),
                Optional.of(new Mark.Plate(Ink.PAPER, Optional.of(draft.pen(edge, 0.2)))));
    }

    private Draft.Style style(int index) {
        return stations.get(index).active() ? Draft.Style.NUMBER.bold() : Draft.Style.NUMBER;
    }

    private record Placed(int index, Place place) {
    }

    private record Place(Box box, boolean leader) {
    }

    /** Places for a plate, best first. */
    private Stream<Place> places(int index, double width, double height) {
        Point centre = centre(index);
        double gap = draft.mm(0.85);
        double beside = radius(index) + gap + width / 2;
        double above = radius(index) + gap + height / 2;
        double corner = 0.75 * radius(index);
        Point over = centre.plus(0, -above);
        Point right = centre.plus(beside, 0);
        Point left = centre.plus(-beside, 0);
        boolean active = stations.get(index).active();
        Stream<Point> near = Stream.of(active ? right : over, active ? left : right, active ? over : left,
                centre.plus(corner + width / 2, -corner - height / 2),
                centre.plus(-corner - width / 2, -corner - height / 2));
        Stream<Place> first = near.map(point -> new Place(Box.around(point, width, height), false));
        Stream<Place> raised = IntStream.rangeClosed(1, 8).boxed().flatMap(row -> Stream.of(0.0, 0.35, -0.35, 0.7, -0.7)
                .map(shift -> new Place(Box.around(over.plus(shift * width, -row * (height + gap)), width, height),
                        true)));
        Stream<Place> below = Stream.of(new Place(Box.around(centre.plus(0, above), width, height), false));
        return Stream.of(first, raised, below).flatMap(places -> places);
    }
}
