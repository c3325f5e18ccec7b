package bedmark.quantity;

import java.math.BigDecimal;
import java.time.OffsetDateTime;
import java.util.Comparator;
import java.util.Objects;
import java.util.Optional;

/**
 * A number as a person entered it, with its unit and what is known about the reading.
 *
 * @param value               the decimal as entered, trailing zeros kept
 * @param unit                the unit it was entered in
 * @param entered             what was typed, where that was not the decimal itself ({@code 9 1/2})
 * @param standardUncertainty the reading's own standard uncertainty, in {@code unit}, not negative
 * @param quality             the person's mark
 * @param at                  when it was read
 * @param beltState           what the belt did then
 */
public record Quantity(BigDecimal value, Unit unit, Optional<String> entered,
                       Optional<BigDecimal> standardUncertainty, Optional<Quality> quality,
                       Optional<OffsetDateTime> at, Optional<BeltState> beltState) {

    /** Orders quantities of one dimension by size, exactly, whatever their units. */
    public static final Comparator<Quantity> BY_SIZE =
            (one, other) -> one.value.compareTo(one.unit == other.unit ? other.value
                    : one.unit.convert(other.value, other.unit));

    public Quantity {
        Objects.requireNonNull(value);
        Objects.requireNonNull(unit);
        Objects.requireNonNull(entered);
        Objects.requireNonNull(standardUncertainty);
        Objects.requireNonNull(quality);
        Objects.requireNonNull(at);
        Objects.requireNonNull(beltState);
        if (standardUncertainty.isPresent() && standardUncertainty.get().signum() < 0) {
            throw new IllegalArgumentException("a standard uncertainty is not negative");
        }
    }

    /** A bare quantity. */
    public static Quantity of(BigDecimal value, Unit unit) {
        return new Quantity(value, unit, Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty(),
                Optional.empty());
    }

    /** A bare quantity from decimal digits. */
    public static Quantity of(String value, Unit unit) {
        return of(new BigDecimal(value), unit);
    }

    public Quantity enteredAs(String text) {
        return new Quantity(value, unit, Optional.of(text), standardUncertainty, quality, at, beltState);
    }

    public Quantity withQuality(Quality mark) {
        return new Quantity(value, unit, entered, standardUncertainty, Optional.of(mark), at, beltState);
    }

    public Quantity readAt(OffsetDateTime time) {
        return new Quantity(value, unit, entered, standardUncertainty, quality, Optional.of(time), beltState);
    }

    public Quantity withBeltState(BeltState state) {
        return new Quantity(value, unit, entered, standardUncertainty, quality, at, Optional.of(state));
    }

    /** The number in the SI unit of its dimension. */
    public double si() {
        return unit.toSi(value);
    }

    /** The reading's own standard uncertainty in the SI unit of its dimension. */
    public Optional<Double> standardUncertaintySi() {
        return standardUncertainty.map(unit::toSi);
    }
}
