package bedmark.picture;

import java.util.ArrayList;
import java.util.List;

/**
 * The zone cut across the belt, in metres: u from the centre line to the right, v upwards from the belt on the centre
 * roll. The crown is the engine's: a parabola with the edge slope tan θ, so that it rises {@code b1 tan θ/4} between
 * the boards.
 *
 * @param beltWidth  B (m), positive
 * @param centreRoll l3 (m), positive, at most B
 * @param angle      λ of the wings (rad), 0 to under π/2
 * @param clearWidth b1 between the boards (m), positive
 * @param height     of the boards above the belt at the board (m), positive
 * @param surcharge  θ (rad), 0 to under π/2
 */
record CrossSection(double beltWidth, double centreRoll, double angle, double clearWidth, double height,
                    double surcharge) {
    private static final int CHORDS = 24;

    /** Horizontal reach of the wing tip from the centre line (m). */
    double tip() {
        return centreRoll / 2 + (beltWidth - centreRoll) / 2 * Math.cos(angle);
    }

    /** The belt's surface at a distance from the centre line (m). */
    double belt(double u) {
        return Math.max(0, Math.min(Math.abs(u), tip()) - centreRoll / 2) * Math.tan(angle);
    }

    /** The belt at the board (m). */
    double boardFoot() {
        return belt(clearWidth / 2);
    }

    double boardTop() {
        return boardFoot() + height;
    }

    /** The belt from tip to tip. */
    List<Point> beltLine() {
        return List.of(new Point(-tip(), belt(tip())), new Point(-centreRoll / 2, 0), new Point(centreRoll / 2, 0),
                new Point(tip(), belt(tip())));
    }

    /** Rise of the crown between the boards (m). */
    double crown() {
        return clearWidth * Math.tan(surcharge) / 4;
    }

    /** The surface of a bed that stands that deep at the boards (m), from the left board to the right one. */
    List<Point> surface(double depth) {
        List<Point> arc = new ArrayList<>();
        for (int i = 0; i <= CHORDS; i++) {
            double share = 2.0 * i / CHORDS - 1;
            arc.add(new Point(share * clearWidth / 2, boardFoot() + depth + crown() * (1 - share * share)));
        }
        return arc;
    }

    /** The bed under that surface: down the right board, along the belt, up the left one. */
    List<Point> bed(double depth) {
        List<Point> outline = new ArrayList<>(surface(depth));
        double half = clearWidth / 2;
        outline.add(new Point(half, boardFoot()));
        if (centreRoll < clearWidth) {
            outline.add(new Point(centreRoll / 2, 0));
            outline.add(new Point(-centreRoll / 2, 0));
        }
        outline.add(new Point(-half, boardFoot()));
        return outline;
    }

    /** What lies between the surface at the allowed depth and the surface. */
    List<Point> over(double allowed, double depth) {
        List<Point> outline = new ArrayList<>(surface(depth));
        List<Point> lower = surface(allowed);
        for (int i = lower.size() - 1; i >= 0; i--) {
            outline.add(lower.get(i));
        }
        return outline;
    }
}
