package bedmark.screen.theme;

/** The light that the screen is read in. */
public enum Light {
    DAY,
    NIGHT
}
