package bedmark.engine.uncertainty;

/**
 * How a result answers to one reading.
 *
 * @param derivative of the result by the reading, in SI
 */
public record Sensitivity(Reading reading, double derivative) {

    /** What the reading brings into the variance of the result. */
    public double variance() {
        double part = derivative * reading.standardUncertainty();
        return part * part;
    }
}
