package bedmark.quantity;

import java.math.BigDecimal;
import java.util.Objects;
import java.util.Optional;

/** What came of the number that a person typed. */
public sealed interface TypedNumber {

    /**
     * A number.
     *
     * @param value   the exact decimal
     * @param entered the typing, where that was not the decimal itself but a fraction
     */
    record Accepted(BigDecimal value, Optional<String> entered) implements TypedNumber {
        public Accepted {
            Objects.requireNonNull(value);
            Objects.requireNonNull(entered);
        }

        /** The number in a unit, as a bare quantity. */
        public Quantity in(Unit unit) {
            Quantity bare = Quantity.of(value, unit);
            return entered.map(bare::enteredAs).orElse(bare);
        }
    }

    /** No number, or not one yet; the words are in the bundle {@code bedmark.words.entry} under the reason's code. */
    record Rejected(Reason reason) implements TypedNumber {
    }

    /** Why a typing is no number. */
    enum Reason {
        /** Nothing was typed. */
        EMPTY("empty"),
        /** A fraction, a sign or a decimal sign waits for digits. */
        UNFINISHED("unfinished"),
        /** Two decimal signs: which one is meant is not guessed. */
        SECOND_DECIMAL_SIGN("second-decimal-sign"),
        /** A comma where the locale writes a point: thousands or decimals are not guessed. */
        COMMA("comma"),
        /** A space between digits that is no fraction. */
        SPACE("space"),
        /** {@code 1e3}. */
        EXPONENT("exponent"),
        /** A letter or another sign that numbers don't have. */
        FOREIGN_SIGN("foreign-sign"),
        /** An inch mark beside another unit. */
        INCH_MARK("inch-mark"),
        /** A fraction below zero's line, above one beside a whole number, or after a decimal. */
        FRACTION("fraction"),
        /** A fraction that no decimal holds exactly, such as a third. */
        ENDLESS_FRACTION("endless-fraction"),
        /** More characters than any reading has. */
        TOO_LONG("too-long");

        private final String code;

        Reason(String code) {
            this.code = code;
        }

        /** The word under which its sentence is found. */
        public String code() {
            return code;
        }
    }
}
