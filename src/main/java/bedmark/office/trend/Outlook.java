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
     * @param latest   by the flatter end; nothing where that end never reaches the limit
     */
    record Reached(LocalDate expected, LocalDate earliest, Optional<LocalDate> latest) {
    }
}
