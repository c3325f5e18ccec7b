package bedmark.engine.bed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;
import java.util.List;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.Test;

/** The integrals as an engineer would write them out; that they give the engine's numbers is WorkingTest's business. */
class ProfileFormulaTest {
    private static Profile of(double length, List<Double> positions, double... levels) {
        return Profile.of(Uncertain.exact(length), positions.stream().map(Uncertain::exact).toList(),
                DoubleStream.of(levels).mapToObj(Uncertain::exact).toList());
    }

    private static void assertSums(String square, String depth, String level, Profile bed) {
        assertEquals(square, ProfileFormula.square(bed).expression());
        assertEquals(depth, ProfileFormula.depth(bed).expression());
        assertEquals("(" + level + ")/L", ProfileFormula.level(bed).expression());
    }

    @Test
    void oneStationStandsForTheWholeZone() {
        assertSums("x1 · h1² + (L − x1) · h1²", "x1 · h1 + (L − x1) · h1", "x1 · h1 + (L − x1) · h1",
                of(6, List.of(2.0), 0.2));
    }

    @Test
    void stationsAtTheEndsOfTheZoneLeaveNothingBeforeAndAfterThem() {
        assertSums("(x2 − x1) · (h1² + h1 · h2 + h2²)/3", "(x2 − x1) · (h1 + h2)/2", "(x2 − x1) · (h1 + h2)/2",
                of(6, List.of(0.0, 6.0), 0.2, 0.3));
        assertSums("(L − x1) · h1²", "(L − x1) · h1", "(L − x1) · h1", of(6, List.of(0.0), 0.2));
    }

    @Test
    void whereTheBedLeavesTheBoardsItsTriangleRemains() {
        assertSums("x1 · h1² + (x2 − x1) · h1³/(3 · (h1 − h2)) + (x3 − x2) · h3³/(3 · (h3 − h2)) + (L − x3) · h3²",
                "x1 · h1 + (x2 − x1) · h1²/(2 · (h1 − h2)) + (x3 − x2) · h3²/(2 · (h3 − h2)) + (L − x3) · h3",
                "x1 · h1 + (x2 − x1) · (h1 + h2)/2 + (x3 − x2) · (h2 + h3)/2 + (L − x3) · h3",
                of(6, List.of(1.0, 3.0, 5.0), 0.2, -0.1, 0.3));
        assertSums("(x2 − x1) · (h1² + h1 · h2 + h2²)/3 + (L − x2) · h2²", "(x2 − x1) · (h1 + h2)/2 + (L − x2) · h2",
                "(x2 − x1) · (h1 + h2)/2 + (L − x2) · h2", of(6, List.of(0.0, 3.0), 0.2, 0));
    }

    @Test
    void aStretchThatTouchesNowhereIsLeftOut() {
        assertSums("(x3 − x2) · h3³/(3 · (h3 − h2)) + (L − x3) · h3²",
                "(x3 − x2) · h3²/(2 · (h3 − h2)) + (L − x3) · h3",
                "x1 · h1 + (x2 − x1) · (h1 + h2)/2 + (x3 − x2) · (h2 + h3)/2 + (L − x3) · h3",
                of(6, List.of(1.0, 3.0, 5.0), -0.1, -0.2, 0.3));
    }

    @Test
    void aBedThatTouchesNowhereHasNoIntegral() {
        assertSums("0", "0", "x1 · h1 + (x2 − x1) · (h1 + h2)/2 + (L − x2) · h2",
                of(6, List.of(1.0, 3.0), -0.2, -0.1));
    }

    @Test
    void theDeepestIsNoLessThanNothing() {
        assertEquals("max(h1, h2)", ProfileFormula.deepest(of(6, List.of(1.0, 3.0), 0.2, 0)).expression());
        assertEquals("max(h1, h2, 0)", ProfileFormula.deepest(of(6, List.of(1.0, 3.0), 0.2, -0.1)).expression());
    }

    /** The last quarter of 8 m begins at 6 m. */
    @Test
    void theLastQuarterBeginsBetweenItsTwoStationsOrBeyondThem() {
        assertEquals("h1 + (0.75 · L − x1)/(x2 − x1) · (h2 − h1)", atLastQuarter(of(8, List.of(2.0, 7.0), 0.2, 0.3)));
        assertEquals("h2 + (0.75 · L − x2)/(x3 − x2) · (h3 − h2)",
                atLastQuarter(of(8, List.of(2.0, 5.0, 6.0), 0.2, 0.3, 0.4)));
        assertEquals("h1", atLastQuarter(of(8, List.of(7.0, 8.0), 0.2, 0.3)));
        assertEquals("h2", atLastQuarter(of(8, List.of(1.0, 2.0), 0.2, 0.3)));
    }

    @Test
    void theChangeOverTheLastQuarterTakesTheStationsWithinIt() {
        assertEquals("max(hq, h2, h3) − min(hq, h2, h3)", change(of(8, List.of(6.0, 7.0, 8.0), 0.2, 0.3, 0.4)));
        assertEquals("hq − hq", change(of(8, List.of(1.0, 6.0), 0.2, 0.3)));
        assertEquals("max(max(hq, 0), max(h2, 0)) − min(max(hq, 0), max(h2, 0))",
                change(of(8, List.of(1.0, 7.0), -0.2, 0.3)));
        assertEquals("max(hq, 0) − max(hq, 0)", change(of(8, List.of(1.0, 2.0), -0.2, 0.3)));
    }

    @Test
    void aBedTouchesWhereNoStationLiesUnderTheBoardLine() {
        assertTrue(ProfileFormula.touches(of(6, List.of(1.0, 3.0), 0.2, 0)));
        assertFalse(ProfileFormula.touches(of(6, List.of(1.0, 3.0), 0.2, -0.001)));
    }

    @Test
    void eachIsNamedBySignSourceAndTheRuleThatHoldsForAnyStations() {
        Profile bed = of(6, List.of(1.0), 0.2);
        assertEquals(List.of("integral-of-square", "J2", "Σ Δx · (h² + h · h′ + h′²)/3", "D"),
                name(ProfileFormula.square(bed)));
        assertEquals(List.of("integral-of-depth", "J1", "Σ Δx · (h + h′)/2", "D"), name(ProfileFormula.depth(bed)));
        assertEquals(List.of("mean-level", "hn", "(Σ Δx · (h + h′)/2)/L", "D"), name(ProfileFormula.level(bed)));
        assertEquals(List.of("deepest-depth", "hmax", "", "D"), name(ProfileFormula.deepest(bed)));
        assertEquals(List.of("level-at-last-quarter", "hq", "", "D"), name(ProfileFormula.atLastQuarter(bed)));
        assertEquals(List.of("change-over-last-quarter", "Δh", "", "D"),
                name(ProfileFormula.changeOverLastQuarter(bed)));
    }

    private static List<String> name(Formula formula) {
        return List.of(formula.code(), formula.sign(), formula.general(), formula.source());
    }

    private static String atLastQuarter(Profile bed) {
        return ProfileFormula.atLastQuarter(bed).expression();
    }

    private static String change(Profile bed) {
        return ProfileFormula.changeOverLastQuarter(bed).expression();
    }
}
