package bedmark.screen.part;

/** How loudly a button speaks. */
public enum Weight {
    /** The one thing to do next. */
    PRIMARY("primary"),
    /** What can be done as well. */
    PLAIN("plain"),
    /** What is only in reach: no box around it. */
    QUIET("quiet");

    private final String styleClass;

    Weight(String styleClass) {
        this.styleClass = styleClass;
    }

    String styleClass() {
        return styleClass;
    }
}
