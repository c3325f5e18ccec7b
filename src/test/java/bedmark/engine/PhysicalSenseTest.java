package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.Section;
import bedmark.engine.bed.Station;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Uncertain;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.function.Consumer;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;

/** What any engineer expects of the numbers, over random zones with depths at the board. */
class PhysicalSenseTest {
    private static final double EXACT = 1e-12;

    @Test
    void dragGrowsWithTheSquareOfDepth() {
        overZones(zone -> {
            LoadingZone deeper = depths(zone, depth -> 3 * depth);
            for (DragMethod method : List.of(DragMethod.TABULATED, DragMethod.RANKINE)) {
                if (assess(zone).methods().containsKey(method)) {
                    close(9 * assess(zone).methods().get(method).value(), assess(deeper).methods().get(method).value());
                }
            }
        });
    }

    @Test
    void dragGrowsWithLength() {
        overZones(zone -> {
            LoadingZone longer = zone.with(Datum.ZONE_LENGTH, 2 * zone.get(Datum.ZONE_LENGTH).orElseThrow().value(), 0)
                    .withStations(zone.stations().stream().map(station -> new Station(
                            times(station.position(), 2), station.raw(), station.method())).toList())
                    .withSeals(zone.seals().stream().map(segment -> new SealSegment(segment.side(), segment.type(),
                            segment.condition(), times(segment.length(), 2))).toList());
            close(2 * value(zone, Result.SKIRT_DRAG), value(longer, Result.SKIRT_DRAG));
            close(value(zone, Result.MEAN_SQUARE_DEPTH), value(longer, Result.MEAN_SQUARE_DEPTH));
            close(value(zone, Result.IMPLIED_THROUGHPUT), value(longer, Result.IMPLIED_THROUGHPUT));
        });
    }

    @Test
    void dragGrowsWithTheFactor() {
        overZones(zone -> {
            LoadingZone one = zone.with(Datum.SKIRT_FRICTION_FACTOR, 0.1, 0);
            LoadingZone two = zone.with(Datum.SKIRT_FRICTION_FACTOR, 0.2, 0);
            close(2 * value(one, Result.MATERIAL_DRAG), value(two, Result.MATERIAL_DRAG));
        });
    }

    @Test
    void powerGrowsWithSpeedAtTheSameDrag() {
        overZones(zone -> {
            LoadingZone slow = zone.with(Datum.BELT_SPEED, 1.5, 0);
            LoadingZone fast = zone.with(Datum.BELT_SPEED, 3, 0);
            close(value(slow, Result.SKIRT_DRAG), value(fast, Result.SKIRT_DRAG));
            close(2 * value(slow, Result.SKIRT_POWER), value(fast, Result.SKIRT_POWER));
        });
    }

    @Test
    void aStationOnTheLineBetweenTwoChangesNothing() {
        overZones(zone -> {
            List<Station> stations = new ArrayList<>(zone.stations());
            Station first = stations.get(0);
            Station last = stations.size() > 1 ? stations.get(1) : first;
            double share = stations.size() > 1 ? 0.3 : 0;
            double between = first.position().value() + share * (last.position().value() - first.position().value());
            double depth = first.raw().value() + share * (last.raw().value() - first.raw().value());
            stations.add(new Station(Reading.exact("/between", stations.size() > 1 ? between : between / 2),
                    Reading.exact("/between/depth", depth), DepthMethod.AT_BOARD));
            LoadingZone split = zone.withStations(stations);
            for (Result result : List.of(Result.MEAN_SQUARE_DEPTH, Result.MEAN_DEPTH, Result.SKIRT_POWER,
                    Result.BED_AREA, Result.DEEPEST_DEPTH)) {
                close(value(zone, result), value(split, result));
            }
        });
    }

    @Test
    void aSealCutInTwoDragsTheSame() {
        overZones(zone -> {
            List<SealSegment> halves = new ArrayList<>();
            for (SealSegment segment : zone.seals()) {
                halves.add(new SealSegment(segment.side(), segment.type(), segment.condition(),
                        times(segment.length(), 0.25)));
                halves.add(new SealSegment(segment.side(), segment.type(), segment.condition(),
                        times(segment.length(), 0.75)));
            }
            close(value(zone, Result.SEAL_DRAG), value(zone.withSeals(halves), Result.SEAL_DRAG));
        });
    }

