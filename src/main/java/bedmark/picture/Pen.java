package bedmark.picture;

import java.util.Objects;

/**
 * How a line is drawn.
 *
 * @param width in units of the sheet, positive
 */
public record Pen(Ink ink, double width, Stroke stroke) {

    /** The kinds of line. */
    public enum Stroke {
        SOLID,
        DASHED
    }

    public Pen {
        Objects.requireNonNull(ink);
        Objects.requireNonNull(stroke);
        if (!(width > 0)) {
            throw new IllegalArgumentException("a line has a width");
        }
    }

    public static Pen solid(Ink ink, double width) {
        return new Pen(ink, width, Stroke.SOLID);
    }

    public static Pen dashed(Ink ink, double width) {
        return new Pen(ink, width, Stroke.DASHED);
    }

    /** Length of a dash, in units of the sheet. */
    public double dash() {
        return 4.5 * width;
    }

    /** Gap between two dashes, in units of the sheet. */
    public double gap() {
        return 3.5 * width;
    }
}
