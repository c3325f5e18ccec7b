package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.flow.LengthConventions;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.verdict.AllowedDepth;
import bedmark.engine.verdict.Component;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Rule;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

class VerdictTest {
    private static final LoadingZone HEALTHY = Zones.healthy();

    @Test
    void aHealthyZoneKeepsEveryRule() {
        Assessment assessment = Engine.assess(HEALTHY, Settings.standard());
        assertEquals(Level.WITHIN, assessment.level());
        assertEquals(Optional.of(Level.WITHIN), assessment.levelAtDesignFeed());
        assertEquals(Stream.of(Rule.values()).toList(), assessment.findings().stream().map(Finding::rule).toList());
        assertEquals(Stream.of(Rule.values()).toList(),
                assessment.findingsAtDesign().stream().map(Finding::rule).toList());
        assertEquals(List.of(), assessment.missing());
    }

    @Test
    void aBedOverTheBoardOverloadsTheZone() {
        assertEquals(Level.OVERLOADED, level(depth(0.45), Rule.BED_OVER_BOARD));
        assertEquals(Level.OVERLOADED, Engine.assess(depth(0.45), Settings.standard()).level());
        assertEquals(Level.NEAR, level(depth(0.37), Rule.BED_OVER_BOARD));
        assertEquals(Level.UNDECIDED, level(depth(0.40), Rule.BED_OVER_BOARD));
    }

    @Test
    void theReadingToRepeatIsTheOneBehindAnUndecidedRule() {
        LoadingZone zone = HEALTHY.without(Datum.DESIGN_BED_DEPTH).without(Datum.DESIGN_THROUGHPUT)
                .withStations(List.of()).withStation(3, 0.40, DepthMethod.AT_BOARD, 0.02);
        Assessment assessment = Engine.assess(zone, Settings.standard());
        assertEquals(Level.UNDECIDED, assessment.level());
        assertEquals("/readings/bedDepths/0/depth", assessment.repeat().orElseThrow().reading());
        assertEquals(Optional.empty(), Engine.assess(HEALTHY, Settings.standard()).repeat());
    }

    @Test
    void aBedOverTheDesignIsJudgedByItsRootMeanSquare() {
        assertEquals(Level.NEAR, level(depth(0.185), Rule.BED_OVER_DESIGN));
        assertEquals(Level.OVERLOADED, level(depth(0.25), Rule.BED_OVER_DESIGN));
    }

    @Test
    void moreThanTheOpenBeltCarriesIsOverloadOnlyByTheScale() {
        LoadingZone flooded = HEALTHY.with(Datum.THROUGHPUT, 900, 0);
        assertEquals(Level.OVERLOADED, level(flooded, Rule.FLOW_OVER_CAPACITY));
        LoadingZone unweighed = HEALTHY.without(Datum.THROUGHPUT);
        assertTrue(finding(unweighed, Rule.FLOW_OVER_CAPACITY).isEmpty());
        assertTrue(Engine.assess(unweighed, Settings.standard()).get(Result.FILL).isPresent());
    }

    @Test
    void theDriveIsJudgedByItsRunningPowerAlone() {
        assertEquals(Level.WITHIN, level(HEALTHY, Rule.DRIVE_NEAR_RATING));
        assertEquals(30_000 * 0.92 / 55_000, finding(HEALTHY, Rule.DRIVE_NEAR_RATING).orElseThrow().observed(), 1e-12);
        assertEquals(Level.NEAR, level(HEALTHY.with(Datum.RUNNING_POWER, 56_000, 0), Rule.DRIVE_NEAR_RATING));
        assertEquals(Level.OVERLOADED, level(HEALTHY.with(Datum.RUNNING_POWER, 80_000, 0), Rule.DRIVE_NEAR_RATING));
        assertTrue(finding(HEALTHY.without(Datum.RUNNING_POWER), Rule.DRIVE_NEAR_RATING).isEmpty());
    }

    @Test
    void withoutTheMotorsEfficiencyARunningPowerSaysNothingOfTheShaft() {
        Assessment assessment = Engine.assess(HEALTHY.without(Datum.MOTOR_EFFICIENCY), Settings.standard());
        assertTrue(assessment.missing().contains("/conveyor/motorEfficiency"));
        assertFalse(assessment.results().containsKey(Result.RUNNING_SHARE));
        assertEquals(Optional.of(Assessment.EnergyKind.SHAFT), assessment.energyKind());
        assertEquals(Level.WITHIN, assessment.level());
    }

