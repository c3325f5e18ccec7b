package bedmark.engine;

import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;

/** The sign and the SI unit of each number that enters the working under one name only. */
final class Signs {

    /** A sign with the UCUM code of its unit. */
    record Sign(String sign, String unit) {
    }

    /** By the number that it stands for. */
    static final Map<Datum, Sign> OF_DATA;

    static {
        Map<Datum, Sign> signs = new EnumMap<>(Datum.class);
        signs.put(Datum.ZONE_LENGTH, new Sign("L", "m"));
        signs.put(Datum.TIMED_REVOLUTIONS, new Sign("n", "1"));
        signs.put(Datum.TIMED_ELAPSED, new Sign("t", "s"));
        signs.put(Datum.PULLEY_DIAMETER, new Sign("Dp", "m"));
        signs.put(Datum.PULLEY_ROTATION, new Sign("N", "1/s"));
        signs.put(Datum.RUNNING_POWER, new Sign("Pe", "W"));
        signs.put(Datum.BELT_WIDTH, new Sign("B", "m"));
        signs.put(Datum.TROUGH_ANGLE, new Sign("λ", "rad"));
        signs.put(Datum.CENTRE_ROLL, new Sign("l3", "m"));
        signs.put(Datum.DESIGN_SPEED, new Sign("vd", "m/s"));
        signs.put(Datum.RATED_POWER, new Sign("Pr", "W"));
        signs.put(Datum.DRIVE_EFFICIENCY, new Sign("ηd", "1"));
        signs.put(Datum.MOTOR_EFFICIENCY, new Sign("ηm", "1"));
        signs.put(Datum.LOADED_HOURS, new Sign("T", "h"));
        signs.put(Datum.DESIGN_THROUGHPUT, new Sign("Qd", "kg/s"));
        signs.put(Datum.DESIGN_BED_DEPTH, new Sign("hg", "m"));
        signs.put(Datum.LUMP_SIZE, new Sign("a", "m"));
        signs.put(Datum.SKIRT_FRICTION_FACTOR, new Sign("Cs", "[lbf_av]/([ft_i].[in_i]2)"));
        signs.put(Datum.BULK_DENSITY, new Sign("ρ", "kg/m3"));
        signs.put(Datum.ANGLE_OF_REPOSE, new Sign("φ", "rad"));
        signs.put(Datum.SURCHARGE_ANGLE, new Sign("θ", "rad"));
        signs.put(Datum.SITE_FACTOR, new Sign("C", "[lbf_av]/([ft_i].[in_i]2)"));
        OF_DATA = Collections.unmodifiableMap(signs);
    }

    private Signs() {
    }
}
