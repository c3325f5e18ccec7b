package bedmark.engine.bed;

import bedmark.engine.uncertainty.Uncertain;
import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.function.UnaryOperator;

/**
 * The bed along the zone. Between stations the level is linear, before the first and after the last it is constant; the
 * depth at the board is the level where that is positive and 0 elsewhere, and every integral is exact for it:
 *
 * <pre>
 * ∫h² dx over a segment = Δx (h0² + h0 h1 + h1²)/3
 * ∫h  dx                = Δx (h0 + h1)/2
 * </pre>
 *
 * <p>and as {@link Segment} says where the level crosses the board line. The square of the mean depth understates the
 * mean of the square.
 */
public final class Profile {
    private final Uncertain length;
    private final Uncertain[] positions;
    private final Uncertain[] levels;
    /** Without uncertainty the integrals are plain sums. */
    private final boolean certain;

    /**
     * @param length    of the zone (m), positive
     * @param positions of the stations (m), at least one, ascending within 0…length
     * @param levels    at the stations (m)
     */
    public static Profile of(Uncertain length, List<Uncertain> positions, List<Uncertain> levels) {
        return new Profile(length, positions.toArray(Uncertain[]::new), levels.toArray(Uncertain[]::new));
    }

    private Profile(Uncertain length, Uncertain[] positions, Uncertain[] levels) {
        this.length = length;
        this.positions = positions;
        this.levels = levels;
        certain = length.isCertain() && areCertain(positions) && areCertain(levels);
    }

    private static boolean areCertain(Uncertain[] numbers) {
        for (Uncertain number : numbers) {
            if (!number.isCertain()) {
                return false;
            }
        }
        return true;
    }

    public Uncertain length() {
        return length;
    }

    public int stations() {
        return levels.length;
    }

    /** Position of a station (m). */
    public Uncertain position(int station) {
        return positions[station];
    }

    /** Depth at the board at a station (m). */
    public Uncertain depth(int station) {
        return levels[station].max(Uncertain.ZERO);
    }

    /** Level at a station (m). */
    public Uncertain level(int station) {
        return levels[station];
    }

    /** The same stations with other levels. */
    public Profile map(UnaryOperator<Uncertain> change) {
        Uncertain[] changed = new Uncertain[levels.length];
        for (int i = 0; i < changed.length; i++) {
            changed[i] = change.apply(levels[i]);
        }
        return new Profile(length, positions, changed);
    }

    /** The same profile without uncertainty. */
    public Profile certain() {
        Uncertain[] places = new Uncertain[positions.length];
        for (int i = 0; i < places.length; i++) {
            places[i] = positions[i].certain();
        }
        return new Profile(length.certain(), places, levels).map(Uncertain::certain);
    }

    /** The first part of the zone alone. */
    public Profile upTo(Uncertain shorter) {
        int kept = 0;
        while (kept < levels.length && positions[kept].value() < shorter.value()) {
            kept++;
        }
        Uncertain[] places = Arrays.copyOf(positions, kept + 1);
        Uncertain[] remaining = Arrays.copyOf(levels, kept + 1);
        places[kept] = shorter;
        remaining[kept] = levelAt(shorter);
        return new Profile(shorter, places, remaining);
    }

    /** ∫h² dx over the zone (m³). */
    public Uncertain integralOfSquare() {
        return integral(Segment.SQUARE);
    }

    /** ∫h dx over the zone (m²). */
    public Uncertain integral() {
        return integral(Segment.DEPTH);
    }

    /** Mean level over the zone (m), from which the mean area follows. */
    public Uncertain meanLevel() {
        return integral(Segment.LEVEL).over(length);
    }

    /** Mean of the square of the depth (m²) of the same stations with other levels (m), as a plain number. */
    public double meanSquare(DoubleUnaryOperator change) {
        return integral(Segment.SQUARE, change) / length.value();
    }

    /**
     * The greatest depth at the board (m), with the derivatives of the station where it lies; of several alike those of
     * the last. That one of several may turn out the deepest is not in them: see {@link #isContested}.
     */
    public Uncertain deepest() {
        Uncertain most = Uncertain.ZERO;
        for (Uncertain level : levels) {
            most = level.max(most);
        }
        return most;
    }

