package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.flow.MaximumBeltSpeed;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Remedy;
import bedmark.engine.verdict.Rule;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

class RemediesTest {
    private static final LoadingZone ZONE = Zones.healthy();
    private static final LoadingZone DEEP = ZONE.withStations(List.of()).without(Datum.THROUGHPUT)
            .withStation(1, 0.36, DepthMethod.AT_BOARD, 0).withStation(5, 0.30, DepthMethod.AT_BOARD, 0);

    @Test
    void aBedThatLagsIsFreedFirst() {
        LoadingZone lagging = DEEP.with(Datum.THROUGHPUT, 250, 0);
        List<Remedy> remedies = remedies(lagging);
        assertEquals("free-bed", remedies.get(0).code());
        assertTrue(remedies.get(0).skirtPower() < power(lagging));
        assertTrue(find(DEEP, "free-bed").isEmpty(), "no scale, no ratio");
    }

    /** What lagged unevenly lies evenly once it moves at belt speed: the shape of before refuses nothing. */
    @Test
    void aFreedBedIsJudgedByItsOwnShape() {
        LoadingZone heaped = ZONE.withStations(List.of()).with(Datum.THROUGHPUT, 210, 0)
                .withStation(4.5, 0.36, DepthMethod.AT_BOARD, 0).withStation(5.5, 0.24, DepthMethod.AT_BOARD, 0);
        assertEquals(Level.NEAR, Engine.assess(heaped, Zones.exactSettings()).findings().stream()
                .filter(finding -> finding.rule() == Rule.BED_NOT_SETTLED).findFirst().orElseThrow().level());
        Remedy freed = find(heaped, "free-bed").orElseThrow();
        assertEquals(Optional.empty(), freed.refusedBecause());
        LoadingZone even = heaped.withStations(List.of())
                .withStation(1, freed.meanDepth(), DepthMethod.AT_BOARD, 0);
        assertTrue(freed.meanDepth() > 0 && freed.meanDepth() < 0.2, freed::toString);
        assertEquals(freed.skirtPower(), power(even), 1e-9 * power(even));
        assertEquals(1, Engine.assess(even, Zones.exactSettings()).get(Result.BED_SPEED_RATIO).orElseThrow().value(),
                1e-9);
        LoadingZone settled = ZONE.withStations(List.of()).with(Datum.THROUGHPUT, 260, 0)
                .withStation(1, 0.30, DepthMethod.AT_BOARD, 0).withStation(5.5, 0.28, DepthMethod.AT_BOARD, 0);
        assertEquals(Optional.empty(), find(settled, "free-bed").orElseThrow().refusedBecause(),
                "a little unevenness does not grow with the depth that goes");
    }

    @Test
    void aLowerFeedEndsTheWarningAndIsComparedByTheTonne() {
        Remedy remedy = find(DEEP, "lower-feed").orElseThrow();
        double factor = remedy.change().orElseThrow();
        assertTrue(factor > 0 && factor < 1);
        double before = energy(DEEP);
        double after = remedy.drivePower().orElseThrow() / 0.92 * 5000 / factor;
        assertEquals(before - after, remedy.savedWh().orElseThrow(), 1e-6 * before);
        double section = carried() / 0.7;
        LoadingZone lowered = ZONE.withStations(List.of())
                .withStation(1, factor * 0.36 + (factor - 1) * section, DepthMethod.AT_BOARD, 0)
                .withStation(5, factor * 0.30 + (factor - 1) * section, DepthMethod.AT_BOARD, 0);
        assertEquals(1.10, observed(lowered, Rule.BED_OVER_DESIGN), 1e-9);
        assertEquals(remedy.skirtPower(), power(lowered), 1e-9 * power(lowered));
    }

    @Test
    void aFloodedBeltIsFedLess() {
        LoadingZone flooded = ZONE.with(Datum.THROUGHPUT, 600, 0);
        Remedy remedy = find(flooded, "lower-feed").orElseThrow();
        assertEquals(0.85, remedy.change().orElseThrow() * observed(flooded, Rule.FLOW_OVER_CAPACITY), 1e-9);
    }

