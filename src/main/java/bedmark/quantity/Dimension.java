package bedmark.quantity;

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
    FREQUENCY
}
