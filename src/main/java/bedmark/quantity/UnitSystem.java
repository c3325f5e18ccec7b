package bedmark.quantity;

import java.util.Optional;
import java.util.stream.Stream;

/** The two families of units that people work in; a document never depends on which one is chosen. */
public enum UnitSystem {
    METRIC("metric"),
    /** US customary units. */
    US("us");

    private final String code;

    UnitSystem(String code) {
        this.code = code;
    }

    /** The word used in options and settings. */
    public String code() {
        return code;
    }

    public static Optional<UnitSystem> ofCode(String code) {
        return Stream.of(values()).filter(system -> system.code.equals(code)).findFirst();
    }

    /** The unit in which results of a dimension are shown. */
    public Unit unit(Dimension dimension) {
        boolean us = this == US;
        return switch (dimension) {
            case LENGTH -> us ? Unit.FOOT : Unit.METRE;
            case SPEED -> us ? Unit.FOOT_PER_MINUTE : Unit.METRE_PER_SECOND;
            case MASS_FLOW -> us ? Unit.SHORT_TON_PER_HOUR : Unit.TONNE_PER_HOUR;
            case DENSITY -> us ? Unit.POUND_PER_CUBIC_FOOT : Unit.KILOGRAM_PER_CUBIC_METRE;
            case POWER -> us ? Unit.HORSEPOWER : Unit.KILOWATT;
            case ANGLE -> Unit.DEGREE;
            case TIME -> Unit.SECOND;
            case RATIO -> Unit.PERCENT;
            case FORCE -> us ? Unit.POUND_FORCE : Unit.NEWTON;
            case LINE_FORCE -> us ? Unit.POUND_FORCE_PER_FOOT : Unit.NEWTON_PER_METRE;
            case FREQUENCY -> Unit.PER_MINUTE;
        };
    }

    /** The unit in which depths, gaps and widths are shown. */
    public Unit smallLength() {
        return this == US ? Unit.INCH : Unit.MILLIMETRE;
    }
}
