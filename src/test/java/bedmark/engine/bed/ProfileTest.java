package bedmark.engine.bed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Tape;
import bedmark.engine.uncertainty.Uncertain;
import java.util.List;
import org.junit.jupiter.api.Test;

class ProfileTest {
    private static final double[] PLACES = {1, 3, 5};

    private static Uncertain[] exact(double... numbers) {
        Uncertain[] all = new Uncertain[numbers.length];
        for (int i = 0; i < all.length; i++) {
            all[i] = Uncertain.exact(numbers[i]);
        }
        return all;
    }

    private static Profile of(double length, double[] positions, double... levels) {
        return Profile.of(Uncertain.exact(length), List.of(exact(positions)), List.of(exact(levels)));
    }

    @Test
    void aZoneIsCutWhereAStationStands() {
        Profile bed = of(6, PLACES, 0.1, 0.3, 0.2);
        Profile cut = bed.upTo(Uncertain.exact(3));
        assertEquals(2, cut.stations());
        assertEquals(0.3, cut.depth(1).value());
        assertEquals(3, cut.length().value());
        assertEquals(0.1 * 1 + 2 * 0.2, cut.integral().value(), 1e-15);
        assertEquals(0.25, bed.upTo(Uncertain.exact(4)).depth(2).value(), 1e-15);
        assertEquals(0.2, bed.upTo(Uncertain.exact(5.5)).depth(3).value());
    }

    /** The last quarter begins at three quarters: a station that stands there opens it and counts once. */
    @Test
    void theLastQuarterBeginsAtItsStation() {
        Profile bed = of(8, new double[] {2, 6, 8}, 0.9, 0.3, 0.24);
        assertEquals(0.3, bed.levelAtLastQuarter().value(), 1e-15);
        assertEquals(0.06, bed.changeOverLastQuarter().value(), 1e-15);
        assertEquals(0, of(8, new double[] {2, 6}, 0.9, 0.3).changeOverLastQuarter().value());
        assertEquals(0.2, of(8, new double[] {7}, 0.2).levelAtLastQuarter().value());
        assertEquals(0.1, of(8, new double[] {2, 7}, 0.5, 0).changeOverLastQuarter().value(), 1e-12);
    }

    /** Any uncertain number among length, positions and levels makes the integral uncertain. */
    @Test
    void onePartThatIsUncertainIsEnough() {
        for (int part = 0; part < 5; part++) {
            Tape tape = new Tape(4);
            Uncertain[] numbers = exact(6, 1, 4, 0.2, 0.3);
            numbers[part] = tape.take(new Reading("/" + part, numbers[part].value(), 0.01));
            Profile bed = Profile.of(numbers[0], List.of(numbers[1], numbers[2]), List.of(numbers[3], numbers[4]));
            assertFalse(bed.integral().isCertain(), "part " + part);
            assertTrue(tape.estimate(bed.integral()).standardUncertainty() > 0, "part " + part);
            assertTrue(bed.certain().integralOfSquare().isCertain());
            assertEquals(bed.integralOfSquare().value(), bed.certain().integralOfSquare().value());
        }
        assertTrue(of(6, new double[] {1, 4}, 0.2, 0.3).integral().isCertain());
    }

    @Test
    void plainNumbersIntegrateToTheSame() {
        double[] positions = {0.5, 2, 5};
        double[] levels = {0.3, -0.1, 0.2};
        assertEquals(of(6, positions, levels).integralOfSquare().value(),
                Profile.integralOfSquare(6, positions, levels), 1e-16);
        assertEquals(6 * 0.04, Profile.integralOfSquare(6, new double[] {1}, new double[] {0.2}), 1e-15);
        assertEquals(of(6, positions, levels).integralOfSquare().value() / 6,
                of(6, positions, levels).meanSquare(level -> level), 1e-16);
    }

    /** Within twice the uncertainties of the two, whichever comes first, and the deepest not against itself. */
    @Test
    void aStationNearlyAsDeepContestsTheDeepest() {
        Profile bed = of(6, PLACES, 0.20, 0.25, 0.10);
        assertTrue(bed.isContested(new double[] {0.02, 0.016, 0}));
        assertFalse(bed.isContested(new double[] {0.02, 0.014, 0}));
        assertTrue(bed.isContested(new double[] {0, 0, 0.08}));
        assertFalse(bed.isContested(new double[] {0, 0, 0}));
        assertFalse(of(6, new double[] {1}, 0.2).isContested(new double[] {0.1}));
        assertTrue(of(6, new double[] {1, 3}, 0.25, 0.2).isContested(new double[] {0.03, 0}));
        assertTrue(of(6, new double[] {1, 3}, 0.2, 0.2).isContested(new double[] {1e-6, 0}));
        assertFalse(of(6, new double[] {1, 3}, 0.5, 0.25).isContested(new double[] {0, 0.125}), "just apart is apart");
    }
}
