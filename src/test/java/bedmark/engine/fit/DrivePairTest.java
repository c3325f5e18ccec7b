package bedmark.engine.fit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Reading;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class DrivePairTest {
    private static final double MOST = 1e9;

    /** 10 and 6 kW at η = 0.8 · 0.9 and 2 m/s; h of 0.3 and 0.1 m along 5 m; 12 and 4 m of seal. */
    private static final DrivePair PAIR = new DrivePair(new Reading("l", 5, 0.1), new Reading("v", 2, 0.02),
            new Reading("d", 0.8, 0.024), new Reading("m", 0.9, 0.036),
            state(new Reading("p1", 10_000, 30), new Reading("h1", 0.3, 0.01), 12),
            state(new Reading("p2", 6_000, 40), new Reading("h2", 0.1, 0.02), 4));

    private static DriveState state(Reading power, Reading depth, double seals) {
        return new DriveState(power, Optional.of(depth), Optional.of(Reading.exact("s", seals)), Optional.empty());
    }

    @Test
    void forceIsThePowerThatReachesTheBeltOverItsSpeed() {
        assertEquals(4_000 * 0.72 / 2, PAIR.force(), 1e-9);
        assertEquals(Math.hypot(50 * 0.72 / 2, 1_440 * 0.01), PAIR.forceSpread(), 1e-9);
        assertEquals(0.72, PAIR.efficiency(), 1e-15);
        assertEquals(0.05, PAIR.efficiencySpread(), 1e-15);
    }

    @Test
    void theIntegralFallsByLengthTimesTheDifferenceOfTheSquares() {
        assertEquals(5 * (0.09 - 0.01), PAIR.squares(), 1e-15);
        double squares = Math.hypot(2 * 0.3 * 0.01, 2 * 0.1 * 0.02);
        assertEquals(Math.hypot(5 * squares, 0.1 * 0.08), PAIR.squaresSpread(), 1e-15);
        assertEquals(8, PAIR.seals());
    }

    /** What the second state does not name is as in the first; what only the second names was nothing in the first. */
    @Test
    void whatTheSecondStateDoesNotNameIsAsInTheFirst() {
        DriveState bare = new DriveState(Reading.exact("p", 1), Optional.empty(), Optional.empty(), Optional.empty());
        DrivePair kept = new DrivePair(PAIR.length(), PAIR.beltSpeed(), PAIR.driveEfficiency(), PAIR.motorEfficiency(),
                PAIR.first(), bare);
        assertEquals(0, kept.squares());
        assertEquals(0, kept.squaresSpread());
        assertEquals(0, kept.seals());
        DrivePair added = new DrivePair(PAIR.length(), PAIR.beltSpeed(), PAIR.driveEfficiency(),
                PAIR.motorEfficiency(), bare, PAIR.second());
        assertEquals(-5 * 0.01, added.squares(), 1e-15);
        assertEquals(Math.hypot(5 * 2 * 0.1 * 0.02, 0.1 * 0.01), added.squaresSpread(), 1e-15);
        assertEquals(-4, added.seals());
    }

    @Test
    void readingsReachFromTheLeastToTheMost() {
        for (double edge : new double[] {1e-9, MOST}) {
            assertEquals(edge, pair(edge, edge, 1, 1, 0).length().value());
        }
        assertEquals(1e-9, pair(1, 1, 1e-9, 1e-9, MOST).motorEfficiency().value());
        refused("v", List.of("reading-zero"), 1, Math.nextDown(1e-9), 1, 1, 0);
        refused("l", List.of("reading-zero"), 0, 1, 1, 1, 0);
        refused("l", List.of("reading-negative", "-1.0"), -1, 1, 1, 1, 0);
        refused("l", List.of("reading-out-of-range", "1.0000000000000001E9", "1.0E-9", "1.0E9"), Math.nextUp(MOST), 1,
                1, 1, 0);
        refused("d", List.of("reading-out-of-range", "1.0000000000000002", "0", "1"), 1, 1, Math.nextUp(1.0), 1, 0);
        refused("m", List.of("reading-out-of-range", "1.0000000000000002", "0", "1"), 1, 1, 1, Math.nextUp(1.0), 0);
        refused("p", List.of("reading-negative", "-4.9E-324"), 1, 1, 1, 1, -Double.MIN_VALUE);
        refused("p", List.of("reading-out-of-range", "1.0000000000000001E9", "0.0", "1.0E9"), 1, 1, 1, 1,
                Math.nextUp(MOST));
    }

    private static DrivePair pair(double length, double speed, double drive, double motor, double power) {
        DriveState state = new DriveState(Reading.exact("p", power), Optional.empty(), Optional.empty(),
                Optional.empty());
        return new DrivePair(Reading.exact("l", length), Reading.exact("v", speed), Reading.exact("d", drive),
                Reading.exact("m", motor), state, state);
    }

    private static void refused(String name, List<String> reason, double length, double speed, double drive,
            double motor, double power) {
        ImpossibleReading refusal = assertThrows(ImpossibleReading.class,
                () -> pair(length, speed, drive, motor, power));
        assertEquals(name, refusal.readingName());
        assertEquals(reason.get(0), refusal.code());
        assertEquals(reason.subList(1, reason.size()), refusal.arguments());
    }
}