    @Test
    void twoHalvesOfAZoneAddUpToTheWhole() {
        overZones(zone -> {
            double length = zone.get(Datum.ZONE_LENGTH).orElseThrow().value();
            LoadingZone level = zone.withStations(List.of(new Station(Reading.exact("/x", 0),
                    Reading.exact("/h", 0.2), DepthMethod.AT_BOARD)));
            LoadingZone half = level.with(Datum.ZONE_LENGTH, length / 2, 0)
                    .withSeals(zone.seals().stream().map(segment -> new SealSegment(segment.side(), segment.type(),
                            segment.condition(), times(segment.length(), 0.5))).toList());
            close(value(level, Result.SKIRT_DRAG), 2 * value(half, Result.SKIRT_DRAG));
        });
    }

    @Test
    void theSquareOfTheMeanNeverExceedsTheMeanOfTheSquare() {
        overZones(zone -> {
            Assessment assessment = assess(zone);
            assessment.get(Result.SQUARE_OF_MEAN_SHARE).ifPresent(share ->
                    assertTrue(share.value() > 0 && share.value() <= 1 + EXACT, share::toString));
        });
    }

    @Test
    void depthIsTheInverseOfArea() {
        Random random = new Random(7);
        for (int i = 0; i < Zones.MANY; i++) {
            Section section = section(random);
            double depth = random.nextDouble();
            Uncertain area = section.area(Uncertain.exact(depth));
            assertEquals(depth, section.level(area).value(), EXACT);
            assertTrue(section.area(Uncertain.exact(depth + 1e-6)).value() > area.value());
        }
    }

    @Test
    void aFallingSurfaceLosesAreaSteadilyDownToNothing() {
        Random random = new Random(8);
        for (int i = 0; i < 200; i++) {
            Section section = section(random);
            double rise = section.troughDepth().value() + section.crownRise().value();
            falls(section, 0.3 + rise, centre -> section.levelOfCentreDepth(Uncertain.exact(centre)).value());
            falls(section, 0.3 + rise, above -> above >= rise ? above - rise
                    : section.levelUnderBoardLine(Uncertain.exact(rise - above)).value());
        }
    }

    /** From a full bed to none in small steps of its height: never up, never by a jump, and empty in the end. */
    private static void falls(Section section, double full, DoubleUnaryOperator level) {
        int steps = 2_000;
        double before = level.applyAsDouble(full);
        for (int step = 1; step <= steps; step++) {
            double now = level.applyAsDouble(full * (steps - step) / steps);
            assertTrue(now <= before + EXACT, "a lower surface, a smaller area");
            assertTrue(before - now < 40 * full / steps, "no jump");
            before = now;
        }
        assertEquals(0, section.area(Uncertain.exact(before)).value(), 1e-9);
    }

    private static Section section(Random random) {
        double centre = 0.2 + random.nextDouble();
        Uncertain spacing = Uncertain.exact(centre * (0.5 + 1.5 * random.nextDouble()));
        Uncertain surcharge = Uncertain.exact(Math.toRadians(3 + 35 * random.nextDouble()));
        return random.nextInt(5) == 0 ? Section.flat(spacing, surcharge) : Section.troughed(spacing,
                Uncertain.exact(centre), Uncertain.exact(Math.toRadians(10 + 40 * random.nextDouble())), surcharge);
    }

    private static void overZones(Consumer<LoadingZone> property) {
        Random random = new Random(11);
        for (int i = 0; i < Zones.MANY; i++) {
            LoadingZone zone = Zones.exact(Zones.random(random));
            property.accept(zone.withStations(zone.stations().stream().map(station -> new Station(station.position(),
                    station.raw(), DepthMethod.AT_BOARD)).toList()));
        }
    }

    private static LoadingZone depths(LoadingZone zone, DoubleUnaryOperator change) {
        return zone.withStations(zone.stations().stream().map(station -> new Station(station.position(),
                Reading.exact(station.raw().name(), change.applyAsDouble(station.raw().value())),
                station.method())).toList());
    }

    private static Reading times(Reading reading, double factor) {
        return Reading.exact(reading.name(), factor * reading.value());
    }

    private static Assessment assess(LoadingZone zone) {
        return Engine.assess(zone, Zones.exactSettings());
    }

    private static double value(LoadingZone zone, Result result) {
        return assess(zone).get(result).orElseThrow().value();
    }

    private static void close(double expected, double actual) {
        assertEquals(expected, actual, EXACT * Math.abs(expected));
    }
}
