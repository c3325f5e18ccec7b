package bedmark.engine.seal;

import bedmark.engine.uncertainty.Reading;
import java.util.Objects;

/**
 * A stretch of one kind of seal on one side; what touches nothing is a segment too.
 *
 * @param length along the belt (m), positive
 */
public record SealSegment(Side side, SealType type, SealCondition condition, Reading length) {
    public SealSegment {
        Objects.requireNonNull(side);
        Objects.requireNonNull(type);
        Objects.requireNonNull(condition);
        Objects.requireNonNull(length);
    }
}