    @Test
    void aFasterBeltIsShownButNotRanked() {
        Remedy remedy = find(DEEP, "faster-belt").orElseThrow();
        assertFalse(remedy.ranked());
        assertEquals(OptionalDouble.empty(), remedy.savedWh());
        assertEquals(2 / find(DEEP, "lower-feed").orElseThrow().change().orElseThrow(),
                remedy.change().orElseThrow(), 1e-12);
        assertEquals(Optional.of(Rule.ZONE_TOO_SHORT), find(DEEP.with(Datum.BELT_SPEED, 3.0, 0), "faster-belt")
                .orElseThrow().refusedBecause());
    }

    @Test
    void boardsGoAsWideAsTheBeltBears() {
        Remedy remedy = find(ZONE, "widen-boards").orElseThrow();
        assertEquals(0.8, remedy.change().orElseThrow(), 1e-12);
        assertEquals(Optional.empty(), remedy.refusedBecause());
        assertTrue(remedy.meanDepth() < 0.12);
        assertTrue(remedy.savedWh().orElseThrow() > 0);
    }

    @Test
    void boardsThatWouldHaveToStandTooWideAreRefusedByName() {
        LoadingZone wide = DEEP.with(Datum.READ_SPACING, 0.795, 0).with(Datum.DESIGN_BED_DEPTH, 0.27, 0);
        Remedy remedy = find(wide, "widen-boards").orElseThrow();
        assertEquals(Optional.of(Rule.BOARDS_TOO_WIDE), remedy.refusedBecause());
        assertTrue(remedy.change().orElseThrow() > 0.8);
        List<Remedy> all = remedies(wide);
        assertEquals(remedy, all.get(all.size() - 1), "refused ones come last");
        LoadingZone hopeless = DEEP.with(Datum.READ_SPACING, 0.799, 0).with(Datum.DESIGN_BED_DEPTH, 0.02, 0);
        assertTrue(find(hopeless, "widen-boards").isEmpty(),
                "not even the whole belt would do");
        assertTrue(find(ZONE.with(Datum.READ_SPACING, 0.8, 0), "widen-boards").isEmpty(), "nothing calls for it");
    }

    @Test
    void aLongZoneIsCutToWhatItNeeds() {
        Remedy remedy = find(ZONE, "shorten-zone").orElseThrow();
        assertEquals(1.5 + 1.2 * 2, remedy.change().orElseThrow(), 1e-12);
        assertEquals(power(ZONE) * 3.9 / 6, remedy.skirtPower(), 1e-9 * power(ZONE));
        assertTrue(find(ZONE.with(Datum.IMPACT_LENGTH, 3.6, 0), "shorten-zone").isEmpty());
        Settings roomy = Settings.standard().with(Settings.standard().limits().with(Rule.ZONE_TOO_SHORT,
                Limit.ofSite(OptionalDouble.of(1.2), OptionalDouble.empty())));
        assertEquals(1.2 * 3.9, Engine.assess(ZONE, roomy).remedies().stream()
                .filter(one -> one.code().equals("shorten-zone")).findFirst().orElseThrow().change().orElseThrow(), 1e-12);
    }

    @Test
    void sealsAreWorthMendingOnlyWhereTheSiteKnowsThatTheyDragMore() {
        LoadingZone tight = ZONE.withSeals(List.of())
                .withSeal(Side.LEFT, SealType.VERTICAL, SealCondition.OVER_TIGHTENED, 6, 0)
                .withSeal(Side.RIGHT, SealType.VERTICAL, SealCondition.WORN, 6, 0);
        assertTrue(find(tight, "adjust-seal").isEmpty());
        assertTrue(find(tight, "renew-seal").isEmpty());
        Settings site = Settings.standard().with(Settings.standard().sealRates()
                .with(SealType.VERTICAL, SealCondition.OVER_TIGHTENED, 3)
                .with(SealType.VERTICAL, SealCondition.WORN, 1.2));
        List<Remedy> remedies = Engine.assess(tight, site).remedies();
        assertTrue(remedies.stream().anyMatch(remedy -> remedy.code().equals("adjust-seal")));
        assertTrue(remedies.stream().anyMatch(remedy -> remedy.code().equals("renew-seal")));
    }