    /** Level (m) where the last quarter of the zone begins. */
    public Uncertain levelAtLastQuarter() {
        return levelAt(length.times(0.75));
    }

    /** Greatest less least depth over the last quarter of the zone (m). */
    public Uncertain changeOverLastQuarter() {
        Uncertain start = length.times(0.75);
        Uncertain least = levelAt(start).max(Uncertain.ZERO);
        Uncertain most = least;
        for (int i = 0; i < levels.length; i++) {
            if (positions[i].value() > start.value()) {
                least = least.min(depth(i));
                most = most.max(depth(i));
            }
        }
        return most.minus(least);
    }

    private Uncertain levelAt(Uncertain position) {
        int last = levels.length - 1;
        if (position.value() >= positions[last].value()) {
            return levels[last];
        }
        int next = 0;
        while (positions[next].value() < position.value()) {
            next++;
        }
        if (next == 0) {
            return levels[0];
        }
        Uncertain from = positions[next - 1];
        Uncertain share = position.minus(from).over(positions[next].minus(from));
        return levels[next - 1].plus(share.times(levels[next].minus(levels[next - 1])));
    }

    /** The integral with its derivatives by length, positions and levels. */
    private Uncertain integral(Segment.Mean mean) {
        double value = integral(mean, level -> level);
        if (certain) {
            return Uncertain.exact(value);
        }
        int last = levels.length - 1;
        Uncertain[] numbers = new Uncertain[2 * levels.length + 1];
        double[] slopes = new double[numbers.length];
        numbers[2 * levels.length] = length;
        slopes[2 * levels.length] = mean.of(levels[last].value(), levels[last].value());
        for (int i = 0; i <= last; i++) {
            double level = levels[i].value();
            double before = i == 0 ? level : levels[i - 1].value();
            double after = i == last ? level : levels[i + 1].value();
            double runBefore = positions[i].value() - (i == 0 ? 0 : positions[i - 1].value());
            double runAfter = (i == last ? length : positions[i + 1]).value() - positions[i].value();
            numbers[2 * i] = positions[i];
            slopes[2 * i] = mean.of(before, level) - mean.of(level, after);
            numbers[2 * i + 1] = levels[i];
            slopes[2 * i + 1] = runBefore * (i == 0 ? 2 : 1) * mean.slope(level, before)
                    + runAfter * (i == last ? 2 : 1) * mean.slope(level, after);
        }
        return Uncertain.composed(value, numbers, slopes);
    }

    /**
     * ∫h² dx (m³) of plain numbers.
     *
     * @param positions ascending within 0…length
     */
    public static double integralOfSquare(double length, double[] positions, double[] levels) {
        int last = levels.length - 1;
        double sum = positions[0] * Segment.SQUARE.of(levels[0], levels[0]);
        for (int i = 1; i <= last; i++) {
            sum += (positions[i] - positions[i - 1]) * Segment.SQUARE.of(levels[i - 1], levels[i]);
        }
        return sum + (length - positions[last]) * Segment.SQUARE.of(levels[last], levels[last]);
    }

    /**
     * Whether a second station is so nearly as deep as the deepest that either may be, within twice the uncertainties
     * of the two.
     */
    public boolean isContested(double[] uncertainties) {
        int deepest = 0;
        for (int i = 1; i < levels.length; i++) {
            deepest = levels[i].value() > levels[deepest].value() ? i : deepest;
        }
        for (int i = 0; i < levels.length; i++) {
            double apart = levels[deepest].value() - levels[i].value();
            if (i != deepest && apart < 2 * Math.hypot(uncertainties[i], uncertainties[deepest])) {
                return true;
            }
        }
        return false;
    }

    private double integral(Segment.Mean mean, DoubleUnaryOperator change) {
        int last = levels.length - 1;
        double before = change.applyAsDouble(levels[0].value());
        double sum = positions[0].value() * mean.of(before, before);
        for (int i = 1; i <= last; i++) {
            double level = change.applyAsDouble(levels[i].value());
            sum += (positions[i].value() - positions[i - 1].value()) * mean.of(before, level);
            before = level;
        }
        return sum + (length.value() - positions[last].value()) * mean.of(before, before);
    }
}
