package bedmark.index;

import bedmark.document.Refused;
import bedmark.journal.Place;
import bedmark.survey.Entry;

/** Reads entries from the journal and proves them. */
@FunctionalInterface
interface EntrySource {

    /** @throws Refused where the entry is not there as it was written */
    Entry read(long sequence, Place place);
}
