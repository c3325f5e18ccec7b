package bedmark.picture;

/** The steps that a pulled bed snaps to. */
public enum Snap {
    /** Depths by 5 mm, positions by 50 mm. */
    METRIC(0.005, 0.05),
    /** Depths by ¼ in, positions by 2 in. */
    INCH(0.25 * 0.0254, 2 * 0.0254);

    private final double depthStep;
    private final double positionStep;

    Snap(double depthStep, double positionStep) {
        this.depthStep = depthStep;
        this.positionStep = positionStep;
    }

    /** The nearest step to a depth (m); never below 0. */
    public Stepped depth(double depth) {
        return new Stepped(Math.max(0, Math.round(depth / depthStep)), depthStep);
    }

    /** The nearest step to a position (m) that lies in a zone of that length (m). */
    public Stepped position(double position, double length) {
        long last = (long) Math.floor(length / positionStep + 1e-9);
        return new Stepped(Math.max(0, Math.min(last, Math.round(position / positionStep))), positionStep);
    }

    /**
     * A snapped number: whole steps, so that who keeps it writes an exact decimal of the person's own unit.
     *
     * @param steps how many, not negative
     * @param step  the size of one (m)
     */
    public record Stepped(long steps, double step) {
        public double metres() {
            return steps * step;
        }
    }
}
