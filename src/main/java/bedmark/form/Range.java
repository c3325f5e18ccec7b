package bedmark.form;

import java.util.Comparator;
import java.util.Optional;

/**
 * A range of numbers or quantities; an absent end is open.
 *
 * @param low      the lower end
 * @param excluded whether the lower end itself lies outside: a length is above zero
 * @param high     the upper end, inside the range
 */
public record Range<T>(Optional<T> low, boolean excluded, Optional<T> high) {

    /** The range without ends. */
    public static <T> Range<T> open() {
        return new Range<>(Optional.empty(), false, Optional.empty());
    }

    public static <T> Range<T> of(T low, T high) {
        return new Range<>(Optional.of(low), false, Optional.of(high));
    }

    public boolean isUnder(T value, Comparator<T> order) {
        return low.map(end -> order.compare(value, end)).filter(sign -> sign < 0 || excluded && sign == 0).isPresent();
    }

    public boolean isOver(T value, Comparator<T> order) {
        return high.filter(end -> order.compare(value, end) > 0).isPresent();
    }

    /** Whether every value of {@code inner} lies in this range, as far as both have ends. */
    public boolean encloses(Range<T> inner, Comparator<T> order) {
        boolean lowFits = inner.low.filter(end -> isUnder(end, order) || isOver(end, order)).isEmpty();
        return lowFits && inner.high.filter(end -> isUnder(end, order) || isOver(end, order)).isEmpty();
    }

    /** Whether the ends stand the right way round. */
    public boolean isOrdered(Comparator<T> order) {
        return low.isEmpty() || high.isEmpty() || order.compare(low.get(), high.get()) < 0;
    }
}
