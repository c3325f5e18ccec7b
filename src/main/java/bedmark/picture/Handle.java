package bedmark.picture;

/**
 * Where a finger takes hold of a station.
 *
 * @param station index in the sketch's list
 * @param radius  of the hit area, at least 7.5 mm of the surface
 */
public record Handle(int station, double x, double y, double radius) {
    /** The least radius of a hit area (mm). */
    public static final double RADIUS_MM = 7.5;

    public Point centre() {
        return new Point(x, y);
    }
}
