package bedmark.journal;

/** Hears how far long work has come, and may stop it where it can be. Called often, on the thread that works. */
@FunctionalInterface
public interface Progress {

    /** Nobody listens and nobody stops the work. */
    Progress NONE = (done, total) -> { };

    /**
     * @param done  how much is done, from 0 to {@code total}; never less than before
     * @param total the whole work in the same measure (bytes, entries)
     */
    void at(long done, long total);

    /** Whether work that can be stopped is to stop as soon as it can, leaving nothing behind. */
    default boolean cancelled() {
        return false;
    }
}
