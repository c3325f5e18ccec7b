package bedmark.engine.verdict;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class ChanceTest {
    private static final OptionalDouble NONE = OptionalDouble.empty();

    /** A drawn number on a limit keeps it, whichever side of it is the good one. */
    @Test
    void trialsBeyondALimitAreCountedAndTrialsOnItAreNot() {
        double[] observed = {0.7, 0.8, 0.9, 1.0, 1.1};
        Chance over = Chance.of(Rule.BED_OVER_BOARD, observed, Limit.ofSite(OptionalDouble.of(0.8),
                OptionalDouble.of(1.0)));
        assertEquals(OptionalDouble.of(0.6), over.near());
        assertEquals(OptionalDouble.of(0.2), over.overloaded());
        assertEquals(Math.sqrt(0.025), over.standardDeviation(), 1e-15);
        Chance under = Chance.of(Rule.BED_BEHIND_BELT, observed, Limit.ofSite(OptionalDouble.of(0.9),
                OptionalDouble.of(0.8)));
        assertEquals(OptionalDouble.of(0.4), under.near());
        assertEquals(OptionalDouble.of(0.2), under.overloaded());
    }

    @Test
    void whereThereIsNoLimitThereIsNoChance() {
        Chance chance = Chance.of(Rule.BED_OVER_BOARD, new double[] {2, 2}, Limit.ofSite(NONE, NONE));
        assertEquals(new Chance(NONE, NONE, 0), chance);
    }
}
