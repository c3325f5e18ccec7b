package bedmark.screen.pad;

import java.util.Objects;

/** What the person wants of the field in hand. */
public sealed interface PadCommand {

    /**
     * The text of the field changed.
     *
     * @param text digits with the locale's decimal sign, a leading {@code -}, or a fraction as in {@code 9 1/2}; empty
     *             where everything was taken away
     */
    record Typed(String text) implements PadCommand {
        public Typed {
            Objects.requireNonNull(text);
        }
    }

    /**
     * One step up or down; who knows the number answers with {@link PadModel#take}.
     *
     * @param direction 1 or −1
     */
    record Stepped(int direction) implements PadCommand {
    }

    /** The other unit. */
    record UnitSwitched() implements PadCommand {
    }

    /** The last entry back. */
    record Undone() implements PadCommand {
    }

    /** What happened to the field so far. */
    record HistoryAsked() implements PadCommand {
    }

    /** The field before. */
    record WentBack() implements PadCommand {
    }

    /** The next field. */
    record WentOn() implements PadCommand {
    }
}
