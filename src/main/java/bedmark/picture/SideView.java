package bedmark.picture;

import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.IntStream;

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
        belt();
        header();
        levels();
        positions();
        dimension();
        if (bed.isEmpty()) {
            prompt();
        }
        new StationMarks(sketch.stations(), layout, draft).draw();
    }

    private double boardTop() {
        return scale.y(sketch.boards().height().orElse(scale.top() / 1.12));
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

    /** Names the board's top and the allowed depth at the right end of their lines; where they are close, in turn. */
    private void levels() {
        Captions captions = sketch.captions();
        double half = draft.mm(Draft.ROW * 0.38);
        double apart = sketch.limit().isPresent() ? 4.2 * half : 0;
        double boardY = boardTop();
        double limitY = sketch.limit().map(limit -> scale.y(limit.depth())).orElse(boardY);
        boolean boardAbove = boardY <= limitY;
        double lower = Math.min(plot.bottom() - 2 * half,
                Math.max(Math.max(boardY, limitY), Math.min(boardY, limitY) + apart));
        double upper = Math.min(Math.min(boardY, limitY), lower - apart);
        level(captions.boardTop(), captions.boardTopWord(), sketch.boards().height().isPresent(),
                boardAbove ? upper : lower, half);
        if (sketch.limit().isPresent()) {
            level(captions.limit(), captions.limitWord(), true, boardAbove ? lower : upper, half);
        }
    }

    private void level(String number, String word, boolean known, double middle, double half) {
        double left = plot.right() + draft.mm(SideLayout.LEVEL_GAP);
        draft.write(number, Draft.Style.WORD.bold().when(known), left, middle - half);
        draft.write(word, Draft.Style.WORD.when(known), left, number.isEmpty() ? middle : middle + half);
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

    private void header() {
        Captions captions = sketch.captions();
        boolean fromLeft = scale.feedEnd() == FeedEnd.LEFT;
        double middle = layout.headerMiddle(draft);
        double inset = draft.mm(4.2);
        feed(fromLeft ? plot.x() + inset : plot.right() - inset, middle, fromLeft);
        Draft.Style speed = Draft.Style.WORD.bold().when(sketch.belt().speed().isPresent());
        double width = draft.width(captions.beltSpeed(), speed) + draft.mm(3.6);
        double taken = inset + draft.mm(2.2 + 3) + draft.width(captions.feed(), Draft.Style.WORD);
        double centred = plot.centre().x() - width / 2;
        double start = fromLeft ? Math.max(centred, plot.x() + taken)
                : Math.min(centred, plot.right() - taken - width);
        speed(captions.beltSpeed(), speed, start, middle, fromLeft);
    }

    private void feed(double x, double middle, boolean fromLeft) {
        double half = draft.mm(1.75);
        double wing = draft.mm(1.1);
        Point tip = new Point(x, middle + half);
        Pen pen = draft.pen(Ink.INK, OUTLINE * 1.25);
        draft.line(pen, tip.plus(0, -2 * half), tip);
        draft.line(pen, tip.plus(-wing, -wing), tip, tip.plus(wing, -wing));
        draft.take(Box.around(new Point(x, middle), 2 * wing, 2 * half));
        String word = sketch.captions().feed();
        double away = draft.mm(2.2);
        draft.write(word, Draft.Style.WORD, fromLeft ? x + away : x - away - draft.width(word, Draft.Style.WORD),
                middle);
    }

    private void speed(String text, Draft.Style style, double start, double middle, boolean rightwards) {
        double length = draft.mm(2.6);
        double wing = draft.mm(0.75);
        double width = draft.width(text, style);
        double words = rightwards ? start : start + length + draft.mm(1);
        draft.write(text, style, words, middle);
        Point from = new Point(rightwards ? start + width + draft.mm(1) : start + length, middle);
        Point to = from.plus(rightwards ? length : -length, 0);
        double back = rightwards ? -wing : wing;
        Pen pen = draft.pen(style.ink(), OUTLINE);
        draft.line(pen, from, to);
        draft.line(pen, to.plus(back, -wing), to, to.plus(back, wing));
    }

    /** Positions in turn in the rows under the belt, from the one in hand outwards; a crowd leaves some out. */
    private void positions() {
        List<ZoneSketch.Station> along = sketch.stations().stream()
                .filter(station -> station.position() <= scale.length() && !station.positionLabel().isEmpty())
                .sorted(Comparator.comparingDouble(ZoneSketch.Station::position)).toList();
        int first = IntStream.range(0, along.size()).filter(i -> along.get(i).active()).findFirst().orElse(0);
        IntStream.range(0, along.size()).boxed().sorted(Comparator.comparingInt(i -> Math.abs(i - first)))
                .forEach(i -> position(along.get(i), Math.abs(i - first)));
    }

    private void position(ZoneSketch.Station station, int turn) {
        Draft.Style style = station.active() ? Draft.Style.WORD.bold() : Draft.Style.WORD;
        double width = draft.width(station.positionLabel(), style);
        double left = Math.max(layout.view().x(), Math.min(layout.view().right() - width,
                scale.x(station.position()) - width / 2));
        IntStream.range(turn, turn + layout.positionRows()).map(row -> row % layout.positionRows())
                .mapToObj(row -> draft.room(station.positionLabel(), style, left, layout.rowMiddle(row, draft)))
                .filter(room -> draft.isFree(room.grown(draft.mm(0.8)))).findFirst()
                .ifPresent(room -> draft.write(station.positionLabel(), style, room, 0, Optional.empty()));
    }

    private void dimension() {
        Captions captions = sketch.captions();
        Draft.Style number = Draft.Style.NUMBER.when(layout.toScale());
        String note = layout.toScale() && scale.exaggeration() > 1 + 1e-9
                ? captions.heights().apply(round(scale.exaggeration())) : "";
        double space = note.isEmpty() ? 0 : draft.mm(2);
        double width = draft.width(captions.zoneLength(), number) + space + draft.width(note, Draft.Style.ASIDE);
        double middle = layout.dimensionMiddle(draft);
        boolean inside = width + draft.mm(10) <= plot.width();
        double start = inside ? plot.centre().x() - width / 2
                : Math.max(layout.view().x(), Math.min(layout.view().right() - width, plot.right() + draft.mm(2)));
        OptionalDouble end = inside ? OptionalDouble.of(start + width + draft.mm(1.7)) : OptionalDouble.empty();
        Optional<Mark.Gap> gap = end.isPresent()
                ? Optional.of(new Mark.Gap(start - draft.mm(1.7), end.getAsDouble())) : Optional.empty();
        draft.add(new Mark.Dimension(new Point(plot.x(), middle), new Point(plot.right(), middle), draft.mm(1.2), gap,
                draft.pen(layout.toScale() ? Ink.INK : Ink.SOFT, OUTLINE * 0.8)));
        draft.write(captions.zoneLength(), number, start, middle);
        draft.write(note, Draft.Style.ASIDE, start + width - draft.width(note, Draft.Style.ASIDE), middle);
    }

    private static double round(double exaggeration) {
        return Math.round(exaggeration * 100) / 100.0;
    }

    private void prompt() {
        sketch.captions().prompt().ifPresent(text -> {
            Draft.Style style = Draft.Style.ASIDE.unknown();
            List<String> lines = draft.lines(text, style, plot.width() - draft.mm(6));
            double first = (boardTop() + plot.bottom()) / 2 - (lines.size() - 1) * draft.mm(Draft.ROW) / 2;
            for (int i = 0; i < lines.size(); i++) {
                draft.writeCentred(lines.get(i), style, plot.centre().x(), first + i * draft.mm(Draft.ROW));
            }
        });
    }
}
