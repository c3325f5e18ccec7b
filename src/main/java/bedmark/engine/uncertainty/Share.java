package bedmark.engine.uncertainty;

/**
 * How much of a result's variance one reading brings.
 *
 * @param reading its name, a JSON Pointer
 * @param share   between 0 and 1; the shares of a result add up to 1
 */
public record Share(String reading, double share) {
}
