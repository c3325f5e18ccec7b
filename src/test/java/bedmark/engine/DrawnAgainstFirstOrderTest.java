package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.Station;
import bedmark.engine.uncertainty.Distribution;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.verdict.Rule;
import java.util.EnumMap;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * Drawing against the first order over many random zones: within 2 % of each other where every reading is fine, apart
 * where a depth is coarse, and then always in the one direction that a square can go.
 */
class DrawnAgainstFirstOrderTest {
    private static final int TRIALS = 200;
    private static final double FINE = 0.1;
    private static final double COARSE = 0.3;

    @Test
    void whereReadingsAreFineTheyAgree() {
        Random random = new Random(91);
        double ratio = 0;
        double meanApart = 0;
        int zones = 0;
        for (int i = 0; i < Zones.MANY; i++) {
            LoadingZone zone = scaled(atBoard(Zones.random(random), 0.005), FINE);
            ZoneFacts facts = new ZoneFacts(Sources.uncertain(zone, Settings.standard()));
            FeedFacts feed = FeedFacts.today(facts);
            if (!facts.referenceDepth().isKnown() || feed.meanSquare().get().value() < 0.02 * 0.02) {
                continue;
            }
            Estimate firstOrder = facts.sources().tape().estimate(
                    feed.meanSquare().get().squareRoot().over(facts.referenceDepth().get()));
            Distribution drawn = Distribution.of(new DrawnBed(feed, new Hypercube(TRIALS)
                    .zone(facts.sources().tape())).observed(Rule.BED_OVER_DESIGN));
            zones++;
            ratio += drawn.standardDeviation() / firstOrder.standardUncertainty();
            meanApart += Math.abs(drawn.mean() - firstOrder.value()) / firstOrder.value();
            assertEquals(1, drawn.standardDeviation() / firstOrder.standardUncertainty(), 0.5, zone::toString);
        }
        assertTrue(zones > Zones.MANY / 3, zones + " zones");
        assertEquals(1, ratio / zones, 0.02);
        assertTrue(meanApart / zones < 0.02, meanApart / zones + " off");
    }

    /** The mean of h² is the square of the mean and the variance besides: u² more at one station. */
    @Test
    void whereADepthIsCoarseDrawingFindsMore() {
        Random random = new Random(92);
        for (int i = 0; i < Zones.MANY; i++) {
            double depth = 0.05 + 0.5 * random.nextDouble();
            double u = COARSE * depth * (0.5 + random.nextDouble() / 2);
            LoadingZone zone = Zones.exact(Zones.random(random));
            zone = zone.withStations(java.util.List.of()).withStation(0.1, depth, DepthMethod.AT_BOARD, u);
            ZoneFacts facts = new ZoneFacts(Sources.uncertain(zone, Zones.exactSettings()));
            FeedFacts feed = FeedFacts.today(facts);
            Hypercube.Zone readings = new Hypercube(TRIALS).zone(facts.sources().tape());
            double[] drawn = readings.of(feed.profile().get().level(0));
            double mean = 0;
            for (double level : drawn) {
                mean += level * level / drawn.length;
            }
            double more = mean - depth * depth;
            assertEquals(u * u, more, 0.05 * u * u, "u² more");
            if (feed.driveShare().isKnown() && facts.method() != bedmark.engine.drag.DragMethod.ISO_5048) {
                double share = Distribution.of(new DrawnBed(feed, readings).driveShare()).mean();
                assertTrue(share >= feed.driveShare().get().value() * (1 - 1e-12), "never less");
            }
        }
    }

    private static LoadingZone atBoard(LoadingZone zone, double uncertainty) {
        return zone.withStations(zone.stations().stream().map(station -> new Station(station.position(),
                new Reading(station.raw().name(), station.raw().value(), uncertainty), DepthMethod.AT_BOARD)).toList());
    }

    /** The same zone, its readings so many times as uncertain. */
    private static LoadingZone scaled(LoadingZone zone, double factor) {
        Map<Datum, Reading> data = new EnumMap<>(Datum.class);
        zone.data().forEach((datum, reading) -> data.put(datum,
                new Reading(reading.name(), reading.value(), factor * reading.standardUncertainty())));
        return zone.with(data).withStations(zone.stations().stream().map(station -> new Station(
                new Reading(station.position().name(), station.position().value(),
                        factor * station.position().standardUncertainty()),
                new Reading(station.raw().name(), station.raw().value(), factor * station.raw().standardUncertainty()),
                station.method())).toList());
    }
}
