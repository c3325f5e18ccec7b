package bedmark.engine.bed;

import bedmark.engine.uncertainty.Uncertain;
import java.util.ArrayList;
import java.util.List;
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
 * <p>and, where the level falls from p to −n within the segment, {@code Δx p³/(3 (p + n))} and
 * {@code Δx p²/(2 (p + n))} [D]. The square of the mean depth understates the mean of the square.
 */
public final class Profile {
    private final Uncertain length;
    private final List<Uncertain> positions;
    private final List<Uncertain> levels;

    /**
     * @param length    of the zone (m), positive
     * @param positions of the stations (m), at least one, ascending within 0…length
     * @param levels    at the stations (m)
     */
    public Profile(Uncertain length, List<Uncertain> positions, List<Uncertain> levels) {
        this.length = length;
        this.positions = List.copyOf(positions);
        this.levels = List.copyOf(levels);
    }

    public Uncertain length() {
        return length;
    }

    public int stations() {
        return levels.size();
    }

    /** Position of a station (m). */
    public Uncertain position(int station) {
        return positions.get(station);
    }

    /** Depth at the board at a station (m). */
    public Uncertain depth(int station) {
        return levels.get(station).max(Uncertain.ZERO);
    }

    /** Level at a station (m). */
    public Uncertain level(int station) {
        return levels.get(station);
    }

    /** The same stations with other levels. */
    public Profile map(UnaryOperator<Uncertain> change) {
        return new Profile(length, positions, levels.stream().map(change).toList());
    }

    /** The first part of the zone alone. */
    public Profile upTo(Uncertain shorter) {
        List<Uncertain> places = new ArrayList<>();
        List<Uncertain> kept = new ArrayList<>();
        for (int i = 0; i < levels.size() && positions.get(i).value() < shorter.value(); i++) {
            places.add(positions.get(i));
            kept.add(levels.get(i));
        }
        places.add(shorter);
        kept.add(levelAt(shorter));
        return new Profile(shorter, places, kept);
    }

    /** ∫h² dx over the zone (m³). */
    public Uncertain integralOfSquare() {
        return integral(level -> level.max(Uncertain.ZERO).square(), Profile::squareOverSegment);
    }

    /** ∫h dx over the zone (m²). */
    public Uncertain integral() {
        return integral(level -> level.max(Uncertain.ZERO), Profile::depthOverSegment);
    }

    /** Mean level over the zone (m), from which the mean area follows. */
    public Uncertain meanLevel() {
        return integral(UnaryOperator.identity(), (first, second) -> first.plus(second).over(2)).over(length);
    }

    /** The greatest depth at the board (m). */
    public Uncertain deepest() {
        return levels.stream().reduce(Uncertain.ZERO, (most, level) -> level.max(most));
    }

    /** Greatest less least depth over the last quarter of the zone (m). */
    public Uncertain changeOverLastQuarter() {
        Uncertain start = length.times(0.75);
        Uncertain least = levelAt(start).max(Uncertain.ZERO);
        Uncertain most = least;
        for (int i = 0; i < levels.size(); i++) {
            if (positions.get(i).value() > start.value()) {
                least = least.min(depth(i));
                most = most.max(depth(i));
            }
        }
        return most.minus(least);
    }

    private Uncertain levelAt(Uncertain position) {
        int last = levels.size() - 1;
        if (position.value() >= positions.get(last).value()) {
            return levels.get(last);
        }
        int next = 0;
        while (positions.get(next).value() < position.value()) {
            next++;
        }
        if (next == 0) {
            return levels.get(0);
        }
        Uncertain from = positions.get(next - 1);
        Uncertain share = position.minus(from).over(positions.get(next).minus(from));
        return levels.get(next - 1).plus(share.times(levels.get(next).minus(levels.get(next - 1))));
    }

    private Uncertain integral(UnaryOperator<Uncertain> constant, Mean mean) {
        int last = levels.size() - 1;
        Uncertain sum = positions.get(0).times(constant.apply(levels.get(0)));
        for (int i = 0; i < last; i++) {
            Uncertain run = positions.get(i + 1).minus(positions.get(i));
            sum = sum.plus(run.times(mean.of(levels.get(i), levels.get(i + 1))));
        }
        return sum.plus(length.minus(positions.get(last)).times(constant.apply(levels.get(last))));
    }

    private static Uncertain squareOverSegment(Uncertain first, Uncertain second) {
        if (first.value() >= 0 && second.value() >= 0) {
            return first.square().plus(first.times(second)).plus(second.square()).over(3);
        }
        Uncertain high = first.max(second);
        return high.value() <= 0 ? Uncertain.ZERO
                : high.square().times(high).over(high.minus(first.min(second)).times(3));
    }

    private static Uncertain depthOverSegment(Uncertain first, Uncertain second) {
        if (first.value() >= 0 && second.value() >= 0) {
            return first.plus(second).over(2);
        }
        Uncertain high = first.max(second);
        return high.value() <= 0 ? Uncertain.ZERO : high.square().over(high.minus(first.min(second)).times(2));
    }

    /** The mean of something over a segment, from the levels at its ends. */
    private interface Mean {
        Uncertain of(Uncertain first, Uncertain second);
    }
}
