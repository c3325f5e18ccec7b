package bedmark.engine.fit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.fit.SiteFit.Fitted;
import bedmark.engine.fit.SiteFit.Unfit;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.uncertainty.Reading;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** The fit against the normal equations, worked out here by themselves for forces with known spreads. */
class LeastSquaresTest {
    private static final double UNIT = 22_620.594_79;
    private static final double LENGTH = 4;
    private static final double SPEED = 2;
    private static final double EFFICIENCY = 0.8;
    private static final double DRIVE_SPREAD = 0.04;

    /** A pair: squares fall by so much (m³), seals by so much (m), and the force (N) with its spread. */
    private record Row(double squares, double seals, double force, double spread) {
    }

    @Test
    void factorRateAndTheirSpreadsAreThoseOfTheNormalEquations() {
        List<Row> rows = List.of(new Row(0.30, 0, 640, 8), new Row(0.20, 10, 890, 10), new Row(0.05, 16, 900, 6),
                new Row(0.25, -6, 230, 12), new Row(0.10, 4, 420, 8));
        double dd = 0;
        double ds = 0;
        double ss = 0;
        double df = 0;
        double sf = 0;
        for (Row row : rows) {
            double weight = 1 / (row.spread * row.spread);
            dd += weight * row.squares * row.squares;
            ds += weight * row.squares * row.seals;
            ss += weight * row.seals * row.seals;
            df += weight * row.squares * row.force;
            sf += weight * row.seals * row.force;
        }
        double det = dd * ss - ds * ds;
        double c = (ss * df - ds * sf) / det;
        double r = (dd * sf - ds * df) / det;
        double chi = chi(rows, c, r) / 3;
        Fitted fitted = fitted(rows);
        assertEquals(chi, fitted.residual(), 1e-9 * chi);
        agree(c / UNIT, Math.sqrt(ss / det * Math.max(1, chi)) / UNIT, fitted.factor());
        agree(r, Math.sqrt(dd / det * Math.max(1, chi)), fitted.sealRate());
        assertTrue(chi > 1, "the spreads are widened: " + chi);
    }

    @Test
    void depthsAloneAndSealsAloneToo() {
        for (boolean depth : new boolean[] {true, false}) {
            List<Row> rows = new ArrayList<>();
            double weights = 0;
            double products = 0;
            for (int i = 1; i <= 4; i++) {
                double x = depth ? 0.08 * i : 3.0 * i;
                Row row = new Row(depth ? x : 0, depth ? 0 : x, 60 * x * (depth ? 40 : 1) + (i % 2 == 0 ? 3 : -3),
                        10 + i);
                rows.add(row);
                weights += x * x / (row.spread * row.spread);
                products += x * row.force / (row.spread * row.spread);
            }
            Fitted fitted = fitted(rows);
            double value = products / weights;
            double chi = chi(rows, depth ? value : 0, depth ? 0 : value) / 3;
            assertEquals(chi, fitted.residual(), 1e-9);
            assertTrue(chi < 1, "nothing is widened: " + chi);
            agree(value / (depth ? UNIT : 1), Math.sqrt(1 / weights) / (depth ? UNIT : 1),
                    depth ? fitted.factor() : fitted.sealRate());
            assertEquals(Optional.empty(), depth ? fitted.sealRate() : fitted.factor());
        }
    }

    /** χ² over its freedom of 1 may exceed 1 by four times √2, and not by more. */
    @Test
    void pairsContradictBeyondFourDeviationsOfChance() {
        double most = 1 + 4 * Math.sqrt(2);
        for (double beyond : new double[] {0.99, 1.01}) {
            double off = Math.sqrt(most * beyond * 2) * 10;
            List<Row> rows = List.of(new Row(0.3, 0, 600 + off / 2, 10), new Row(0.3, 0, 600 - off / 2, 10));
            double residual = off * off / 2 / 100;
            if (beyond < 1) {
                assertEquals(residual, fitted(rows).residual(), 1e-9);
            } else {
                Unfit unfit = unfit(rows);
                assertEquals("site-pairs-contradict", unfit.code());
                assertEquals(residual, Double.parseDouble(unfit.arguments().get(0)), 1e-9);
            }
        }
    }

    /** With a freedom of 2 it is four times 1. */
    @Test
    void morePairsMayContradictLess() {
        for (double residual : new double[] {4.9, 5.1}) {
            double off = Math.sqrt(residual) * 10;
            List<Row> rows = List.of(new Row(0.3, 0, 600 + off, 10), new Row(0.3, 0, 600 - off, 10),
                    new Row(0.3, 0, 600, 10));
            assertEquals(residual < 5, SiteFit.of(pairs(rows)) instanceof Fitted, "residual " + residual);
        }
    }

