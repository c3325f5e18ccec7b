package bedmark.sample;

/**
 * What the drive of a conveyor asks for while it runs: belt, idlers and load rolling (an artificial friction of 0.025,
 * a third more for everything small), lift, acceleration of the feed, and the skirts.
 */
final class SampleDrive {
    private static final double GRAVITY = 9.806_65;
    private static final double ROLLING = 1.3 * 0.025;
    private static final double TABLE_FACTOR = 22_620.594_79;
    private static final double SEAL_RATE = 43.78;

    private SampleDrive() {
    }

    /**
     * Power at the motor shaft (W).
     *
     * @param speed of the belt (m/s)
     * @param flow  (kg/s)
     * @param skirt drag of all the conveyor's skirts (N)
     */
    static double shaft(SampleZone zone, double speed, double flow, double skirt) {
        double width = zone.conveyor("beltWidth");
        double length = zone.conveyor("beltLength") / 2;
        double slope = zone.conveyor("incline");
        double load = flow / speed;
        double moving = (30 * width + 4) + 2 * 14 * width + load * Math.cos(slope);
        double force = ROLLING * length * GRAVITY * moving + length * Math.sin(slope) * GRAVITY * load
                + flow * (speed - zone.transfer("feedVelocity")) + skirt;
        return force * speed / zone.share("driveEfficiency");
    }

    /** Drag of one zone's skirts (N): the tabulated factor, and two seals that touch. */
    static double skirt(SampleZone zone, double length, double integralOfSquare) {
        return TABLE_FACTOR * zone.skirtFrictionFactor() * integralOfSquare + 2 * SEAL_RATE * length;
    }
}
