package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.verdict.AllowedDepth;
import bedmark.engine.verdict.Component;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.RefusedVerdict;
import bedmark.engine.verdict.Rule;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;

/** A conveyor against its one drive, belt feeders, conveyors that are skirted all along. */
class WholeConveyorTest {
    private static final LoadingZone ZONE = Zones.healthy();
    private static final LoadingZone DEEP = ZONE.withStations(List.of())
            .withStation(3, 0.3, DepthMethod.AT_BOARD, 0.005);

    @Test
    void theZonesAreSummedAgainstTheDrive() {
        ConveyorAssessment conveyor = Engine.assessConveyor(List.of(ZONE, DEEP, ZONE), 0, Settings.standard());
        assertEquals(0, conveyor.lacking());
        for (Result result : List.of(Result.MATERIAL_DRAG, Result.SEAL_DRAG, Result.SKIRT_DRAG, Result.LOADING_FORCE,
                Result.SKIRT_POWER, Result.DRIVE_POWER, Result.DRIVE_SHARE, Result.ENERGY)) {
            assertEquals(conveyor.zones().stream().mapToDouble(zone -> zone.get(result).orElseThrow().value()).sum(),
                    conveyor.get(result).orElseThrow().value(), 1e-9 * conveyor.get(result).orElseThrow().value());
            assertTrue(conveyor.get(result).orElseThrow().standardUncertainty()
                    <= conveyor.zones().stream().mapToDouble(zone -> zone.get(result).orElseThrow()
                    .standardUncertainty()).sum() * (1 + 1e-12));
        }
        Finding skirts = conveyor.driveFindings().get(1);
        assertEquals(Rule.SKIRTS_OVER_BUDGET, skirts.rule());
        assertEquals(conveyor.get(Result.DRIVE_SHARE).orElseThrow().value(), skirts.observed(), 1e-15);
        assertEquals(Rule.DRIVE_NEAR_RATING, conveyor.driveFindings().get(0).rule());
    }

    @Test
    void theZoneAndTheComponentThatLeadAreNamed() {
        assertEquals(OptionalInt.of(1), Engine.assessConveyor(List.of(ZONE, DEEP, ZONE), 0, Settings.standard())
                .leadingZone());
        assertEquals(Optional.of(Component.BED), Engine.assessConveyor(List.of(DEEP.with(Datum.FEED_VELOCITY, 2, 0)),
                0, Settings.standard()).leading());
        assertEquals(Optional.of(Component.SEAL), Engine.assessConveyor(List.of(ZONE.with(Datum.FEED_VELOCITY, 2, 0)),
                0, Settings.standard()).leading());
        assertEquals(Optional.of(Component.LOADING), Engine.assessConveyor(Collections.nCopies(2,
                ZONE.with(Datum.FEED_VELOCITY, -2, 0)), 0, Settings.standard()).leading());
    }

    @Test
    void aZoneThatDoesNotKnowItsPartLeavesNoSum() {
        ConveyorAssessment conveyor = Engine.assessConveyor(List.of(DEEP, ZONE.without(Datum.BELT_SPEED)), 1,
                Settings.standard());
        assertEquals(2, conveyor.lacking());
        assertTrue(conveyor.get(Result.SKIRT_DRAG).isPresent());
        assertEquals(Optional.empty(), conveyor.get(Result.SKIRT_POWER));
        assertEquals(OptionalInt.of(0), conveyor.leadingZone());
        assertEquals(OptionalInt.of(0), Engine.assessConveyor(List.of(ZONE, ZONE), 0, Settings.standard())
                .leadingZone(), "of zones alike the first");
        assertEquals(Level.OVERLOADED, conveyor.level(), "what is there is overloaded already");
    }

    @Test
    void ofNoZoneNothingIsKnown() {
        ConveyorAssessment none = Engine.assessConveyor(List.of(), 3, Settings.standard());
        assertEquals(Level.INCOMPLETE, none.level());
        assertEquals(3, none.lacking());
        assertEquals(Map.of(), none.sums());
        assertEquals(OptionalInt.empty(), none.leadingZone());
        assertEquals(Optional.empty(), none.leading());
        assertEquals(List.of(), none.driveFindings());
        ConveyorAssessment unknown = Engine.assessConveyor(List.of(LoadingZone.UNKNOWN), 0, Settings.standard());
        assertEquals(OptionalInt.empty(), unknown.leadingZone());
        assertEquals(Optional.empty(), unknown.leading());
        assertEquals(1, unknown.lacking());
    }

    @Test
    void theWorstZoneMakesTheLevel() {
        LoadingZone full = ZONE.withStations(List.of()).withStation(3, 0.6, DepthMethod.AT_BOARD, 0.005);
        assertEquals(Level.OVERLOADED, Engine.assessConveyor(List.of(ZONE, full), 0, Settings.standard()).level());
        assertEquals(Level.WITHIN, Engine.assessConveyor(List.of(ZONE, ZONE), 0, Settings.standard()).level());
    }

