package bedmark.picture;

/** A point of the sheet; x to the right, y downwards, in the sheet's own unit. */
public record Point(double x, double y) {

    /** The point moved by that much. */
    public Point plus(double dx, double dy) {
        return new Point(x + dx, y + dy);
    }

    public double distance(Point other) {
        return Math.hypot(x - other.x, y - other.y);
    }
}
