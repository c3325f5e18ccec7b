package bedmark.engine;

import bedmark.engine.uncertainty.Instrument;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * Every single number that describes a loading zone: its place (a JSON Pointer into the survey, or into the register
 * below {@code /conveyor}, {@code /transfer} or {@code /material}), what it may be, and where its default uncertainty
 * comes from. All in SI; a new number is one row.
 */
public enum Datum {
    /** Skirted length of the zone, one side (m). */
    ZONE_LENGTH("/readings/loadingZoneLength", Domain.POSITIVE, Instrument.TAPE),
    /** Belt speed, read directly (m/s). */
    BELT_SPEED("/readings/beltSpeed", Domain.NOT_NEGATIVE, Instrument.TACHOMETER),
    /** Belt length of a timing (m); the conveyor's where it is absent. */
    TIMED_BELT_LENGTH("/readings/beltTiming/beltLength", Domain.POSITIVE, Instrument.EXACT),
    /** Belt revolutions of a timing. */
    TIMED_REVOLUTIONS("/readings/beltTiming/revolutions", Domain.NOT_NEGATIVE, Instrument.EXACT),
    /** Elapsed time of a timing (s). */
    TIMED_ELAPSED("/readings/beltTiming/elapsed", Domain.POSITIVE, Instrument.TIMING),
    /** Diameter of the pulley over its lagging (m). */
    PULLEY_DIAMETER("/readings/pulleySpeed/diameter", Domain.POSITIVE, Instrument.EXACT),
    /** Rotation of the pulley (revolutions per second). */
    PULLEY_ROTATION("/readings/pulleySpeed/rotation", Domain.NOT_NEGATIVE, Instrument.PULLEY),
    /** Clear width between the skirtboards, read (m). */
    READ_SPACING("/readings/skirtSpacing", Domain.POSITIVE, Instrument.TAPE),
    /** Height of the skirtboard above the belt at the board, read (m). */
    READ_HEIGHT("/readings/skirtHeight", Domain.POSITIVE, Instrument.TAPE),
    /** Mass flow by belt scale (kg/s). */
    THROUGHPUT("/readings/throughput", Domain.NOT_NEGATIVE, Instrument.BELT_SCALE),
    /** Running electrical power of the drive (W). */
    RUNNING_POWER("/readings/runningPower", Domain.NOT_NEGATIVE, Instrument.POWER_METER),

    /** Belt width (m). */
    BELT_WIDTH("/conveyor/beltWidth", Domain.POSITIVE, Instrument.REGISTER_GEOMETRY),
    /** Angle of the wing rolls (rad); 0 for a flat belt. */
    TROUGH_ANGLE("/conveyor/troughAngle", Domain.ANGLE, Instrument.EXACT),
    /** Length of the centre roll (m); not needed for a flat belt. */
    CENTRE_ROLL("/conveyor/centreRollLength", Domain.POSITIVE, Instrument.REGISTER_GEOMETRY),
    /** Slope of the conveyor at the zone (rad), rising positive. */
    INCLINE("/conveyor/incline", Domain.SLOPE, Instrument.EXACT),
    /** Belt speed of the design (m/s). */
    DESIGN_SPEED("/conveyor/designSpeed", Domain.POSITIVE, Instrument.EXACT),
    /** Rated power of the motor (W). */
    RATED_POWER("/conveyor/ratedPower", Domain.POSITIVE, Instrument.EXACT),
    /** Efficiency from the motor shaft to the belt (0–1). */
    DRIVE_EFFICIENCY("/conveyor/driveEfficiency", Domain.EFFICIENCY, Instrument.EFFICIENCY),
    /** Efficiency of the motor (0–1). */
    MOTOR_EFFICIENCY("/conveyor/motorEfficiency", Domain.EFFICIENCY, Instrument.EFFICIENCY),
    /** Hours a year that the conveyor runs loaded (h). */
    LOADED_HOURS("/conveyor/loadedHoursPerYear", Domain.HOURS, Instrument.EXACT),
    /** Length of the whole belt (m). */
    BELT_LENGTH("/conveyor/beltLength", Domain.POSITIVE, Instrument.EXACT),
    /** Share of the rated power that the site grants to the skirts (0–1). */
    SKIRT_POWER_BUDGET("/conveyor/skirtPowerBudget", Domain.EFFICIENCY, Instrument.EXACT),

