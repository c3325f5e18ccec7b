package bedmark.bench;

import bedmark.engine.Datum;
import bedmark.engine.LoadingZone;
import bedmark.engine.bed.DepthMethod;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.uncertainty.Reading;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/** Zones with everything read and registered, a bed that is too deep and lags: every remedy has something to say. */
final class BenchZones {
    private static final Map<Datum, Double> NUMBERS = Map.ofEntries(Map.entry(Datum.ZONE_LENGTH, 6.0),
            Map.entry(Datum.BELT_SPEED, 2.0), Map.entry(Datum.READ_SPACING, 0.7), Map.entry(Datum.READ_HEIGHT, 0.4),
            Map.entry(Datum.THROUGHPUT, 300.0), Map.entry(Datum.RUNNING_POWER, 30_000.0),
            Map.entry(Datum.BELT_WIDTH, 1.2), Map.entry(Datum.TROUGH_ANGLE, Math.toRadians(35)),
            Map.entry(Datum.CENTRE_ROLL, 0.45), Map.entry(Datum.INCLINE, 0.05), Map.entry(Datum.DESIGN_SPEED, 2.0),
            Map.entry(Datum.RATED_POWER, 55_000.0), Map.entry(Datum.DRIVE_EFFICIENCY, 0.9),
            Map.entry(Datum.MOTOR_EFFICIENCY, 0.92), Map.entry(Datum.LOADED_HOURS, 5_000.0),
            Map.entry(Datum.SKIRT_POWER_BUDGET, 0.08), Map.entry(Datum.DESIGN_THROUGHPUT, 330.0),
            Map.entry(Datum.DESIGN_BED_DEPTH, 0.16), Map.entry(Datum.FEED_VELOCITY, 0.5),
            Map.entry(Datum.REGISTER_SPACING, 0.7), Map.entry(Datum.REGISTER_HEIGHT, 0.4),
            Map.entry(Datum.IMPACT_LENGTH, 1.5), Map.entry(Datum.LUMP_SIZE, 0.1),
            Map.entry(Datum.SKIRT_FRICTION_FACTOR, 0.0754), Map.entry(Datum.BULK_DENSITY, 1000.0),
            Map.entry(Datum.ANGLE_OF_REPOSE, Math.toRadians(38)),
            Map.entry(Datum.SURCHARGE_ANGLE, Math.toRadians(20)), Map.entry(Datum.WALL_FRICTION, 0.5));

    private BenchZones() {
    }

    static LoadingZone of(int stations) {
        return of(stations, 0.33, 0.005);
    }

    /** The same with a bed near its limit and depths that were sighted from afar. */
    static LoadingZone coarse(int stations) {
        return of(stations, 0.18, 0.025);
    }

    private static LoadingZone of(int stations, double depth, double uncertainty) {
        Map<Datum, Reading> data = new EnumMap<>(Datum.class);
        NUMBERS.forEach((datum, value) ->
                data.put(datum, Instruments.standard().reading(datum.pointer(), value, datum.instrument())));
        LoadingZone zone = LoadingZone.UNKNOWN.with(data).withSpeedClass(SpeedClass.COAL_SOFT_ORE_FINE_STONE)
                .withStations(List.of())
                .withSeal(Side.LEFT, SealType.VERTICAL, SealCondition.SOUND, 6, 0.005)
                .withSeal(Side.RIGHT, SealType.OBLIQUE, SealCondition.SOUND, 6, 0.005);
        for (int i = 0; i < stations; i++) {
            zone = zone.withStation(6 * (i + 0.5) / stations, depth + 0.01 * (i % 4), DepthMethod.AT_BOARD,
                    uncertainty);
        }
        return zone;
    }
}
