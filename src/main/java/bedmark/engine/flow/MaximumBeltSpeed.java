package bedmark.engine.flow;

import bedmark.engine.uncertainty.ImpossibleReading;
import java.util.ArrayList;
import java.util.List;

/**
 * Highest belt speed for a material and a belt width (CEMA, recommended maximum belt speeds) [R]; ft/min by in:
 *
 * <pre>
 * grain, free-flowing                            18: 500   24–30: 700   36–42: 800   48–96: 1000
 * coal, damp clay, soft ore, fine stone          18: 400   24–36: 600   42–60: 800   72–96: 1000
 * heavy, hard, sharp ore, coarse stone           18: 350   24–36: 500   over 36: 600
 * </pre>
 *
 * <p>A width between two rows has the speed of the narrower one, and one below all rows that of the narrowest. A belt
 * within 2 % of a row's width belongs to it, as metric widths do to the customary ones that they stand for (600 mm to
 * 24 in, 1200 mm to 48 in) [A].
 *
 * @param rows of every class at least one; those of one class from narrow to wide
 */
public record MaximumBeltSpeed(List<Row> rows) {
    private static final double FOOT_PER_MINUTE = 0.3048 / 60;
    private static final double INCH = 0.0254;
    private static final double NOMINAL = 0.98;
    private static final MaximumBeltSpeed STANDARD = new MaximumBeltSpeed(standardRows());

    /**
     * A row of the table.
     *
     * @param width at which the row begins (m)
     * @param above whether it holds for wider belts only, and not for that width itself
     * @param speed (m/s)
     */
    public record Row(SpeedClass material, double width, boolean above, double speed) {
        private boolean holds(double beltWidth) {
            return above ? beltWidth > width * (2 - NOMINAL) : beltWidth >= width * NOMINAL;
        }
    }

    /** @throws ImpossibleReading {@code speed-table-incomplete} where a class has no row */
    public MaximumBeltSpeed {
        rows = List.copyOf(rows);
        for (SpeedClass material : SpeedClass.values()) {
            if (rows.stream().noneMatch(row -> row.material() == material)) {
                throw new ImpossibleReading("speed-table-incomplete", "/speeds", material.code());
            }
        }
    }

    /** The table above. */
    public static MaximumBeltSpeed standard() {
        return STANDARD;
    }

    /** The speed (m/s) of the table above for a belt of that width (m). */
    public static double of(SpeedClass material, double beltWidth) {
        return STANDARD.forBelt(material, beltWidth);
    }

    /** The speed (m/s) for a belt of that width (m). */
    public double forBelt(SpeedClass material, double beltWidth) {
        List<Row> ofClass = rows.stream().filter(row -> row.material() == material).toList();
        Row last = ofClass.get(0);
        for (Row row : ofClass) {
            last = row.holds(beltWidth) ? row : last;
        }
        return last.speed();
    }

    private static List<Row> standardRows() {
        List<Row> rows = new ArrayList<>();
        rows.addAll(from(SpeedClass.GRAIN_FREE_FLOWING, 18, 500, 24, 700, 36, 800, 48, 1000));
        rows.addAll(from(SpeedClass.COAL_SOFT_ORE_FINE_STONE, 18, 400, 24, 600, 42, 800, 72, 1000));
        rows.addAll(from(SpeedClass.HEAVY_HARD_SHARP_COARSE, 18, 350, 24, 500));
        rows.add(new Row(SpeedClass.HEAVY_HARD_SHARP_COARSE, 36 * INCH, true, 600 * FOOT_PER_MINUTE));
        return rows;
    }

    private static List<Row> from(SpeedClass material, double... inchesAndSpeeds) {
        List<Row> rows = new ArrayList<>();
        for (int i = 0; i < inchesAndSpeeds.length; i += 2) {
            rows.add(new Row(material, inchesAndSpeeds[i] * INCH, false, inchesAndSpeeds[i + 1] * FOOT_PER_MINUTE));
        }
        return rows;
    }
}
