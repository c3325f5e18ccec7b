package bedmark.engine.uncertainty;

import java.util.Optional;
import java.util.stream.Stream;

/**
 * What a number was taken with, or where it comes from: the key to its default standard uncertainty. All defaults are
 * common practice or assumptions [C/A] that a site may change; a reading's own standard uncertainty wins.
 */
public enum Instrument {
    /** A length by tape: 5 mm. */
    TAPE("tape", 0.005, false),
    /** A bed depth that was measured: 5 mm. */
    DEPTH_MEASURED("depth-measured", 0.005, false),
    /** A bed depth that was estimated, wear lines among them: 20 mm. */
    DEPTH_ESTIMATED("depth-estimated", 0.020, false),
    /** A bed depth under suspicion: 40 mm. */
    DEPTH_SUSPECT("depth-suspect", 0.040, false),
    /** Belt speed by tachometer: 1 %. */
    TACHOMETER("tachometer", 0.01, true),
    /** Belt speed by timing revolutions, carried by the elapsed time: 1 %. */
    TIMING("timing", 0.01, true),
    /** Belt speed from a pulley, carried by its rotation: 3 %. */
    PULLEY("pulley", 0.03, true),
    /** Mass flow by belt scale: 2 %. */
    BELT_SCALE("belt-scale", 0.02, true),
    /** Running electrical power: 2 %. */
    POWER_METER("power-meter", 0.02, true),
    /** The tabulated skirtboard friction factor: 25 %. */
    SKIRT_FRICTION_FACTOR("skirt-friction-factor", 0.25, true),
    /** The coefficient of friction at the board: 20 %. */
    WALL_FRICTION("wall-friction", 0.20, true),
    /** The angle of repose: 3°. */
    REPOSE("repose", Math.toRadians(3), false),
    /** Bulk density: 5 %. */
    BULK_DENSITY("bulk-density", 0.05, true),
    /** The surcharge angle: 3°. */
    SURCHARGE("surcharge", Math.toRadians(3), false),
    /** Drag per length of seal: 30 %. */
    SEAL_RATE("seal-rate", 0.30, true),
    /** Efficiencies of drive and motor: 3 %. */
    EFFICIENCY("efficiency", 0.03, true),
    /** Lengths of the register: 5 mm. */
    REGISTER_GEOMETRY("register-geometry", 0.005, false),
    /** Targets, nameplates, angles of idlers, counts: taken as they stand. */
    EXACT("exact", 0, false);

    private final String code;
    private final double spread;
    private final boolean relative;

    Instrument(String code, double spread, boolean relative) {
        this.code = code;
        this.spread = spread;
        this.relative = relative;
    }

    /** The instrument of that code. */
    public static Optional<Instrument> ofCode(String code) {
        return Stream.of(values()).filter(instrument -> instrument.code.equals(code)).findFirst();
    }

    public String code() {
        return code;
    }

    /** The default standard uncertainty: in SI, or as a share of the value where {@link #relative()}. */
    public double spread() {
        return spread;
    }

    /** Whether the spread is an angle (rad); one that is none and no share of the value is a length (m). */
    public boolean angle() {
        return this == REPOSE || this == SURCHARGE;
    }

    /** Whether the spread is a share of the value. */
    public boolean relative() {
        return relative;
    }
}
