package bedmark.engine.working;

import java.util.Optional;

/**
 * A number that goes into a formula.
 *
 * @param sign    as it stands in the formula
 * @param value   in SI
 * @param unit    UCUM code of the SI unit; {@code 1} for a plain number
 * @param reading the JSON Pointer of the reading or registered number that it is; nothing where it was computed or is
 *                a constant
 */
public record Symbol(String sign, double value, String unit, Optional<String> reading) {
}
