package bedmark.office;

import java.util.OptionalDouble;

/**
 * What the best remedy of a zone saves in a year.
 *
 * @param remedy its code
 * @param wh     energy (Wh), counted as the assessment counts it
 * @param cost   in the site's currency
 * @param co2    in kg
 */
public record Saving(String remedy, double wh, OptionalDouble cost, OptionalDouble co2) {
}
