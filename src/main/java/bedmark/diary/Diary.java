package bedmark.diary;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.time.Clock;
import java.time.OffsetDateTime;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * A small text file in the store's folder that says what the program did: times, fixed words and counts, and of a
 * failure the classes and lines that it went through. What a person answered, wrote or is called never gets in: there is
 * no way to hand over a text. It is bounded: at {@value #LARGEST} bytes it becomes the earlier half, and the half before
 * that is dropped. The diary never stands in the way of the work: what cannot be noted is let go.
 */
public final class Diary {
    /** The size at which a diary becomes the earlier one (bytes). */
    static final long LARGEST = 256 * 1024;

    private static final String NAME = "diary.txt";
    private static final String EARLIER = "diary-earlier.txt";
    private static final int FRAMES = 40;
    private static final int CAUSES = 5;

    private final Path folder;
    private final Clock clock;

    /**
     * A diary in a folder.
     *
     * @param folder the store's folder
     */
    public Diary(Path folder, Clock clock) {
        this.folder = folder;
        this.clock = clock;
    }

    /** Notes what happened, with counts. */
    public void note(Happening happening, Map<String, Long> counts) {
        StringBuilder line = new StringBuilder(happening.word());
        new TreeMap<>(counts).forEach((what, count) -> line.append(' ').append(what).append('=').append(count));
        append(List.of(stamped(line.toString())));
    }

    /** Notes a failure by its classes and places; its message may hold what a person wrote and stays out. */
    public void note(Throwable failure) {
        List<String> lines = new ArrayList<>();
        lines.add(stamped(Happening.FAILED.word() + " " + failure.getClass().getName()));
        int depth = 0;
        for (Throwable cause = failure; cause != null && depth < CAUSES; cause = cause.getCause(), depth++) {
            if (depth > 0) {
                lines.add("  because " + cause.getClass().getName());
            }
            StackTraceElement[] frames = cause.getStackTrace();
            for (int i = 0; i < Math.min(frames.length, FRAMES); i++) {
                lines.add("    " + frames[i].getClassName() + "." + frames[i].getMethodName() + ":"
                        + frames[i].getLineNumber());
            }
        }
        append(lines);
    }

    /** What is noted in a store's folder, earliest first; empty where nothing is. */
    public static List<String> read(Path folder) {
        List<String> lines = new ArrayList<>();
        for (String name : List.of(EARLIER, NAME)) {
            Path file = folder.resolve(name);
            if (Files.isRegularFile(file)) {
                try {
                    lines.addAll(Files.readAllLines(file, StandardCharsets.UTF_8));
                } catch (IOException e) {
                    throw new UncheckedIOException(e);
                }
            }
        }
        return lines;
    }

    private String stamped(String text) {
        return OffsetDateTime.now(clock).truncatedTo(ChronoUnit.SECONDS) + " " + text;
    }

    private synchronized void append(List<String> lines) {
        try {
            Path file = folder.resolve(NAME);
            if (Files.exists(file) && Files.size(file) >= LARGEST) {
                Files.move(file, folder.resolve(EARLIER), StandardCopyOption.REPLACE_EXISTING);
            }
            Files.write(file, lines, StandardCharsets.UTF_8, StandardOpenOption.CREATE, StandardOpenOption.APPEND);
        } catch (IOException e) {
            // A full or read-only medium is said where it matters, by the journal.
            return;
        }
    }
}
