package bedmark.picture;

/** The faces of the one typeface. */
public enum Face {
    PLAIN,
    BOLD,
    ITALIC
}
