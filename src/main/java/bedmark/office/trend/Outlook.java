package bedmark.office.trend;

import java.time.LocalDate;
import java.util.Optional;

/** What the observations of one regime say about what comes. */
public sealed interface Outlook {

    /**
     * Too few surveys to say.
     *
     * @param surveys since the last change
     * @param needed  to say anything
     */
    record TooFew(int surveys, int needed) implements Outlook {
    }

    /** Enough surveys, and no trend in them that chance would not bring as well. */
    record Level(TheilSen line, MannKendall test) implements Outlook {
    }

    /**
     * A trend.
     *
     * @param near       when the near limit is reached
     * @param overloaded when the overloaded limit is reached
     */
    record Trend(TheilSen line, MannKendall test, Optional<Reached> near, Optional<Reached> overloaded)
            implements Outlook {
    }

    /**
     * When a limit is reached if the line goes on.
     *
     * @param expected by the line itself
     * @param earliest by the steeper end of the slope's interval
     * @param latest   by the flatter end
     */
    record Reached(When expected, When earliest, When latest) {
    }

    /** When one line meets a limit. */
    sealed interface When {
        /** Where the line says a day that is worth naming. */
        default Optional<LocalDate> day() {
            return this instanceof On on ? Optional.of(on.date) : Optional.empty();
        }
    }

    /** On a day within the ten years after the last survey. */
    record On(LocalDate date) implements When {
    }

    /** Later than that: a day would say no more than that it is far away. */
    record Beyond() implements When {
    }

    /** The line does not rise. */
    record Never() implements When {
    }
}
