package bedmark.report.paper;

import bedmark.picture.Face;
import bedmark.picture.Ink;

/**
 * How text is set.
 *
 * @param size of the type (pt), positive
 */
public record Lettering(Face face, double size, Ink ink) {
    /** From one baseline to the next, as a share of the size. */
    private static final double LEADING = 1.36;

    public static Lettering plain(double size) {
        return new Lettering(Face.PLAIN, size, Ink.INK);
    }

    public Lettering bold() {
        return new Lettering(Face.BOLD, size, ink);
    }

    public Lettering italic() {
        return new Lettering(Face.ITALIC, size, ink);
    }

    public Lettering in(Ink other) {
        return new Lettering(face, size, other);
    }

    /** In the second place. */
    public Lettering soft() {
        return in(Ink.SOFT);
    }

    public Lettering sized(double other) {
        return new Lettering(face, other, ink);
    }

    /** Height of a line (pt). */
    public double leading() {
        return size * LEADING;
    }

    /** From the top of a line to its baseline (pt). */
    public double rise() {
        return size * 1.02;
    }
}
