package bedmark.screen.round;

import bedmark.screen.part.RoundTicks;
import bedmark.screen.part.RoundTicks.Tick;
import bedmark.wording.Wording;
import java.util.List;
import java.util.Locale;
import java.util.OptionalInt;
import java.util.stream.IntStream;

/** Puts a round on its strip of ticks. */
public final class Ticks {
    private Ticks() {
    }

    /**
     * Shows the round.
     *
     * @param inHand the transfer point that is worked on; empty for none
     */
    public static void show(RoundTicks strip, List<RoundRow> rows, String inHand, Wording wording) {
        OptionalInt current = IntStream.range(0, rows.size())
                .filter(i -> rows.get(i).transfer().equals(inHand)).findFirst();
        strip.show(rows.stream().map(Ticks::tick).toList(), current);
        long done = rows.stream().filter(row -> row.progress() == RoundRow.Progress.DONE
                || row.progress() == RoundRow.Progress.SKIPPED).count();
        strip.setAccessibleText(wording.text("screen.round.progress", done, rows.size()));
    }

    private static Tick tick(RoundRow row) {
        return switch (row.progress()) {
            case TO_DO, BEGUN -> Tick.TO_DO;
            case SKIPPED -> Tick.SKIPPED;
            case DONE -> row.level().isEmpty() ? Tick.INCOMPLETE
                    : Tick.valueOf(row.level().toUpperCase(Locale.ROOT));
        };
    }
}
