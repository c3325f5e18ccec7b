package bedmark.wording;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.engine.Assessment;
import bedmark.engine.Datum;
import bedmark.engine.LoadingZone;
import bedmark.engine.Result;
import bedmark.engine.bed.DepthPoint;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.verdict.AllowedDepth;
import bedmark.picture.Captions;
import bedmark.picture.FeedEnd;
import bedmark.picture.SealShape;
import bedmark.picture.SealState;
import bedmark.picture.ZoneSketch;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.survey.Assessor;
import bedmark.survey.Survey;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/** Draws up what is known of a survey for its zone picture: numbers as the engine sees them, words as people do. */
public final class ZoneSketcher {
    private final Assessor assessor;
    private final Wording wording;

    public ZoneSketcher(Assessor assessor, Wording wording) {
        this.assessor = assessor;
        this.wording = wording;
    }

    /**
     * The sketch of a survey.
     *
     * @param active the line of the table of depths that the person has in hand
     */
    public ZoneSketch sketch(Branch document, Optional<Assessment> assessment, Optional<Integer> active) {
        return sketch(document, zone(document), assessment, active);
    }

    /** The same, with what the engine sees of the survey. */
    public ZoneSketch sketch(Branch document, LoadingZone zone, Optional<Assessment> assessment,
                             Optional<Integer> active) {
        OptionalDouble length = number(zone, Datum.ZONE_LENGTH);
        OptionalDouble height = number(zone, Datum.READ_HEIGHT, Datum.REGISTER_HEIGHT);
        OptionalDouble spacing = number(zone, Datum.READ_SPACING, Datum.REGISTER_SPACING);
        OptionalDouble speed = assessment.flatMap(found -> found.get(Result.BELT_SPEED))
                .map(found -> OptionalDouble.of(found.value())).orElse(number(zone, Datum.BELT_SPEED));
        Optional<AllowedDepth> allowed = assessment.flatMap(Assessment::lowestAllowedDepth);
        List<ZoneSketch.Station> stations = stations(document, assessment, active);
        return new ZoneSketch(new ZoneSketch.Boards(length, height, spacing),
                new ZoneSketch.Belt(number(zone, Datum.BELT_WIDTH), number(zone, Datum.TROUGH_ANGLE),
                        number(zone, Datum.CENTRE_ROLL), number(zone, Datum.SURCHARGE_ANGLE), speed),
                stations, allowed.map(limit -> new ZoneSketch.Limit(limit.overloaded().orElseThrow(),
                        limit.rule().code())), seals(zone), FeedEnd.LEFT,
                captions(zone, length, height, spacing, speed, allowed, stations));
    }

    /** The engine's zone; while something in it is impossible, the picture shows what the register knows. */
    private LoadingZone zone(Branch document) {
        try {
            return assessor.zone(new Survey(document));
        } catch (Refused e) {
            return registered(document);
        }
    }

    /** What the register knows of a survey's zone: what the picture shows while a reading cannot be. */
    public LoadingZone registered(Branch document) {
        return assessor.zone(new Survey(document.with("readings", Branch.EMPTY)));
    }

    private static OptionalDouble number(LoadingZone zone, Datum... firstOf) {
        for (Datum datum : firstOf) {
            Optional<Reading> reading = zone.get(datum);
            if (reading.isPresent()) {
                return OptionalDouble.of(reading.get().value());
            }
        }
        return OptionalDouble.empty();
    }

    /** Stations by the lines of their table, with the depths at the board that the engine made of them. */
    private List<ZoneSketch.Station> stations(Branch document, Optional<Assessment> assessment,
                                              Optional<Integer> active) {
        List<DepthPoint> profile = assessment.map(Assessment::profile).orElse(List.of());
        List<ZoneSketch.Station> stations = new ArrayList<>();
        List<Node> rows = document.at(Survey.READINGS.child("bedDepths"))
                .filter(Node.Series.class::isInstance).map(node -> ((Node.Series) node).items()).orElse(List.of());
        for (int i = 0; i < rows.size(); i++) {
            Optional<Quantity> position = length(rows.get(i), "position");
            if (position.isEmpty() || !(position.get().si() >= 0)) {
                continue;
            }
            double at = position.get().si();
            OptionalDouble depth = profile.stream().filter(point -> point.position() == at)
                    .mapToDouble(point -> point.depth().value()).findFirst();
            stations.add(new ZoneSketch.Station(at, depth, wording.entered(position.get()),
                    depth.isPresent() ? small(depth.getAsDouble()) : "", active.equals(Optional.of(i))));
        }
        return stations;
    }