    @Test
    void aRefusalTellsItsNumbers() {
        assertEquals(List.of("1", "2"), unfit(List.of(new Row(0.3, 0, 600, 10))).arguments());
        assertEquals(List.of("2", "3"), unfit(List.of(new Row(0.3, 0, 600, 10), new Row(0, 5, 300, 10))).arguments());
        Unfit negative = unfit(List.of(new Row(0.3, 0, -678.6178437, 1), new Row(0.3, 0, -678.6178437, 1)));
        assertEquals("site-factor-not-positive", negative.code());
        assertEquals(-0.1, Double.parseDouble(negative.arguments().get(0)), 1e-9);
        Unfit rate = unfit(List.of(new Row(0, 10, -300, 1), new Row(0, 10, -300, 1)));
        assertEquals("site-seal-rate-not-positive", rate.code());
        assertEquals(-30, Double.parseDouble(rate.arguments().get(0)), 1e-9);
    }

    /** A factor that is known to no better than half of itself is none. */
    @Test
    void halfOfItselfIsTooUncertain() {
        double common = DRIVE_SPREAD / EFFICIENCY;
        for (double share : new double[] {0.49, 0.51}) {
            double own = Math.sqrt(share * share - common * common);
            double spread = own * 600 * Math.sqrt(2);
            List<Row> rows = List.of(new Row(0.3, 0, 600, spread), new Row(0.3, 0, 600, spread));
            if (share < 0.5) {
                Estimate factor = fitted(rows).factor().orElseThrow();
                assertEquals(share, factor.standardUncertainty() / factor.value(), 1e-9);
            } else {
                Unfit unfit = unfit(rows);
                assertEquals("site-factor-too-uncertain", unfit.code());
                assertEquals(share, Double.parseDouble(unfit.arguments().get(0)), 1e-9);
                assertEquals(0, Double.parseDouble(unfit.arguments().get(1)));
            }
        }
    }

    @Test
    void whatHardlyChangesApartIsNotToldApart() {
        assertEquals("site-changes-together", unfit(List.of(new Row(0.3, 10, 900, 10), new Row(0.2, 6.7, 600, 10),
                new Row(0.1, 3.2, 300, 10))).code());
        assertTrue(SiteFit.of(pairs(List.of(new Row(0.3, 10, 1_500, 10), new Row(0.2, 12, 1_220, 10),
                new Row(0.1, 3.2, 495, 10)))) instanceof Fitted);
    }

    private static double chi(List<Row> rows, double c, double r) {
        return rows.stream().mapToDouble(row -> Math.pow((row.force - c * row.squares - r * row.seals) / row.spread, 2))
                .sum();
    }

    /** The drive's efficiency errs in all pairs alike. */
    private static void agree(double value, double own, Optional<Estimate> fitted) {
        assertEquals(value, fitted.orElseThrow().value(), 1e-9 * value);
        double all = Math.hypot(own, value * DRIVE_SPREAD / EFFICIENCY);
        assertEquals(all, fitted.orElseThrow().standardUncertainty(), 1e-9 * all);
    }

    private static Fitted fitted(List<Row> rows) {
        SiteFit fit = SiteFit.of(pairs(rows));
        assertTrue(fit instanceof Fitted, fit::toString);
        return (Fitted) fit;
    }

    private static Unfit unfit(List<Row> rows) {
        SiteFit fit = SiteFit.of(pairs(rows));
        assertTrue(fit instanceof Unfit, fit::toString);
        return (Unfit) fit;
    }

    private static List<DrivePair> pairs(List<Row> rows) {
        return rows.stream().map(LeastSquaresTest::pair).toList();
    }

    private static DrivePair pair(Row row) {
        double perForce = SPEED / EFFICIENCY;
        boolean rises = row.squares < 0;
        double depth = Math.sqrt(Math.abs(row.squares) / LENGTH);
        return new DrivePair(Reading.exact("l", LENGTH), Reading.exact("v", SPEED),
                new Reading("d", EFFICIENCY, DRIVE_SPREAD), Reading.exact("m", 1),
                new DriveState(new Reading("p1", 20_000 + row.force * perForce, row.spread * perForce),
                        Optional.of(Reading.exact("h1", rises ? 0 : depth)),
                        Optional.of(Reading.exact("s1", 20 + row.seals)), Optional.empty()),
                new DriveState(Reading.exact("p2", 20_000), Optional.of(Reading.exact("h2", rises ? depth : 0)),
                        Optional.of(Reading.exact("s2", 20)), Optional.empty()));
    }
}
