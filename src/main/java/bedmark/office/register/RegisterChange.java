package bedmark.office.register;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;

/**
 * A change that a person makes of one row of a register.
 *
 * @param list  the list
 * @param row   what the row is known by ({@link RegisterGrid#identity}); nothing for a new one
 * @param cells the texts of the cells that were typed, by key; an empty one empties what it stands for
 * @param removal whether the row is taken away
 */
public record RegisterChange(String list, Optional<List<String>> row, Map<String, String> cells, boolean removal) {
    public RegisterChange {
        Objects.requireNonNull(list);
        Objects.requireNonNull(row);
        cells = Map.copyOf(cells);
    }

    public RegisterChange(String list, Optional<List<String>> row, Map<String, String> cells) {
        this(list, row, cells, false);
    }

    /** Takes a row away. */
    public static RegisterChange removal(String list, List<String> row) {
        return new RegisterChange(list, Optional.of(row), Map.of(), true);
    }
}
