package bedmark.screen.pad;

import java.util.Objects;
import java.util.Optional;

/**
 * What the pad offers for one field.
 *
 * @param decimalSign of the locale, a point or a comma
 * @param negative    whether a number below zero makes sense
 * @param fractions   whether quarters of the unit make sense
 * @param steps       the steps up and down
 * @param units       the face of the key that switches the unit
 */
public record PadSetup(char decimalSign, boolean negative, boolean fractions, Optional<Steps> steps,
                       Optional<String> units) {

    /** The faces of the two keys that step. */
    public record Steps(String down, String up) {
        public Steps {
            Objects.requireNonNull(down);
            Objects.requireNonNull(up);
        }
    }

    public PadSetup {
        Objects.requireNonNull(steps);
        Objects.requireNonNull(units);
    }

    /** Whether the field can make use of a key. */
    public boolean offers(PadKey key) {
        return switch (key) {
            case SIGN -> negative;
            case FRACTION -> fractions;
            case STEP_DOWN, STEP_UP -> steps.isPresent();
            case UNIT -> units.isPresent();
            default -> true;
        };
    }
}
