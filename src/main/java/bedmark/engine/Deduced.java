package bedmark.engine;

import java.util.ArrayList;
import java.util.List;
import java.util.NoSuchElementException;
import java.util.Optional;
import java.util.function.BiFunction;
import java.util.function.Function;
import java.util.function.Supplier;
import java.util.function.UnaryOperator;

/**
 * What follows from readings: a value, or the places of the readings that it still waits for. A formula is applied only
 * where all of its inputs are there, so that nothing is ever guessed, and what is missing is named by the very
 * computation that lacks it.
 */
final class Deduced<T> {
    private static final Deduced<?> NOTHING = new Deduced<>(null, List.of());

    /** There are hundreds of these in one assessment: an absent value is null in here, and nowhere else. */
    private final T value;
    private final List<String> missing;

    private Deduced(T value, List<String> missing) {
        this.value = value;
        this.missing = missing;
    }

    static <T> Deduced<T> known(T value) {
        return new Deduced<>(value, List.of());
    }

    static <T> Deduced<T> waitingFor(String place) {
        return new Deduced<>(null, List.of(place));
    }

    /** Something that has no value, and that no further reading would give one. */
    @SuppressWarnings("unchecked")
    static <T> Deduced<T> nothing() {
        return (Deduced<T>) NOTHING;
    }

    /** What may be there, and waits for nothing where it is not. */
    static <T> Deduced<T> ofOptional(Optional<T> value) {
        return value.map(Deduced::known).orElseGet(Deduced::nothing);
    }

    /** A formula of three numbers. */
    interface OfThree<A, B, C, R> {
        R apply(A a, B b, C c);
    }

    /** A formula of four numbers. */
    interface OfFour<A, B, C, D, R> {
        R apply(A a, B b, C c, D d);
    }

    /** The formula's value, where its input is known. */
    static <A, R> Deduced<R> from(Deduced<A> a, Function<A, R> formula) {
        return a.value == null ? waitingFor(a) : known(formula.apply(a.value));
    }

    /** The formula's value, where both inputs are known. */
    static <A, B, R> Deduced<R> from(Deduced<A> a, Deduced<B> b, BiFunction<A, B, R> formula) {
        return a.value == null || b.value == null ? waitingFor(a, b) : known(formula.apply(a.value, b.value));
    }

    /** The formula's value, where all inputs are known. */
    static <A, B, C, R> Deduced<R> from(Deduced<A> a, Deduced<B> b, Deduced<C> c, OfThree<A, B, C, R> formula) {
        return a.value == null || b.value == null || c.value == null ? waitingFor(a, b, c)
                : known(formula.apply(a.value, b.value, c.value));
    }

    /** The formula's value, where all inputs are known. */
    static <A, B, C, D, R> Deduced<R> from(Deduced<A> a, Deduced<B> b, Deduced<C> c, Deduced<D> d,
            OfFour<A, B, C, D, R> formula) {
        return a.value == null || b.value == null || c.value == null || d.value == null ? waitingFor(a, b, c, d)
                : known(formula.apply(a.value, b.value, c.value, d.value));
    }

    /** The formula's value, where all of its inputs are known, however many they are. */
    static <R> Deduced<R> fromAll(Supplier<R> formula, Deduced<?>... inputs) {
        for (Deduced<?> input : inputs) {
            if (input.value == null) {
                return waitingFor(inputs);
            }
        }
        return known(formula.get());
    }

    /** What a formula that may have no value within its range gives, where its inputs are known. */
    static <R> Deduced<R> flat(Deduced<Optional<R>> perhaps) {
        return perhaps.value == null ? waitingFor(perhaps) : ofOptional(perhaps.value);
    }

    private static <T> Deduced<T> waitingFor(Deduced<?>... inputs) {
        List<String> waiting = new ArrayList<>();
        for (Deduced<?> input : inputs) {
            for (String place : input.missing) {
                if (!waiting.contains(place)) {
                    waiting.add(place);
                }
            }
        }
        return new Deduced<>(null, waiting);
    }

    boolean isKnown() {
        return value != null;
    }

    Optional<T> value() {
        return Optional.ofNullable(value);
    }

    /** The value, inside a formula whose inputs are known. */
    T get() {
        if (value == null) {
            throw new NoSuchElementException(missing.toString());
        }
        return value;
    }

    List<String> missing() {
        return missing;
    }

    /** This where it is known, else the other where that is known, else what this waits for. */
    Deduced<T> or(Deduced<T> other) {
        return isKnown() || !other.isKnown() ? this : other;
    }

    /** The same with another value, where it is known. */
    Deduced<T> map(UnaryOperator<T> change) {
        if (value == null) {
            return this;
        }
        T changed = change.apply(value);
        return changed == value ? this : known(changed);
    }
}
