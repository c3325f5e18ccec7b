package bedmark.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;

class CrossSectionTest {
    private static final double ANGLE = Math.toRadians(35);
    private static final double SURCHARGE = Math.toRadians(20);
    private static final CrossSection TROUGHED = new CrossSection(1.2, 0.45, ANGLE, 0.78, 0.35, SURCHARGE);

    private static double area(List<Point> outline) {
        double twice = 0;
        for (int i = 0; i < outline.size(); i++) {
            Point a = outline.get(i);
            Point b = outline.get((i + 1) % outline.size());
            twice += a.x() * b.y() - b.x() * a.y();
        }
        return Math.abs(twice) / 2;
    }

    @Test
    void beltKeepsItsWidthRoundTheRolls() {
        List<Point> line = TROUGHED.beltLine();
        double width = 0;
        for (int i = 1; i < line.size(); i++) {
            width += line.get(i - 1).distance(line.get(i));
        }
        assertEquals(1.2, width, 1e-12);
    }

    @Test
    void boardStandsOnTheWing() {
        assertEquals((0.78 - 0.45) / 2 * Math.tan(ANGLE), TROUGHED.boardFoot(), 1e-12);
        assertEquals(TROUGHED.boardFoot() + 0.35, TROUGHED.boardTop(), 1e-12);
    }

    @Test
    void crownRisesAsTheEngineHasIt() {
        List<Point> surface = TROUGHED.surface(0.2);
        double middle = surface.get(surface.size() / 2).y();
        assertEquals(0.78 * Math.tan(SURCHARGE) / 4, middle - surface.get(0).y(), 1e-12);
        assertEquals(TROUGHED.boardFoot() + 0.2, surface.get(0).y(), 1e-12);
    }

    @Test
    void bedHasTheAreaOfTroughDepthAndCrown() {
        double run = (0.78 - 0.45) / (2 * Math.cos(ANGLE));
        double trough = (0.45 + run * Math.cos(ANGLE)) * run * Math.sin(ANGLE);
        double crown = 0.78 * 0.78 * Math.tan(SURCHARGE) / 6;
        assertEquals(trough + 0.78 * 0.2 + crown, area(TROUGHED.bed(0.2)), 2e-4 * crown + 1e-4);
    }

    @Test
    void overloadIsTheBandBetweenBothSurfaces() {
        assertEquals(0.78 * 0.05, area(TROUGHED.over(0.15, 0.2)), 1e-12);
    }

    @Test
    void flatBeltIsFlat() {
        CrossSection flat = new CrossSection(1, 1, 0, 0.6, 0.3, 0);
        assertEquals(0, flat.boardFoot());
        assertTrue(flat.beltLine().stream().allMatch(point -> point.y() == 0));
        assertEquals(0.6 * 0.2, area(flat.bed(0.2)), 1e-12);
    }
}
