package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.Station;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Reading;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.function.Function;
import org.junit.jupiter.api.Test;

/** The derivatives that come with every result against central differences of the whole assessment. */
class GradientTest {
    private static final double STEP = 1e-6;
    private int compared;

    @Test
    void everyDerivativeIsThatOfTheResult() {
        Random random = new Random(20_260_101);
        int zones = Zones.atMost(100);
        for (int i = 0; i < zones; i++) {
            LoadingZone zone = Zones.exact(Zones.random(random));
            for (Datum datum : zone.data().keySet()) {
                compare(datum.pointer(), zone.data().get(datum).value(), reading -> {
                    Map<Datum, Reading> data = new EnumMap<>(zone.data());
                    data.put(datum, reading);
                    return zone.with(data);
                });
            }
            for (int row = 0; row < zone.stations().size(); row++) {
                Station station = zone.stations().get(row);
                int place = row;
                compare(station.raw().name(), station.raw().value(), reading -> zone.withStations(
                        replaced(zone.stations(), place, new Station(station.position(), reading, station.method()))));
                compare(station.position().name(), station.position().value(), reading -> zone.withStations(
                        replaced(zone.stations(), place, new Station(reading, station.raw(), station.method()))));
            }
            for (int row = 0; row < zone.seals().size(); row++) {
                SealSegment segment = zone.seals().get(row);
                int place = row;
                compare(segment.length().name(), segment.length().value(), reading -> zone.withSeals(
                        replaced(zone.seals(), place, new SealSegment(segment.side(), segment.type(),
                                segment.condition(), reading))));
            }
        }
        assertTrue(compared > 200 * zones, () -> compared + " derivatives");
    }

    /** With one uncertain reading a standard uncertainty is the size of the derivative times that reading's own. */
    private void compare(String name, double value, Function<Reading, LoadingZone> zone) {
        double step = STEP * Math.max(Math.abs(value), 1e-3);
        Assessment at = Engine.assess(zone.apply(new Reading(name, value, step)), Zones.exactSettings());
        Map<Result, Double> over = values(zone, name, value + step);
        Map<Result, Double> under = values(zone, name, value - step);
        at.results().forEach((result, estimate) -> {
            if (over.containsKey(result) && under.containsKey(result)) {
                double derivative = (over.get(result) - under.get(result)) / 2;
                double rounding = 1e-9 * Math.abs(estimate.value()) + 1e-5 * Math.abs(derivative);
                boolean kink = Math.abs(over.get(result) - 2 * estimate.value() + under.get(result))
                        > 1e-3 * Math.abs(derivative) + 1e-11 * Math.abs(estimate.value());
                if (!kink) {
                    assertEquals(Math.abs(derivative), estimate.standardUncertainty(), rounding + 1e-20,
                            () -> result + " by " + name);
                    compared++;
                }
            }
        });
    }

    private static <T> List<T> replaced(List<T> rows, int place, T row) {
        List<T> changed = new ArrayList<>(rows);
        changed.set(place, row);
        return changed;
    }

    private static Map<Result, Double> values(Function<Reading, LoadingZone> zone, String name,
            double value) {
        Map<Result, Double> values = new EnumMap<>(Result.class);
        try {
            Engine.assess(zone.apply(Reading.exact(name, value)), Zones.exactSettings()).results()
                    .forEach((result, estimate) -> values.put(result, estimate.value()));
        } catch (ImpossibleReading atTheEdgeOfThePossible) {
            return Map.of();
        }
        return values;
    }
}
