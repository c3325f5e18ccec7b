package bedmark.pack;

/** Hears how far long work has come, and may stop it. Called often, on the thread that works. */
public interface Progress {

    /** Nobody listens and nobody stops the work. */
    Progress NONE = (done, total) -> { };

    /**
     * @param done  bytes handled so far, never falling
     * @param total bytes to handle in all, the same in every call
     */
    void at(long done, long total);

    /** Whether the work is to stop as soon as it can, leaving nothing behind. */
    default boolean cancelled() {
        return false;
    }
}
