package bedmark.picture;

import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.IntStream;

/** Writes the words of the side view: feed and speed above, levels at the right, positions and length below. */
final class SideWords {
    private static final double ARROW = 0.34;

    private final ZoneSketch sketch;
    private final SideLayout layout;
    private final Draft draft;
    private final SideScale scale;
    private final Box plot;

    SideWords(ZoneSketch sketch, SideLayout layout, Draft draft) {
        this.sketch = sketch;
        this.layout = layout;
        this.draft = draft;
        scale = layout.scale();
        plot = scale.plot();
    }

    void write(boolean empty) {
        header();
        levels();
        positions();
        dimension();
        if (empty) {
            prompt();
        }
    }

    /** Names the board's top and the allowed depth at the right end of their lines; where they are close, in turn. */
    private void levels() {
        Captions captions = sketch.captions();
        double half = draft.mm(Draft.ROW * 0.38);
        double apart = sketch.limit().isPresent() ? 4.2 * half : 0;
        double boardY = layout.boardTop(sketch);
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

    private void header() {
        Captions captions = sketch.captions();
        boolean fromLeft = scale.feedEnd() == FeedEnd.LEFT;
        double middle = layout.headerMiddle(draft);
        double inset = draft.mm(4.2);
        feed(fromLeft ? plot.x() + inset : plot.right() - inset, middle, fromLeft);
        Draft.Style known = Draft.Style.WORD.bold().when(sketch.belt().speed().isPresent());
        Draft.Style speed = sketch.asIf().isPresent() ? new Draft.Style(known.face(), known.mm(), Ink.ACCENT) : known;
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
        Pen pen = draft.pen(Ink.INK, ARROW * 1.25);
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
        Pen pen = draft.pen(style.ink(), ARROW);
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
                draft.pen(layout.toScale() ? Ink.INK : Ink.SOFT, ARROW * 0.8)));
        draft.write(captions.zoneLength(), number, start, middle);
        draft.write(note, Draft.Style.ASIDE, start + width - draft.width(note, Draft.Style.ASIDE), middle);
    }

    private static double round(double exaggeration) {
        return Math.round(exaggeration * 100) / 100.0;
    }

    /** The middle of the greater room over or under the line of the allowed depth. */
    private double promptMiddle() {
        double top = layout.boardTop(sketch);
        double limit = sketch.limit().map(allowed -> scale.y(allowed.depth())).filter(y -> y > top).orElse(top);
        return limit - top > plot.bottom() - limit ? (top + limit) / 2 : (limit + plot.bottom()) / 2;
    }

    private void prompt() {
        sketch.captions().prompt().ifPresent(text -> {
            Draft.Style style = Draft.Style.ASIDE.unknown();
            List<String> lines = draft.lines(text, style, plot.width() - draft.mm(6));
            double first = promptMiddle() - (lines.size() - 1) * draft.mm(Draft.ROW) / 2;
            for (int i = 0; i < lines.size(); i++) {
                draft.writeCentred(lines.get(i), style, plot.centre().x(), first + i * draft.mm(Draft.ROW));
            }
        });
    }
}
