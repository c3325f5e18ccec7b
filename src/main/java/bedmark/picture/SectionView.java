package bedmark.picture;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/** Draws the cross-section at the shown station to scale: rolls, belt, boards, bed with its crown, seals. */
final class SectionView {
    private static final double BELT = 0.95;
    private static final double BOARD = 0.9;
    private static final double ROLL = 1.9;
    private static final double NOMINAL_WIDTH = 1.0;
    private static final double NOMINAL_ANGLE = Math.toRadians(35);

    private final ZoneSketch sketch;
    private final Draft draft;
    private final Box view;
    private final double ground;
    private final CrossSection section;
    private final boolean beltKnown;
    private final boolean boardsKnown;
    private final double scale;
    private final double titleRoom;

    /**
     * @param view   the room for everything over the belt
     * @param ground where the belt lies on the centre roll
     */
    SectionView(ZoneSketch sketch, Box view, double ground, Draft draft) {
        this.sketch = sketch;
        this.draft = draft;
        this.view = view;
        this.ground = ground;
        ZoneSketch.Belt belt = sketch.belt();
        boolean flat = belt.troughAngle().isPresent() && belt.troughAngle().getAsDouble() == 0;
        beltKnown = belt.width().isPresent() && belt.troughAngle().isPresent()
                && (flat || belt.centreRollLength().isPresent());
        boardsKnown = sketch.boards().clearWidth().isPresent() && sketch.boards().height().isPresent();
        section = section(sketch, flat);
        titleRoom = titleLines().size() * draft.mm(Draft.ROW) + draft.mm(1);
        double wide = 2 * Math.max(section.tip(), section.clearWidth() / 2);
        double tall = Math.max(section.boardTop(), section.belt(section.tip()));
        double deep = shownDepth().map(depth -> section.boardFoot() + depth + section.crown()).orElse(0.0);
        double badges = 2 * draft.mm(BOARD + SealFigure.BADGE_GAP + 2 * SealFigure.BADGE + 0.3);
        scale = Math.min(Math.min((view.width() - draft.mm(2 * BELT)) / wide,
                        Math.max(draft.mm(6), view.width() - badges) / section.clearWidth()),
                Math.max(draft.mm(6), ground - view.y() - titleRoom) / Math.max(tall, deep));
    }

    /** The section with a usual shape for whatever is not known; those parts are drawn lightly. */
    private static CrossSection section(ZoneSketch sketch, boolean flat) {
        ZoneSketch.Belt belt = sketch.belt();
        double clear = sketch.boards().clearWidth().orElseGet(() -> 0.65 * belt.width().orElse(NOMINAL_WIDTH));
        double width = belt.width().orElse(clear / 0.65);
        double roll = flat ? width : Math.min(width, belt.centreRollLength().orElse(0.37 * width));
        double angle = belt.troughAngle().orElse(NOMINAL_ANGLE);
        double height = sketch.boards().height().orElse(0.4 * clear);
        return new CrossSection(width, roll, angle, clear, height, belt.surchargeAngle().orElse(0));
    }

    private Optional<Double> shownDepth() {
        OptionalInt shown = ZoneSketch.shown(sketch.stations());
        return shown.isPresent() ? sketch.stations().get(shown.getAsInt()).depth().stream().boxed().findFirst()
                : Optional.empty();
    }

    void draw(double dimensionRow) {
        rolls();
        if (beltKnown && boardsKnown) {
            shownDepth().ifPresent(this::bed);
        }
        boards();
        draft.add(new Mark.Line(places(section.beltLine()), beltKnown
                ? draft.pen(Ink.INK, BELT) : draft.dashes(Ink.SOFT, 0.26)));
        seals();
        words(dimensionRow);
    }

    private Point place(double u, double v) {
        return new Point(view.centre().x() + u * scale, ground - v * scale);
    }

    private List<Point> places(List<Point> metres) {
        return metres.stream().map(point -> place(point.x(), point.y())).toList();
    }

    /** The three rolls under the belt, drawn as signs of a fixed thickness. */
    private void rolls() {
        List<Point> line = places(section.beltLine());
        for (int i = 0; i + 1 < line.size(); i++) {
            Point a = line.get(i);
            Point b = line.get(i + 1);
            double length = a.distance(b);
            if (length > draft.mm(2.5)) {
                capsule(a, b, length);
            }
        }
    }

    private void capsule(Point a, Point b, double length) {
        double dx = (b.x() - a.x()) / length;
        double dy = (b.y() - a.y()) / length;
        double near = draft.mm(BELT / 2 + 0.25);
        double far = near + draft.mm(ROLL);
        double end = draft.mm(0.9);
        List<Point> outline = new ArrayList<>();
        for (double[] corner : new double[][] {{end, near}, {length - end, near}, {length - end, far}, {end, far}}) {
            outline.add(a.plus(corner[0] * dx - corner[1] * dy, corner[0] * dy + corner[1] * dx));
        }
        draft.outline(beltKnown ? draft.pen(Ink.SOFT, 0.2) : draft.pen(Ink.LINE, 0.2), outline);
    }