    /** Mass flow of the design (kg/s). */
    DESIGN_THROUGHPUT("/transfer/designThroughput", Domain.POSITIVE, Instrument.EXACT),
    /** Bed depth at the board that the zone was designed for (m). */
    DESIGN_BED_DEPTH("/transfer/designBedDepth", Domain.POSITIVE, Instrument.EXACT),
    /** Velocity of the feed along the belt (m/s); negative where it comes against the belt's travel. */
    FEED_VELOCITY("/transfer/feedVelocity", Domain.ANY, Instrument.EXACT),
    /** Clear width between the skirtboards, registered (m). */
    REGISTER_SPACING("/transfer/skirtSpacing", Domain.POSITIVE, Instrument.REGISTER_GEOMETRY),
    /** Height of the skirtboard, registered (m). */
    REGISTER_HEIGHT("/transfer/skirtHeight", Domain.POSITIVE, Instrument.REGISTER_GEOMETRY),
    /** Length of the zone in the design (m). */
    REGISTER_ZONE_LENGTH("/transfer/designZoneLength", Domain.POSITIVE, Instrument.REGISTER_GEOMETRY),
    /** Length of belt that the stream strikes (m). */
    IMPACT_LENGTH("/transfer/impactLength", Domain.NOT_NEGATIVE, Instrument.REGISTER_GEOMETRY),
    /** Size of the largest lumps (m). */
    LUMP_SIZE("/transfer/lumpSize", Domain.POSITIVE, Instrument.EXACT),

    /** Tabulated skirtboard friction factor Cs (lbf/(ft·in²), as the table prints it). */
    SKIRT_FRICTION_FACTOR("/material/skirtFrictionFactor", Domain.NOT_NEGATIVE, Instrument.SKIRT_FRICTION_FACTOR),
    /** Bulk density (kg/m³). */
    BULK_DENSITY("/material/bulkDensity", Domain.POSITIVE, Instrument.BULK_DENSITY),
    /** Angle of repose (rad). */
    ANGLE_OF_REPOSE("/material/angleOfRepose", Domain.ANGLE, Instrument.REPOSE),
    /** Surcharge angle on the belt (rad). */
    SURCHARGE_ANGLE("/material/surchargeAngle", Domain.ANGLE, Instrument.SURCHARGE),
    /** Coefficient of friction between material and board. */
    WALL_FRICTION("/material/wallFriction", Domain.NOT_NEGATIVE, Instrument.WALL_FRICTION),

    /** The site's own factor for this material and conveyor (lbf/(ft·in²)); it brings its own uncertainty. */
    SITE_FACTOR("/plant/siteFactor", Domain.POSITIVE, Instrument.EXACT),
    /** Drag per length of seal that the site fitted beside it (N/m); it brings its own uncertainty. */
    SITE_SEAL_RATE("/plant/siteSealRate", Domain.POSITIVE, Instrument.EXACT);

    private static final Map<String, Datum> BY_POINTER =
            Stream.of(values()).collect(Collectors.toUnmodifiableMap(Datum::pointer, Function.identity()));

    private final String pointer;
    private final Domain domain;
    private final Instrument instrument;

    Datum(String pointer, Domain domain, Instrument instrument) {
        this.pointer = pointer;
        this.domain = domain;
        this.instrument = instrument;
    }

    /** The datum at that place. */
    public static Optional<Datum> ofPointer(String pointer) {
        return Optional.ofNullable(BY_POINTER.get(pointer));
    }

    /** Where the number stands: a JSON Pointer. */
    public String pointer() {
        return pointer;
    }

    /** What the number may be. */
    public Domain domain() {
        return domain;
    }

    /** Where its uncertainty comes from, if it brings none of its own. */
    public Instrument instrument() {
        return instrument;
    }

    /** Whether it was read on this walk, rather than registered. */
    public boolean isReading() {
        return pointer.startsWith("/readings/");
    }
}
