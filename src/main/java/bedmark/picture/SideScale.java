package bedmark.picture;

import java.util.Objects;

/**
 * Turns metres along the zone and above the belt into places of the sheet, and back.
 *
 * @param plot    from start to end of the zone, from the belt's surface up to {@code top}
 * @param length  of the zone (m), positive
 * @param top     the greatest depth that the plot can show (m), positive
 * @param feedEnd which end is position 0
 */
public record SideScale(Box plot, double length, double top, FeedEnd feedEnd) {
    public SideScale {
        Objects.requireNonNull(plot);
        Objects.requireNonNull(feedEnd);
        if (!(length > 0 && top > 0)) {
            throw new IllegalArgumentException("a scale spans something");
        }
    }

    /** Place of a position (m). */
    public double x(double position) {
        double share = position / length;
        return plot.x() + (feedEnd == FeedEnd.LEFT ? share : 1 - share) * plot.width();
    }

    /** Place of a depth (m). */
    public double y(double depth) {
        return plot.bottom() - depth / top * plot.height();
    }

    /** Place of a point of the bed. */
    public Point at(double position, double depth) {
        return new Point(x(position), y(depth));
    }

    /** Position (m) under a place, held within the zone. */
    public double position(double x) {
        double share = Math.max(0, Math.min(1, (x - plot.x()) / plot.width()));
        return (feedEnd == FeedEnd.LEFT ? share : 1 - share) * length;
    }

    /** Depth (m) at a place, held between the belt and the top of the plot. */
    public double depth(double y) {
        return Math.max(0, Math.min(1, (plot.bottom() - y) / plot.height())) * top;
    }

    /** How many times heights are drawn taller than lengths. */
    public double exaggeration() {
        return plot.height() / top / (plot.width() / length);
    }
}
