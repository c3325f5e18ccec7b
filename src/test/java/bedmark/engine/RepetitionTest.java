package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.Station;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Repeat;
import bedmark.engine.verdict.Rule;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class RepetitionTest {
    private static final LoadingZone ZONE = Zones.healthy().without(Datum.DESIGN_BED_DEPTH)
            .without(Datum.DESIGN_THROUGHPUT);

    @Test
    void aReadingAsGoodAsAskedSettlesTheVerdictAndAWorseOneDoesNot() {
        for (double depth : new double[]{0.380, 0.392, 0.41, 0.42}) {
            LoadingZone zone = depth(depth, 0.03);
            Repeat repeat = Engine.assess(zone, Settings.standard()).repeat().orElseThrow();
            assertEquals("/readings/bedDepths/0/depth", repeat.reading());
            assertEquals(Rule.BED_OVER_BOARD, repeat.rule());
            double needed = repeat.standardUncertainty().orElseThrow();
            assertTrue(needed > 0 && needed < 0.03);
            assertTrue(level(depth(depth, needed * 0.999)) != Level.UNDECIDED, "settled at " + depth);
            assertEquals(Level.UNDECIDED, level(depth(depth, needed * 1.001)), "not settled at " + depth);
        }
    }

    @Test
    void theReadingThatMustImproveLeastIsAskedFor() {
        LoadingZone zone = depth(0.392, 0.006).with(Datum.READ_HEIGHT, 0.4, 0.004);
        Repeat repeat = Engine.assess(zone, Settings.standard()).repeat().orElseThrow();
        assertEquals("/readings/bedDepths/0/depth", repeat.reading());
        double room = 0.008 / 1.2815515655446004;
        double heights = 0.392 / 0.4 * 0.004;
        assertEquals(Math.sqrt(room * room - heights * heights), repeat.standardUncertainty().orElseThrow(), 1e-9);
        LoadingZone vagueBoard = depth(0.392, 0.004).with(Datum.READ_HEIGHT, 0.4, 0.012);
        assertEquals("/readings/skirtHeight", Engine.assess(vagueBoard, Settings.standard()).repeat().orElseThrow()
                .reading());
    }

    @Test
    void whereNoReadingAloneWouldDoTheOneThatBringsMostIsNamedWithoutANumber() {
        LoadingZone zone = depth(0.399, 0.006).with(Datum.READ_HEIGHT, 0.4, 0.005);
        Repeat repeat = Engine.assess(zone, Settings.standard()).repeat().orElseThrow();
        assertEquals("/readings/bedDepths/0/depth", repeat.reading());
        assertEquals(OptionalDouble.empty(), repeat.standardUncertainty());
    }

    @Test
    void whatTheRegisterHoldsIsNoReadingToRepeat() {
        LoadingZone zone = Zones.exact(ZONE).without(Datum.READ_HEIGHT).with(Datum.REGISTER_HEIGHT, 0.4, 0.02)
                .withStations(List.of()).withStation(3, 0.395, DepthMethod.AT_BOARD, 0);
        Assessment assessment = Engine.assess(zone, Zones.exactSettings());
        assertEquals(Level.UNDECIDED, assessment.level());
        assertEquals(Optional.empty(), assessment.repeat());
    }

    @Test
    void aDecidedVerdictAsksForNothing() {
        assertEquals(Optional.empty(), Engine.assess(Zones.healthy(), Settings.standard()).repeat());
        assertEquals(Optional.empty(), Engine.assess(depth(0.6, 0.005), Settings.standard()).repeat());
    }

    @Test
    void aBudgetOfTheConveyorAsksTheZoneForItsOwnReading() {
        LoadingZone zone = Zones.healthy().withStations(List.of()).withStation(3, 0.3, DepthMethod.AT_BOARD, 0.02);
        double share = Engine.assess(zone, exact()).get(Result.DRIVE_SHARE).orElseThrow().value();
        LoadingZone tight = Zones.exact(zone).with(Datum.SKIRT_POWER_BUDGET, share * 1.02, 0)
                .withStations(uncertain(zone, 0.02));
        Assessment assessment = Engine.assess(tight, exact());
        assertEquals(Rule.SKIRTS_OVER_BUDGET, assessment.repeat().orElseThrow().rule());
        double needed = assessment.repeat().orElseThrow().standardUncertainty().orElseThrow();
        assertTrue(finding(Engine.assess(tight.withStations(uncertain(zone, needed * 0.999)), exact())).level()
                != Level.UNDECIDED);
        assertEquals(Level.UNDECIDED, finding(Engine.assess(tight.withStations(uncertain(zone, needed * 1.001)),
                exact())).level());
    }

    private static Settings exact() {
        return Zones.exactSettings();
    }

    private static List<Station> uncertain(LoadingZone zone, double spread) {
        List<Station> stations = new ArrayList<>();
        for (Station station : zone.stations()) {
            stations.add(new Station(Reading.exact(station.position().name(), station.position().value()),
                    new Reading(station.raw().name(), station.raw().value(), spread), station.method()));
        }
        return stations;
    }

    private static Finding finding(Assessment assessment) {
        return assessment.findings().stream().filter(found -> found.rule() == Rule.SKIRTS_OVER_BUDGET).findFirst()
                .orElseThrow();
    }

    private static LoadingZone depth(double depth, double spread) {
        return Zones.exact(ZONE).withStations(List.of()).withStation(3, depth, DepthMethod.AT_BOARD, spread);
    }

    private static Level level(LoadingZone zone) {
        return Engine.assess(zone, Settings.standard()).findings().stream()
                .filter(found -> found.rule() == Rule.BED_OVER_BOARD).findFirst().orElseThrow().level();
    }
}
