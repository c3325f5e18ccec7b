package bedmark.index.office;

import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The judgement of a zone in the numbers that lists rank by.
 *
 * @param level      the level's place from the best
 * @param incomplete whether a required reading is missing
 * @param driveShare of rated power, 0–1
 * @param skirtPower at the belt (W)
 * @param savingWh   of the best remedy, in a year
 * @param savingCost the same in the site's currency
 * @param savingCo2  the same in kg
 * @param remedy     the best remedy's code
 * @param energyWh   of the skirts, in a year
 * @param cost       of that energy
 * @param co2        of that energy (kg)
 * @param energyKind {@code shaft} or {@code electrical}
 * @param findings   every finding that is not within its limits, one line each
 */
public record Verdict(int level, boolean incomplete, OptionalDouble driveShare, OptionalDouble skirtPower,
                      OptionalDouble savingWh, OptionalDouble savingCost, OptionalDouble savingCo2,
                      Optional<String> remedy, OptionalDouble energyWh, OptionalDouble cost, OptionalDouble co2,
                      Optional<String> energyKind, Optional<String> currency, String findings) {

    /** Of a zone that was not judged, or could not be: no number at all. */
    public static final Verdict NONE = new Verdict(-1, false, OptionalDouble.empty(), OptionalDouble.empty(),
            OptionalDouble.empty(), OptionalDouble.empty(), OptionalDouble.empty(), Optional.empty(),
            OptionalDouble.empty(), OptionalDouble.empty(), OptionalDouble.empty(), Optional.empty(),
            Optional.empty(), "");
}
