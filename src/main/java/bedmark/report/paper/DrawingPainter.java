package bedmark.report.paper;

import bedmark.picture.Box;
import bedmark.picture.Drawing;
import bedmark.picture.Mark;
import bedmark.picture.Pen;
import bedmark.picture.Point;
import java.util.ArrayList;
import java.util.List;

/** Draws the marks of a picture with its upper left corner at a place of a page: lines and letters, no bitmap. */
public final class DrawingPainter {
    private final Leaf leaf;
    private final double left;
    private final double top;

    public DrawingPainter(Leaf leaf, double left, double top) {
        this.leaf = leaf;
        this.left = left;
        this.top = top;
    }

    public void paint(Drawing drawing) {
        drawing.marks().forEach(this::paint);
    }

    private void paint(Mark mark) {
        if (mark instanceof Mark.Line line) {
            stroke(line.points(), line.pen());
        } else if (mark instanceof Mark.Area area) {
            leaf.fill(area.fill(), placed(area.outline()));
        } else if (mark instanceof Mark.Disc disc) {
            disc.fill().ifPresent(fill -> leaf.disc(fill, placed(disc.centre()), disc.radius()));
            disc.edge().ifPresent(edge ->
                    leaf.ring(edge.ink(), edge.width(), placed(disc.centre()), disc.radius()));
        } else if (mark instanceof Mark.Label label) {
            label(label);
        } else if (mark instanceof Mark.Hatching hatching) {
            strokes(hatching.strokes(), hatching.pen());
        } else if (mark instanceof Mark.Grain grain) {
            grain.dots().forEach(dot -> leaf.disc(grain.ink(), placed(dot), grain.radius()));
        } else if (mark instanceof Mark.Dimension dimension) {
            strokes(dimension.strokes(), dimension.pen());
        }
    }

    private void label(Mark.Label label) {
        label.plate().ifPresent(plate -> {
            Box box = label.box();
            leaf.fill(plate.fill(), left + box.x(), top + box.y(), box.width(), box.height());
            plate.edge().ifPresent(edge -> leaf.frame(edge.ink(), edge.width(), left + box.x(), top + box.y(),
                    box.width(), box.height()));
        });
        Point start = placed(label.start());
        leaf.mutter(label.text(), new Lettering(label.face(), label.size(), label.ink()), start.x(), start.y());
    }

    private void strokes(List<Mark.Segment> strokes, Pen pen) {
        strokes.forEach(stroke -> stroke(List.of(stroke.from(), stroke.to()), pen));
    }

    private void stroke(List<Point> points, Pen pen) {
        if (pen.stroke() == Pen.Stroke.DASHED) {
            leaf.dashed(pen.ink(), pen.width(), pen.dash(), pen.gap(), placed(points));
        } else {
            leaf.line(pen.ink(), pen.width(), placed(points));
        }
    }

    private List<Point> placed(List<Point> points) {
        List<Point> placed = new ArrayList<>(points.size());
        points.forEach(point -> placed.add(placed(point)));
        return placed;
    }

    private Point placed(Point point) {
        return point.plus(left, top);
    }
}
