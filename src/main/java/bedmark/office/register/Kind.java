package bedmark.office.register;

import bedmark.quantity.Dimension;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;

/** What a column of a register holds. */
sealed interface Kind {

    /** A name that is unique among its kind. */
    record Id() implements Kind {
    }

    /** Any text. */
    record Plain() implements Kind {
    }

    /** The id of a row of another list. */
    record Reference(String list) implements Kind {
    }

    /**
     * A plain number.
     *
     * @param above whether the least value itself is refused
     */
    record Number(BigDecimal least, boolean above, Optional<BigDecimal> most) implements Kind {
    }

    /** Which signs a quantity may have. */
    enum Sign {
        ANY, NOT_NEGATIVE, POSITIVE
    }

    /** @param other what may stand there too, such as a share in percent */
    record Measured(Dimension dimension, Sign sign, Optional<Dimension> other) implements Kind {
    }

    /** Yes or no. */
    record YesNo() implements Kind {
    }

    /** One of some words. */
    record Word(List<String> words) implements Kind {
    }
}
