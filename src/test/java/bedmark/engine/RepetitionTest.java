package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.Station;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Sensitivity;
import bedmark.engine.verdict.Certainty;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Judgement;
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

    private static Optional<Repeat> repeat(double observed, double uncertainty, Certainty certainty,
            Sensitivity... sensitivities) {
        Finding finding = Judgement.of(Rule.BED_OVER_BOARD, new Estimate(observed, uncertainty),
                Rule.BED_OVER_BOARD.limit(), certainty, Optional.empty());
        return new Repetition(finding, certainty).of(List.of(sensitivities));
    }

    private static Sensitivity by(String name, double uncertainty, double derivative) {
        return new Sensitivity(new Reading("/readings/" + name, 1, uncertainty), derivative);
    }

    /** 1.6449 standard uncertainties over the limit are 95 % sure, 0.8416 under it leave no more than 20 %. */
    @Test
    void howFarAwayIsFarEnoughIsTheSitesOwn() {
        Certainty own = new Certainty(0.95, 0.2, 0.5);
        Sensitivity all = by("x", 0.05, 2);
        assertEquals(0.05 / 1.644_853_627 / 2, repeat(1.05, 0.1, own, all).orElseThrow().standardUncertainty()
                .orElseThrow(), 1e-9);
        assertEquals(0.05 / 0.841_621_234 / 2, repeat(0.95, 0.1, own, all).orElseThrow().standardUncertainty()
                .orElseThrow(), 1e-9);
    }

    /** A reading is asked to improve by its own share, however fine it already is. */
    @Test
    void theShareCountsAndNotTheSize() {
        Certainty standard = Certainty.standard();
        double observed = 1 - Math.sqrt(0.005) * 1.2815515655446004;
        Sensitivity coarse = by("coarse", 1, 0.05);
        Sensitivity fine = by("fine", 0.01, 6);
        for (Sensitivity[] order : new Sensitivity[][] {{coarse, fine}, {fine, coarse}}) {
            Repeat repeat = repeat(observed, Math.sqrt(0.0061), standard, order).orElseThrow();
            assertEquals("/readings/fine", repeat.reading());
            assertEquals(0.05 / 6, repeat.standardUncertainty().orElseThrow(), 1e-9);
        }
    }

    @Test
    void ofReadingsAlikeTheFirstIsAskedFor() {
        Certainty standard = Certainty.standard();
        assertEquals("/readings/x", repeat(1.07, 0.0707, standard, by("x", 0.05, 1), by("y", 0.05, 1)).orElseThrow()
                .reading());
        Repeat hopeless = repeat(1.001, 0.0707, standard, by("x", 0.05, 1), by("y", 0.05, 1)).orElseThrow();
        assertEquals("/readings/x", hopeless.reading());
        assertEquals(OptionalDouble.empty(), hopeless.standardUncertainty());
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
