package bedmark.picture;

/** The conditions of a seal that have a mark of their own. */
public enum SealState {
    SOUND,
    WORN,
    HARDENED,
    TORN,
    OVER_TIGHTENED,
    MISSING
}
