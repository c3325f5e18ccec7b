package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.verdict.AllowedDepth;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Rule;
import java.util.EnumSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.Set;
import org.junit.jupiter.api.Test;

/** The allowed depth of every limit is its inverse: a bed laid so deep stands exactly on the limit. */
class AllowedDepthTest {
    private static final LoadingZone ZONE = Zones.exact(Zones.healthy());

    @Test
    void aBedAsDeepAsAllowedStandsOnTheLimit() {
        Random random = new Random(31);
        Set<Rule> tried = EnumSet.noneOf(Rule.class);
        for (int i = 0; i < Zones.MANY; i++) {
            LoadingZone zone = Zones.exact(Zones.random(random));
            DragMethod method = DragMethod.values()[random.nextInt(4)];
            Settings settings = Zones.exactSettings().with(method);
            for (AllowedDepth allowed : Engine.assess(zone, settings).allowedDepths()) {
                if (check(zone, settings, allowed)) {
                    tried.add(allowed.rule());
                }
            }
        }
        assertEquals(EnumSet.of(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN, Rule.FLOW_OVER_CAPACITY,
                Rule.DRIVE_NEAR_RATING, Rule.SKIRTS_OVER_BUDGET), tried);
    }

    private static boolean check(LoadingZone zone, Settings settings, AllowedDepth allowed) {
        OptionalDouble depth = allowed.near();
        if (depth.isEmpty() || depth.getAsDouble() < 1e-3 || depth.getAsDouble() > 1e3) {
            return false;
        }
        Assessment before = Engine.assess(zone, settings);
        LoadingZone laid = zone.withStations(List.of())
                .withStation(0, depth.getAsDouble(), DepthMethod.AT_BOARD, 0);
        laid = atSameBedSpeed(zone, laid, before, settings);
        Assessment after = Engine.assess(laid, settings);
        Optional<Finding> finding = finding(after, allowed.rule());
        double observed = finding.map(Finding::observed).orElse(Double.NaN);
        if (allowed.rule() == Rule.DRIVE_NEAR_RATING) {
            double rated = zone.get(Datum.RATED_POWER).orElseThrow().value();
            observed += (after.get(Result.DRIVE_POWER).orElseThrow().value()
                    - before.get(Result.DRIVE_POWER).orElseThrow().value()) / rated;
        }
        double limit = finding(before, allowed.rule()).orElseThrow().near().orElseThrow();
        assertEquals(limit, observed, 1e-9 * Math.max(1, limit), allowed.rule() + " by " + settings.method());
        return true;
    }

    /** The flow goes with the area, as it does where the bed keeps its speed. */
    private static LoadingZone atSameBedSpeed(LoadingZone zone, LoadingZone laid, Assessment before,
            Settings settings) {
        if (zone.get(Datum.THROUGHPUT).isEmpty()) {
            return laid;
        }
        double area = Engine.assess(laid, settings).get(Result.BED_AREA).map(found -> found.value()).orElse(1.0);
        double areaBefore = before.get(Result.BED_AREA).map(found -> found.value()).orElse(1.0);
        return areaBefore <= 1e-9 ? laid : laid.with(Datum.THROUGHPUT, zone.get(Datum.THROUGHPUT).orElseThrow().value() * area / areaBefore, 0);
    }

    @Test
    void whatTheSealsAloneExceedAllowsNoDepth() {
        LoadingZone tight = ZONE.with(Datum.SKIRT_POWER_BUDGET, 0.005, 0);
        assertEquals(0, allowed(Engine.assess(tight, Zones.exactSettings()), Rule.SKIRTS_OVER_BUDGET).overloaded()
                .orElseThrow());
        LoadingZone full = ZONE.with(Datum.RUNNING_POWER, 90_000, 0);
        assertEquals(0, allowed(Engine.assess(full, Zones.exactSettings()), Rule.DRIVE_NEAR_RATING).overloaded()
                .orElseThrow());
    }

