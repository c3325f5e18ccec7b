package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class ConveyorLoadTest {
    private static FeedFacts today(LoadingZone zone) {
        return FeedFacts.today(new ZoneFacts(Sources.uncertain(zone, Settings.standard())));
    }

    @Test
    void sharesAndSpreadsOfTheKnownZonesAddUp() {
        FeedFacts zone = today(Zones.healthy());
        FeedFacts feeder = today(Zones.healthy().withMark(LoadingZone.Mark.BELT_FEEDER));
        FeedFacts unknown = today(Zones.healthy().without(Datum.RATED_POWER));
        ConveyorLoad load = ConveyorLoad.of(List.of(zone, feeder, unknown), 3, 1).orElseThrow();
        assertEquals(2 * zone.driveShare().get().value(), load.share().value(), 1e-15);
        assertTrue(zone.spreadOfShare() > 0);
        assertEquals(2 * zone.spreadOfShare(), load.spread(), 1e-15);
        assertEquals(Math.hypot(load.share().standardUncertainty(), load.spread()),
                load.counted().standardUncertainty(), 1e-15);
        assertEquals(4, load.lacking(), "three that nobody surveyed and one without a rating");
        assertEquals(1, load.asToday());
        assertEquals(1, load.feeders());
    }

    @Test
    void aSumIsALowerBoundWhereAZoneOrAHopperIsNotInIt() {
        FeedFacts zone = today(Zones.healthy());
        FeedFacts feeder = today(Zones.healthy().withMark(LoadingZone.Mark.BELT_FEEDER));
        assertFalse(ConveyorLoad.of(List.of(zone), 0, 0).orElseThrow().isLowerBound());
        assertTrue(ConveyorLoad.of(List.of(zone), 1, 0).orElseThrow().isLowerBound());
        assertTrue(ConveyorLoad.of(List.of(feeder), 0, 0).orElseThrow().isLowerBound());
        assertEquals(Optional.empty(), ConveyorLoad.of(List.of(today(LoadingZone.UNKNOWN)), 2, 0));
    }
}
