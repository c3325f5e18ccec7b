package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Progress;

/** Counts long work and stops it when the person wants that. */
final class Work {
    private final Progress progress;
    private final long total;
    private long done;

    Work(Progress progress, long total) {
        this.progress = progress;
        this.total = total;
        progress.at(0, total);
    }

    /** @throws Refused {@code pack-cancelled} */
    void add(long bytes) {
        if (progress.cancelled() || Thread.currentThread().isInterrupted()) {
            throw new Refused(Defect.in("", "pack-cancelled"));
        }
        done += bytes;
        progress.at(done, total);
    }
}
