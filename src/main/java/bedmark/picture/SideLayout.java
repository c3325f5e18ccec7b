package bedmark.picture;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;

/**
 * Where everything of the side view goes: rows for words above and below, and between them the scale. It is kept while
 * a person pulls, so that the picture does not move under the finger.
 *
 * @param view         the room of the side view
 * @param scale        metres to sheet
 * @param toScale      whether the length is known, so that the scale means something
 * @param positionRows rows of station positions under the belt
 */
record SideLayout(Box view, SideScale scale, boolean toScale, int positionRows) {
    /** Belt beyond the zone at either end (mm). */
    static final double OVERHANG = 6.6;
    /** Plot to the names of its levels (mm): past a handle at the very end of the zone. */
    static final double LEVEL_GAP = 3.6;
    static final double BELT = 0.95;
    static final double IDLER = 2.6;
    static final double GAP = 1.4;
    /** What the dimension row takes (mm). */
    static final double DIMENSION = Draft.ROW + 0.4;
    /** Belt to first row of text (mm). */
    static final double UNDER = BELT + IDLER + 1;

    private static final double[] ROUND = {1, 1.5, 2, 2.5, 3, 4, 5, 6, 7, 8, 9};
    private static final double HEADROOM = 1.12;
    private static final double NOMINAL_HEIGHT = 0.4;

    /**
     * Lays a side view out.
     *
     * @param besideRows rows of words that stand beside the rows under the belt
     */
    static SideLayout of(ZoneSketch sketch, Box view, int besideRows, Draft draft) {
        boolean toScale = sketch.boards().length().isPresent();
        double length = sketch.boards().length().orElseGet(() -> 1.1 * sketch.stations().stream()
                .mapToDouble(ZoneSketch.Station::position).filter(position -> position > 0).max().orElse(1 / 1.1));
        double top = top(sketch);
        double left = draft.mm(OVERHANG);
        double width = Math.floor(Math.max(draft.mm(10),
                view.width() - left - rightMargin(sketch.captions(), draft)));
        int rows = positionRows(sketch, draft, width / length);
        double above = draft.mm(Draft.ROW) + draft.mm(GAP);
        double below = draft.mm(UNDER) + Math.max(rows, besideRows - 1) * draft.mm(Draft.ROW) + draft.mm(DIMENSION);
        double room = Math.max(draft.mm(6), view.height() - above - below);

        double along = width / length;
        double ratio = room / top / along;
        double exaggeration = Math.max(1, roundBelow(ratio));
        if (ratio < 1) {
            along = room / top;
        }
        double plotWidth = along * length;
        double plotHeight = along * exaggeration * top;
        double x = Math.floor(view.x() + left + (width - plotWidth) / 2);
        double y = Math.rint(view.y() + above + (room + plotHeight) / 2) - plotHeight;
        SideScale scale = new SideScale(new Box(x, y, plotWidth, plotHeight), length, top, sketch.feedEnd());
        return new SideLayout(view, scale, toScale, rows);
    }

    /** The greatest round number that is not over a positive ratio. */
    private static double roundBelow(double ratio) {
        double power = Math.pow(10, Math.floor(Math.log10(ratio)));
        return Arrays.stream(ROUND).map(step -> step * power).filter(step -> step <= ratio + 1e-9).max().orElse(power);
    }

    /** The greatest depth that the plot shows: over the board by a little, so that a heaped bed can be pulled too. */
    private static double top(ZoneSketch sketch) {
        double deepest = sketch.stations().stream().flatMapToDouble(station -> station.depth().stream()).max()
                .orElse(0);
        double allowed = sketch.limit().map(ZoneSketch.Limit::depth).orElse(0.0);
        double height = sketch.boards().height()
                .orElse(Math.max(1.2 * Math.max(deepest, allowed), NOMINAL_HEIGHT));
        return Math.max(height * HEADROOM, Math.max(1.06 * deepest, 1.1 * allowed));
    }

    private static double rightMargin(Captions captions, Draft draft) {
        double numbers = Math.max(draft.width(captions.limit(), Draft.Style.WORD.bold()),
                draft.width(captions.boardTop(), Draft.Style.WORD.bold()));
        double words = Math.max(draft.width(captions.limitWord(), Draft.Style.WORD),
                draft.width(captions.boardTopWord(), Draft.Style.WORD));
        return Math.max(draft.mm(OVERHANG), draft.mm(LEVEL_GAP) + Math.max(numbers, words));
    }

    /** One row where all positions fit side by side, else two. */
    private static int positionRows(ZoneSketch sketch, Draft draft, double along) {
        List<ZoneSketch.Station> sorted = new ArrayList<>(sketch.stations());
        sorted.sort(Comparator.comparingDouble(ZoneSketch.Station::position));
        for (int i = 1; i < sorted.size(); i++) {
            double apart = (sorted.get(i).position() - sorted.get(i - 1).position()) * along;
            double needed = (draft.width(sorted.get(i).positionLabel(), Draft.Style.WORD.bold())
                    + draft.width(sorted.get(i - 1).positionLabel(), Draft.Style.WORD.bold())) / 2 + draft.mm(1);
            if (apart < needed) {
                return 2;
            }
        }
        return 1;
    }

    /** Where the top of the boards lies; at a usual place where their height is not known. */
    double boardTop(ZoneSketch sketch) {
        return scale.y(sketch.boards().height().orElse(scale.top() / HEADROOM));
    }

    /** Middle of the row of words over the plot. */
    double headerMiddle(Draft draft) {
        return scale.plot().y() - draft.mm(GAP) - draft.mm(Draft.ROW) / 2;
    }

    /** Middle of a row under the belt: the positions, then the dimension. */
    double rowMiddle(int row, Draft draft) {
        return scale.plot().bottom() + draft.mm(UNDER) + (row + 0.5) * draft.mm(Draft.ROW);
    }

    double dimensionMiddle(Draft draft) {
        return rowMiddle(positionRows, draft) + draft.mm(0.4);
    }
}