    private void bed(double depth) {
        draft.add(new Mark.Area(places(section.bed(depth)), Ink.BED));
        double allowed = sketch.limit().map(ZoneSketch.Limit::depth).orElse(Double.MAX_VALUE);
        List<Point> within = places(section.bed(Math.min(depth, allowed)));
        double dot = draft.mm(0.19);
        draft.add(new Mark.Grain(within, Texture.grain(within, draft.mm(2.1), dot), dot, Ink.GRAIN));
        if (depth > allowed) {
            List<Point> over = places(section.over(allowed, depth));
            draft.add(new Mark.Hatching(over, Texture.hatch(over, draft.mm(1.75)), draft.pen(Ink.OVER, 0.34)));
        }
        if (allowed < Double.MAX_VALUE) {
            draft.add(new Mark.Line(places(section.surface(allowed)), draft.dashes(Ink.INK, 0.27)));
        }
        draft.add(new Mark.Line(places(section.surface(depth)), draft.pen(Ink.INK, 0.45)));
        OptionalInt shown = ZoneSketch.shown(sketch.stations());
        sketch.asIf().filter(curve -> shown.isPresent()).ifPresent(curve -> draft.add(new Mark.Line(
                places(section.surface(curve.depthAt(sketch.stations().get(shown.getAsInt()).position()))),
                draft.dashes(Ink.ACCENT, 0.45))));
    }

    private void boards() {
        for (int side : new int[] {-1, 1}) {
            double u = side * section.clearWidth() / 2;
            double outward = boardsKnown ? side * draft.mm(BOARD) / 2 : 0;
            double lift = draft.mm(BELT / 2 + 0.4);
            draft.line(boardsKnown ? draft.pen(Ink.INK, BOARD) : draft.dashes(Ink.SOFT, 0.26),
                    place(u, section.boardFoot()).plus(outward, -lift),
                    place(u, section.boardTop()).plus(outward, 0));
        }
    }

    private void seals() {
        if (!beltKnown || !boardsKnown) {
            return;
        }
        OptionalInt shown = ZoneSketch.shown(sketch.stations());
        double position = shown.isPresent() ? sketch.stations().get(shown.getAsInt()).position() : 0;
        seal(-1, sketch.seals().left(), position);
        seal(1, sketch.seals().right(), position);
    }

    private void seal(int side, List<ZoneSketch.SealSpan> spans, double position) {
        Point board = place(side * section.clearWidth() / 2, section.boardFoot()).plus(side * draft.mm(BOARD), 0);
        Point tip = place(side * section.tip(), section.belt(section.tip()));
        double angle = section.clearWidth() / 2 > section.centreRoll() / 2 ? section.angle() : 0;
        SealFigure figure = new SealFigure(board.plus(0, -draft.mm(BELT / 2)), side, angle, tip, draft);
        at(spans, position).ifPresentOrElse(figure::draw, figure::unread);
    }

    /** Rows of words under a section of that width: its dimension, its note. */
    static int rows(ZoneSketch sketch, double width, Draft draft) {
        return 1 + draft.lines(sketch.captions().sectionNote(), Draft.Style.WORD, width).size();
    }

    /** The segment that covers a position. */
    static Optional<ZoneSketch.SealSpan> at(List<ZoneSketch.SealSpan> spans, double position) {
        double end = 0;
        for (ZoneSketch.SealSpan span : spans) {
            end += span.length();
            if (position < end) {
                return Optional.of(span);
            }
        }
        return spans.isEmpty() ? Optional.empty() : Optional.of(spans.get(spans.size() - 1));
    }

    private List<String> titleLines() {
        return draft.lines(sketch.captions().sectionTitle(), Draft.Style.WORD, view.width());
    }

    private void words(double dimensionRow) {
        double centre = view.centre().x();
        double top = ground - Math.max(Math.max(section.boardTop(), section.belt(section.tip())),
                shownDepth().filter(depth -> beltKnown && boardsKnown)
                        .map(depth -> section.boardFoot() + depth + section.crown()).orElse(0.0)) * scale;
        List<String> title = titleLines();
        for (int i = 0; i < title.size(); i++) {
            draft.writeCentred(title.get(i), Draft.Style.WORD, centre,
                    top - draft.mm(1) - (title.size() - i - 0.5) * draft.mm(Draft.ROW));
        }
        dimension(dimensionRow);
        List<String> note = draft.lines(sketch.captions().sectionNote(), Draft.Style.WORD, view.width());
        for (int i = 0; i < note.size(); i++) {
            draft.writeCentred(note.get(i), Draft.Style.WORD, centre,
                    dimensionRow + (i + 1) * draft.mm(Draft.ROW) + draft.mm(0.4));
        }
    }

    private void dimension(double middle) {
        boolean known = sketch.boards().clearWidth().isPresent();
        Draft.Style style = Draft.Style.NUMBER.when(known);
        String text = sketch.captions().clearWidth();
        double half = draft.width(text, style) / 2 + draft.mm(1.4);
        Point left = new Point(place(-section.clearWidth() / 2, 0).x(), middle);
        Point right = new Point(place(section.clearWidth() / 2, 0).x(), middle);
        double centre = view.centre().x();
        Pen pen = draft.pen(known ? Ink.INK : Ink.SOFT, 0.27);
        if (right.x() - left.x() > 2 * half + draft.mm(2)) {
            draft.add(new Mark.Dimension(left, right, draft.mm(1.2),
                    Optional.of(new Mark.Gap(centre - half, centre + half)), pen));
        }
        draft.writeCentred(text, style, centre, middle);
        if (known && beltKnown) {
            freeEdge(right, middle);
        }
    }

    /** The belt's edge that lies free beyond the board, on the same line as the clear width. */
    private void freeEdge(Point board, double middle) {
        Point tip = new Point(place(section.tip(), 0).x(), middle);
        if (tip.x() - board.x() > draft.mm(1)) {
            draft.add(new Mark.Dimension(board, tip, draft.mm(1.2), Optional.empty(), draft.pen(Ink.SOFT, 0.2)));
        }
    }
}
