package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Rule;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class ConveyorTest {
    private static final LoadingZone ZONE = Zones.healthy();

    @Test
    void noWarningLiesBeyondTheBudget() {
        for (double budget : new double[] {0.03, 0.2}) {
            Finding finding = skirts(Engine.assess(Zones.healthy().with(Datum.SKIRT_POWER_BUDGET, budget, 0),
                    Settings.standard())).orElseThrow();
            assertEquals(budget, finding.overloaded().orElseThrow());
            assertEquals(Math.min(0.10, budget), finding.near().orElseThrow());
        }
    }

    @Test
    void theSumIsLedByAReadingOfTheZonesOwn() {
        LoadingZone coarse = Zones.exact(ZONE).with(Datum.BELT_SPEED, 2, 0.2);
        assertEquals(Optional.of("/readings/beltSpeed"), skirts(Engine.assess(coarse, Settings.standard()))
                .orElseThrow().leadingReading());
    }

    @Test
    void zonesOfAConveyorAddUp() {
        double one = skirts(Engine.assess(ZONE, Settings.standard())).orElseThrow().observed();
        List<Assessment> three = Engine.assessConveyor(Collections.nCopies(3, ZONE), 0, Settings.standard()).zones();
        assertEquals(3, three.size());
        for (Assessment assessment : three) {
            assertEquals(3 * one, skirts(assessment).orElseThrow().observed(), 1e-12);
            assertEquals(one, assessment.get(Result.DRIVE_SHARE).orElseThrow().value(), 1e-12);
        }
    }

    @Test
    void whatTheZonesShareErrsInAllOfThemAlike() {
        LoadingZone shared = Zones.exact(ZONE).with(Datum.DRIVE_EFFICIENCY, 0.9, 0.03);
        LoadingZone own = Zones.exact(ZONE).with(Datum.BELT_SPEED, 2, 0.1);
        for (int zones : List.of(1, 4)) {
            assertEquals(zones, spread(shared, zones) / spread(shared, 1), 1e-12);
            assertEquals(Math.sqrt(zones), spread(own, zones) / spread(own, 1), 1e-12);
        }
    }

    @Test
    void materialsWithDifferentFactorsErrApart() {
        LoadingZone one = Zones.exact(ZONE).with(Datum.SKIRT_FRICTION_FACTOR, 0.08, 0.02);
        LoadingZone other = Zones.exact(ZONE).with(Datum.SKIRT_FRICTION_FACTOR, 0.09, 0.02);
        Assessment assessment = Engine.assessConveyor(List.of(one, other), 0, Zones.exactSettings()).zones().get(0);
        assertEquals(spread(one, 1) * Math.sqrt(2), skirts(assessment).orElseThrow().standardUncertainty(), 1e-12);
    }

    @Test
    void aSumThatLacksZonesShowsOnlyThatTheLimitIsPassed() {
        Assessment alone = Engine.assessConveyor(List.of(ZONE), 2, Settings.standard()).zones().get(0);
        assertEquals(Optional.empty(), skirts(alone));
        assertEquals(List.of(), alone.refused(), "a zone that is not surveyed yet is no refusal");
        LoadingZone weak = ZONE.with(Datum.RATED_POWER, 5_000, 0);
        Assessment passed = Engine.assessConveyor(List.of(weak), 2, Settings.standard()).zones().get(0);
        assertEquals(Level.NEAR, skirts(passed).orElseThrow().level());
        assertTrue(passed.assumptions().contains(Assumption.of("conveyor-sum-lower-bound", "2")));
    }

    @Test
    void aZoneWithoutPowerCountsAsLacking() {
        LoadingZone weak = ZONE.with(Datum.RATED_POWER, 5_000, 0);
        List<Assessment> both = Engine.assessConveyor(List.of(weak, weak.without(Datum.BELT_SPEED)), 0,
                Settings.standard()).zones();
        for (Assessment assessment : both) {
            assertEquals(Level.NEAR, skirts(assessment).orElseThrow().level());
            assertTrue(assessment.assumptions().contains(Assumption.of("conveyor-sum-lower-bound", "1")));
        }
    }

    @Test
    void atDesignFeedAZoneWithoutAScaleCountsAsItIsToday() {
        LoadingZone half = ZONE.with(Datum.DESIGN_THROUGHPUT, 400, 0);
        LoadingZone unweighed = half.without(Datum.THROUGHPUT);
        List<Assessment> both = Engine.assessConveyor(List.of(half, unweighed), 0, Settings.standard()).zones();
        double alone = skirtsAtDesign(Engine.assess(half, Settings.standard()));
        double other = both.get(1).get(Result.DRIVE_SHARE).orElseThrow().value();
        assertEquals(alone + other, skirtsAtDesign(both.get(0)), 1e-12);
        assertEquals(List.of(), both.get(1).findingsAtDesign());
        Assumption asToday = Assumption.of("conveyor-sum-at-todays-feed", "1");
        assertTrue(both.get(0).assumptions().contains(asToday));
        Assessment lacking = Engine.assessConveyor(List.of(half, unweighed), 2, Settings.standard()).zones().get(0);
        assertFalse(lacking.assumptions().contains(asToday), "of a sum that nothing is judged by");
    }

    private static double spread(LoadingZone zone, int zones) {
        return skirts(Engine.assessConveyor(Collections.nCopies(zones, zone), 0, Zones.exactSettings()).zones().get(0))
                .orElseThrow().standardUncertainty();
    }

    private static Optional<Finding> skirts(Assessment assessment) {
        return assessment.findings().stream().filter(finding -> finding.rule() == Rule.SKIRTS_OVER_BUDGET).findFirst();
    }

    private static double skirtsAtDesign(Assessment assessment) {
        return assessment.findingsAtDesign().stream().filter(finding -> finding.rule() == Rule.SKIRTS_OVER_BUDGET)
                .findFirst().orElseThrow().observed();
    }
}
