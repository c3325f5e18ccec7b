package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.uncertainty.Distribution;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Chance;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Rule;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** That so many drawings come out as the theory says they must; slow, and no proof of any single line. */
class MonteCarloAgreementTest {
    private static final Settings FIRST_ORDER = Settings.standard().with(Conventions.standard().withTrials(0));
    private static final int TRIALS = 6_000;
    private static final long SEED = 7;
    private static final LoadingZone ZONE = Zones.healthy();

    @Test
    void firstOrderAndDrawingAgreeWhereTheReadingsAreFine() {
        LoadingZone fine = ZONE.withStations(List.of()).withStation(1, 0.30, DepthMethod.AT_BOARD, 0.004)
                .withStation(3, 0.25, DepthMethod.FROM_BOARD_TOP, 0.004)
                .withStation(5, 0.20, DepthMethod.AT_BOARD, 0.004);
        Assessment firstOrder = Engine.assess(fine, Settings.standard());
        MonteCarlo drawn = Engine.monteCarlo(List.of(fine), Settings.standard(), SEED, 20_000).get(0);
        assertEquals(firstOrder.results().keySet(), drawn.results().keySet());
        for (Result result : List.of(Result.SKIRT_DRAG, Result.SKIRT_POWER, Result.DRIVE_POWER, Result.DRIVE_SHARE,
                Result.ENERGY, Result.MATERIAL_DRAG, Result.SEAL_DRAG, Result.IMPLIED_THROUGHPUT, Result.BED_AREA,
                Result.MEAN_SQUARE_DEPTH, Result.MEAN_DEPTH, Result.LOADING_FORCE, Result.FILL,
                Result.RUNNING_SHARE, Result.DESIGN_DEPTH)) {
            agree(result.key(), firstOrder.get(result).orElseThrow(), drawn.results().get(result));
        }
        for (DragMethod method : drawn.methods().keySet()) {
            if (method != DragMethod.ISO_5048) {
                agree(method.code(), firstOrder.methods().get(method), drawn.methods().get(method));
            }
        }
        assertTrue(drawn.methods().containsKey(DragMethod.ISO_5048));
    }

    private static void agree(String what, Estimate firstOrder, Distribution drawn) {
        double u = firstOrder.standardUncertainty();
        assertEquals(firstOrder.value(), drawn.mean(), Math.max(0.02 * Math.abs(firstOrder.value()), 0.02 * u), what);
        assertEquals(u, drawn.standardDeviation(), 0.02 * u, what);
        assertEquals(firstOrder.value() - 1.96 * u, drawn.low(), 0.4 * u, what);
        assertEquals(firstOrder.value() + 1.96 * u, drawn.high(), 0.4 * u, what);
    }

    /** The mean of a square is that of the mean and the variance: drawing finds more drag, and a tail to the right. */
    @Test
    void whereTheSquareMattersDrawingFindsMore() {
        for (double spread : new double[]{0.02, 0.03, 0.04}) {
            LoadingZone coarse = Zones.exact(ZONE).withStations(List.of())
                    .withStation(3, 0.15, DepthMethod.AT_BOARD, spread);
            Estimate firstOrder = Engine.assess(coarse, Zones.exactSettings()).get(Result.MEAN_SQUARE_DEPTH)
                    .orElseThrow();
            Distribution drawn = Engine.monteCarlo(List.of(coarse), Zones.exactSettings(), SEED, 50_000).get(0)
                    .results().get(Result.MEAN_SQUARE_DEPTH);
            double exact = Math.sqrt(4 * 0.0225 * spread * spread + 2 * Math.pow(spread, 4));
            double chance = 4 * exact / Math.sqrt(50_000);
            assertEquals(firstOrder.value() + spread * spread, drawn.mean(), chance);
            assertTrue(chance < 0.5 * spread * spread && drawn.mean() > firstOrder.value());
            assertEquals(exact, drawn.standardDeviation(), 0.02 * exact);
            assertTrue(drawn.standardDeviation() > firstOrder.standardUncertainty());
            assertTrue(drawn.high() - firstOrder.value() > firstOrder.value() - drawn.low(), "skewed to the right");
        }
    }

    @Test
    void whereNumbersAreLinearTheChanceIsThatOfTheNormalDistribution() {
        LoadingZone zone = ZONE.withStations(List.of()).withStation(3, 0.395, DepthMethod.AT_BOARD, 0.005);
        Chance chance = drawn(zone).chances().get(Rule.BED_OVER_BOARD);
        Finding finding = finding(Engine.assess(zone, Settings.standard()), Rule.BED_OVER_BOARD);
        assertEquals(finding.probabilityOverloaded().orElseThrow(), chance.overloaded().orElseThrow(), 0.02);
        assertEquals(finding.probabilityNear().orElseThrow(), chance.near().orElseThrow(), 0.02);
        assertEquals(finding.standardUncertainty(), chance.standardDeviation(), 0.02 * finding.standardUncertainty());
        assertFalse(drawn(zone).chances().containsKey(Rule.BED_NOT_SETTLED), "one station tells no change");
        Chance slow = drawn(zone.with(Datum.THROUGHPUT, 470, 30)).chances().get(Rule.BED_BEHIND_BELT);
        Finding behind = finding(Engine.assess(zone.with(Datum.THROUGHPUT, 470, 30), Settings.standard()),
                Rule.BED_BEHIND_BELT);
        assertEquals(behind.probabilityNear().orElseThrow(), slow.near().orElseThrow(), 0.02);
        assertEquals(OptionalDouble.empty(), slow.overloaded());
    }

