package bedmark.engine.uncertainty;

import java.util.Objects;

/**
 * One number that somebody read or registered, in SI.
 *
 * @param name                the JSON Pointer of the reading inside its survey or register, such as
 *                            {@code /readings/bedDepths/0/depth} or {@code /conveyor/beltWidth}
 * @param value               in the SI unit of the quantity
 * @param standardUncertainty in the same unit, not negative
 */
public record Reading(String name, double value, double standardUncertainty) {

    /** @throws ImpossibleReading {@code reading-not-finite}, {@code uncertainty-impossible} */
    public Reading {
        Objects.requireNonNull(name);
        if (!Double.isFinite(value)) {
            throw new ImpossibleReading("reading-not-finite", name);
        }
        if (!(standardUncertainty >= 0 && standardUncertainty <= 1e9)) {
            throw new ImpossibleReading("uncertainty-impossible", name, Double.toString(standardUncertainty));
        }
    }

    /** The value with its standard uncertainty. */
    public Estimate estimate() {
        return new Estimate(value, standardUncertainty);
    }

    /** A number without uncertainty: a target, a nameplate, a count. */
    public static Reading exact(String name, double value) {
        return new Reading(name, value, 0);
    }
}
