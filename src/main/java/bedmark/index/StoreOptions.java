package bedmark.index;

import bedmark.journal.FileLayer;
import bedmark.journal.Progress;
import bedmark.vault.Passphrase;
import java.time.Clock;
import java.util.Objects;
import java.util.Optional;

/**
 * How a store is opened.
 *
 * @param clock        the time that entries carry, with its zone
 * @param files        the file layer under journal, photos and device identity
 * @param progress     told when the index is rebuilt or catches up
 * @param deviceName   the tablet's name, used when the store is made
 * @param levels       judges surveys for lists
 * @param passphrase   opens a store that is sealed; a store that is not takes none
 * @param segmentBytes the length at which a journal segment is sealed, at least 1024
 */
public record StoreOptions(Clock clock, FileLayer files, Progress progress, String deviceName, LevelOf levels,
                           Optional<Passphrase> passphrase, long segmentBytes) {
    private static final long SEGMENT_BYTES = 64L << 20;

    public StoreOptions {
        Objects.requireNonNull(clock);
        Objects.requireNonNull(files);
        Objects.requireNonNull(progress);
        Objects.requireNonNull(deviceName);
        Objects.requireNonNull(levels);
        Objects.requireNonNull(passphrase);
        if (segmentBytes < 1024) {
            throw new IllegalArgumentException("a segment holds at least 1024 bytes");
        }
    }

    /** The tablet's own clock and disk, no progress, no levels. */
    public static StoreOptions of(String deviceName) {
        return of(deviceName, Clock.systemDefaultZone());
    }

    /** The same with another clock. */
    public static StoreOptions of(String deviceName, Clock clock) {
        return new StoreOptions(clock, FileLayer.disk(), Progress.NONE, deviceName, LevelOf.NONE,
                Optional.empty(), SEGMENT_BYTES);
    }

    public StoreOptions withClock(Clock other) {
        return new StoreOptions(other, files, progress, deviceName, levels, passphrase, segmentBytes);
    }

    public StoreOptions withFiles(FileLayer other) {
        return new StoreOptions(clock, other, progress, deviceName, levels, passphrase, segmentBytes);
    }

    public StoreOptions withProgress(Progress other) {
        return new StoreOptions(clock, files, other, deviceName, levels, passphrase, segmentBytes);
    }

    public StoreOptions withLevels(LevelOf other) {
        return new StoreOptions(clock, files, progress, deviceName, other, passphrase, segmentBytes);
    }

    public StoreOptions withPassphrase(Optional<Passphrase> other) {
        return new StoreOptions(clock, files, progress, deviceName, levels, other, segmentBytes);
    }

    public StoreOptions withSegmentBytes(long other) {
        return new StoreOptions(clock, files, progress, deviceName, levels, passphrase, other);
    }
}
