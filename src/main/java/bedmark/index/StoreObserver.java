package bedmark.index;

import bedmark.journal.NotSaved;
import bedmark.survey.Entry;

/** Told on the thread that appended, after each attempt. */
public interface StoreObserver {

    /** The entry is on the medium since {@link Store#savedAt()}. */
    void saved(Entry entry);

    /** The act is not on the medium. */
    void notSaved(NotSaved why);
}
