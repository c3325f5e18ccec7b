package bedmark.screen.theme;

/**
 * The levels as miniature cross-sections, told apart by their shape alone: where the bed lies against its line. On a
 * grid of 40 × 30.
 */
public enum LevelShape {
    /** The bed lies well under its line. */
    WITHIN("within", "M9 17 Q20 13.6 31 17 V23.2 L28 26 H12 L9 23.2 Z", Shapes.LIMIT, ""),
    /** The bed comes up to its line. */
    NEAR("near", "M9 11.2 Q20 7.4 31 11.2 V23.2 L28 26 H12 L9 23.2 Z", Shapes.LIMIT, ""),
    /** The bed is heaped over its line. */
    OVERLOADED("overloaded", "M9 5 Q20 -2.5 31 5 V23.2 L28 26 H12 L9 23.2 Z", "M10.2 10.5 H29.8",
            "M2.5 10.5 H8 M32 10.5 H37.5"),
    /** The bed's surface may lie under its line or over it. */
    UNDECIDED("undecided", "M9 17 Q20 13.6 31 17 V23.2 L28 26 H12 L9 23.2 Z", Shapes.LIMIT,
            "M9.5 4 L12.5 2.6 M15 1.9 L18.4 1.4 M21.6 1.4 L25 1.9 M27.5 2.6 L30.5 4"),
    /** Part of the bed has not been seen. */
    INCOMPLETE("incomplete", "M9 17 L18 14.6 L15.5 18.5 L19 21.5 L16.5 26 H12 L9 23.2 Z", Shapes.LIMIT, ""),
    /** Nobody has looked. */
    NOT_INSPECTED("not-inspected", "", "", "M14 20 L26 8");

    private final String styleClass;
    private final String bed;
    private final String limit;
    private final String dashes;

    LevelShape(String styleClass, String bed, String limit, String dashes) {
        this.styleClass = styleClass;
        this.bed = bed;
        this.limit = limit;
        this.dashes = dashes;
    }

    /** The class that the style sheet knows the level by. */
    public String styleClass() {
        return styleClass;
    }

    String bed() {
        return bed;
    }

    String limit() {
        return limit;
    }

    String dashes() {
        return dashes;
    }

    /** Strokes that levels share. */
    static final class Shapes {
        static final String TROUGH = "M1.5 16.5 L12 26 H28 L38.5 16.5";
        static final String BOARDS = "M9 3 V20.5 M31 3 V20.5";
        static final String LIMIT = "M2.5 10.5 H37.5";

        private Shapes() {
        }
    }
}
