package bedmark.screen.finish;

import bedmark.engine.Assessment;
import bedmark.engine.Result;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What the skirts of a round take in a year, over the zones for which it is known.
 *
 * @param zones     how many zones it is known for
 * @param energyWh  energy (Wh)
 * @param power     at the motor shafts while the belts run (W)
 * @param cost      of the site's currency; nothing where no price is known
 * @param currency  as the site writes it
 * @param co2Kg     nothing where the site names no factor
 * @param savedWh   what the best remedy of each overloaded zone would save together (Wh)
 */
public record WalkTotal(int zones, double energyWh, double power, OptionalDouble cost, Optional<String> currency,
                        OptionalDouble co2Kg, double savedWh) {

    static WalkTotal of(List<Assessment> assessments) {
        List<Assessment> known = assessments.stream().filter(one -> one.get(Result.ENERGY).isPresent()).toList();
        return new WalkTotal(known.size(), sum(known, Result.ENERGY).orElse(0),
                sum(known, Result.DRIVE_POWER).orElse(0), sum(known, Result.COST),
                known.stream().flatMap(one -> one.currency().stream()).findFirst(), sum(known, Result.CO2),
                assessments.stream().flatMapToDouble(one -> bestSaving(one).stream()).sum());
    }

    private static OptionalDouble sum(List<Assessment> assessments, Result result) {
        List<Double> values = assessments.stream().flatMap(one -> one.get(result).stream())
                .map(estimate -> estimate.value()).toList();
        return values.isEmpty() ? OptionalDouble.empty()
                : OptionalDouble.of(values.stream().mapToDouble(Double::doubleValue).sum());
    }

    /** What the best remedy saves that is not refused (Wh a year). */
    static OptionalDouble bestSaving(Assessment assessment) {
        return assessment.remedies().stream().filter(remedy -> remedy.ranked() && remedy.refusedBecause().isEmpty())
                .flatMapToDouble(remedy -> remedy.savedWh().stream()).filter(saved -> saved > 0).max();
    }
}
