package bedmark.picture;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A seal at the foot of a board, told apart by its shape, its condition by a badge over the wing. A seal is far too
 * small to be seen at the section's scale, so it is a sign of a fixed size at its true place.
 */
final class SealFigure {
    private static final double LENGTH = 4.2;
    private static final double THICKNESS = 1.15;
    private static final double GAP = 1.1;
    /** Radius of a badge (mm). */
    static final double BADGE = 2.0;

    /** Board to badge, at least (mm). */
    static final double BADGE_GAP = 1.0;

    private final Point foot;
    private final int side;
    private final double angle;
    private final Point tip;
    private final Draft draft;

    /**
     * @param foot  where the outer face of the board meets the belt's surface
     * @param side  −1 at the left, 1 at the right
     * @param angle of the belt there (rad)
     * @param tip   of the wing
     */
    SealFigure(Point foot, int side, double angle, Point tip, Draft draft) {
        this.foot = foot;
        this.side = side;
        this.angle = angle;
        this.tip = tip;
        this.draft = draft;
    }

    void draw(ZoneSketch.SealSpan span) {
        boolean missing = span.state() == SealState.MISSING;
        for (List<Point> part : parts(span.shape())) {
            if (!missing) {
                draft.add(new Mark.Area(part, span.state() == SealState.SOUND ? Ink.ACCENT : Ink.OVER));
            }
            draft.outline(missing ? draft.dashes(Ink.OVER, 0.22) : draft.pen(Ink.GROUND, 0.12), part);
        }
        if (span.state() != SealState.SOUND) {
            badge(span.state());
        }
    }

    /** The place of a seal that nobody has looked at yet. */
    void unread() {
        parts(SealShape.VERTICAL).forEach(part -> draft.outline(draft.dashes(Ink.SOFT, 0.2), part));
    }

    /** A point that far out from the board (mm) and that far above the belt (mm). */
    private Point at(double out, double up) {
        return foot.plus(side * draft.mm(out), -draft.mm(out * Math.tan(angle) + up));
    }

    /** The same, measured along the belt and square to it. */
    private Point along(double run, double square) {
        double out = run * Math.cos(angle) - square * Math.sin(angle);
        return foot.plus(side * draft.mm(out), -draft.mm(run * Math.sin(angle) + square * Math.cos(angle)));
    }

    private List<List<Point>> parts(SealShape shape) {
        double t = THICKNESS;
        return switch (shape) {
            case NONE -> List.of();
            case VERTICAL -> List.of(plumb(0.15, 0));
            case CONTACTLESS -> List.of(plumb(0.15, GAP));
            case PERPENDICULAR -> {
                double run = (t * 0.3 + LENGTH * Math.sin(angle)) / Math.cos(angle);
                yield List.of(List.of(along(run, 0), along(run + t, 0), along(run + t, LENGTH), along(run, LENGTH)));
            }
            case OBLIQUE -> {
                double out = LENGTH * 0.85;
                yield List.of(List.of(at(0.15, LENGTH * 0.9), at(0.15 + t * 0.7, LENGTH * 0.9 + t * 0.7),
                        at(out + t * 0.8, 0), at(out - t * 0.6, 0)));
            }
            case PARALLEL -> List.of(List.of(at(0.15, LENGTH), at(0.15 + t, LENGTH), at(0.15 + t, t * 1.1),
                    along(LENGTH + t, t), along(LENGTH + t, 0.1), at(0.15, 0.1)));
        };
    }

    private List<Point> plumb(double out, double gap) {
        return List.of(at(out, gap), at(out + THICKNESS, gap), at(out + THICKNESS, gap + LENGTH),
                at(out, gap + LENGTH));
    }

    private void badge(SealState state) {
        double radius = draft.mm(BADGE);
        double nearest = foot.x() + side * (draft.mm(BADGE_GAP) + radius);
        double x = side < 0 ? Math.min(nearest, tip.x() + radius) : Math.max(nearest, tip.x() - radius);
        Point centre = new Point(x, Math.min(tip.y(), foot.y() - draft.mm(LENGTH)) - radius - draft.mm(1.3));
        draft.add(new Mark.Disc(centre, radius, Optional.of(Ink.PAPER), Optional.of(draft.pen(Ink.OVER, 0.28))));
        draft.take(Box.around(centre, 2 * radius, 2 * radius));
        double r = radius * 0.5;
        Pen pen = draft.pen(Ink.OVER, 0.34);
        switch (state) {
            case WORN -> draft.add(new Mark.Area(half(centre, r * 1.35), Ink.OVER));
            case HARDENED -> draft.add(new Mark.Area(Box.around(centre, 1.7 * r, 1.7 * r).corners(), Ink.OVER));
            case TORN -> draft.line(pen, centre.plus(-r * 0.2, -r * 1.3), centre.plus(r * 0.6, -r * 0.4),
                    centre.plus(-r * 0.6, r * 0.4), centre.plus(r * 0.2, r * 1.3));
            case OVER_TIGHTENED -> {
                draft.add(new Mark.Area(List.of(centre.plus(-r * 1.3, -r * 0.8), centre.plus(-r * 0.1, 0),
                        centre.plus(-r * 1.3, r * 0.8)), Ink.OVER));
                draft.add(new Mark.Area(List.of(centre.plus(r * 1.3, -r * 0.8), centre.plus(r * 0.1, 0),
                        centre.plus(r * 1.3, r * 0.8)), Ink.OVER));
            }
            case MISSING -> {
                draft.line(pen, centre.plus(-r, -r), centre.plus(r, r));
                draft.line(pen, centre.plus(-r, r), centre.plus(r, -r));
            }
            case SOUND -> {
            }
        }
    }

    /** The lower half of a disc: what wear has left. */
    private static List<Point> half(Point centre, double radius) {
        List<Point> outline = new ArrayList<>();
        for (int i = 0; i <= 12; i++) {
            double turn = Math.PI * i / 12;
            outline.add(centre.plus(radius * Math.cos(turn), radius * Math.sin(turn)));
        }
        return outline;
    }
}
