package bedmark.office;

/** Where a zone stands in the list, from the worst to the best. What nobody has looked at never looks healthy. */
public enum Place {
    OVERLOADED("overloaded"),
    UNDECIDED("undecided"),
    /** A required reading is missing, or the survey can't be judged. */
    INCOMPLETE("incomplete"),
    /** Never inspected, or not on the last visit. */
    NOT_INSPECTED("not-inspected"),
    /** Nothing bad was found, but that was too long ago to count, or nobody knows how long. */
    STALE("stale"),
    NEAR("near"),
    WITHIN("within");

    private final String code;

    Place(String code) {
        this.code = code;
    }

    public String code() {
        return code;
    }
}
