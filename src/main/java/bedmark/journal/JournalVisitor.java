package bedmark.journal;

import bedmark.document.Defect;

/** Takes what a walk over a journal meets, in the order of the journal. */
public interface JournalVisitor {

    /** An entry that counts, as it was written. */
    void entry(long sequence, Place place, byte[] payload);

    /** Something that is not as it was written; the place is a segment's file name, the first detail the offset. */
    void flaw(Defect flaw);

    /** How far the walk has come, in bytes of the segments. */
    void walked(long done, long total);
}
