package bedmark.engine.verdict;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.uncertainty.Estimate;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class JudgementTest {
    private static final Limit LIMIT = Rule.BED_OVER_BOARD.limit();
    private static final double NINETY = 1.2815515655446004;

    @Test
    void overloadTakesNinetyPercent() {
        assertEquals(Level.OVERLOADED, level(1 + 0.1 * NINETY * 1.001, 0.1));
        assertEquals(Level.UNDECIDED, level(1 + 0.1 * NINETY * 0.999, 0.1));
        assertEquals(Level.UNDECIDED, level(1 - 0.1 * NINETY * 0.999, 0.1));
        assertEquals(Level.NEAR, level(1 - 0.1 * NINETY * 1.001, 0.1));
    }

    @Test
    void nearTakesFiftyPercent() {
        assertEquals(Level.NEAR, level(0.85, 0.01));
        assertEquals(Level.WITHIN, level(0.8499, 0.01));
    }

    @Test
    void aCertainValueOnALimitKeepsIt() {
        assertEquals(Level.WITHIN, level(0.85, 0));
        assertEquals(Level.NEAR, level(1.00, 0));
        assertEquals(Level.OVERLOADED, level(Math.nextUp(1.0), 0));
    }

    @Test
    void aProbabilityOnItsThresholdReachesIt() {
        Certainty sure = new Certainty(0.75, 0.25, 0.5);
        assertEquals(Level.OVERLOADED, drawn(1, 0.75, sure).level());
        assertEquals(Level.UNDECIDED, drawn(1, Math.nextDown(0.75), sure).level());
        assertEquals(Level.UNDECIDED, drawn(0, 0.25, sure).level());
        assertEquals(Level.NEAR, drawn(0.5, Math.nextDown(0.25), sure).level());
        assertEquals(Level.WITHIN, drawn(Math.nextDown(0.5), 0, sure).level());
    }

    /** A quarter of the way from the threshold to nothing, or to certainty; a fifth about the warning's own. */
    @Test
    void aFindingIsDoubtfulBetweenTheMarginsOfItsThresholds() {
        Certainty sure = new Certainty(0.5, 0.25, 0.2);
        assertFalse(isDoubtful(1, 0.0625, sure));
        assertTrue(isDoubtful(1, Math.nextUp(0.0625), sure));
        assertTrue(isDoubtful(1, Math.nextDown(0.875), sure));
        assertFalse(isDoubtful(1, 0.875, sure));
        assertFalse(isDoubtful(0.4, 0, sure));
        assertTrue(isDoubtful(Math.nextDown(0.4), 0, sure));
        assertTrue(isDoubtful(1e-9, 0, sure));
        assertFalse(isDoubtful(0, 1, sure));
    }

    @Test
    void aDrawnFindingKeepsWhatWasObservedAndTakesItsChance() {
        Finding drawn = drawn(0.9, 0.1, Certainty.standard());
        assertTrue(drawn.drawn());
        assertEquals(0.02, drawn.standardUncertainty());
        assertEquals(OptionalDouble.of(0.9), drawn.probabilityNear());
        assertEquals(OptionalDouble.of(0.1), drawn.probabilityOverloaded());
        assertEquals(1.05, drawn.observed());
        assertEquals(LIMIT.near(), drawn.near());
        assertEquals(LIMIT.overloaded(), drawn.overloaded());
        assertEquals(Optional.of("/readings/x"), drawn.leadingReading());
        assertEquals("A", drawn.source());
        assertTrue(drawn.assumption());
        assertFalse(firstOrder().drawn());
    }

    @Test
    void aRuleMayBeBrokenFromBelow() {
        Finding finding = Judgement.of(Rule.ZONE_TOO_SHORT, new Estimate(0.9, 0.05), Rule.ZONE_TOO_SHORT.limit(),
                Certainty.standard(), Optional.empty());
        assertEquals(Level.NEAR, finding.level());
        assertEquals(0.9772498680518208, finding.probabilityNear().orElseThrow(), 1e-12);
        assertEquals(OptionalDouble.empty(), finding.probabilityOverloaded());
    }

    @Test
    void theSiteMaySetHowSureAVerdictMustBe() {
        Finding finding = Judgement.of(Rule.BED_OVER_BOARD, new Estimate(1.05, 0.1), LIMIT,
                new Certainty(0.6, 0.4, 0.5), Optional.of("/readings/x"));
        assertEquals(Level.OVERLOADED, finding.level());
        assertEquals(Optional.of("/readings/x"), finding.leadingReading());
    }

    @Test
    void aRuleWithoutLimitsIsKept() {
        Limit none = Limit.ofSite(OptionalDouble.empty(), OptionalDouble.empty());
        assertEquals(Level.WITHIN, Judgement.of(Rule.BED_OVER_BOARD, new Estimate(9, 1), none, Certainty.standard(),
                Optional.empty()).level());
        assertEquals(Level.WITHIN, certain(9, none));
    }

    @Test
    void brokenIsBeyondEitherLimit() {
        assertEquals(Level.WITHIN, certain(0.85, LIMIT));
        assertEquals(Level.NEAR, certain(0.86, LIMIT));
        assertEquals(Level.NEAR, certain(1.00, LIMIT));
        assertEquals(Level.OVERLOADED, certain(1.01, LIMIT));
        assertEquals(Level.OVERLOADED, certain(1.1, Limit.ofSite(OptionalDouble.empty(), OptionalDouble.of(1))));
        assertEquals(Level.NEAR, Judgement.certain(Rule.BED_BEHIND_BELT, 0.7, OptionalDouble.of(0.8),
                OptionalDouble.empty()));
        assertEquals(Level.WITHIN, Judgement.certain(Rule.BED_BEHIND_BELT, 0.8, OptionalDouble.of(0.8),
                OptionalDouble.empty()));
    }

    @Test
    void levelsAreOrderedFromBestToWorst() {
        assertEquals(Level.OVERLOADED, Level.UNDECIDED.or(Level.OVERLOADED));
        assertEquals(Level.UNDECIDED, Level.UNDECIDED.or(Level.INCOMPLETE));
        assertEquals(Level.INCOMPLETE, Level.NEAR.or(Level.INCOMPLETE));
        assertEquals(Level.NEAR, Level.NEAR.or(Level.WITHIN));
    }

    @Test
    void aFindingSpeaksItsRule() {
        Finding finding = Judgement.of(Rule.BELT_TOO_FAST, new Estimate(1, 0), Rule.BELT_TOO_FAST.limit(),
                Certainty.standard(), Optional.empty());
        assertEquals("belt-too-fast", finding.code());
        assertEquals("m/s", finding.unit());
        assertEquals("slow-belt", finding.action());
    }

    private static Finding firstOrder() {
        return Judgement.of(Rule.BED_OVER_BOARD, new Estimate(1.05, 0.1), LIMIT, Certainty.standard(),
                Optional.of("/readings/x"));
    }

    private static Finding drawn(double near, double overloaded, Certainty certainty) {
        return Judgement.drawn(firstOrder(), new Chance(OptionalDouble.of(near), OptionalDouble.of(overloaded), 0.02),
                certainty);
    }

    private static boolean isDoubtful(double near, double overloaded, Certainty certainty) {
        return Judgement.isDoubtful(drawn(near, overloaded, certainty), certainty);
    }

    private static Level certain(double observed, Limit limit) {
        return Judgement.certain(Rule.BED_OVER_BOARD, observed, limit.near(), limit.overloaded());
    }

    private static Level level(double observed, double uncertainty) {
        return Judgement.of(Rule.BED_OVER_BOARD, new Estimate(observed, uncertainty), LIMIT, Certainty.standard(),
                Optional.empty()).level();
    }
}
