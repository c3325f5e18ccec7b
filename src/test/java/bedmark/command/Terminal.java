package bedmark.command;

import bedmark.words.Words;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.Locale;
import java.util.Optional;

/** Runs a command as a terminal does, and keeps what it printed. */
public final class Terminal {

    /** What came of a command. */
    public record Result(int code, String out, String err) {
    }

    private Terminal() {
    }

    /** Runs a command where there is no display. */
    public static Result run(String... arguments) {
        return run(file -> false, arguments);
    }

    /** Runs a command where files are shown in a way of the test's. */
    static Result run(Surroundings.Showing showing, String... arguments) {
        StringWriter out = new StringWriter();
        StringWriter err = new StringWriter();
        int code = BedmarkCommand.run(new Surroundings(new PrintWriter(out), new PrintWriter(err),
                Optional.of(Path.of("").toAbsolutePath()),
                Clock.fixed(Instant.parse("2026-10-01T09:42:07Z"), ZoneOffset.UTC), new Words(Locale.ENGLISH),
                (store, samples, load) -> false, showing), arguments);
        return new Result(code, out.toString(), err.toString());
    }
}
