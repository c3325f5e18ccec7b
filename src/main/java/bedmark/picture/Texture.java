package bedmark.picture;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Cuts hatching and grain to a region. Both hang on a grid that stays where it is when the region changes, so that a
 * bed that is pulled uncovers its texture and does not drag it along.
 */
final class Texture {
    private static final double SLOPE = Math.sqrt(0.5);

    private Texture() {
    }

    /** Strokes that rise to the right at 45°, that far apart, cut to the polygon. */
    static List<Mark.Segment> hatch(List<Point> region, double spacing) {
        double[] across = region.stream().mapToDouble(Texture::across).toArray();
        int first = (int) Math.ceil(Arrays.stream(across).min().orElse(0) / spacing);
        int last = (int) Math.floor(Arrays.stream(across).max().orElse(0) / spacing);
        List<Mark.Segment> strokes = new ArrayList<>();
        for (int i = first; i <= last; i++) {
            double[] cuts = cuts(region, across, i * spacing);
            for (int cut = 0; cut + 1 < cuts.length; cut += 2) {
                if (cuts[cut + 1] - cuts[cut] > spacing / 50) {
                    strokes.add(new Mark.Segment(at(cuts[cut], i * spacing), at(cuts[cut + 1], i * spacing)));
                }
            }
        }
        return strokes;
    }

    /** Staggered dots, that far apart, that lie wholly in the polygon. */
    static List<Point> grain(List<Point> region, double spacing, double radius) {
        double top = Double.POSITIVE_INFINITY;
        double bottom = Double.NEGATIVE_INFINITY;
        for (Point corner : region) {
            top = Math.min(top, corner.y());
            bottom = Math.max(bottom, corner.y());
        }
        double rise = spacing * 0.75;
        List<Point> dots = new ArrayList<>();
        for (long row = (long) Math.ceil(top / rise); row * rise <= bottom; row++) {
            double[] cuts = crossings(region, row * rise);
            double shift = row % 2 == 0 ? 0 : spacing / 2;
            for (int cut = 0; cut + 1 < cuts.length; cut += 2) {
                long column = (long) Math.ceil((cuts[cut] - shift) / spacing);
                for (; column * spacing + shift < cuts[cut + 1]; column++) {
                    Point dot = new Point(column * spacing + shift, row * rise);
                    if (clear(region, dot, 2 * radius)) {
                        dots.add(dot);
                    }
                }
            }
        }
        return dots;
    }

    /** Where a level line crosses the polygon's edge, from left to right: the polygon lies between each two. */
    private static double[] crossings(List<Point> region, double level) {
        double[] crossings = new double[region.size()];
        int count = 0;
        for (int i = 0; i < region.size(); i++) {
            Point a = region.get(i);
            Point b = region.get((i + 1) % region.size());
            if (a.y() > level != b.y() > level) {
                crossings[count++] = a.x() + (level - a.y()) / (b.y() - a.y()) * (b.x() - a.x());
            }
        }
        double[] sorted = Arrays.copyOf(crossings, count);
        Arrays.sort(sorted);
        return sorted;
    }

    private static boolean clear(List<Point> region, Point dot, double radius) {
        for (int i = 0; i < region.size(); i++) {
            Point a = region.get(i);
            Point b = region.get((i + 1) % region.size());
            if (canReach(a, b, dot, radius) && fromEdge(a, b, dot) < radius) {
                return false;
            }
        }
        return true;
    }

    /** Whether an edge may come that close: most lie far off, and how far need not be known while a finger pulls. */
    private static boolean canReach(Point a, Point b, Point point, double radius) {
        return Math.min(a.x(), b.x()) - radius <= point.x() && point.x() <= Math.max(a.x(), b.x()) + radius
                && Math.min(a.y(), b.y()) - radius <= point.y() && point.y() <= Math.max(a.y(), b.y()) + radius;
    }

    private static double fromEdge(Point a, Point b, Point point) {
        double dx = b.x() - a.x();
        double dy = b.y() - a.y();
        double square = dx * dx + dy * dy;
        double share = square == 0 ? 0
                : Math.max(0, Math.min(1, ((point.x() - a.x()) * dx + (point.y() - a.y()) * dy) / square));
        return point.distance(new Point(a.x() + share * dx, a.y() + share * dy));
    }

    private static double[] cuts(List<Point> region, double[] across, double level) {
        double[] cuts = new double[region.size()];
        int count = 0;
        for (int i = 0; i < region.size(); i++) {
            int next = (i + 1) % region.size();
            if (across[i] > level != across[next] > level) {
                double share = (level - across[i]) / (across[next] - across[i]);
                cuts[count++] = along(region.get(i)) + share * (along(region.get(next)) - along(region.get(i)));
            }
        }
        double[] sorted = Arrays.copyOf(cuts, count);
        Arrays.sort(sorted);
        return sorted;
    }

    private static double along(Point point) {
        return (point.x() - point.y()) * SLOPE;
    }

    private static double across(Point point) {
        return (point.x() + point.y()) * SLOPE;
    }

    private static Point at(double along, double across) {
        return new Point((across + along) * SLOPE, (across - along) * SLOPE);
    }
}
