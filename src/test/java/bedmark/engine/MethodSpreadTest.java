package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.MethodSpread.Cause;
import bedmark.engine.MethodSpread.Reason;
import bedmark.engine.bed.DepthMethod;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Rule;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

class MethodSpreadTest {
    private static final LoadingZone ZONE = Zones.healthy();

    @Test
    void theRatiosOfTheReasonsMultiplyUpToThatOfTheMethods() {
        Random random = new Random(23);
        int zones = Zones.atMost(2_000);
        int several = 0;
        for (int i = 0; i < zones; i++) {
            Assessment assessment = Engine.assess(Zones.random(random), Settings.standard());
            Optional<MethodSpread> spread = assessment.spread();
            if (spread.isPresent()) {
                double most = assessment.methods().get(spread.get().highest()).value();
                double least = assessment.methods().get(spread.get().lowest()).value();
                assertEquals(most / least, spread.get().ratio(), 1e-12 * spread.get().ratio());
                assertTrue(assessment.methods().values().stream()
                        .allMatch(drag -> drag.value() <= most && drag.value() >= least));
                double product = spread.get().reasons().stream().mapToDouble(Reason::ratio)
                        .reduce(1, (a, b) -> a * b);
                assertEquals(0, Math.log(product / spread.get().ratio()), 0.0301, "each may leave out 1 %");
                several += spread.get().reasons().size() > 1 ? 1 : 0;
            }
        }
        assertTrue(several > zones / 2, several + " with more than one reason");
    }

    @Test
    void eachReasonIsWhatTheTwoMethodsTakeDifferently() {
        LoadingZone zone = Zones.exact(ZONE).withStations(List.of())
                .withStation(3, 0.2, DepthMethod.AT_BOARD, 0).with(Datum.SKIRT_FRICTION_FACTOR, 0.05, 0);
        MethodSpread spread = Engine.assess(zone.without(Datum.SKIRT_FRICTION_FACTOR), Zones.exactSettings()).spread()
                .orElseThrow();
        assertEquals(DragMethod.RANKINE, spread.lowest());
        assertEquals(DragMethod.ISO_5048, spread.highest());
        double sine = Math.sin(Math.toRadians(38));
        Map<Cause, Double> ratios = ratios(spread);
        assertEquals((1 + sine) / (1 - sine), ratios.get(Cause.LATERAL_PRESSURE), 1e-9);
        assertEquals(0.6 / 0.5, ratios.get(Cause.WALL_FRICTION), 1e-12);
        double mean = 270 / 1000.0 / 2 / 0.7;
        double accelerated = (4 - 0.25) / (2 * 9.80665 * (0.6 * Math.cos(0.05) - Math.sin(0.05)));
        double integral = mean * mean * (accelerated * (2 / 1.25) * (2 / 1.25) + 6 - accelerated);
        assertEquals(integral / (6 * 0.04), ratios.get(Cause.WHICH_DEPTH), 1e-9);
        LoadingZone deep = zone.without(Datum.SKIRT_FRICTION_FACTOR).with(Datum.WALL_FRICTION, 1, 0)
                .withStations(List.of()).withStation(3, 0.39, DepthMethod.AT_BOARD, 0);
        MethodSpread other = Engine.assess(deep, Zones.exactSettings()).spread().orElseThrow();
        assertEquals(DragMethod.ISO_5048, other.lowest());
        assertEquals((1 - sine) / (1 + sine), ratios(other).get(Cause.LATERAL_PRESSURE), 1e-9);
        assertEquals(1 / 0.6, ratios(other).get(Cause.WALL_FRICTION), 1e-12);
        assertEquals(6 * 0.39 * 0.39 / integral, ratios(other).get(Cause.WHICH_DEPTH), 1e-9);
        MethodSpread depthsAlike = Engine.assess(zone.with(Datum.WALL_FRICTION, 1, 0).without(Datum.BELT_SPEED),
                Zones.exactSettings()).spread().orElseThrow();
        assertEquals(List.of(Cause.LATERAL_PRESSURE), depthsAlike.reasons().stream().map(Reason::cause).toList());
        assertEquals(DragMethod.TABULATED, depthsAlike.lowest());
    }

    @Test
    void theGreatestReasonComesFirst() {
        Random random = new Random(24);
        for (int i = 0; i < Zones.atMost(200); i++) {
            Engine.assess(Zones.random(random), Settings.standard()).spread().ifPresent(spread -> {
                double before = Double.POSITIVE_INFINITY;
                for (Reason reason : spread.reasons()) {
                    double size = Math.abs(Math.log(reason.ratio()));
                    assertTrue(size <= before && size > 0.01);
                    before = size;
                }
            });
        }
    }

