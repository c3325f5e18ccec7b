package bedmark.engine;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.Station;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.uncertainty.Reading;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Random;

/** Loading zones for tests: one that is as it should be, and as many random ones as wanted. */
final class Zones {
    /** How many random zones a property is tried on. */
    static final int MANY = Integer.getInteger("bedmark.zones", 10_000);

    private static final Instruments INSTRUMENTS = Instruments.standard();

    private Zones() {
    }

    /** As many random zones as wanted, but no more than are worth their time. */
    static int atMost(int enough) {
        return Math.min(enough, MANY);
    }

    /** A complete zone within every limit, at a bed that moves with the belt. */
    static LoadingZone healthy() {
        Map<Datum, Reading> data = new EnumMap<>(Datum.class);
        put(data, Datum.ZONE_LENGTH, 6);
        put(data, Datum.BELT_SPEED, 2);
        put(data, Datum.READ_SPACING, 0.7);
        put(data, Datum.READ_HEIGHT, 0.4);
        put(data, Datum.THROUGHPUT, 270);
        put(data, Datum.RUNNING_POWER, 30_000);
        put(data, Datum.BELT_WIDTH, 1.2);
        put(data, Datum.TROUGH_ANGLE, Math.toRadians(35));
        put(data, Datum.CENTRE_ROLL, 0.45);
        put(data, Datum.INCLINE, 0.05);
        put(data, Datum.DESIGN_SPEED, 2);
        put(data, Datum.RATED_POWER, 55_000);
        put(data, Datum.DRIVE_EFFICIENCY, 0.9);
        put(data, Datum.MOTOR_EFFICIENCY, 0.92);
        put(data, Datum.LOADED_HOURS, 5_000);
        put(data, Datum.DESIGN_THROUGHPUT, 270);
        put(data, Datum.DESIGN_BED_DEPTH, 0.16);
        put(data, Datum.FEED_VELOCITY, 0.5);
        put(data, Datum.REGISTER_SPACING, 0.7);
        put(data, Datum.REGISTER_HEIGHT, 0.4);
        put(data, Datum.IMPACT_LENGTH, 1.5);
        put(data, Datum.LUMP_SIZE, 0.1);
        put(data, Datum.SKIRT_FRICTION_FACTOR, 0.0754);
        put(data, Datum.BULK_DENSITY, 1000);
        put(data, Datum.ANGLE_OF_REPOSE, Math.toRadians(38));
        put(data, Datum.SURCHARGE_ANGLE, Math.toRadians(20));
        put(data, Datum.WALL_FRICTION, 0.5);
        return LoadingZone.UNKNOWN.with(data).withSpeedClass(SpeedClass.COAL_SOFT_ORE_FINE_STONE)
                .withStation(1, 0.12, DepthMethod.AT_BOARD, 0.005)
                .withStation(5, 0.12, DepthMethod.AT_BOARD, 0.005)
                .withSeal(Side.LEFT, SealType.VERTICAL, SealCondition.SOUND, 6, 0.005)
                .withSeal(Side.RIGHT, SealType.OBLIQUE, SealCondition.SOUND, 6, 0.005);
    }

    /** A possible zone, complete but for what a coin leaves out, from the plausible to the odd. */
    static LoadingZone random(Random random) {
        Map<Datum, Reading> data = new EnumMap<>(Datum.class);
        double belt = between(random, 0.4, 2.6);
        double centre = belt * between(random, 0.2, 0.6);
        double trough = random.nextInt(5) == 0 ? 0 : Math.toRadians(between(random, 5, 50));
        double reach = trough == 0 ? belt : centre + (belt - centre) * Math.cos(trough);
        double length = between(random, 0.5, 30);
        double height = between(random, 0.1, 1.2);
        put(data, Datum.ZONE_LENGTH, length);
        speed(random, data);
        put(data, Datum.READ_SPACING, reach * between(random, 0.15, 0.98));
        put(data, Datum.READ_HEIGHT, height);
        put(data, Datum.BELT_WIDTH, belt);
        put(data, Datum.TROUGH_ANGLE, trough);
        put(data, Datum.CENTRE_ROLL, centre);
        put(data, Datum.BULK_DENSITY, between(random, 100, 3500));
        put(data, Datum.SURCHARGE_ANGLE, Math.toRadians(random.nextInt(10) == 0 ? 0 : between(random, 3, 40)));
        put(data, Datum.ANGLE_OF_REPOSE, Math.toRadians(between(random, 15, 45)));
        maybe(random, data, Datum.SKIRT_FRICTION_FACTOR, between(random, 0.005, 0.3));
        maybe(random, data, Datum.WALL_FRICTION, between(random, 0.2, 0.8));
        maybe(random, data, Datum.THROUGHPUT, between(random, 1, 2000));
        maybe(random, data, Datum.RUNNING_POWER, between(random, 1000, 500_000));
        maybe(random, data, Datum.INCLINE, Math.toRadians(between(random, -15, 20)));
        maybe(random, data, Datum.DESIGN_SPEED, between(random, 0.3, 6));
        maybe(random, data, Datum.RATED_POWER, between(random, 2000, 800_000));
        maybe(random, data, Datum.DRIVE_EFFICIENCY, between(random, 0.6, 0.98));
        maybe(random, data, Datum.MOTOR_EFFICIENCY, between(random, 0.7, 0.97));
        maybe(random, data, Datum.LOADED_HOURS, between(random, 0, 8700));
        maybe(random, data, Datum.SKIRT_POWER_BUDGET, between(random, 0.02, 0.4));
        maybe(random, data, Datum.DESIGN_THROUGHPUT, between(random, 1, 2000));
        maybe(random, data, Datum.DESIGN_BED_DEPTH, between(random, 0.02, 0.8));
        maybe(random, data, Datum.FEED_VELOCITY, between(random, -1, 4));
        maybe(random, data, Datum.REGISTER_SPACING, reach * between(random, 0.15, 0.98));
        maybe(random, data, Datum.REGISTER_HEIGHT, between(random, 0.1, 1.2));
        maybe(random, data, Datum.IMPACT_LENGTH, between(random, 0, 4));
        maybe(random, data, Datum.LUMP_SIZE, between(random, 0.005, 0.5));
        maybe(random, data, Datum.SITE_FACTOR, between(random, 0.005, 0.3));
        maybe(random, data, Datum.SITE_SEAL_RATE, between(random, 5, 200));
        LoadingZone zone = LoadingZone.UNKNOWN.with(data).withStations(stations(random, length, height))
                .withSeals(seals(random, length));
        for (LoadingZone.Mark mark : LoadingZone.Mark.values()) {
            zone = random.nextInt(3) == 0 ? zone.withMark(mark) : zone;
        }
        return random.nextBoolean() ? zone.withSpeedClass(SpeedClass.values()[random.nextInt(3)]) : zone;
    }

