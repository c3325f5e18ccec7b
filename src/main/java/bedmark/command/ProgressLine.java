package bedmark.command;

import java.io.PrintWriter;

/** Progress of long work on a terminal; nothing where standard error goes elsewhere. */
final class ProgressLine implements AutoCloseable {
    private static final int STEPS = 100;

    private final PrintWriter err;
    private final boolean shown;
    private long last = -1;

    ProgressLine(Surroundings surroundings) {
        this.err = surroundings.err();
        this.shown = System.console() != null;
    }

    void at(long done, long total) {
        long step = total <= 0 ? 0 : done * STEPS / total;
        if (shown && step != last) {
            last = step;
            err.print("\r" + step + " %");
            err.flush();
        }
    }

    /** Clears the line, since what comes next is no progress. */
    void done() {
        if (last >= 0) {
            err.print("\r      \r");
            err.flush();
            last = -1;
        }
    }

    @Override
    public void close() {
        done();
    }
}
