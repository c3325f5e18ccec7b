package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Reading;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.Test;

class LoadingZoneTest {
    private static final LoadingZone ZONE = Zones.healthy();

    @Test
    void sealsAreLookedForByTheirCondition() {
        LoadingZone worn = ZONE.withSeal(Side.LEFT, SealType.VERTICAL, SealCondition.WORN, 1, 0);
        assertTrue(worn.hasSeals(EnumSet.of(SealCondition.TORN, SealCondition.WORN)));
        assertFalse(worn.hasSeals(EnumSet.of(SealCondition.TORN)));
        assertFalse(ZONE.hasSeals(EnumSet.of(SealCondition.WORN)));
        assertFalse(LoadingZone.UNKNOWN.hasSeals(EnumSet.allOf(SealCondition.class)));
    }

    @Test
    void stationsStandInOrderOfTheirPositionAndKeepTheirNames() {
        LoadingZone zone = LoadingZone.UNKNOWN.withStation(5, 0.1, DepthMethod.AT_BOARD, 0.01)
                .withStation(1, 0.2, DepthMethod.AT_CENTRE, 0.02);
        assertEquals(List.of("/readings/bedDepths/1/depth", "/readings/bedDepths/0/depth"),
                zone.stations().stream().map(station -> station.raw().name()).toList());
        assertEquals(new Reading("/readings/bedDepths/1/depth", 0.2, 0.02), zone.stations().get(0).raw());
        assertEquals(Reading.exact("/readings/bedDepths/1/position", 1), zone.stations().get(0).position());
    }

    /** A change gives another zone with everything else as it was. */
    @Test
    void oneThingIsChangedAtATime() {
        LoadingZone base = ZONE.withMark(LoadingZone.Mark.BELT_FEEDER).withUnfinished(List.of("/readings/seals/0"));
        assertEquals(Optional.of(new Reading("/readings/throughput", 99, 3)), base.with(Datum.THROUGHPUT, 99, 3)
                .get(Datum.THROUGHPUT));
        assertEquals(base, base.with(Datum.THROUGHPUT, 99, 3).with(base.data()));
        assertEquals(Optional.empty(), base.without(Datum.THROUGHPUT).get(Datum.THROUGHPUT));
        assertEquals(base.data().size() - 1, base.without(Datum.THROUGHPUT).data().size());
        assertEquals(base, base.withSpeedClass(SpeedClass.GRAIN_FREE_FLOWING)
                .withSpeedClass(SpeedClass.COAL_SOFT_ORE_FINE_STONE));
        LoadingZone marked = base.withMark(LoadingZone.Mark.FREE_FLOWING);
        assertTrue(marked.is(LoadingZone.Mark.BELT_FEEDER) && marked.is(LoadingZone.Mark.FREE_FLOWING));
        assertFalse(base.is(LoadingZone.Mark.FREE_FLOWING));
        assertEquals(base, base.withSeals(List.of()).withSeals(base.seals()));
        assertEquals(List.of("/readings/seals/0"), base.withStations(List.of()).unfinished());
    }

    @Test
    void aZoneIsNotChangedFromOutside() {
        Map<Datum, Reading> numbers = new EnumMap<>(ZONE.data());
        LoadingZone zone = new LoadingZone(numbers, ZONE.stations(), ZONE.seals(), ZONE.speedClass(), Set.of(),
                List.of());
        numbers.clear();
        assertEquals(ZONE.data(), zone.data());
        assertThrows(UnsupportedOperationException.class, () -> zone.data().remove(Datum.THROUGHPUT));
    }
}
