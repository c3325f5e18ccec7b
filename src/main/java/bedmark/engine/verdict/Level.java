package bedmark.engine.verdict;

/** How a rule or a zone stands, from the best to the worst. */
public enum Level {
    WITHIN("within"),
    NEAR("near"),
    /** A required reading is missing; zones only. */
    INCOMPLETE("incomplete"),
    /** The uncertainty reaches across the limit of overload. */
    UNDECIDED("undecided"),
    OVERLOADED("overloaded");

    private final String code;

    Level(String code) {
        this.code = code;
    }

    public String code() {
        return code;
    }

    /** The worse of the two. */
    public Level or(Level other) {
        return compareTo(other) >= 0 ? this : other;
    }
}
