package bedmark.screen.office;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/** One row of the register's table: what the register says, and what was typed over it and does not hold yet. */
public final class RegisterLine {
    private final Optional<List<String>> identity;
    private final List<ReadOnlyObjectWrapper<Shown>> cells = new ArrayList<>();

    /**
     * What a cell shows.
     *
     * @param waiting whether it was typed and is not in the register
     */
    public record Shown(String text, boolean waiting) {
    }

    /** @param identity what the row is known by; nothing for one that is new */
    RegisterLine(Optional<List<String>> identity, List<Shown> shown) {
        this.identity = identity;
        shown.forEach(cell -> cells.add(new ReadOnlyObjectWrapper<>(cell)));
    }

    /** What the row is known by; nothing for one that is new. */
    public Optional<List<String>> identity() {
        return identity;
    }

    public ReadOnlyObjectProperty<Shown> cell(int column) {
        return cells.get(column).getReadOnlyProperty();
    }

    /** Shows something else where it differs, so that a cell that is being typed into is left alone. */
    void show(List<Shown> shown) {
        IntStream.range(0, cells.size()).forEach(i -> cells.get(i).set(shown.get(i)));
    }
}
