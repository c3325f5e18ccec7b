package bedmark.journal;

import bedmark.document.Defect;

/**
 * An act was not saved; the person must be told so. Everything that was saved before is safe and stays readable, and
 * the same act may be tried again.
 */
public final class NotSaved extends RuntimeException {
    private final transient Defect defect;
    private final long safe;

    /**
     * @param defect why, and what to do: one of the codes {@code not-saved-…}
     * @param safe   the sequence number up to which everything is on the medium
     */
    public NotSaved(Defect defect, long safe, Throwable cause) {
        super(defect.code() + " at " + defect.where() + " " + defect.details(), cause);
        this.defect = defect;
        this.safe = safe;
    }

    public Defect defect() {
        return defect;
    }

    /** The sequence number of the last entry that is safe; 0 where there is none. */
    public long safe() {
        return safe;
    }
}