    @Test
    void atDesignFeedTheDriveBearsAtLeastWhatTheSkirtsAddToday() {
        LoadingZone zone = HEALTHY.with(Datum.DESIGN_THROUGHPUT, 400, 0);
        Assessment assessment = Engine.assess(zone, Settings.standard());
        double today = observed(assessment.findings(), Rule.DRIVE_NEAR_RATING);
        double design = observed(assessment.findingsAtDesign(), Rule.DRIVE_NEAR_RATING);
        double skirtsToday = observed(assessment.findings(), Rule.SKIRTS_OVER_BUDGET);
        double skirtsAtDesign = observed(assessment.findingsAtDesign(), Rule.SKIRTS_OVER_BUDGET);
        assertTrue(skirtsAtDesign > skirtsToday);
        assertEquals(skirtsAtDesign - skirtsToday, design - today, 1e-12);
    }

    @Test
    void aLesserFeedOrAFallingBeltLeavesTheDriveUnjudgedAtDesign() {
        for (LoadingZone zone : List.of(HEALTHY.with(Datum.DESIGN_THROUGHPUT, 200, 0),
                HEALTHY.with(Datum.INCLINE, -0.05, 0))) {
            assertTrue(Engine.assess(zone, Settings.standard()).findingsAtDesign().stream()
                    .noneMatch(finding -> finding.rule() == Rule.DRIVE_NEAR_RATING));
        }
    }

    @Test
    void aZoneAtHalfFeedIsJudgedAgainAtDesignFeed() {
        Assessment assessment = Engine.assess(HEALTHY.with(Datum.DESIGN_THROUGHPUT, 800, 0), Settings.standard());
        assertEquals(Level.WITHIN, assessment.level());
        assertEquals(Optional.of(Level.OVERLOADED), assessment.levelAtDesignFeed());
    }

    @Test
    void withoutAScaleTheVerdictHoldsForToday() {
        for (LoadingZone zone : List.of(HEALTHY.without(Datum.THROUGHPUT), HEALTHY.with(Datum.THROUGHPUT, 0, 0))) {
            Assessment assessment = Engine.assess(zone, Settings.standard());
            assertEquals(Optional.empty(), assessment.levelAtDesignFeed());
            assertEquals(List.of(), assessment.findingsAtDesign());
            assertTrue(assessment.assumptions().stream()
                    .anyMatch(assumption -> assumption.code().equals("verdict-holds-at-todays-feed")));
        }
    }

    @Test
    void aBudgetOverloadsWhereItIsPassed() {
        LoadingZone granted = HEALTHY.with(Datum.SKIRT_POWER_BUDGET, 0.01, 0);
        Finding finding = finding(granted, Rule.SKIRTS_OVER_BUDGET).orElseThrow();
        assertEquals(OptionalDouble.of(0.01), finding.overloaded());
        assertEquals(OptionalDouble.of(0.01), finding.near(), "a warning beyond the budget would never be heard");
        assertEquals(Level.OVERLOADED, finding.level());
        assertEquals(OptionalDouble.empty(), finding(HEALTHY, Rule.SKIRTS_OVER_BUDGET).orElseThrow().overloaded());
    }

    @Test
    void theSpeedOfTheBedTellsWhatNoDepthTells() {
        assertEquals(Level.NEAR, level(HEALTHY.with(Datum.THROUGHPUT, 150, 0), Rule.BED_BEHIND_BELT));
        assertEquals(Level.WITHIN, level(HEALTHY.with(Datum.THROUGHPUT, 150, 0), Rule.READINGS_DISAGREE));
        assertEquals(Level.NEAR, level(HEALTHY.with(Datum.THROUGHPUT, 400, 0), Rule.READINGS_DISAGREE));
        assertTrue(finding(HEALTHY.without(Datum.THROUGHPUT), Rule.BED_BEHIND_BELT).isEmpty());
    }

    @Test
    void geometryIsJudged() {
        assertEquals(Level.NEAR, level(HEALTHY.with(Datum.IMPACT_LENGTH, 4, 0), Rule.ZONE_TOO_SHORT));
        assertEquals(Level.NEAR, level(HEALTHY.with(Datum.READ_SPACING, 0.85, 0), Rule.BOARDS_TOO_WIDE));
        assertEquals(Level.NEAR, level(HEALTHY.withMark(LoadingZone.Mark.FREE_FLOWING), Rule.BOARDS_TOO_WIDE));
        assertEquals(Level.NEAR, level(HEALTHY.with(Datum.READ_SPACING, 1.0, 0), Rule.EDGE_TOO_SMALL));
        assertEquals(Level.NEAR, level(HEALTHY.with(Datum.LUMP_SIZE, 0.2, 0), Rule.BOARD_TOO_LOW_FOR_LUMPS));
        assertEquals(Level.NEAR, level(HEALTHY.with(Datum.BELT_SPEED, 5, 0), Rule.BELT_TOO_FAST));
        assertEquals(Level.NEAR, level(HEALTHY.withMark(LoadingZone.Mark.HIGH_AIR_FLOW)
                .with(Datum.IMPACT_LENGTH, 3, 0), Rule.ZONE_TOO_SHORT));
    }

