package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealRates;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.verdict.Level;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class MissingReadingsTest {
    private static final LoadingZone ZONE = Zones.healthy();

    @Test
    void ofAnUnknownZoneEveryRequiredReadingIsNamed() {
        Assessment assessment = Engine.assess(LoadingZone.UNKNOWN, Settings.standard());
        assertEquals(Level.INCOMPLETE, assessment.level());
        assertEquals(List.of("/readings/loadingZoneLength", "/readings/beltSpeed", "/readings/skirtSpacing",
                "/readings/skirtHeight", "/readings/bedDepths", "/readings/seals", "/conveyor/beltWidth",
                "/conveyor/troughAngle", "/conveyor/centreRollLength", "/material/bulkDensity",
                "/material/surchargeAngle", "/material/skirtFrictionFactor", "/material/angleOfRepose"),
                assessment.missingRequired());
        assertEquals(List.of(Side.LEFT, Side.RIGHT), assessment.sidesWithoutSeals());
        assertEquals(Map.of(), assessment.results());
        assertEquals(List.of(), assessment.findings());
        assertEquals(Optional.empty(), assessment.method());
    }

    @Test
    void eachRequiredReadingAloneKeepsAZoneIncomplete() {
        for (Datum datum : List.of(Datum.ZONE_LENGTH, Datum.BELT_SPEED, Datum.BELT_WIDTH, Datum.TROUGH_ANGLE,
                Datum.CENTRE_ROLL, Datum.BULK_DENSITY, Datum.SURCHARGE_ANGLE)) {
            Assessment assessment = Engine.assess(ZONE.without(datum), Settings.standard());
            assertEquals(List.of(datum.pointer()), assessment.missingRequired());
            assertEquals(Level.INCOMPLETE, assessment.level());
        }
        assertEquals(List.of("/readings/bedDepths"),
                Engine.assess(ZONE.withStations(List.of()), Settings.standard()).missingRequired());
    }

    @Test
    void spacingAndHeightComeFromTheRegisterWhereTheyWereNotRead() {
        LoadingZone registered = ZONE.without(Datum.READ_SPACING).without(Datum.READ_HEIGHT);
        Assessment assessment = Engine.assess(registered, Settings.standard());
        assertEquals(List.of(), assessment.missingRequired());
        assertTrue(assessment.assumptions().contains(Assumption.of("register-used", "/transfer/skirtSpacing")));
        assertTrue(assessment.assumptions().contains(Assumption.of("register-used", "/transfer/skirtHeight")));
        assertEquals(List.of("/readings/skirtSpacing", "/readings/skirtHeight"), Engine.assess(
                registered.without(Datum.REGISTER_SPACING).without(Datum.REGISTER_HEIGHT),
                Settings.standard()).missingRequired());
    }

    @Test
    void aSideWithoutSealsIsMissingAndNotZero() {
        Assessment assessment = Engine.assess(ZONE.withSeals(ZONE.seals().subList(0, 1)), Settings.standard());
        assertEquals(List.of("/readings/seals"), assessment.missingRequired());
        assertEquals(List.of(Side.RIGHT), assessment.sidesWithoutSeals());
        assertFalse(assessment.results().containsKey(Result.SEAL_DRAG));
        assertFalse(assessment.results().containsKey(Result.SKIRT_POWER));
        assertTrue(assessment.results().containsKey(Result.MATERIAL_DRAG));
    }

    @Test
    void whatNeedsNoSectionIsComputedWithoutIt() {
        LoadingZone bare = ZONE.without(Datum.SURCHARGE_ANGLE).without(Datum.CENTRE_ROLL).without(Datum.READ_HEIGHT)
                .without(Datum.REGISTER_HEIGHT);
        Assessment assessment = Engine.assess(bare, Settings.standard());
        assertEquals(Engine.assess(ZONE, Settings.standard()).get(Result.SKIRT_POWER),
                assessment.get(Result.SKIRT_POWER));
        assertFalse(assessment.results().containsKey(Result.BED_AREA));
        assertEquals(List.of(), assessment.remedies());
        LoadingZone fromTop = bare.withStations(List.of()).withStation(1, 0.1, DepthMethod.FROM_BOARD_TOP, 0);
        assertFalse(Engine.assess(fromTop, Settings.standard()).results().containsKey(Result.SKIRT_POWER));
        assertTrue(Engine.assess(fromTop.with(Datum.READ_HEIGHT, 0.3, 0), Settings.standard()).results()
                .containsKey(Result.SKIRT_POWER));
        assertFalse(Engine.assess(fromTop.with(Datum.READ_HEIGHT, 0.05, 0), Settings.standard()).results()
                .containsKey(Result.SKIRT_POWER), "below the board the section decides");
    }

    @Test
    void aFlatBeltNeedsNoCentreRoll() {
        LoadingZone flat = ZONE.with(Datum.TROUGH_ANGLE, 0, 0).without(Datum.CENTRE_ROLL);
        Assessment assessment = Engine.assess(flat, Settings.standard());
        assertEquals(List.of(), assessment.missing());
        assertEquals(0.7 * 0.12 + 0.49 * Math.tan(Math.toRadians(20)) / 6,
                assessment.get(Result.BED_AREA).orElseThrow().value(), 1e-12);
        assertEquals(assessment.get(Result.FILL).orElseThrow().value(), Engine.assess(
                flat.with(Datum.CENTRE_ROLL, 0.3, 0), Settings.standard()).get(Result.FILL).orElseThrow().value());
    }

    @Test
    void aTimingOrAPulleyNamesTheNumberThatItLacks() {
        LoadingZone unknown = ZONE.without(Datum.BELT_SPEED);
        assertEquals(List.of("/readings/beltTiming/elapsed"), Engine.assess(unknown
                .with(Datum.TIMED_BELT_LENGTH, 200, 0).with(Datum.TIMED_REVOLUTIONS, 3, 0),
                Settings.standard()).missingRequired());
        assertEquals(List.of("/readings/pulleySpeed/rotation"), Engine.assess(unknown
                .with(Datum.PULLEY_DIAMETER, 0.6, 0), Settings.standard()).missingRequired());
        Assessment registered = Engine.assess(unknown.with(Datum.TIMED_REVOLUTIONS, 3, 0)
                .with(Datum.TIMED_ELAPSED, 300, 3).with(Datum.BELT_LENGTH, 200, 0), Settings.standard());
        assertEquals(2, registered.get(Result.BELT_SPEED).orElseThrow().value(), 1e-15);
        assertEquals(0.02, registered.get(Result.BELT_SPEED).orElseThrow().standardUncertainty(), 1e-15);
        assertTrue(registered.assumptions().contains(Assumption.of("register-used", "/conveyor/beltLength")));
        Assessment pulley = Engine.assess(unknown.with(Datum.PULLEY_DIAMETER, 0.6, 0)
                .with(Datum.PULLEY_ROTATION, 1, 0.03), Settings.standard());
        assertTrue(pulley.assumptions().contains(Assumption.of("pulley-slip-ignored")));
        assertEquals(0.03, pulley.get(Result.BELT_SPEED).orElseThrow().standardUncertainty()
                / pulley.get(Result.BELT_SPEED).orElseThrow().value(), 1e-15);
    }

    @Test
    void aRowThatWasBegunKeepsTheZoneIncomplete() {
        Assessment assessment = Engine.assess(ZONE.withUnfinished(List.of("/readings/bedDepths/2/depth")),
                Settings.standard());
        assertEquals(List.of("/readings/bedDepths/2/depth"), assessment.missingRequired());
        assertEquals(Level.INCOMPLETE, assessment.level());
        assertEquals(List.of("/readings/beltTiming/elapsed", "/readings/bedDepths/0/depth"), Engine.assess(
                ZONE.without(Datum.BELT_SPEED).withStations(List.of()).withUnfinished(
                        List.of("/readings/beltTiming/elapsed", "/readings/bedDepths/0/depth")),
                Settings.standard()).missingRequired());
    }

    @Test
    void whatIsNotRequiredIsNamedButLeavesTheVerdict() {
        LoadingZone bare = ZONE.without(Datum.RATED_POWER).without(Datum.DRIVE_EFFICIENCY)
                .without(Datum.LOADED_HOURS).without(Datum.LUMP_SIZE).without(Datum.ANGLE_OF_REPOSE)
                .without(Datum.DESIGN_SPEED);
        Assessment assessment = Engine.assess(bare, Settings.standard());
        assertEquals(Level.WITHIN, assessment.level());
        assertEquals(List.of(), assessment.missingRequired());
        for (String place : List.of("/conveyor/ratedPower", "/conveyor/driveEfficiency",
                "/conveyor/loadedHoursPerYear", "/transfer/lumpSize", "/material/angleOfRepose",
                "/conveyor/designSpeed")) {
            assertTrue(assessment.missing().contains(place), place);
        }
        assertFalse(assessment.missing().contains("/readings/throughput"), "nobody has to weigh");
    }

    @Test
    void aMaterialWithoutFactorFallsBackOnRankine() {
        assertEquals(Optional.of(DragMethod.TABULATED), Engine.assess(ZONE, Settings.standard()).method());
        Assessment assessment = Engine.assess(ZONE.without(Datum.SKIRT_FRICTION_FACTOR), Settings.standard());
        assertEquals(Optional.of(DragMethod.RANKINE), assessment.method());
        assertEquals(assessment.methods().get(DragMethod.RANKINE),
                assessment.get(Result.MATERIAL_DRAG).orElseThrow());
        assertEquals(Optional.of(DragMethod.ISO_5048),
                Engine.assess(ZONE, Settings.standard().with(DragMethod.ISO_5048)).method());
        Assessment chosen = Engine.assess(ZONE.without(Datum.ANGLE_OF_REPOSE),
                Settings.standard().with(DragMethod.RANKINE));
        assertEquals(List.of("/material/angleOfRepose"), chosen.missingRequired());
    }

    /** By ISO 5048 a zone has drag and power before anybody read a depth: there is no bed to change yet. */
    @Test
    void aFlowWithoutABedHasItsDragAndNoRemedy() {
        LoadingZone bare = ZONE.withStations(List.of());
        Assessment assessment = Engine.assess(bare, Settings.standard().with(DragMethod.ISO_5048));
        assertEquals(assessment.methods().get(DragMethod.ISO_5048),
                assessment.get(Result.MATERIAL_DRAG).orElseThrow());
        assertTrue(assessment.get(Result.SKIRT_POWER).isPresent());
        assertEquals(List.of(), assessment.remedies());
        assertEquals(List.of("/readings/bedDepths"), assessment.missingRequired());
    }

    @Test
    void aBeltThatStandsHasNoRatios() {
        Assessment assessment = Engine.assess(ZONE.with(Datum.BELT_SPEED, 0, 0), Settings.standard());
        assertEquals(0, assessment.get(Result.SKIRT_POWER).orElseThrow().value());
        for (Result result : List.of(Result.FILL, Result.BED_SPEED_RATIO)) {
            assertFalse(assessment.results().containsKey(result));
        }
        assertFalse(assessment.methods().containsKey(DragMethod.ISO_5048));
    }

    @Test
    void aBeltTooSteepToCarryTheFeedHasNoAccelerationLength() {
        Assessment assessment = Engine.assess(ZONE.with(Datum.INCLINE, 0.6, 0), Settings.standard());
        assertFalse(assessment.results().containsKey(Result.ACCELERATION_LENGTH));
        assertTrue(assessment.assumptions().contains(
                Assumption.of("acceleration-length-endless", "/conveyor/incline")));
    }

    @Test
    void aBeltTooNarrowForTheStandardHasNoCapacity() {
        LoadingZone narrow = LoadingZone.UNKNOWN.with(Datum.BELT_WIDTH, 0.05, 0).with(Datum.TROUGH_ANGLE, 0, 0)
                .with(Datum.READ_SPACING, 0.03, 0).with(Datum.SURCHARGE_ANGLE, 0.3, 0)
                .with(Datum.BULK_DENSITY, 500, 0).with(Datum.BELT_SPEED, 1, 0).with(Datum.THROUGHPUT, 1, 0);
        assertFalse(Engine.assess(narrow, Settings.standard()).results().containsKey(Result.FILL));
    }

    @Test
    void whatIsTakenForGrantedIsSaid() {
        LoadingZone bare = ZONE.without(Datum.INCLINE).without(Datum.FEED_VELOCITY).without(Datum.IMPACT_LENGTH)
                .without(Datum.WALL_FRICTION).without(Datum.THROUGHPUT).withStations(List.of())
                .withStation(2, 0.1, DepthMethod.WEAR_LINE, 0.02);
        List<Assumption> assumptions = Engine.assess(bare, Settings.standard()).assumptions();
        for (Assumption expected : List.of(Assumption.of("incline-level", "/conveyor/incline"),
                Assumption.of("feed-velocity-zero", "/transfer/feedVelocity"),
                Assumption.of("impact-length-zero", "/transfer/impactLength"),
                Assumption.of("wall-friction-one", "/material/wallFriction"),
                Assumption.of("repose-for-friction-angle"), Assumption.of("bed-at-belt-speed"),
                Assumption.of("verdict-holds-at-todays-feed", "/readings/throughput"),
                Assumption.of("wear-line-is-history", "/readings/bedDepths/0/depth"),
                Assumption.of("first-order-coarse", "/readings/bedDepths/0/depth"),
                Assumption.of("depth-constant-along-zone"))) {
            assertTrue(assumptions.contains(expected), () -> expected + " in " + assumptions);
        }
        assertEquals(List.of(Assumption.of("repose-for-friction-angle")),
                Engine.assess(ZONE, Settings.standard()).assumptions());
    }

    /** The rate that was fitted with the site's factor goes with the site's method, and with no other. */
    @Test
    void theFittedSealRateCountsWhereTheSitesMethodDecides() {
        LoadingZone fitted = ZONE.with(Datum.SITE_FACTOR, 0.08, 0).with(Datum.SITE_SEAL_RATE, 55, 0);
        Settings site = Settings.standard().with(DragMethod.SITE);
        Assumption said = Assumption.of("seal-rate-fitted", "55.0");
        Assessment bySite = Engine.assess(fitted, site);
        assertEquals(55 * 12, bySite.get(Result.SEAL_DRAG).orElseThrow().value(), 1e-9);
        assertTrue(bySite.assumptions().contains(said));
        for (Assessment other : List.of(Engine.assess(fitted, Settings.standard()),
                Engine.assess(fitted.without(Datum.SITE_SEAL_RATE), site))) {
            assertEquals(SealRates.CONVENTION * 12, other.get(Result.SEAL_DRAG).orElseThrow().value(), 1e-9);
            assertTrue(other.assumptions().stream().noneMatch(one -> one.code().startsWith("seal-rate")));
        }
    }

    /** ISO 5048 takes the mean of feed and belt speed: where the feed runs against the belt as fast there is none. */
    @Test
    void aFeedAgainstTheBeltHasNoSpecialResistance() {
        assertTrue(Engine.assess(ZONE.with(Datum.FEED_VELOCITY, 2, 0), Settings.standard()).methods()
                .containsKey(DragMethod.ISO_5048));
        for (double against : new double[] {-2, -2.1}) {
            assertFalse(Engine.assess(ZONE.with(Datum.FEED_VELOCITY, against, 0), Settings.standard()).methods()
                    .containsKey(DragMethod.ISO_5048));
        }
    }

    @Test
    void theSitesOwnSealRateIsSaid() {
        Settings own = Settings.standard().with(new SealRates(50, Map.of()));
        assertTrue(Engine.assess(ZONE, own).assumptions().contains(Assumption.of("seal-rate-site", "50.0")));
        assertTrue(Engine.assess(ZONE.withSeals(List.of()), own).assumptions().stream()
                .noneMatch(one -> one.code().startsWith("seal-rate")), "but not of seals that nobody looked at");
        Settings worn = Settings.standard().with(
                Settings.standard().sealRates().with(SealType.VERTICAL, SealCondition.SOUND, 1.5));
        assertTrue(Engine.assess(ZONE, worn).assumptions().contains(
                Assumption.of("seal-multiplier-site", "vertical", "sound", "1.5")));
    }
}
