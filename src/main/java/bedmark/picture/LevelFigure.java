package bedmark.picture;

/**
 * The levels as miniature cross-sections, told apart by their shape alone: where the bed lies against its line. Paths in
 * the notation of SVG on a grid of 40 × 30, y downwards.
 */
public enum LevelFigure {
    /** The bed lies well under its line. */
    WITHIN("within", "M9 17 Q20 13.6 31 17 V23.2 L28 26 H12 L9 23.2 Z", Strokes.LIMIT, ""),
    /** The bed comes up to its line. */
    NEAR("near", "M9 11.2 Q20 7.4 31 11.2 V23.2 L28 26 H12 L9 23.2 Z", Strokes.LIMIT, ""),
    /** The bed is heaped over its line. */
    OVERLOADED("overloaded", "M9 5 Q20 -2.5 31 5 V23.2 L28 26 H12 L9 23.2 Z", "M10.2 10.5 H29.8",
            "M2.5 10.5 H8 M32 10.5 H37.5"),
    /** The bed's surface may lie under its line or over it. */
    UNDECIDED("undecided", "M9 17 Q20 13.6 31 17 V23.2 L28 26 H12 L9 23.2 Z", Strokes.LIMIT,
            "M9.5 4 L12.5 2.6 M15 1.9 L18.4 1.4 M21.6 1.4 L25 1.9 M27.5 2.6 L30.5 4"),
    /** Part of the bed has not been seen. */
    INCOMPLETE("incomplete", "M9 17 L18 14.6 L15.5 18.5 L19 21.5 L16.5 26 H12 L9 23.2 Z", Strokes.LIMIT, ""),
    /** Nobody has looked. */
    NOT_INSPECTED("not-inspected", "", "", "M14 20 L26 8");

    /** Width of the grid. */
    public static final double WIDTH = 40;
    /** Height of the grid. */
    public static final double HEIGHT = 30;
    /** The belt in its trough. */
    public static final String TROUGH = "M1.5 16.5 L12 26 H28 L38.5 16.5";
    /** The boards at both sides. */
    public static final String BOARDS = "M9 3 V20.5 M31 3 V20.5";

    private final String code;
    private final String bed;
    private final String limit;
    private final String dashes;

    LevelFigure(String code, String bed, String limit, String dashes) {
        this.code = code;
        this.bed = bed;
        this.limit = limit;
        this.dashes = dashes;
    }

    public String code() {
        return code;
    }

    /** The bed's outline; empty where nobody has looked. */
    public String bed() {
        return bed;
    }

    /** The line that the bed is held against; empty where there is none. */
    public String limit() {
        return limit;
    }

    /** Strokes that say how the bed stands to its line; empty where there are none. */
    public String dashes() {
        return dashes;
    }

    /** The line that most levels share. */
    private static final class Strokes {
        private static final String LIMIT = "M2.5 10.5 H37.5";

        private Strokes() {
        }
    }
}
