package bedmark.picture;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;

/** Draws the zone from the side: boards, bed and limit to scale, the belt and its idlers as signs. */
final class SideView {
    private static final double OUTLINE = 0.34;
    private static final double SURFACE = 0.55;
    private static final double HAIRLINE = 0.17;
    private static final double GRAIN = 2.1;
    private static final double GRAIN_DOT = 0.19;
    private static final double HATCH = 1.75;
    private static final double HATCH_LINE = 0.34;
    private static final double IDLER_PITCH = 10.3;

    private final ZoneSketch sketch;
    private final SideLayout layout;
    private final Draft draft;
    private final SideScale scale;
    private final Box plot;

    SideView(ZoneSketch sketch, SideLayout layout, Draft draft) {
        this.sketch = sketch;
        this.layout = layout;
        this.draft = draft;
        scale = layout.scale();
        plot = scale.plot();
    }

    void draw() {
        Optional<BedCurve> bed = BedCurve.through(sketch.stations(), scale.length());
        boardFace();
        bed.ifPresent(this::bed);
        boardOutline();
        limitLine();
        bed.ifPresent(curve -> draft.add(new Mark.Line(surface(curve), draft.pen(Ink.INK, SURFACE))));
        sketch.asIf().ifPresent(curve -> draft.add(new Mark.Line(surface(curve), draft.dashes(Ink.ACCENT, SURFACE))));
        belt();
        new SideWords(sketch, layout, draft).write(bed.isEmpty());
        new StationMarks(sketch.stations(), layout, draft).draw();
    }

    private double boardTop() {
        return layout.boardTop(sketch);
    }

    private boolean boardsKnown() {
        return layout.toScale() && sketch.boards().height().isPresent();
    }

    private void boardFace() {
        if (boardsKnown()) {
            draft.add(new Mark.Area(new Box(plot.x(), boardTop(), plot.width(), plot.bottom() - boardTop()).corners(),
                    Ink.BOARD));
        }
    }

    /** Where the line of a level ends, shortly before its name. */
    private double levelEnd() {
        return plot.right() + draft.mm(SideLayout.LEVEL_GAP - 0.9);
    }

    private void boardOutline() {
        Pen pen = boardsKnown() ? draft.pen(Ink.INK, OUTLINE) : draft.dashes(Ink.SOFT, HAIRLINE * 1.5);
        draft.line(pen, new Point(plot.x(), plot.bottom()), new Point(plot.x(), boardTop()),
                new Point(plot.right(), boardTop()), new Point(plot.right(), plot.bottom()));
        draft.line(draft.pen(boardsKnown() ? Ink.INK : Ink.SOFT, HAIRLINE), new Point(plot.right(), boardTop()),
                new Point(levelEnd(), boardTop()));
    }

    private void bed(BedCurve curve) {
        draft.add(new Mark.Area(between(curve, 0), Ink.BED));
        double allowed = sketch.limit().map(ZoneSketch.Limit::depth).orElse(Double.MAX_VALUE);
        List<Point> within = between(curve.under(allowed), 0);
        double dot = draft.mm(GRAIN_DOT);
        draft.add(new Mark.Grain(within, Texture.grain(within, draft.mm(GRAIN), dot), dot, Ink.GRAIN));
        for (BedCurve part : curve.over(allowed)) {
            List<Point> over = between(part, allowed);
            draft.add(new Mark.Hatching(over, Texture.hatch(over, draft.mm(HATCH)), draft.pen(Ink.OVER, HATCH_LINE)));
        }
    }

    private List<Point> surface(BedCurve curve) {
        return curve.knots().stream().map(knot -> scale.at(knot.position(), knot.depth())).toList();
    }

    /** The polygon between a surface and a level line under it. */
    private List<Point> between(BedCurve curve, double level) {
        List<Point> outline = new ArrayList<>(surface(curve));
        List<BedCurve.Knot> knots = new ArrayList<>(curve.knots());
        Collections.reverse(knots);
        outline.add(scale.at(knots.get(0).position(), level));
        outline.add(scale.at(knots.get(knots.size() - 1).position(), level));
        return outline;
    }

    private void limitLine() {
        sketch.limit().ifPresent(limit -> {
            double y = scale.y(limit.depth());
            draft.add(new Mark.Line(List.of(new Point(plot.x(), y), new Point(levelEnd(), y)),
                    draft.dashes(Ink.INK, HAIRLINE * 1.6)));
        });
    }

    private void belt() {
        double thickness = draft.mm(SideLayout.BELT);
        double left = plot.x() - draft.mm(SideLayout.OVERHANG);
        double right = plot.right() + draft.mm(SideLayout.OVERHANG);
        double middle = plot.bottom() + thickness / 2;
        draft.line(Pen.solid(Ink.INK, thickness), new Point(left, middle), new Point(right, middle));
        long idlers = Math.max(2, Math.round((right - left) / draft.mm(IDLER_PITCH)));
        double radius = draft.mm(SideLayout.IDLER) / 2;
        double pitch = (right - left) / idlers;
        for (long i = 0; i < idlers; i++) {
            Point centre = new Point(left + (i + 0.5) * pitch, plot.bottom() + thickness + radius - draft.mm(0.1));
            draft.add(new Mark.Disc(centre, radius - draft.mm(OUTLINE) / 2, Optional.of(Ink.GROUND),
                    Optional.of(draft.pen(Ink.INK, OUTLINE))));
        }
    }
}
