package bedmark.index;

import bedmark.journal.FileLayer;
import bedmark.journal.Progress;
import java.time.Clock;
import java.util.Objects;

/**
 * How a store is opened.
 *
 * @param clock        the time that entries carry, with its zone
 * @param files        the file layer under journal, photos and device identity
 * @param progress     told when the index is rebuilt or catches up
 * @param deviceName   the tablet's name, used when the store is made
 * @param levels       judges surveys for lists
 * @param segmentBytes the length at which a journal segment is sealed, at least 1024
 */
public record StoreOptions(Clock clock, FileLayer files, Progress progress, String deviceName, LevelOf levels,
                           long segmentBytes) {
    private static final long SEGMENT_BYTES = 64L << 20;

    public StoreOptions {
        Objects.requireNonNull(clock);
        Objects.requireNonNull(files);
        Objects.requireNonNull(progress);
        Objects.requireNonNull(deviceName);
        Objects.requireNonNull(levels);
        if (segmentBytes < 1024) {
            throw new IllegalArgumentException("a segment holds at least 1024 bytes");
        }
    }

    /** The tablet's own clock and disk, no progress, no levels. */
    public static StoreOptions of(String deviceName) {
        return new StoreOptions(Clock.systemDefaultZone(), FileLayer.disk(), Progress.NONE, deviceName, LevelOf.NONE,
                SEGMENT_BYTES);
    }

    public StoreOptions withClock(Clock other) {
        return new StoreOptions(other, files, progress, deviceName, levels, segmentBytes);
    }

    public StoreOptions withFiles(FileLayer other) {
        return new StoreOptions(clock, other, progress, deviceName, levels, segmentBytes);
    }

    public StoreOptions withProgress(Progress other) {
        return new StoreOptions(clock, files, other, deviceName, levels, segmentBytes);
    }

    public StoreOptions withLevels(LevelOf other) {
        return new StoreOptions(clock, files, progress, deviceName, other, segmentBytes);
    }

    public StoreOptions withSegmentBytes(long other) {
        return new StoreOptions(clock, files, progress, deviceName, levels, other);
    }
}