    @Test
    void aHopperLeavesTheSkirtsShareALowerBound() {
        LoadingZone feeder = ZONE.withMark(LoadingZone.Mark.BELT_FEEDER);
        Assessment assessment = Engine.assess(feeder, Settings.standard());
        assertTrue(find(assessment, Rule.SKIRTS_OVER_BUDGET).isEmpty(), "what the hopper asks for is not known");
        assertTrue(assessment.refused().contains(
                new RefusedVerdict(Rule.SKIRTS_OVER_BUDGET, "hopper-load-outside")));
        assertTrue(assessment.assumptions().contains(Assumption.of("hopper-load-outside")));
        assertTrue(find(assessment, Rule.DRIVE_NEAR_RATING).isPresent(), "a running power is read, hopper and all");
        assertFalse(assessment.allowedDepths().stream().map(AllowedDepth::rule).toList()
                .contains(Rule.SKIRTS_OVER_BUDGET));
        Assessment over = Engine.assess(feeder.with(Datum.SKIRT_POWER_BUDGET, 0.01, 0), Settings.standard());
        assertEquals(Level.OVERLOADED, find(over, Rule.SKIRTS_OVER_BUDGET).orElseThrow().level());
        assertEquals(List.of(new RefusedVerdict(Rule.DRIVE_NEAR_RATING, "hopper-load-outside")), over.refused());
    }

    @Test
    void aHopperLeavesTheDriveUnjudgedAtDesignFeed() {
        LoadingZone feeder = ZONE.withMark(LoadingZone.Mark.BELT_FEEDER);
        Assessment assessment = Engine.assess(feeder, Settings.standard());
        assertTrue(assessment.findingsAtDesign().stream().noneMatch(found -> found.rule() == Rule.DRIVE_NEAR_RATING));
        assertEquals(List.of(new RefusedVerdict(Rule.SKIRTS_OVER_BUDGET, "hopper-load-outside"),
                new RefusedVerdict(Rule.DRIVE_NEAR_RATING, "hopper-load-outside")), assessment.refused());
        Assessment unread = Engine.assess(feeder.without(Datum.RUNNING_POWER), Settings.standard());
        assertEquals(1, unread.refused().size(), "what was not read for is not refused");
        assertEquals(List.of(), Engine.assess(ZONE, Settings.standard()).refused());
    }

    @Test
    void anotherZonesHopperIsOnTheSameDrive() {
        Assessment plain = Engine.assessConveyor(List.of(ZONE, ZONE.withMark(LoadingZone.Mark.BELT_FEEDER)), 0,
                Settings.standard()).zones().get(0);
        assertTrue(find(plain, Rule.SKIRTS_OVER_BUDGET).isEmpty());
        assertEquals(List.of(new RefusedVerdict(Rule.SKIRTS_OVER_BUDGET, "hopper-load-outside")), plain.refused());
    }

    @Test
    void aConveyorSkirtedAllAlongHasNoOpenBelt() {
        LoadingZone skirted = ZONE.withMark(LoadingZone.Mark.FULLY_SKIRTED).with(Datum.THROUGHPUT, 900, 0);
        Assessment assessment = Engine.assess(skirted, Settings.standard());
        assertTrue(find(assessment, Rule.FLOW_OVER_CAPACITY).isEmpty());
        assertEquals(List.of(new RefusedVerdict(Rule.FLOW_OVER_CAPACITY, "no-open-belt")), assessment.refused());
        assertTrue(assessment.assumptions().contains(Assumption.of("no-open-belt")));
        assertFalse(assessment.results().containsKey(Result.FILL));
        assertTrue(assessment.remedies().stream().noneMatch(remedy -> remedy.code().equals("shorten-zone")));
        assertEquals(List.of(), Engine.assess(skirted.without(Datum.THROUGHPUT), Settings.standard()).refused());
    }

    @Test
    void whatTheVerdictAtDesignFeedLeavesOutIsSaid() {
        LoadingZone half = ZONE.with(Datum.DESIGN_THROUGHPUT, 400, 0);
        LoadingZone unweighed = half.without(Datum.THROUGHPUT);
        List<Assessment> both = Engine.assessConveyor(List.of(half, unweighed), 0, Settings.standard()).zones();
        assertTrue(both.get(0).assumptions().contains(Assumption.of("drive-lower-bound-at-design")));
        assertTrue(both.get(0).assumptions().contains(Assumption.of("conveyor-sum-at-todays-feed", "1")));
        assertTrue(both.get(1).assumptions().stream().noneMatch(one -> one.code().endsWith("-at-design")
                || one.code().equals("conveyor-sum-at-todays-feed")));
        Assessment alone = Engine.assess(ZONE, Settings.standard());
        assertTrue(alone.assumptions().stream().noneMatch(one -> one.code().equals("drive-lower-bound-at-design")
                || one.code().equals("conveyor-sum-at-todays-feed")), "nothing is added at today's own feed");
        assertTrue(Engine.assess(half.without(Datum.RUNNING_POWER), Settings.standard()).assumptions().stream()
                .noneMatch(one -> one.code().equals("drive-lower-bound-at-design")));
    }

    private static Optional<Finding> find(Assessment assessment, Rule rule) {
        return assessment.findings().stream().filter(finding -> finding.rule() == rule).findFirst();
    }
}
