package bedmark.engine.verdict;

/** On which side of its limit a rule is broken. */
public enum Sense {
    OVER,
    UNDER
}
