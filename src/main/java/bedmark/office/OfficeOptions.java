package bedmark.office;

import bedmark.journal.FileLayer;
import bedmark.journal.Progress;
import bedmark.pack.PackLimits;
import java.time.Clock;
import java.util.Objects;

/**
 * How an office store is opened.
 *
 * @param clock    the office's time, with its zone
 * @param files    the file layer under journal and packs
 * @param progress told when the tables are made anew
 * @param name     the office's name, used when the store is made
 * @param limits   how large a pack may be
 */
public record OfficeOptions(Clock clock, FileLayer files, Progress progress, String name, PackLimits limits) {
    public OfficeOptions {
        Objects.requireNonNull(clock);
        Objects.requireNonNull(files);
        Objects.requireNonNull(progress);
        Objects.requireNonNull(name);
        Objects.requireNonNull(limits);
    }

    /** This machine's disk, no progress, the standard limits. */
    public static OfficeOptions of(Clock clock) {
        return new OfficeOptions(clock, FileLayer.disk(), Progress.NONE, "", PackLimits.STANDARD);
    }

    public OfficeOptions withProgress(Progress other) {
        return new OfficeOptions(clock, files, other, name, limits);
    }

    public OfficeOptions withFiles(FileLayer other) {
        return new OfficeOptions(clock, other, progress, name, limits);
    }
}
