package bedmark.screen.zone;

import bedmark.picture.Box;
import bedmark.picture.Drawing;
import bedmark.picture.Ink;
import bedmark.picture.Mark;
import bedmark.picture.Pen;
import bedmark.picture.Point;
import java.util.List;
import java.util.function.Function;
import javafx.geometry.VPos;
import javafx.scene.canvas.GraphicsContext;
import javafx.scene.paint.Color;
import javafx.scene.shape.StrokeLineCap;
import javafx.scene.shape.StrokeLineJoin;

/** Paints the marks of a drawing, in their order. */
final class MarkPainter {
    private final GraphicsContext canvas;
    private final Function<Ink, Color> colour;
    private final FontMeasure fonts;

    MarkPainter(GraphicsContext canvas, Function<Ink, Color> colour, FontMeasure fonts) {
        this.canvas = canvas;
        this.colour = colour;
        this.fonts = fonts;
    }

    void paint(Drawing drawing) {
        canvas.setLineJoin(StrokeLineJoin.ROUND);
        canvas.setTextBaseline(VPos.BASELINE);
        drawing.marks().forEach(this::paint);
    }

    private void paint(Mark mark) {
        if (mark instanceof Mark.Line line) {
            polyline(line.points(), line.pen());
        } else if (mark instanceof Mark.Area area) {
            canvas.setFill(colour.apply(area.fill()));
            canvas.fillPolygon(xs(area.outline()), ys(area.outline()), area.outline().size());
        } else if (mark instanceof Mark.Disc disc) {
            disc(disc);
        } else if (mark instanceof Mark.Label label) {
            label(label);
        } else if (mark instanceof Mark.Hatching hatching) {
            strokes(hatching.strokes(), hatching.pen());
        } else if (mark instanceof Mark.Grain grain) {
            canvas.setFill(colour.apply(grain.ink()));
            grain.dots().forEach(dot -> canvas.fillOval(dot.x() - grain.radius(), dot.y() - grain.radius(),
                    2 * grain.radius(), 2 * grain.radius()));
        } else if (mark instanceof Mark.Dimension dimension) {
            strokes(dimension.strokes(), dimension.pen());
        }
    }

    private void polyline(List<Point> points, Pen pen) {
        use(pen);
        canvas.strokePolyline(xs(points), ys(points), points.size());
    }

    private void strokes(List<Mark.Segment> strokes, Pen pen) {
        use(pen);
        strokes.forEach(stroke -> canvas.strokeLine(stroke.from().x(), stroke.from().y(), stroke.to().x(),
                stroke.to().y()));
    }

    private void disc(Mark.Disc disc) {
        double x = disc.centre().x() - disc.radius();
        double y = disc.centre().y() - disc.radius();
        disc.fill().ifPresent(fill -> {
            canvas.setFill(colour.apply(fill));
            canvas.fillOval(x, y, 2 * disc.radius(), 2 * disc.radius());
        });
        disc.edge().ifPresent(edge -> {
            use(edge);
            canvas.strokeOval(x, y, 2 * disc.radius(), 2 * disc.radius());
        });
    }

    private void label(Mark.Label label) {
        label.plate().ifPresent(plate -> plate(label.box(), plate));
        canvas.setFill(colour.apply(label.ink()));
        canvas.setFont(fonts.font(label.face(), label.size()));
        canvas.fillText(label.text(), label.start().x(), label.start().y());
    }

    private void plate(Box box, Mark.Plate plate) {
        double arc = box.height() / 4;
        canvas.setFill(colour.apply(plate.fill()));
        canvas.fillRoundRect(box.x(), box.y(), box.width(), box.height(), arc, arc);
        plate.edge().ifPresent(edge -> {
            use(edge);
            canvas.strokeRoundRect(box.x(), box.y(), box.width(), box.height(), arc, arc);
        });
    }

    private void use(Pen pen) {
        canvas.setStroke(colour.apply(pen.ink()));
        canvas.setLineWidth(pen.width());
        if (pen.stroke() == Pen.Stroke.DASHED) {
            canvas.setLineCap(StrokeLineCap.BUTT);
            canvas.setLineDashes(pen.dash(), pen.gap());
        } else {
            canvas.setLineCap(StrokeLineCap.ROUND);
            canvas.setLineDashes();
        }
    }

    private static double[] xs(List<Point> points) {
        return points.stream().mapToDouble(Point::x).toArray();
    }

    private static double[] ys(List<Point> points) {
        return points.stream().mapToDouble(Point::y).toArray();
    }
}
