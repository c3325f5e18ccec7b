package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.flow.MaximumBeltSpeed;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Rule;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

class ResultsTest {
    private static final LoadingZone ZONE = Zones.healthy();

    private static Assessment assess(LoadingZone zone) {
        return Engine.assess(zone, Settings.standard());
    }

    private static double value(Assessment assessment, Result result) {
        return assessment.get(result).orElseThrow().value();
    }

    /** 30 kW of electrical power at a motor of 92 % are 27.6 kW at its shaft. */
    @Test
    void theRunningShareIsOfTheShaftPower() {
        Assessment running = assess(ZONE);
        assertEquals(value(running, Result.DRIVE_POWER) / 27_600, value(running, Result.RUNNING_SHARE), 1e-12);
        assertEquals(Optional.empty(), assess(ZONE.with(Datum.RUNNING_POWER, 0, 0)).get(Result.RUNNING_SHARE));
        Assessment unread = assess(ZONE.without(Datum.RUNNING_POWER));
        assertEquals(Optional.empty(), unread.get(Result.RUNNING_SHARE));
        assertFalse(unread.missing().contains(Datum.RUNNING_POWER.pointer()), "nobody has to read it");
    }

    /** What follows the drag errs with it by the same share; what does not follow it is as the readings leave it. */
    @Test
    void theDisagreementOfTheMethodsCountsInAllThatFollowsTheDrag() {
        Assessment assessment = assess(ZONE);
        double share = assessment.spread().orElseThrow().standardUncertainty() / value(assessment, Result.SKIRT_DRAG);
        assertTrue(share > 0);
        for (Result result : List.of(Result.SKIRT_POWER, Result.DRIVE_POWER, Result.ENERGY, Result.RUNNING_SHARE)) {
            Estimate readings = assessment.get(result).orElseThrow();
            Estimate counted = assessment.counted(result).orElseThrow();
            assertEquals(readings.value(), counted.value());
            assertEquals(Math.hypot(readings.standardUncertainty(), share * readings.value()),
                    counted.standardUncertainty(), 1e-9 * counted.value(), result.key());
        }
        for (Result result : List.of(Result.MEAN_DEPTH, Result.FILL, Result.LOADING_FORCE)) {
            assertEquals(assessment.get(result), assessment.counted(result));
        }
        assertEquals(Optional.empty(), assessment.counted(Result.COST));
    }

    @Test
    void whatNothingDragsDisagreesByNothing() {
        Assessment bare = assess(ZONE.without(Datum.ANGLE_OF_REPOSE));
        assertEquals(bare.get(Result.SKIRT_POWER), bare.counted(Result.SKIRT_POWER));
        assertEquals(Optional.empty(), assess(LoadingZone.UNKNOWN).counted(Result.SKIRT_POWER));
        LoadingZone untouched = Zones.exact(ZONE).withStations(List.of()).withStation(3, 0, DepthMethod.AT_BOARD, 0)
                .withSeals(List.of()).withSeal(Side.LEFT, SealType.NONE, SealCondition.SOUND, 6, 0)
                .withSeal(Side.RIGHT, SealType.NONE, SealCondition.SOUND, 6, 0);
        assertEquals(Optional.of(new Estimate(0, 0)), assess(untouched).counted(Result.SKIRT_POWER));
    }

    @Test
    void electricityIsPricedByTheKilowattHour() {
        Prices prices = new Prices(OptionalDouble.of(0.2), Optional.of("EUR"), OptionalDouble.of(0.4));
        Assessment priced = Engine.assess(ZONE, Settings.standard().with(prices));
        assertEquals(value(priced, Result.ENERGY) / 1000 * 0.2, value(priced, Result.COST), 1e-9);
        assertEquals(value(priced, Result.ENERGY) / 1000 * 0.4, value(priced, Result.CO2), 1e-9);
        assertEquals(Optional.of("EUR"), priced.currency());
        assertEquals(new Prices(OptionalDouble.empty(), Optional.empty(), OptionalDouble.empty()), Prices.unknown());
    }

    @Test
    void somethingMoreMayBeTakenForGrantedBeforeTheEngineSeesTheZone() {
        Assessment assessment = assess(ZONE);
        Assumption converted = Assumption.of("converted-from", "bar");
        assertEquals(Stream.concat(assessment.assumptions().stream(), Stream.of(converted)).toList(),
                assessment.with(converted).assumptions());
        assertEquals(assessment.results(), assessment.with(converted).results());
        assertEquals(assessment.remedies(), assessment.with(converted).remedies());
    }

    @Test
    void aSiteMayHaveItsOwnTableOfSpeeds() {
        MaximumBeltSpeed slow = new MaximumBeltSpeed(Stream.of(SpeedClass.values())
                .map(material -> new MaximumBeltSpeed.Row(material, 0.5, true, 1.5)).toList());
        Settings own = Settings.standard().with(slow);
        assertEquals(slow, own.maximumSpeeds());
        assertEquals(Settings.standard().limits(), own.limits());
        assertEquals(OptionalDouble.of(1.5), Engine.assess(ZONE, own).findings().stream()
                .filter(finding -> finding.rule() == Rule.BELT_TOO_FAST).findFirst().orElseThrow().near());
    }

    /** A row that was begun is missing by itself and not as a whole; one begun elsewhere leaves the whole missing. */
    @Test
    void whatWasBegunIsAskedForByItsPart() {
        LoadingZone bare = ZONE.withStations(List.of()).without(Datum.BELT_SPEED);
        List<String> depth = List.of("/readings/bedDepths/0/depth");
        assertEquals(List.of("/readings/bedDepths/0/depth", "/readings/beltSpeed"), required(bare, depth));
        for (String speed : List.of("/readings/beltTiming/elapsed", "/readings/pulleySpeed/rotation")) {
            assertEquals(List.of(speed, "/readings/bedDepths"), required(bare, List.of(speed)));
        }
        assertEquals(List.of("/readings/seals/2/length", "/readings/beltSpeed", "/readings/bedDepths"),
                required(bare, List.of("/readings/seals/2/length")));
    }

    private static List<String> required(LoadingZone zone, List<String> unfinished) {
        return assess(zone.withUnfinished(unfinished)).missingRequired();
    }
}