    /** The line of the table that each station of the sketch stands for. */
    public static List<Integer> lines(Branch document) {
        List<Integer> lines = new ArrayList<>();
        List<Node> rows = document.at(Survey.READINGS.child("bedDepths"))
                .filter(Node.Series.class::isInstance).map(node -> ((Node.Series) node).items()).orElse(List.of());
        for (int i = 0; i < rows.size(); i++) {
            if (length(rows.get(i), "position").filter(position -> position.si() >= 0).isPresent()) {
                lines.add(i);
            }
        }
        return lines;
    }

    private static Optional<Quantity> length(Node row, String key) {
        try {
            return row instanceof Branch branch ? branch.quantity(key)
                    .filter(quantity -> quantity.unit().dimension() == Dimension.LENGTH) : Optional.empty();
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    private static ZoneSketch.Seals seals(LoadingZone zone) {
        return new ZoneSketch.Seals(spans(zone, Side.LEFT), spans(zone, Side.RIGHT));
    }

    private static List<ZoneSketch.SealSpan> spans(LoadingZone zone, Side side) {
        return zone.seals().stream().filter(segment -> segment.side() == side)
                .map(segment -> new ZoneSketch.SealSpan(SealShape.valueOf(segment.type().name()),
                        SealState.valueOf(segment.condition().name()), segment.length().value())).toList();
    }

    private Captions captions(LoadingZone zone, OptionalDouble length, OptionalDouble height, OptionalDouble spacing,
                              OptionalDouble speed, Optional<AllowedDepth> allowed,
                              List<ZoneSketch.Station> stations) {
        Unit metres = wording.unit(Dimension.LENGTH);
        return new Captions(wording.text("screen.picture.feed"),
                speed.isPresent() ? wording.text("screen.picture.belt",
                        wording.computed(speed.getAsDouble(), wording.unit(Dimension.SPEED)))
                        : wording.text("screen.picture.belt-unknown"),
                height.isPresent() ? small(height.getAsDouble()) : "",
                wording.text(height.isPresent() ? "screen.picture.board-top" : "screen.picture.board-unknown"),
                length.isPresent() ? wording.computed(length.getAsDouble(), metres)
                        : wording.text("screen.picture.length-unknown"),
                allowed.map(limit -> small(limit.overloaded().orElseThrow())).orElse(""),
                allowed.map(limit -> wording.text("zone.limit." + limit.rule().code())).orElse(""),
                times -> wording.text("screen.picture.heights", wording.format().exact(
                        new BigDecimal(times, new MathContext(2)).stripTrailingZeros())),
                stations.isEmpty() ? Optional.of(wording.text("screen.picture.prompt")) : Optional.empty(),
                spacing.isPresent() ? small(spacing.getAsDouble()) : wording.text("screen.picture.width-unknown"),
                sectionTitle(stations), new SectionNote(wording, this::small).of(zone, shownAt(stations)));
    }

    private String sectionTitle(List<ZoneSketch.Station> stations) {
        OptionalInt shown = ZoneSketch.shown(stations);
        return shown.isPresent() ? wording.text("screen.picture.at", stations.get(shown.getAsInt()).positionLabel())
                : "";
    }

    /** Where the zone is cut across. */
    private static double shownAt(List<ZoneSketch.Station> stations) {
        OptionalInt shown = ZoneSketch.shown(stations);
        return shown.isPresent() ? stations.get(shown.getAsInt()).position() : 0;
    }

    /** A depth or width as a bare number of the small unit; the picture's captions share one unit. */
    private String small(double metres) {
        Unit unit = wording.smallLength();
        return unit == Unit.MILLIMETRE ? wording.format().computed(unit.fromSi(metres), 0)
                : wording.format().computed(metres, unit);
    }
}