    /** The same zone with every number exact. */
    static LoadingZone exact(LoadingZone zone) {
        Map<Datum, Reading> data = new EnumMap<>(Datum.class);
        zone.data().forEach((datum, reading) -> data.put(datum, exact(reading)));
        return zone.with(data)
                .withStations(zone.stations().stream().map(station -> new Station(exact(station.position()),
                        exact(station.raw()), station.method())).toList())
                .withSeals(zone.seals().stream().map(segment -> new SealSegment(segment.side(), segment.type(),
                        segment.condition(), exact(segment.length()))).toList());
    }

    /** The standard settings with exact instruments and factors, methods taken to agree. */
    static Settings exactSettings() {
        Instruments exact = INSTRUMENTS;
        for (Instrument instrument : Instrument.values()) {
            exact = exact.with(instrument, 0);
        }
        return Settings.standard().with(exact).with(Conventions.standard().withGrip(0.6, 0.6).withSpread(false));
    }

    private static Reading exact(Reading reading) {
        return Reading.exact(reading.name(), reading.value());
    }

    private static void speed(Random random, Map<Datum, Reading> data) {
        double speed = between(random, 0.2, 7);
        switch (random.nextInt(4)) {
            case 0 -> {
                put(data, Datum.TIMED_BELT_LENGTH, speed * 50);
                put(data, Datum.TIMED_REVOLUTIONS, 2);
                put(data, Datum.TIMED_ELAPSED, 100);
            }
            case 1 -> {
                put(data, Datum.PULLEY_DIAMETER, 0.5);
                put(data, Datum.PULLEY_ROTATION, speed / 1.5);
            }
            default -> put(data, Datum.BELT_SPEED, speed);
        }
    }

    private static List<Station> stations(Random random, double length, double height) {
        List<Station> stations = new ArrayList<>();
        int count = 1 + random.nextInt(6);
        for (int i = 0; i < count; i++) {
            String row = "/readings/bedDepths/" + i;
            DepthMethod method = DepthMethod.values()[random.nextInt(4)];
            Instrument quality = method == DepthMethod.WEAR_LINE ? Instrument.DEPTH_ESTIMATED
                    : Instrument.DEPTH_MEASURED;
            stations.add(new Station(
                    INSTRUMENTS.reading(row + "/position", length * (i + between(random, 0.05, 0.9)) / count,
                            Instrument.TAPE),
                    INSTRUMENTS.reading(row + "/depth", height * between(random, 0, 1.2), quality), method));
        }
        return stations;
    }

    private static List<SealSegment> seals(Random random, double length) {
        List<SealSegment> seals = new ArrayList<>();
        for (Side side : Side.values()) {
            int count = 1 + random.nextInt(3);
            for (int i = 0; i < count; i++) {
                seals.add(new SealSegment(side, SealType.values()[random.nextInt(6)],
                        SealCondition.values()[random.nextInt(6)], INSTRUMENTS.reading(
                        "/readings/seals/" + seals.size() + "/length", length / count, Instrument.TAPE)));
            }
        }
        return seals;
    }

    private static double between(Random random, double low, double high) {
        return low + (high - low) * random.nextDouble();
    }

    private static void maybe(Random random, Map<Datum, Reading> data, Datum datum, double value) {
        if (random.nextInt(4) > 0) {
            put(data, datum, value);
        }
    }

    static void put(Map<Datum, Reading> data, Datum datum, double value) {
        data.put(datum, INSTRUMENTS.reading(datum.pointer(), value, datum.instrument()));
    }
}
