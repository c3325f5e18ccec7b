package bedmark.journal;

/** Told how far long work has come. */
@FunctionalInterface
public interface Progress {

    /** Tells nobody. */
    Progress NONE = (done, total) -> { };

    /**
     * @param done  how much is done, from 0 to {@code total}; never less than before
     * @param total the whole work in the same measure (bytes, entries)
     */
    void at(long done, long total);
}