    /** Where several stations are as deep, any of them may be over the board; the first order sees one alone. */
    @Test
    void ofSeveralDepthsTheDeepestIsDeeperThanEach() {
        LoadingZone level = ZONE.withStations(List.of());
        for (int i = 0; i < 4; i++) {
            level = level.withStation(0.5 + i, 0.37, DepthMethod.AT_BOARD, 0.02);
        }
        double drawn = drawn(level).chances().get(Rule.BED_OVER_BOARD).overloaded().orElseThrow();
        double one = finding(Engine.assess(level, FIRST_ORDER), Rule.BED_OVER_BOARD).probabilityOverloaded()
                .orElseThrow();
        assertTrue(drawn > 2 * one && drawn < 4 * one, drawn + " for " + one);
        Finding judged = finding(Engine.assess(level, Settings.standard()), Rule.BED_OVER_BOARD);
        assertTrue(judged.drawn(), "which an assessment finds too");
        assertEquals(drawn, judged.probabilityOverloaded().orElseThrow(), 0.02);
    }

    @Test
    void whatTheZonesShareIsDrawnOnceForAll() {
        LoadingZone shared = Zones.exact(ZONE).with(Datum.DRIVE_EFFICIENCY, 0.9, 0.02)
                .with(Datum.BELT_SPEED, 2, 0.02);
        List<LoadingZone> four = Collections.nCopies(4, shared);
        double drawn = Engine.monteCarlo(four, Zones.exactSettings(), SEED, TRIALS).get(0).chances()
                .get(Rule.SKIRTS_OVER_BUDGET).standardDeviation();
        double firstOrder = finding(Engine.assessConveyor(four, 0, Zones.exactSettings()).zones().get(0),
                Rule.SKIRTS_OVER_BUDGET).standardUncertainty();
        assertEquals(firstOrder, drawn, 0.02 * firstOrder);
    }

    @Test
    void theDisagreementOfTheMethodsIsDrawnEvenlyInAllZonesAlike() {
        Settings exact = Zones.exactSettings().with(Zones.exactSettings().conventions().withSpread(true));
        List<LoadingZone> three = Collections.nCopies(3, Zones.exact(ZONE));
        MonteCarlo drawn = Engine.monteCarlo(three, exact, SEED, TRIALS).get(0);
        double spread = finding(Engine.assessConveyor(three, 0, exact).zones().get(0), Rule.SKIRTS_OVER_BUDGET)
                .standardUncertainty();
        assertEquals(spread, drawn.chances().get(Rule.SKIRTS_OVER_BUDGET).standardDeviation(), 0.02 * spread);
        assertEquals(0, drawn.results().get(Result.DRIVE_SHARE).standardDeviation(), 1e-12);
        LoadingZone more = Zones.exact(ZONE).with(Datum.DESIGN_THROUGHPUT, 400, 0);
        Finding drive = Engine.assess(more, exact).findingsAtDesign().stream()
                .filter(found -> found.rule() == Rule.DRIVE_NEAR_RATING).findFirst().orElseThrow();
        assertTrue(drive.standardUncertainty() > 0);
        assertEquals(drive.standardUncertainty(), Engine.monteCarlo(List.of(more), exact, SEED, TRIALS).get(0)
                .chancesAtDesign().get(Rule.DRIVE_NEAR_RATING).standardDeviation(),
                0.02 * drive.standardUncertainty());
    }

    /** An assessment draws what is not straight and takes the rest by its derivatives: the whole drawing agrees. */
    @Test
    void theDrawingOfAnAssessmentAgreesWithTheWholeOne() {
        Random random = new Random(83);
        int compared = 0;
        double apart = 0;
        for (int i = 0; i < 600 && compared < 60; i++) {
            LoadingZone zone = Zones.random(random);
            Assessment assessment = Engine.assess(zone, Settings.standard());
            if (assessment.findings().stream().noneMatch(Finding::drawn)) {
                continue;
            }
            Map<Rule, Chance> whole = Engine.monteCarlo(List.of(zone), Settings.standard(), i, 4_000).get(0).chances();
            for (Finding finding : assessment.findings()) {
                if (finding.drawn() && whole.containsKey(finding.rule())) {
                    Chance chance = whole.get(finding.rule());
                    compared++;
                    if (finding.overloaded().isPresent()) {
                        double off = finding.probabilityOverloaded().orElseThrow() - chance.overloaded().orElseThrow();
                        assertEquals(0, off, 0.04, finding + " of " + zone);
                        apart += Math.abs(off);
                    }
                    assertEquals(chance.near().orElseThrow(), finding.probabilityNear().orElseThrow(), 0.04,
                            finding::toString);
                }
            }
        }
        assertTrue(compared >= 60, "compared " + compared);
        assertTrue(apart / compared < 0.01, "on average " + apart / compared);
    }

    @Test
    void asManyTrialsAsASiteMayAskForAreDrawn() {
        assertEquals(Conventions.MOST_TRIALS, Engine.monteCarlo(List.of(LoadingZone.UNKNOWN), Settings.standard(), 1,
                Conventions.MOST_TRIALS).get(0).trials());
    }

    private static MonteCarlo drawn(LoadingZone zone) {
        return Engine.monteCarlo(List.of(zone), Settings.standard(), SEED, TRIALS).get(0);
    }

    private static Finding finding(Assessment assessment, Rule rule) {
        return assessment.findings().stream().filter(finding -> finding.rule() == rule).findFirst().orElseThrow();
    }
}
