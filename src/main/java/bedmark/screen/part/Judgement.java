package bedmark.screen.part;

/** How a value was judged when its field was left. */
public enum Judgement {
    /** Fine, or not judged. */
    NONE,
    /** Unlikely: asked about once, then believed. */
    QUESTIONED,
    /** Impossible: it holds up completing, never saving. */
    WRONG
}