    @Test
    void oneMethodOrABedThatTouchesNothingHasNoSpread() {
        assertEquals(Optional.empty(), Engine.assess(ZONE.without(Datum.ANGLE_OF_REPOSE).without(Datum.BELT_SPEED),
                Settings.standard()).spread());
        assertEquals(Optional.empty(), Engine.assess(ZONE.withStations(List.of())
                .withStation(3, 0, DepthMethod.AT_BOARD, 0), Settings.standard()).spread());
        assertEquals(Optional.empty(), Engine.assess(LoadingZone.UNKNOWN, Settings.standard()).spread());
        assertEquals(Optional.empty(), Engine.assess(ZONE.without(Datum.BULK_DENSITY)
                .with(Datum.SITE_FACTOR, 0.1, 0.01), Settings.standard()).spread(), "no density, no pressure");
    }

    /** Two factors of the same size, and nothing else that tells a drag. */
    @Test
    void methodsThatAgreeDoNotSpread() {
        LoadingZone agreed = ZONE.with(Datum.SITE_FACTOR, 0.0754, 0).without(Datum.ANGLE_OF_REPOSE)
                .without(Datum.BELT_SPEED);
        Assessment assessment = Engine.assess(agreed, Settings.standard());
        assertEquals(assessment.methods().get(DragMethod.TABULATED).value(),
                assessment.methods().get(DragMethod.SITE).value());
        assertEquals(Optional.empty(), assessment.spread());
        assertEquals(Optional.empty(), Engine.assess(ZONE.with(Datum.THROUGHPUT, 0, 0), Settings.standard()).spread(),
                "of nothing there is no ratio");
    }

    @Test
    void theSpreadCountsAsARectangleBetweenTheMethodsOfOneDepth() {
        Assessment assessment = Engine.assess(ZONE, Settings.standard());
        double tabulated = assessment.methods().get(DragMethod.TABULATED).value();
        double rankine = assessment.methods().get(DragMethod.RANKINE).value();
        double spread = assessment.spread().orElseThrow().standardUncertainty();
        assertEquals(Math.abs(tabulated - rankine) / Math.sqrt(12), spread, 1e-9);
        Estimate drag = assessment.get(Result.SKIRT_DRAG).orElseThrow();
        assertEquals(Math.hypot(drag.standardUncertainty(), spread),
                assessment.counted(Result.SKIRT_DRAG).orElseThrow().standardUncertainty(), 1e-9);
        Estimate share = assessment.get(Result.DRIVE_SHARE).orElseThrow();
        assertEquals(Math.hypot(share.standardUncertainty(), spread * share.value() / drag.value()),
                skirts(assessment).standardUncertainty(), 1e-12);
        assertEquals(assessment.get(Result.SEAL_DRAG), assessment.counted(Result.SEAL_DRAG));
        assertEquals(Math.hypot(assessment.get(Result.MATERIAL_DRAG).orElseThrow().standardUncertainty(), spread),
                assessment.counted(Result.MATERIAL_DRAG).orElseThrow().standardUncertainty(), 1e-9);
    }

    @Test
    void theSpreadDoesNotCountWhereTheSiteSaysSoOrWhereAMethodStandsAlone() {
        Settings off = Settings.standard().with(Conventions.standard().withSpread(false));
        Assessment without = Engine.assess(ZONE, off);
        assertEquals(0, without.spread().orElseThrow().standardUncertainty());
        assertEquals(without.get(Result.DRIVE_SHARE).orElseThrow().standardUncertainty(),
                skirts(without).standardUncertainty(), 1e-15);
        for (DragMethod alone : List.of(DragMethod.ISO_5048, DragMethod.SITE)) {
            assertEquals(0, Engine.assess(ZONE.with(Datum.SITE_FACTOR, 0.1, 0.01), Settings.standard().with(alone))
                    .spread().orElseThrow().standardUncertainty());
        }
        assertTrue(Engine.assess(ZONE, Settings.standard().with(DragMethod.RANKINE)).spread().orElseThrow()
                .standardUncertainty() > 0);
    }

    @Test
    void methodsErrInAllZonesOfAConveyorAlike() {
        double one = spreadOf(Engine.assess(ZONE, Settings.standard()));
        List<Assessment> three = Engine.assessConveyor(List.of(ZONE, ZONE, ZONE), 0, Settings.standard()).zones();
        Settings off = Settings.standard().with(Conventions.standard().withSpread(false));
        double readings = skirts(Engine.assessConveyor(List.of(ZONE, ZONE, ZONE), 0, off).zones().get(0))
                .standardUncertainty();
        assertEquals(Math.hypot(readings, 3 * one), skirts(three.get(0)).standardUncertainty(), 1e-12);
    }

    private static double spreadOf(Assessment assessment) {
        return assessment.spread().orElseThrow().standardUncertainty()
                * assessment.get(Result.DRIVE_SHARE).orElseThrow().value()
                / assessment.get(Result.SKIRT_DRAG).orElseThrow().value();
    }

    private static Finding skirts(Assessment assessment) {
        return assessment.findings().stream().filter(finding -> finding.rule() == Rule.SKIRTS_OVER_BUDGET).findFirst()
                .orElseThrow();
    }

    private static Map<Cause, Double> ratios(MethodSpread spread) {
        return spread.reasons().stream().collect(Collectors.toMap(Reason::cause, Reason::ratio));
    }
}