    @Test
    void nothingIsOfferedThatTheReadingsDoNotSupport() {
        assertEquals(List.of(), remedies(LoadingZone.UNKNOWN));
        assertEquals(List.of(), remedies(DEEP.without(Datum.BELT_SPEED)));
        assertTrue(find(DEEP.without(Datum.BELT_WIDTH), "widen-boards").isEmpty());
        Remedy unlabelled = find(DEEP.without(Datum.LOADED_HOURS).without(Datum.DRIVE_EFFICIENCY), "lower-feed")
                .orElseThrow();
        assertEquals(OptionalDouble.empty(), unlabelled.savedWh());
        assertEquals(OptionalDouble.empty(), unlabelled.drivePower());
        assertEquals(OptionalDouble.empty(), unlabelled.driveShare());
    }

    @Test
    void theGreatestSavingComesFirst() {
        double before = Double.POSITIVE_INFINITY;
        for (Remedy remedy : remedies(DEEP)) {
            if (remedy.ranked() && remedy.refusedBecause().isEmpty()) {
                assertTrue(remedy.savedWh().orElseThrow() <= before);
                before = remedy.savedWh().orElseThrow();
            }
        }
        assertTrue(before < Double.POSITIVE_INFINITY);
    }

    @Test
    void aRuleWithoutAnyLimitAsksForNoRemedy() {
        Settings silent = Settings.standard().with(Settings.standard().limits()
                .with(Rule.BED_OVER_DESIGN, Limit.ofSite(OptionalDouble.empty(), OptionalDouble.empty()))
                .with(Rule.BED_OVER_BOARD, Limit.ofSite(OptionalDouble.empty(), OptionalDouble.of(0.8))));
        Remedy remedy = Engine.assess(DEEP, silent).remedies().stream()
                .filter(offered -> offered.code().equals("lower-feed")).findFirst().orElseThrow();
        assertEquals((carried() + 0.7 * 0.8 * 0.4) / (carried() + 0.7 * 0.36), remedy.change().orElseThrow(), 1e-12);
    }

    /** A slower belt carries a deeper bed: with the other zones' share that is too much, and alone it would do. */
    @Test
    void theOtherZonesOfTheConveyorCountAgainstARemedy() {
        Settings slow = Settings.standard().with(new MaximumBeltSpeed(Stream.of(SpeedClass.values())
                .map(material -> new MaximumBeltSpeed.Row(material, 0.5, true, 1.5)).toList()));
        Settings free = slow.with(slow.limits().without(Rule.BED_OVER_DESIGN)
                .without(Rule.FLOW_OVER_CAPACITY).without(Rule.SKIRTS_OVER_BUDGET));
        Assessment now = Engine.assess(ZONE, free);
        double share = now.get(Result.DRIVE_SHARE).orElseThrow().value();
        double then = slower(now).driveShare().orElseThrow();
        assertEquals(Optional.empty(), slower(now).refusedBecause());
        assertTrue(then > share && then < 3 * share);
        Settings bound = free.with(free.limits().with(Rule.SKIRTS_OVER_BUDGET, Limit.ofSite(
                OptionalDouble.of(share + (share + then) / 2), OptionalDouble.empty())));
        assertEquals(Optional.empty(), slower(Engine.assess(ZONE, bound)).refusedBecause());
        assertEquals(Optional.of(Rule.SKIRTS_OVER_BUDGET), slower(Engine.assessConveyor(List.of(ZONE, ZONE), 0, bound)
                .zones().get(0)).refusedBecause());
    }

    private static Remedy slower(Assessment assessment) {
        return assessment.remedies().stream().filter(remedy -> remedy.code().equals("slower-belt")).findFirst()
                .orElseThrow();
    }

