package bedmark.engine.flow;

/**
 * Highest belt speed for a material and a belt width (CEMA, recommended maximum belt speeds) [R]; ft/min by in:
 *
 * <pre>
 * grain, free-flowing                            18: 500   24–30: 700   36–42: 800   48–96: 1000
 * coal, damp clay, soft ore, fine stone          18: 400   24–36: 600   42–60: 800   72–96: 1000
 * heavy, hard, sharp ore, coarse stone           18: 350   24–36: 500   over 36: 600
 * </pre>
 *
 * <p>A width between two rows has the speed of the narrower one. A belt within 2 % of a row's width belongs to it, as
 * metric widths do to the customary ones that they stand for (600 mm to 24 in, 1200 mm to 48 in) [A].
 */
public final class MaximumBeltSpeed {
    private static final double FOOT_PER_MINUTE = 0.3048 / 60;
    private static final double INCH = 0.0254;
    private static final double NOMINAL = 0.98;

    private MaximumBeltSpeed() {
    }

    /** The speed (m/s) for a belt of that width (m). */
    public static double of(SpeedClass material, double beltWidth) {
        return FOOT_PER_MINUTE * switch (material) {
            case GRAIN_FREE_FLOWING -> from(48, beltWidth) ? 1000 : from(36, beltWidth) ? 800
                    : from(24, beltWidth) ? 700 : 500;
            case COAL_SOFT_ORE_FINE_STONE -> from(72, beltWidth) ? 1000 : from(42, beltWidth) ? 800
                    : from(24, beltWidth) ? 600 : 400;
            case HEAVY_HARD_SHARP_COARSE -> beltWidth > 36 * INCH * (2 - NOMINAL) ? 600
                    : from(24, beltWidth) ? 500 : 350;
        };
    }

    private static boolean from(double inches, double beltWidth) {
        return beltWidth >= inches * INCH * NOMINAL;
    }
}
