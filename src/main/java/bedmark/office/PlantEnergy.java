package bedmark.office;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;

/** What the skirts take in a year, by conveyor or by area, the greatest first. */
public final class PlantEnergy {

    /**
     * One bar.
     *
     * @param plant   its name
     * @param area    the area's name; empty where conveyors of several areas are one bar
     * @param name    conveyor's tag, or area
     * @param wh      energy of the zones that could be judged (Wh in a year)
     * @param shaft   whether any of it is counted at the shaft, since a motor's efficiency is not known
     * @param cost    where a price in one currency is known for all of it
     * @param co2     where it is known for all of it (kg)
     * @param savedWh by the best remedy of each zone (Wh in a year)
     * @param savedCost of that, where a price is known for all of it
     * @param best    the zone whose best remedy saves most
     * @param zones   how many zones it sums
     * @param lacking how many zones have no figure
     */
    public record Bar(String plant, String area, String name, double wh, boolean shaft, OptionalDouble cost,
                      OptionalDouble co2, Optional<String> currency, double savedWh, OptionalDouble savedCost,
                      Optional<RankedZone> best, int zones, int lacking) {

        /** Whether any zone has a figure: without one the sum is not nothing, but unknown. */
        public boolean known() {
            return zones > 0;
        }
    }

    private PlantEnergy() {
    }

    /** A bar for each conveyor. */
    public static List<Bar> byConveyor(List<RankedZone> zones) {
        return bars(zones, zone -> List.of(zone.zone().plant(), zone.names().conveyor()), zone ->
                zone.names().conveyorTag());
    }

    /** A bar for each area. */
    public static List<Bar> byArea(List<RankedZone> zones) {
        return bars(zones, zone -> List.of(zone.zone().plant(), zone.names().area()), zone -> zone.names().area());
    }

    private static List<Bar> bars(List<RankedZone> zones, Function<RankedZone, List<String>> key,
                                  Function<RankedZone, String> name) {
        Map<List<String>, List<RankedZone>> groups = new LinkedHashMap<>();
        zones.stream().filter(zone -> zone.names().registered()).forEach(zone ->
                groups.computeIfAbsent(key.apply(zone), one -> new ArrayList<>()).add(zone));
        return groups.values().stream().map(group -> bar(group, name.apply(group.get(0)))).sorted(
                Comparator.comparingDouble(Bar::wh).reversed().thenComparing(Bar::plant).thenComparing(Bar::name))
                .toList();
    }

    private static Bar bar(List<RankedZone> all, String name) {
        List<RankedZone> group = all.stream().filter(zone -> zone.energyWh().isPresent()).toList();
        Optional<String> currency = currency(group);
        List<String> areas = all.stream().map(zone -> zone.names().area()).distinct().toList();
        return new Bar(all.get(0).names().plant(), areas.size() == 1 ? areas.get(0) : "", name,
                group.stream().mapToDouble(zone -> zone.energyWh().getAsDouble()).sum(),
                group.stream().anyMatch(zone -> zone.energyKind().filter("shaft"::equals).isPresent()),
                currency.isPresent() ? sum(group, RankedZone::cost) : OptionalDouble.empty(),
                sum(group, RankedZone::co2), currency,
                group.stream().mapToDouble(zone -> zone.saving().map(Saving::wh).orElse(0.0)).sum(),
                currency.isPresent() ? sum(group.stream().filter(zone -> zone.saving().isPresent()).toList(), zone ->
                        zone.saving().get().cost()) : OptionalDouble.empty(),
                group.stream().filter(zone -> zone.saving().isPresent()).max(Comparator.comparingDouble(zone ->
                        zone.saving().get().wh())), group.size(), all.size() - group.size());
    }

    /** The one currency of all zones that have a price; nothing where there are two, since their money is not added. */
    public static Optional<String> currency(List<RankedZone> zones) {
        List<String> currencies = zones.stream().flatMap(zone -> zone.currency().stream()).distinct().toList();
        return currencies.size() == 1 ? Optional.of(currencies.get(0)) : Optional.empty();
    }

    private static OptionalDouble sum(List<RankedZone> zones, Function<RankedZone, OptionalDouble> number) {
        boolean all = !zones.isEmpty() && zones.stream().allMatch(zone -> number.apply(zone).isPresent());
        return all ? OptionalDouble.of(zones.stream().mapToDouble(zone -> number.apply(zone).getAsDouble()).sum())
                : OptionalDouble.empty();
    }
}
