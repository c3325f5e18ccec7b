package bedmark.picture;

/** What a mark means; who draws it gives the ink its colour. */
public enum Ink {
    /** The sheet itself. */
    GROUND,
    /** Lines and words that matter. */
    INK,
    /** Lines and words in the second place; things not known yet. */
    SOFT,
    /** Hairlines that only order the sheet. */
    LINE,
    /** What the person has in hand. */
    ACCENT,
    /** The bed of material. */
    BED,
    /** The grain of the bed. */
    GRAIN,
    /** The face of a skirtboard. */
    BOARD,
    /** What is too much, or defect. */
    OVER,
    /** Plates and boxes on the sheet. */
    PAPER
}
