package bedmark.picture;

/** The end of the picture where the material comes on: the left, or the right for who looks from the other side. */
public enum FeedEnd {
    LEFT,
    RIGHT
}
