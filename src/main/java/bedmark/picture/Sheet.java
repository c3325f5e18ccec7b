package bedmark.picture;

/**
 * The surface that a picture is drawn on.
 *
 * @param width     in units of the sheet (pixels of the screen, points of a page), positive
 * @param height    in units of the sheet, positive
 * @param corner    height of what stands over the upper right corner (units of the sheet), not negative: the drawing
 *                  stays clear of it
 * @param unitPerMm units of the sheet to the millimetre, positive: what keeps type, lines and targets at the size of
 *                  an eye and a finger
 */
public record Sheet(double width, double height, double corner, double unitPerMm) {
    public Sheet {
        if (!(width > 0 && height > 0 && corner >= 0 && unitPerMm > 0)) {
            throw new IllegalArgumentException("a sheet has a size");
        }
    }

    /** A surface that is all for the drawing. */
    public Sheet(double width, double height, double unitPerMm) {
        this(width, height, 0, unitPerMm);
    }

    /** A length on the surface (mm) in units of the sheet. */
    public double mm(double millimetres) {
        return millimetres * unitPerMm;
    }
}