    /** A limit of nothing can be met by no change at all, and one that is nearly met is not worth a change. */
    @Test
    void whatNoChangeCanReachIsNotOffered() {
        LoadingZone flooded = ZONE.with(Datum.THROUGHPUT, 600, 0);
        assertTrue(find(flooded, "lower-feed").isPresent());
        assertFalse(codes(flooded, Rule.FLOW_OVER_CAPACITY, 0).contains("lower-feed"));
        assertFalse(codes(ZONE, Rule.ZONE_TOO_SHORT, 0).contains("shorten-zone"));
        LoadingZone level = DEEP.with(Datum.TROUGH_ANGLE, 0, 0).with(Datum.SURCHARGE_ANGLE, 0, 0);
        assertTrue(codes(level, Rule.BED_OVER_BOARD, 0.5).containsAll(List.of("faster-belt", "lower-feed")));
        assertTrue(codes(level, Rule.BED_OVER_BOARD, 0).stream()
                .noneMatch(code -> code.equals("faster-belt") || code.equals("lower-feed")));
        assertEquals(List.of("shorten-zone", "widen-boards"), remedies(ZONE).stream().map(Remedy::code).toList());
    }

    /** The bed grows as the belt slows: at 1.5 m/s instead of 2 it has the area times 4/3. */
    @Test
    void aBeltThatIsTooFastIsSlowedToWhatItsMaterialBears() {
        Settings slow = Settings.standard().with(new MaximumBeltSpeed(Stream.of(SpeedClass.values())
                .map(material -> new MaximumBeltSpeed.Row(material, 0.5, true, 1.5)).toList()));
        Remedy slower = slower(Engine.assess(ZONE, slow));
        assertEquals(1.5, slower.change().orElseThrow(), 1e-12);
        assertEquals(((carried() + 0.7 * 0.12) * 4 / 3 - carried()) / 0.7, slower.meanDepth(), 1e-12);
        assertFalse(slower.ranked());
        Settings iso = slow.with(DragMethod.ISO_5048);
        double drag = Engine.assess(ZONE.with(Datum.BELT_SPEED, 1.5, 0), iso).get(Result.SKIRT_DRAG).orElseThrow()
                .value();
        assertEquals(drag, slower(Engine.assess(ZONE, iso)).skirtDrag(), 1e-9,
                "the feed comes to another speed in another length");
        Settings never = slow.with(slow.limits().with(Rule.BELT_TOO_FAST, Limit.ofSite(OptionalDouble.of(0),
                OptionalDouble.empty())));
        assertTrue(Engine.assess(ZONE, never).remedies().stream()
                .noneMatch(remedy -> remedy.code().equals("slower-belt")), "a belt that stands carries nothing");
    }

    /** The area under the deepest depth, 0.36 m between boards 0.795 m apart, lies 85 % of the board deep in between. */
    @Test
    void boardsAreSetAsWideAsTheHeightOfTheBoardNeeds() {
        Settings byBoard = Settings.standard().with(Settings.standard().limits().without(Rule.BED_OVER_DESIGN));
        double spacing = widened(DEEP.with(Datum.READ_SPACING, 0.795, 0), byBoard);
        assertEquals(carried(0.795) + 0.36 * 0.795, carried(spacing) + 0.85 * 0.4 * spacing, 1e-9);
        LoadingZone level = ZONE.with(Datum.READ_SPACING, 0.795, 0).with(Datum.DESIGN_BED_DEPTH, 0.3, 0)
                .withStations(List.of()).withStation(1, 0.339, DepthMethod.AT_BOARD, 0);
        double byDesign = widened(level, Settings.standard());
        assertEquals(carried(0.795) + 0.339 * 0.795, carried(byDesign) + 1.1 * 0.3 * byDesign, 1e-9);
    }

    /** Where the width of the belt allows more, its free edge of 0.055 B + 22.86 mm decides, along the belt. */
    @Test
    void boardsLeaveTheFreeEdgeOnTroughedAndOnFlatBelts() {
        Settings wide = Settings.standard().with(Settings.standard().limits().with(Rule.BOARDS_TOO_WIDE,
                Limit.ofSite(OptionalDouble.of(2), OptionalDouble.empty())));
        double edge = 0.055 * 1.2 + 0.02286;
        assertEquals(0.45 + 2 * (0.375 - edge) * Math.cos(Math.toRadians(35)), widened(ZONE, wide), 1e-12);
        assertEquals(1.2 - 2 * edge, widened(ZONE.with(Datum.TROUGH_ANGLE, 0, 0), wide), 1e-12);
        Limit none = Limit.ofSite(OptionalDouble.empty(), OptionalDouble.empty());
        Settings unlimited = Settings.standard().with(Settings.standard().limits().with(Rule.BOARDS_TOO_WIDE, none)
                .with(Rule.EDGE_TOO_SMALL, none));
        assertEquals(0.45 + 0.75 * Math.cos(Math.toRadians(35)), widened(ZONE, unlimited), 1e-12,
                "without limits as far as the wing rolls reach");
    }

