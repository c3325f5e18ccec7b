package bedmark.picture;

import java.util.List;
import java.util.Objects;
import java.util.Optional;

/** One thing that is drawn. Marks are drawn in the order of their list, each over those before it. */
public sealed interface Mark {

    /** A line through points; an arc comes as such a line. */
    record Line(List<Point> points, Pen pen) implements Mark {
        public Line {
            points = List.copyOf(points);
            Objects.requireNonNull(pen);
        }
    }

    /** A filled polygon. */
    record Area(List<Point> outline, Ink fill) implements Mark {
        public Area {
            outline = List.copyOf(outline);
            Objects.requireNonNull(fill);
        }
    }

    /** A circle, filled, edged or both. */
    record Disc(Point centre, double radius, Optional<Ink> fill, Optional<Pen> edge) implements Mark {
        public Disc {
            Objects.requireNonNull(centre);
            Objects.requireNonNull(fill);
            Objects.requireNonNull(edge);
        }
    }

    /**
     * A line of text.
     *
     * @param start where the baseline begins
     * @param size  of the type, in units of the sheet
     * @param box   the room it takes, its plate included
     * @param plate what lies under it
     */
    record Label(String text, Face face, double size, Ink ink, Point start, Box box, Optional<Plate> plate)
            implements Mark {
        public Label {
            Objects.requireNonNull(text);
            Objects.requireNonNull(face);
            Objects.requireNonNull(ink);
            Objects.requireNonNull(start);
            Objects.requireNonNull(box);
            Objects.requireNonNull(plate);
        }
    }

    /** The plate under a text, so that no text stands on a texture. */
    record Plate(Ink fill, Optional<Pen> edge) {
        public Plate {
            Objects.requireNonNull(fill);
            Objects.requireNonNull(edge);
        }
    }

    /** A hatched region: its outline, and the strokes already cut to it. */
    record Hatching(List<Point> region, List<Segment> strokes, Pen pen) implements Mark {
        public Hatching {
            region = List.copyOf(region);
            strokes = List.copyOf(strokes);
            Objects.requireNonNull(pen);
        }
    }

    /** A dotted region: its outline, and the dots already chosen within it. */
    record Grain(List<Point> region, List<Point> dots, double radius, Ink ink) implements Mark {
        public Grain {
            region = List.copyOf(region);
            dots = List.copyOf(dots);
            Objects.requireNonNull(ink);
        }
    }

    /**
     * A level dimension line with a stroke across each end; the text in its gap is a label of its own.
     *
     * @param from left end
     * @param to   right end, at the same height
     * @param tick half the length of the strokes across
     * @param gap  the part left open for the text; without one the line runs through
     */
    record Dimension(Point from, Point to, double tick, Optional<Gap> gap, Pen pen) implements Mark {
        public Dimension {
            Objects.requireNonNull(from);
            Objects.requireNonNull(to);
            Objects.requireNonNull(gap);
            Objects.requireNonNull(pen);
        }

        /** All strokes of the line. */
        public List<Segment> strokes() {
            Segment left = new Segment(from.plus(0, -tick), from.plus(0, tick));
            Segment right = new Segment(to.plus(0, -tick), to.plus(0, tick));
            return gap.map(open -> List.of(left, new Segment(from, new Point(open.from(), from.y())),
                            new Segment(new Point(open.to(), to.y()), to), right))
                    .orElseGet(() -> List.of(left, new Segment(from, to), right));
        }
    }

    /** An open stretch of a level line, from one x to another. */
    record Gap(double from, double to) {
    }

    /** A straight stroke. */
    record Segment(Point from, Point to) {
    }
}
