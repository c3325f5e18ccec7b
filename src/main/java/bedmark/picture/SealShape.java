package bedmark.picture;

/** The seals that can be drawn, told apart by their geometry. */
public enum SealShape {
    /** The strip hangs plumb. */
    VERTICAL,
    /** The strip stands square on the wing of the belt. */
    PERPENDICULAR,
    /** The strip leans outward across the belt's surface. */
    OBLIQUE,
    /** The lip lies along the belt's surface. */
    PARALLEL,
    /** A gap is kept. */
    CONTACTLESS,
    /** Nothing is there. */
    NONE
}
