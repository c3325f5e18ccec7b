package bedmark.engine.verdict;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.uncertainty.ImpossibleReading;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class LimitsTest {
    private static final OptionalDouble NONE = OptionalDouble.empty();
    private static final double MOST = 1e9;

    @Test
    void aLimitReachesFromNothingToTheMost() {
        for (double edge : new double[] {0, MOST}) {
            Limit limit = Limit.ofSite(OptionalDouble.of(edge), OptionalDouble.of(edge));
            assertEquals(limit, Limits.standard().with(Rule.SEAL_DEFECT, limit).of(Rule.SEAL_DEFECT));
        }
        for (double beyond : new double[] {-Double.MIN_VALUE, Math.nextUp(MOST), Double.NaN}) {
            refused("near", beyond, Limit.ofSite(OptionalDouble.of(beyond), NONE));
            refused("overloaded", beyond, Limit.ofSite(NONE, OptionalDouble.of(beyond)));
        }
    }

    private static void refused(String key, double value, Limit limit) {
        ImpossibleReading refusal = assertThrows(ImpossibleReading.class,
                () -> Limits.standard().with(Rule.SEAL_DEFECT, limit));
        assertEquals("limit-impossible", refusal.code());
        assertEquals("/plant/limits/seal-defect/" + key, refusal.readingName());
        assertEquals(List.of(Double.toString(value)), refusal.arguments());
    }

    @Test
    void aSiteChangesOneRuleAndLeavesTheOthersAsTheyAre() {
        Limit own = Limit.ofSite(OptionalDouble.of(0.7), OptionalDouble.of(0.9));
        Limits limits = Limits.standard().with(Rule.BED_OVER_BOARD, own).with(Rule.SEAL_DEFECT, own)
                .without(Rule.BED_OVER_DESIGN);
        assertEquals(own, limits.of(Rule.BED_OVER_BOARD));
        assertEquals(own, limits.of(Rule.SEAL_DEFECT));
        assertEquals(Rule.ZONE_TOO_SHORT.limit(), limits.of(Rule.ZONE_TOO_SHORT));
        assertEquals(Rule.BED_OVER_DESIGN.limit().near(), limits.of(Rule.BED_OVER_DESIGN).near());
        assertFalse(limits.of(Rule.BED_OVER_DESIGN).on());
        assertTrue(own.on() && own.assumption());
        assertEquals("site", own.source());
        assertFalse(limits.without(Rule.BED_OVER_BOARD).of(Rule.BED_OVER_BOARD).on());
    }

    /** 90 %, 10 % and 50 %; a site may be as sure as it likes, but never undecided beyond where it is overloaded. */
    @Test
    void certaintyReachesUpToOneAndKeepsItsOrder() {
        assertEquals(new Certainty(0.9, 0.1, 0.5), Certainty.standard());
        assertEquals(1, new Certainty(1, 1, 1).near());
        double over = Math.nextUp(1.0);
        for (double[] impossible : new double[][] {{over, 0.1, 0.5}, {0.9, 0, 0.5}, {0.9, Math.nextUp(0.9), 0.5},
            {0.9, 0.1, 0}, {0.9, 0.1, over}, {Double.NaN, 0.1, 0.5}}) {
            ImpossibleReading refusal = assertThrows(ImpossibleReading.class,
                    () -> new Certainty(impossible[0], impossible[1], impossible[2]));
            assertEquals("certainty-impossible", refusal.code());
            assertEquals(3, refusal.arguments().size());
        }
    }
}
