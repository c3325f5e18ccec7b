package bedmark.screen.theme;

/** The hand that works the screen; a gloved one gets larger targets, and the pad the whole form pane. */
public enum Hand {
    BARE(15, 12),
    GLOVED(20, 15);

    private final double target;
    private final double secondary;

    Hand(double target, double secondary) {
        this.target = target;
        this.secondary = secondary;
    }

    /** Least height of a target (mm). */
    public double target() {
        return target;
    }

    /** Least height of a secondary target in a list (mm). */
    public double secondary() {
        return secondary;
    }
}
