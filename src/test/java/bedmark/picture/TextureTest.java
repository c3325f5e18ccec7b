package bedmark.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;

class TextureTest {
    /** A region with a notch, so that strokes must stop and go on. */
    private static final List<Point> NOTCHED = List.of(new Point(0, 0), new Point(40, 0), new Point(50, 40),
            new Point(60, 0), new Point(100, 0), new Point(100, 60), new Point(0, 60));

    @Test
    void strokesLieInTheRegion() {
        List<Mark.Segment> strokes = Texture.hatch(NOTCHED, 7);
        assertFalse(strokes.isEmpty());
        for (Mark.Segment stroke : strokes) {
            for (double share : new double[] {0.01, 0.25, 0.5, 0.75, 0.99}) {
                Point point = new Point(stroke.from().x() + share * (stroke.to().x() - stroke.from().x()),
                        stroke.from().y() + share * (stroke.to().y() - stroke.from().y()));
                assertTrue(holds(NOTCHED, point), () -> "outside: " + point);
            }
        }
    }

    @Test
    void strokesCoverTheRegionEvenly() {
        double length = Texture.hatch(NOTCHED, 0.5).stream().mapToDouble(stroke -> stroke.from().distance(stroke.to()))
                .sum();
        double area = 100 * 60 - 20 * 40 / 2.0;
        assertEquals(area, length * 0.5, area * 0.01);
    }

    @Test
    void dotsLieInTheRegionAndKeepOffItsEdge() {
        List<Point> dots = Texture.grain(NOTCHED, 8, 1);
        assertFalse(dots.isEmpty());
        assertTrue(dots.stream().allMatch(dot -> holds(NOTCHED, dot) && dot.x() >= 2 && dot.y() <= 58));
    }

    @Test
    void noDotIsLeftOutThatKeepsOffEveryEdge() {
        List<Point> dots = Texture.grain(NOTCHED, 4, 0.5);
        for (int row = 1; row < 20; row++) {
            for (int column = 0; column < 25; column++) {
                Point dot = new Point(column * 4 + (row % 2 == 0 ? 0 : 2), row * 3);
                boolean clear = holds(NOTCHED, dot) && fromEdges(dot) >= 1;
                assertEquals(clear, dots.contains(dot), () -> "dot at " + dot);
            }
        }
    }

    /** Whether the point lies in the polygon (even-odd rule). */
    static boolean holds(List<Point> region, Point point) {
        boolean inside = false;
        for (int i = 0; i < region.size(); i++) {
            Point a = region.get(i);
            Point b = region.get((i + 1) % region.size());
            if (a.y() > point.y() != b.y() > point.y()
                    && point.x() < a.x() + (point.y() - a.y()) / (b.y() - a.y()) * (b.x() - a.x())) {
                inside = !inside;
            }
        }
        return inside;
    }

    /** How far a point lies from the nearest of many points along the edges. */
    private static double fromEdges(Point point) {
        double least = Double.MAX_VALUE;
        for (int i = 0; i < NOTCHED.size(); i++) {
            Point a = NOTCHED.get(i);
            Point b = NOTCHED.get((i + 1) % NOTCHED.size());
            for (int step = 0; step <= 5000; step++) {
                double share = step / 5000.0;
                least = Math.min(least, Math.hypot(a.x() + share * (b.x() - a.x()) - point.x(),
                        a.y() + share * (b.y() - a.y()) - point.y()));
            }
        }
        return least;
    }

    @Test
    void textureStaysWhenTheRegionGrows() {
        List<Point> small = new Box(0, 30, 100, 30).corners();
        List<Point> large = new Box(0, 0, 100, 60).corners();
        assertTrue(Texture.grain(large, 8, 1).containsAll(Texture.grain(small, 8, 1)));
    }
}