    @Test
    void theOtherZonesOfAConveyorTakeTheirPart() {
        double alone = allowed(Engine.assess(ZONE, Zones.exactSettings()), Rule.SKIRTS_OVER_BUDGET).near()
                .orElseThrow();
        Assessment one = Engine.assessConveyor(List.of(ZONE, ZONE), 0, Zones.exactSettings()).zones().get(0);
        double together = allowed(one, Rule.SKIRTS_OVER_BUDGET).near().orElseThrow();
        assertTrue(together < alone);
        LoadingZone laid = ZONE.withStations(List.of()).withStation(0, together, DepthMethod.AT_BOARD, 0);
        assertEquals(0.10, finding(Engine.assessConveyor(List.of(laid, ZONE), 0, Zones.exactSettings()).zones().get(0),
                Rule.SKIRTS_OVER_BUDGET).orElseThrow().observed(), 1e-12);
    }

    @Test
    void aRuleThatIsOffOrHasNoLimitAllowsAnything() {
        Settings without = Zones.exactSettings().with(Zones.exactSettings().limits().without(Rule.BED_OVER_BOARD)
                .with(Rule.FLOW_OVER_CAPACITY, Limit.ofSite(OptionalDouble.empty(), OptionalDouble.empty())));
        List<Rule> rules = Engine.assess(ZONE, without).allowedDepths().stream().map(AllowedDepth::rule).toList();
        assertEquals(List.of(Rule.BED_OVER_DESIGN, Rule.DRIVE_NEAR_RATING, Rule.SKIRTS_OVER_BUDGET), rules);
    }

    @Test
    void withoutWhatItTakesThereIsNoAllowedDepth() {
        assertEquals(List.of(), Engine.assess(LoadingZone.UNKNOWN, Zones.exactSettings()).allowedDepths());
        assertEquals(List.of(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN), rules(ZONE.without(Datum.THROUGHPUT)
                .without(Datum.RATED_POWER)));
        assertEquals(List.of(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN, Rule.SKIRTS_OVER_BUDGET),
                rules(ZONE.without(Datum.THROUGHPUT).without(Datum.MOTOR_EFFICIENCY)));
        assertEquals(List.of(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN), rules(ZONE.without(Datum.THROUGHPUT)
                .withStations(List.of()).withStation(0, 0, DepthMethod.AT_BOARD, 0)));
        assertEquals(List.of(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN), rules(ZONE.with(Datum.THROUGHPUT, 0, 0)
                .with(Datum.BELT_SPEED, 0, 0)));
    }

    /** By ISO 5048 the drag is known from the flow alone, but no depth is; the others tell a depth without a section. */
    @Test
    void aDepthIsToldWhereTheDragComesFromABed() {
        LoadingZone bare = ZONE.withStations(List.of());
        Settings iso = Zones.exactSettings().with(DragMethod.ISO_5048);
        assertTrue(Engine.assess(bare, iso).get(Result.DRIVE_SHARE).isPresent());
        List<Rule> ofBed = List.of(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN);
        assertEquals(ofBed, Engine.assess(bare, iso).allowedDepths().stream().map(AllowedDepth::rule).toList());
        assertEquals(List.of(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN, Rule.DRIVE_NEAR_RATING,
                Rule.SKIRTS_OVER_BUDGET), rules(ZONE.without(Datum.SURCHARGE_ANGLE)));
        assertFalse(rules(ZONE.with(Datum.THROUGHPUT, 0, 0)).contains(Rule.FLOW_OVER_CAPACITY), "nothing to scale");
    }

    private static List<Rule> rules(LoadingZone zone) {
        return Engine.assess(zone, Zones.exactSettings()).allowedDepths().stream().map(AllowedDepth::rule).toList();
    }

    private static AllowedDepth allowed(Assessment assessment, Rule rule) {
        return assessment.allowedDepths().stream().filter(depth -> depth.rule() == rule).findFirst().orElseThrow();
    }

    private static Optional<Finding> finding(Assessment assessment, Rule rule) {
        return assessment.findings().stream().filter(finding -> finding.rule() == rule).findFirst();
    }
}
