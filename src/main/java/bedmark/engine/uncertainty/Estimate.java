package bedmark.engine.uncertainty;

/**
 * A result with its standard uncertainty (JCGM 100), both in the SI unit of the quantity; the expanded uncertainty is
 * twice the standard one.
 */
public record Estimate(double value, double standardUncertainty) {
}
