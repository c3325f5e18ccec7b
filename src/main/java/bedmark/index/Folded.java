package bedmark.index;

import bedmark.journal.Digest;
import bedmark.survey.SurveyHistory;
import java.util.Optional;

/**
 * A survey as far as it is folded.
 *
 * @param first sequence number of the entry that opened it
 * @param last  sequence number of the last entry that changed it
 * @param hash  that entry's hash
 */
record Folded(Optional<SurveyHistory> history, long first, long last, Digest hash) {
}
