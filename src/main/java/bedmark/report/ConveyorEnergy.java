package bedmark.report;

import bedmark.office.PlantEnergy;
import bedmark.office.RankedZone;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What the skirts of one conveyor, or of several, take in a year: the sum over the zones whose energy is known.
 *
 * @param plant    its name
 * @param area     its name; empty where there is none, or several
 * @param conveyor its tag
 * @param known    how many zones are in the sum
 * @param zones    how many there are
 * @param wh       energy (Wh)
 * @param savingWh what the best remedy of each zone would save (Wh)
 * @param cost     of the energy, where all of it has a price in one currency
 * @param co2      of the energy (kg), where all of it is known
 * @param currency of the cost
 * @param shaft    whether some of it is counted at the motor's shaft, since the motor's efficiency is not known
 */
public record ConveyorEnergy(String plant, String area, String conveyor, int known, int zones, double wh,
                             double savingWh, OptionalDouble cost, OptionalDouble co2, Optional<String> currency,
                             boolean shaft) {

    /** The conveyors of some zones, greatest energy first; those of which none is known last. */
    public static List<ConveyorEnergy> ranked(List<ReportZone> zones) {
        Map<List<String>, List<RankedZone>> conveyors = new LinkedHashMap<>();
        zones.forEach(zone -> conveyors.computeIfAbsent(List.of(zone.ranked().zone().plant(),
                zone.ranked().names().conveyor()), key -> new ArrayList<>()).add(zone.ranked()));
        return conveyors.values().stream().map(ConveyorEnergy::of)
                .sorted(Comparator.comparingDouble(ConveyorEnergy::wh).reversed()
                        .thenComparing(ConveyorEnergy::plant).thenComparing(ConveyorEnergy::conveyor)).toList();
    }

    /** All of them together. */
    public static ConveyorEnergy whole(List<ReportZone> zones) {
        return of(zones.stream().map(ReportZone::ranked).toList());
    }

    private static ConveyorEnergy of(List<RankedZone> all) {
        List<RankedZone> known = all.stream().filter(zone -> zone.energyWh().isPresent()).toList();
        Optional<String> currency = PlantEnergy.currency(known);
        boolean priced = currency.isPresent()
                && known.stream().allMatch(zone -> zone.cost().isPresent() && zone.currency().isPresent());
        boolean weighed = !known.isEmpty() && known.stream().allMatch(zone -> zone.co2().isPresent());
        List<String> areas = all.stream().map(zone -> zone.names().area()).distinct().toList();
        return new ConveyorEnergy(all.isEmpty() ? "" : all.get(0).names().plant(), areas.size() == 1 ? areas.get(0) : "",
                all.isEmpty() ? "" : all.get(0).names().conveyorTag(), known.size(), all.size(),
                known.stream().mapToDouble(zone -> zone.energyWh().getAsDouble()).sum(),
                known.stream().mapToDouble(zone -> zone.saving().map(saving -> saving.wh()).orElse(0.0)).sum(),
                priced ? OptionalDouble.of(known.stream().mapToDouble(zone -> zone.cost().getAsDouble()).sum())
                        : OptionalDouble.empty(),
                weighed ? OptionalDouble.of(known.stream().mapToDouble(zone -> zone.co2().getAsDouble()).sum())
                        : OptionalDouble.empty(),
                priced ? currency : Optional.empty(),
                known.stream().anyMatch(zone -> zone.energyKind().filter("shaft"::equals).isPresent()));
    }
}
