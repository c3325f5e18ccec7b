package bedmark.picture;

/** Measures text for whoever draws it; the picture lays out by it and knows no font. */
@FunctionalInterface
public interface TextMeasure {

    /**
     * @param size of the type, in units of the sheet
     * @return the room that the text takes, in units of the sheet
     */
    Extent of(String text, Face face, double size);

    /**
     * The room that a text takes.
     *
     * @param ascent  above the baseline
     * @param descent below the baseline
     */
    record Extent(double width, double ascent, double descent) {
        public double height() {
            return ascent + descent;
        }
    }
}