    private static double widened(LoadingZone zone, Settings settings) {
        return Engine.assess(zone, settings).remedies().stream()
                .filter(remedy -> remedy.code().equals("widen-boards")).findFirst().orElseThrow().change()
                .orElseThrow();
    }

    private static List<String> codes(LoadingZone zone, Rule rule, double near) {
        Settings own = Settings.standard().with(Settings.standard().limits().with(rule,
                Limit.ofSite(OptionalDouble.of(near), OptionalDouble.empty())));
        return Engine.assess(zone, own).remedies().stream().map(Remedy::code).toList();
    }

    /** 7.5 m of impact and 1.2 s at 2 m/s are 9.9 m: one in a hundred of 10 m is not worth a cut, more is. */
    @Test
    void aZoneIsCutByMoreThanAHundredth() {
        LoadingZone nearly = ZONE.with(Datum.ZONE_LENGTH, 10, 0).withSeals(List.of())
                .withSeal(Side.LEFT, SealType.VERTICAL, SealCondition.SOUND, 10, 0)
                .withSeal(Side.RIGHT, SealType.VERTICAL, SealCondition.SOUND, 10, 0);
        assertTrue(find(nearly.with(Datum.IMPACT_LENGTH, 7.5, 0), "shorten-zone").isEmpty());
        assertTrue(find(nearly.with(Datum.IMPACT_LENGTH, 7.4999, 0), "shorten-zone").isPresent());
    }

    /** By ISO 5048 the drag goes with the square of the flow that the scale reads, which the lower feed lowers too. */
    @Test
    void aLowerFeedLowersTheFlowThatWasRead() {
        Settings iso = Settings.standard().with(DragMethod.ISO_5048);
        LoadingZone weighed = DEEP.with(Datum.THROUGHPUT, 300, 0);
        Assessment now = Engine.assess(weighed, iso);
        Remedy lower = now.remedies().stream().filter(one -> one.code().equals("lower-feed")).findFirst()
                .orElseThrow();
        double seals = now.get(Result.SEAL_DRAG).orElseThrow().value();
        double factor = lower.change().orElseThrow();
        assertEquals(seals + factor * factor * now.get(Result.MATERIAL_DRAG).orElseThrow().value(),
                lower.skirtDrag(), 1e-9);
    }

    private static double carried() {
        return carried(0.7);
    }

    private static double carried(double spacing) {
        double wing = (spacing - 0.45) / 2 / Math.cos(Math.toRadians(35));
        return (0.45 + (spacing - 0.45) / 2) * wing * Math.sin(Math.toRadians(35))
                + spacing * spacing * Math.tan(Math.toRadians(20)) / 6;
    }

    private static List<Remedy> remedies(LoadingZone zone) {
        return Engine.assess(zone, Settings.standard()).remedies();
    }

    private static Optional<Remedy> find(LoadingZone zone, String code) {
        return remedies(zone).stream().filter(remedy -> remedy.code().equals(code)).findFirst();
    }

    private static double power(LoadingZone zone) {
        return Engine.assess(zone, Settings.standard()).get(Result.SKIRT_POWER).orElseThrow().value();
    }

    private static double energy(LoadingZone zone) {
        return Engine.assess(zone, Settings.standard()).get(Result.ENERGY).orElseThrow().value();
    }

    private static double observed(LoadingZone zone, Rule rule) {
        return Engine.assess(zone, Settings.standard()).findings().stream()
                .filter(finding -> finding.rule() == rule).findFirst().orElseThrow().observed();
    }
}
