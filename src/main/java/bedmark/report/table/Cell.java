package bedmark.report.table;

import java.math.BigDecimal;
import java.time.OffsetDateTime;
import java.util.Optional;
import java.util.OptionalDouble;

/** What stands in a cell of a table. */
public sealed interface Cell {
    /** Nothing is known. */
    Cell EMPTY = new Empty();

    /** Nothing is known. */
    record Empty() implements Cell {
    }

    /** Words, a name, a code. */
    record Text(String value) implements Cell {
    }

    /** A finite number in the unit of its column. */
    record Number(BigDecimal value) implements Cell {
    }

    /** Yes or no. */
    record Flag(boolean value) implements Cell {
    }

    /** A moment, with the offset of who was there. */
    record Moment(OffsetDateTime value) implements Cell {
    }

    static Cell text(String value) {
        return value.isEmpty() ? EMPTY : new Text(value);
    }

    static Cell text(Optional<String> value) {
        return value.map(Cell::text).orElse(EMPTY);
    }

    static Cell number(long value) {
        return new Number(BigDecimal.valueOf(value));
    }

    static Cell number(OptionalDouble value) {
        return value.isPresent() ? new Number(BigDecimal.valueOf(value.getAsDouble())) : EMPTY;
    }

    static Cell moment(Optional<OffsetDateTime> value) {
        return value.<Cell>map(Moment::new).orElse(EMPTY);
    }
}
