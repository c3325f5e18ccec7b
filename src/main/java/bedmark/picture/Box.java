package bedmark.picture;

import java.util.List;

/** An upright rectangle of the sheet. */
public record Box(double x, double y, double width, double height) {

    /** The box of that size around a centre. */
    public static Box around(Point centre, double width, double height) {
        return new Box(centre.x() - width / 2, centre.y() - height / 2, width, height);
    }

    public double right() {
        return x + width;
    }

    public double bottom() {
        return y + height;
    }

    public Point centre() {
        return new Point(x + width / 2, y + height / 2);
    }

    /** Whether the two share an area; boxes that only touch do not. */
    public boolean overlaps(Box other) {
        return x < other.right() && other.x < right() && y < other.bottom() && other.y < bottom();
    }

    /** Whether the other box lies wholly in this one, its edge included. */
    public boolean holds(Box other) {
        return other.x >= x && other.y >= y && other.right() <= right() && other.bottom() <= bottom();
    }

    public boolean holds(Point point) {
        return point.x() >= x && point.x() <= right() && point.y() >= y && point.y() <= bottom();
    }

    /** The box with that much more (or, negative, less) on every side. */
    public Box grown(double by) {
        return new Box(x - by, y - by, width + 2 * by, height + 2 * by);
    }

    /** The corners, clockwise from the upper left. */
    public List<Point> corners() {
        return List.of(new Point(x, y), new Point(right(), y), new Point(right(), bottom()), new Point(x, bottom()));
    }
}