    @Test
    void aBedThatStillChangesAtTheEndIsNotSettled() {
        LoadingZone rising = HEALTHY.withStations(List.of()).withStation(0, 0.05, DepthMethod.AT_BOARD, 0)
                .withStation(6, 0.2, DepthMethod.AT_BOARD, 0);
        assertEquals(0.25 * 0.15 / 0.125, finding(rising, Rule.BED_NOT_SETTLED).orElseThrow().observed(), 1e-12);
        assertEquals(Level.NEAR, level(rising, Rule.BED_NOT_SETTLED));
        assertTrue(finding(depth(0.2), Rule.BED_NOT_SETTLED).isEmpty(), "one station tells no change");
        LoadingZone hump = HEALTHY.withStations(List.of()).withStation(4, 0.1, DepthMethod.AT_BOARD, 0)
                .withStation(5, 0.2, DepthMethod.AT_BOARD, 0).withStation(6, 0.1, DepthMethod.AT_BOARD, 0);
        assertEquals(0.1, finding(hump, Rule.BED_NOT_SETTLED).orElseThrow().observed()
                * Engine.assess(hump, Settings.standard()).get(Result.MEAN_DEPTH).orElseThrow().value(), 1e-12);
    }

    @Test
    void sealsThatAreNotSoundAreCounted() {
        LoadingZone torn = HEALTHY.withSeals(List.of())
                .withSeal(Side.LEFT, SealType.VERTICAL, SealCondition.TORN, 3, 0)
                .withSeal(Side.LEFT, SealType.VERTICAL, SealCondition.MISSING, 3, 0);
        assertEquals(2, finding(torn, Rule.SEAL_DEFECT).orElseThrow().observed());
        assertEquals(Level.NEAR, level(torn, Rule.SEAL_DEFECT));
        LoadingZone oneSide = HEALTHY.withSeals(HEALTHY.seals().subList(0, 1));
        assertTrue(finding(oneSide, Rule.SEAL_DEFECT).isEmpty(), "the other side may hide a defect");
    }

    @Test
    void aRuleThatTheSiteDoesNotUseIsNotJudged() {
        Settings without = Settings.standard().with(Settings.standard().limits().without(Rule.BED_OVER_DESIGN));
        Assessment assessment = Engine.assess(depth(0.25), without);
        assertTrue(assessment.findings().stream().noneMatch(finding -> finding.rule() == Rule.BED_OVER_DESIGN));
        assertEquals(List.of(Rule.BED_OVER_BOARD, Rule.FLOW_OVER_CAPACITY, Rule.DRIVE_NEAR_RATING,
                Rule.SKIRTS_OVER_BUDGET), assessment.allowedDepths().stream().map(AllowedDepth::rule).toList());
    }

    @Test
    void theSitesOwnLimitsCountAndSaySo() {
        Settings strict = Settings.standard().with(Settings.standard().limits().with(Rule.BED_OVER_BOARD,
                Limit.ofSite(OptionalDouble.of(0.2), OptionalDouble.of(0.25))));
        Finding finding = Engine.assess(HEALTHY, strict).findings().get(0);
        assertEquals(Level.OVERLOADED, finding.level());
        assertEquals("site", finding.source());
        assertTrue(finding.assumption());
    }

    @Test
    void aMissingReadingIsWorseThanNearAndBetterThanUndecided() {
        LoadingZone incomplete = HEALTHY.without(Datum.BELT_WIDTH);
        assertEquals(Level.INCOMPLETE, Engine.assess(incomplete, Settings.standard()).level());
        LoadingZone near = incomplete.withStations(List.of()).withStation(0, 0.37, DepthMethod.AT_BOARD, 0)
                .without(Datum.DESIGN_BED_DEPTH);
        assertEquals(Level.INCOMPLETE, Engine.assess(near, Settings.standard()).level());
        LoadingZone over = near.withStations(List.of()).withStation(0, 0.5, DepthMethod.AT_BOARD, 0);
        assertEquals(Level.OVERLOADED, Engine.assess(over, Settings.standard()).level());
        LoadingZone doubtful = near.withStations(List.of()).withStation(0, 0.4, DepthMethod.AT_BOARD, 0.005);
        assertEquals(Level.UNDECIDED, Engine.assess(doubtful, Settings.standard()).level());
    }

