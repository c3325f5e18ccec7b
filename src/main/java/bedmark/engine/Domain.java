package bedmark.engine;

import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Reading;

/**
 * What a number may be at all. Outside of it a reading is impossible and refused; an implausible one is computed.
 * No magnitude reaches beyond 1e9, and what is divided by is 0 or at least 1e-9, so that no formula can overflow.
 */
public enum Domain {
    /** More than nothing: lengths, densities, powers. */
    POSITIVE(1e-9, 1e9),
    /** Nothing or more. */
    NOT_NEGATIVE(0, 1e9),
    /** From level to steep (rad): 0 to 89°. */
    ANGLE(0, Math.toRadians(89)),
    /** Falling to rising (rad): −89° to 89°. */
    SLOPE(-Math.toRadians(89), Math.toRadians(89)),
    /** A share above 0 and up to 1. */
    EFFICIENCY(1e-9, 1),
    /** Hours within a year. */
    HOURS(0, 8784),
    /** Either sign. */
    ANY(-1e9, 1e9);

    private static final double LEAST = 1e-9;

    private final double lowest;
    private final double highest;

    Domain(double lowest, double highest) {
        this.lowest = lowest;
        this.highest = highest;
    }

    /** The least that the number may be. */
    double lowest() {
        return lowest;
    }

    /** The most that it may be. */
    double highest() {
        return highest;
    }

    /** Whether the number may be. */
    boolean holds(double value) {
        return value >= lowest && value <= highest && !(lowest == 0 && value > 0 && value < LEAST);
    }

    /**
     * Refuses what cannot be.
     *
     * @throws ImpossibleReading {@code reading-negative}, {@code reading-zero}, {@code reading-out-of-range} (with the
     *                           value and, for the last, the lowest and highest possible one, in SI)
     */
    public void check(Reading reading) {
        double value = reading.value();
        if (value < 0 && lowest >= 0) {
            throw new ImpossibleReading("reading-negative", reading.name(), Double.toString(value));
        }
        if (value == 0 && lowest > 0) {
            throw new ImpossibleReading("reading-zero", reading.name());
        }
        if (!holds(value)) {
            throw new ImpossibleReading("reading-out-of-range", reading.name(), Double.toString(value),
                    Double.toString(lowest), Double.toString(highest));
        }
    }
}
