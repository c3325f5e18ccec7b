package bedmark.engine;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;

/**
 * What follows from readings: a value, or the places of the readings that it still waits for. A formula is applied only
 * where all of its inputs are there, so that nothing is ever guessed, and what is missing is named by the very
 * computation that lacks it.
 */
final class Deduced<T> {
    private final Optional<T> value;
    private final List<String> missing;

    private Deduced(Optional<T> value, List<String> missing) {
        this.value = value;
        this.missing = missing;
    }

    static <T> Deduced<T> known(T value) {
        return new Deduced<>(Optional.of(value), List.of());
    }

    static <T> Deduced<T> waitingFor(String place) {
        return new Deduced<>(Optional.empty(), List.of(place));
    }

    /** Something that has no value, and that no further reading would give one. */
    static <T> Deduced<T> nothing() {
        return new Deduced<>(Optional.empty(), List.of());
    }

    /** The formula's value, where all inputs are known. */
    static <T> Deduced<T> from(Supplier<T> formula, Deduced<?>... inputs) {
        return perhaps(() -> Optional.of(formula.get()), inputs);
    }

    /** The same for a formula that may have no value within its range. */
    static <T> Deduced<T> perhaps(Supplier<Optional<T>> formula, Deduced<?>... inputs) {
        boolean allKnown = true;
        for (Deduced<?> input : inputs) {
            allKnown &= input.isKnown();
        }
        if (allKnown) {
            return new Deduced<>(formula.get(), List.of());
        }
        List<String> waiting = new ArrayList<>();
        for (Deduced<?> input : inputs) {
            input.missing.stream().filter(place -> !waiting.contains(place)).forEach(waiting::add);
        }
        return new Deduced<>(Optional.empty(), waiting);
    }

    boolean isKnown() {
        return value.isPresent();
    }

    Optional<T> value() {
        return value;
    }

    /** The value, inside a formula whose inputs are known. */
    T get() {
        return value.orElseThrow();
    }

    List<String> missing() {
        return missing;
    }

    /** This where it is known, else the other where that is known, else what this waits for. */
    Deduced<T> or(Deduced<T> other) {
        return isKnown() || !other.isKnown() ? this : other;
    }
}