    @Test
    void theLowestAllowedDepthNamesItsRule() {
        Assessment assessment = Engine.assess(HEALTHY.without(Datum.THROUGHPUT), Settings.standard());
        AllowedDepth lowest = assessment.lowestAllowedDepth().orElseThrow();
        assertEquals(Rule.BED_OVER_DESIGN, lowest.rule());
        assertEquals(1.25 * 0.16, lowest.overloaded().orElseThrow(), 1e-15);
        assertEquals(1.10 * 0.16, lowest.near().orElseThrow(), 1e-15);
        assertEquals(Optional.empty(), Engine.assess(LoadingZone.UNKNOWN, Settings.standard()).lowestAllowedDepth());
    }

    /** What is judged anew at design feed is just what comes out otherwise there. */
    @Test
    void theRulesThatChangeWithTheFeedAreThoseWhoseNumberDoes() {
        LoadingZone uneven = HEALTHY.withStations(List.of()).with(Datum.DESIGN_THROUGHPUT, 400, 0)
                .withStation(1, 0.2, DepthMethod.AT_BOARD, 0).withStation(5.5, 0.15, DepthMethod.AT_BOARD, 0);
        ZoneFacts zone = new ZoneFacts(Sources.uncertain(uneven, Settings.standard()));
        FeedFacts today = FeedFacts.today(zone);
        Observations now = new Observations(today, today);
        Observations then = new Observations(today, FeedFacts.atDesign(zone).get());
        for (Rule rule : Rule.values()) {
            boolean changes = now.of(rule).get().value() != then.of(rule).get().value();
            assertEquals(changes, Observations.changesWithFeed(rule), rule.code());
        }
    }

    /** A lower bound of the drive's power at more feed holds on a belt that is level or rises, not on one that falls. */
    @Test
    void theDriveAtDesignIsJudgedOnABeltThatDoesNotFall() {
        LoadingZone more = HEALTHY.with(Datum.DESIGN_THROUGHPUT, 300, 0);
        for (double incline : new double[] {-0.01, 0, 0.01}) {
            assertEquals(incline >= 0, Engine.assess(more.with(Datum.INCLINE, incline, 0), Settings.standard())
                    .findingsAtDesign().stream().anyMatch(finding -> finding.rule() == Rule.DRIVE_NEAR_RATING));
        }
    }

    /** On a belt that stands, by speed alone, nothing is needed to settle, and no zone is too short for that. */
    @Test
    void aZoneThatNeedsNoLengthIsNotTooShort() {
        Settings bySpeed = Settings.standard().with(Conventions.standard().with(
                new LengthConventions(true, false, false)));
        LoadingZone standing = HEALTHY.with(Datum.BELT_SPEED, 0, 0).with(Datum.IMPACT_LENGTH, 0, 0);
        assertTrue(Engine.assess(standing, bySpeed).findings().stream()
                .noneMatch(finding -> finding.rule() == Rule.ZONE_TOO_SHORT));
        assertTrue(Engine.assess(standing, Settings.standard()).findings().stream()
                .anyMatch(finding -> finding.rule() == Rule.ZONE_TOO_SHORT));
    }

    @Test
    void theLeadingComponentIsNamed() {
        assertEquals(Optional.of(Component.SEAL), leading(HEALTHY.with(Datum.FEED_VELOCITY, 2, 0)));
        assertEquals(Optional.of(Component.LOADING), leading(HEALTHY.with(Datum.FEED_VELOCITY, -2, 0)));
        assertEquals(Optional.of(Component.BED), leading(depth(0.39).with(Datum.FEED_VELOCITY, 2, 0)));
        assertEquals(Optional.of(Component.BED), leading(depth(0).with(Datum.FEED_VELOCITY, 2, 0)
                .withSeals(List.of()).withSeal(Side.LEFT, SealType.NONE, SealCondition.SOUND, 6, 0)
                .withSeal(Side.RIGHT, SealType.NONE, SealCondition.SOUND, 6, 0)), "where nothing pulls at all");
        assertEquals(Optional.empty(), leading(LoadingZone.UNKNOWN));
    }

    private static Optional<Component> leading(LoadingZone zone) {
        return Engine.assess(zone, Settings.standard()).leading();
    }

    private static LoadingZone depth(double depth) {
        return HEALTHY.withStations(List.of()).withStation(3, depth, DepthMethod.AT_BOARD, 0.005);
    }

    private static Level level(LoadingZone zone, Rule rule) {
        return finding(zone, rule).orElseThrow().level();
    }

    private static Optional<Finding> finding(LoadingZone zone, Rule rule) {
        return Engine.assess(zone, Settings.standard()).findings().stream()
                .filter(finding -> finding.rule() == rule).findFirst();
    }

    private static double observed(List<Finding> findings, Rule rule) {
        return findings.stream().filter(finding -> finding.rule() == rule).findFirst().orElseThrow().observed();
    }
}
