package bedmark.engine.verdict;

import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One change that would lower the skirt power, with what would come of it at constant flow and constant yearly tonnes.
 *
 * @param code           lower-case words joined by hyphens
 * @param change         the new value of what is changed, where it has one
 * @param unit           UCUM code of the change; {@code 1} for a share
 * @param meanDepth      new mean depth at the board (m)
 * @param skirtDrag      new drag of material and seals (N)
 * @param skirtPower     new power at the belt (W)
 * @param drivePower     new power at the motor shaft (W)
 * @param driveShare     the same as a share of the rated power
 * @param savedWh        energy saved in a year (Wh), counted as the assessment counts it
 * @param savedCost      the same in the site's currency, where the electrical energy and its price are known
 * @param savedCo2       the same in kg of CO₂, likewise
 * @param ranked         whether the saving may be compared with that of other remedies
 * @param refusedBecause the rule that the change would break
 */
public record Remedy(String code, OptionalDouble change, String unit, double meanDepth, double skirtDrag,
        double skirtPower, OptionalDouble drivePower, OptionalDouble driveShare, OptionalDouble savedWh,
        OptionalDouble savedCost, OptionalDouble savedCo2, boolean ranked, Optional<Rule> refusedBecause) {
}
