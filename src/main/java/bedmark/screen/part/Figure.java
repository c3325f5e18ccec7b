package bedmark.screen.part;

import java.util.Objects;

/**
 * One of the numbers of a verdict.
 *
 * @param caption what it is
 * @param value   the number, formatted
 * @param detail  its uncertainty and unit, formatted
 */
public record Figure(String caption, String value, String detail) {
    public Figure {
        Objects.requireNonNull(caption);
        Objects.requireNonNull(value);
        Objects.requireNonNull(detail);
    }
}
