package bedmark.quantity;

import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;

/** The kind of quantity that a {@link Unit} measures; only units of one dimension convert into each other. */
public enum Dimension {
    /** SI unit m. */
    LENGTH,
    /** SI unit m/s. */
    SPEED,
    /** SI unit kg/s. */
    MASS_FLOW,
    /** SI unit kg/m³. */
    DENSITY,
    /** SI unit W. */
    POWER,
    /** SI unit rad. */
    ANGLE,
    /** SI unit s. */
    TIME,
    /** Dimensionless. */
    RATIO,
    /** SI unit N. */
    FORCE,
    /** SI unit N/m. */
    LINE_FORCE,
    /** SI unit 1/s. */
    FREQUENCY;

    /** The word used in form files. */
    public String code() {
        return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    public static Optional<Dimension> ofCode(String code) {
        return Stream.of(values()).filter(dimension -> dimension.code().equals(code)).findFirst();
    }
}
