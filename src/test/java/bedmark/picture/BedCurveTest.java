package bedmark.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.picture.BedCurve.Knot;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class BedCurveTest {
    private static final double LIMIT = 0.15;

    private static BedCurve gravel() {
        return BedCurve.through(Sketches.gravel().stations(), 6.4).orElseThrow();
    }

    /** Area under a surface, down to a level (m²). */
    private static double area(BedCurve curve, double level) {
        double area = 0;
        for (int i = 1; i < curve.knots().size(); i++) {
            Knot a = curve.knots().get(i - 1);
            Knot b = curve.knots().get(i);
            area += (b.position() - a.position()) * ((a.depth() + b.depth()) / 2 - level);
        }
        return area;
    }

    @Test
    void bedIsConstantBeforeTheFirstStationAndAfterTheLast() {
        List<Knot> knots = gravel().knots();
        assertEquals(new Knot(0, 0.128), knots.get(0));
        assertEquals(new Knot(6.4, 0.238), knots.get(knots.size() - 1));
        assertEquals(6, knots.size());
    }

    @Test
    void oneStationMakesALevelBed() {
        BedCurve curve = BedCurve.through(List.of(Sketches.station(1, 0.2, true)), 3).orElseThrow();
        assertEquals(List.of(new Knot(0, 0.2), new Knot(1, 0.2), new Knot(3, 0.2)), curve.knots());
    }

    @Test
    void stationAtTheVeryEndStillMakesABed() {
        BedCurve curve = BedCurve.through(List.of(Sketches.station(3, 0.2, true)), 3).orElseThrow();
        assertEquals(List.of(new Knot(0, 0.2), new Knot(3, 0.2)), curve.knots());
    }

    @Test
    void stationsOutOfOrderOrWithoutDepthOrPastTheEndDoNotBendTheBed() {
        BedCurve curve = BedCurve.through(List.of(Sketches.station(2, 0.2, false), Sketches.station(1, 0.1, false),
                new ZoneSketch.Station(1.5, OptionalDouble.empty(), "", "", true), Sketches.station(9, 0.9, false)),
                3).orElseThrow();
        assertEquals(List.of(new Knot(0, 0.1), new Knot(1, 0.1), new Knot(2, 0.2), new Knot(3, 0.2)), curve.knots());
    }

    @Test
    void nothingReadIsNoBed() {
        assertTrue(BedCurve.through(List.of(), 3).isEmpty());
    }

    @Test
    void overloadBeginsWhereTheBedCrossesTheLimit() {
        BedCurve over = gravel().over(LIMIT).get(0);
        double crossing = 0.8 + (LIMIT - 0.128) / (0.205 - 0.128) * (2.2 - 0.8);
        assertEquals(crossing, over.knots().get(0).position(), 1e-12);
        assertEquals(LIMIT, over.knots().get(0).depth());
        assertEquals(6.4, over.knots().get(over.knots().size() - 1).position());
    }

    @Test
    void bedThatOnlyTouchesTheLimitIsNotOver() {
        BedCurve curve = BedCurve.through(List.of(Sketches.station(1, LIMIT, false), Sketches.station(2, LIMIT, false)),
                3).orElseThrow();
        assertTrue(curve.over(LIMIT).isEmpty());
    }

    @Test
    void twoHeapsAreTwoParts() {
        BedCurve curve = BedCurve.through(List.of(Sketches.station(1, 0.2, false), Sketches.station(2, 0.1, false),
                Sketches.station(3, 0.2, false)), 4).orElseThrow();
        List<BedCurve> over = curve.over(LIMIT);
        assertEquals(2, over.size());
        assertEquals(1.5, over.get(0).knots().get(over.get(0).knots().size() - 1).position(), 1e-12);
        assertEquals(2.5, over.get(1).knots().get(0).position(), 1e-12);
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12})
    void whatIsUnderAndWhatIsOverMakeTheWholeBed(long seed) {
        ZoneSketch sketch = Sketches.random(seed, 1 + new Random(seed).nextInt(12));
        double limit = sketch.limit().orElseThrow().depth();
        BedCurve curve = BedCurve.through(sketch.stations(), sketch.boards().length().getAsDouble()).orElseThrow();
        double over = curve.over(limit).stream().mapToDouble(part -> area(part, limit)).sum();
        assertEquals(area(curve, 0), area(curve.under(limit), 0) + over, 1e-12);
    }
}
