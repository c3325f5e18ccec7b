package bedmark.screen;

import java.util.Optional;
import java.util.function.Supplier;

/** What takes time to make, and is made when it is first asked for, by any thread; what failed is tried again. */
final class Later<T> {
    private final Supplier<T> making;
    private Optional<T> made = Optional.empty();

    Later(Supplier<T> making) {
        this.making = making;
    }

    synchronized T get() {
        if (made.isEmpty()) {
            made = Optional.of(making.get());
        }
        return made.get();
    }
}
