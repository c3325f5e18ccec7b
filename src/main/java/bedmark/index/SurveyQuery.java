package bedmark.index;

import bedmark.survey.QueueState;
import java.util.EnumSet;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;

/**
 * Which surveys a list holds; all conditions together.
 *
 * @param beside        the round whose surveys are left out
 * @param states        the states wanted; none for any
 * @param currentOnly   leaves out what another revision stands in the place of
 * @param inspectedOnly leaves out where nothing could be inspected
 * @param newest        how many of those that were opened last; all where it is absent
 */
public record SurveyQuery(Optional<String> round, Optional<String> beside, Optional<String> transfer,
                          Set<QueueState> states, boolean currentOnly, boolean inspectedOnly, OptionalInt newest) {

    /** Every survey of the store. */
    public static final SurveyQuery ALL = new SurveyQuery(Optional.empty(), Optional.empty(), Optional.empty(),
            Set.of(), false, false, OptionalInt.empty());

    public SurveyQuery {
        states = Set.copyOf(states);
    }

    public SurveyQuery ofRound(String id) {
        return new SurveyQuery(Optional.of(id), beside, transfer, states, currentOnly, inspectedOnly, newest);
    }

    /** Those of other rounds, or of none. */
    public SurveyQuery besideRound(String id) {
        return new SurveyQuery(round, Optional.of(id), transfer, states, currentOnly, inspectedOnly, newest);
    }

    public SurveyQuery ofTransfer(String id) {
        return new SurveyQuery(round, beside, Optional.of(id), states, currentOnly, inspectedOnly, newest);
    }

    public SurveyQuery in(QueueState first, QueueState... more) {
        return new SurveyQuery(round, beside, transfer, EnumSet.of(first, more), currentOnly, inspectedOnly, newest);
    }

    public SurveyQuery current() {
        return new SurveyQuery(round, beside, transfer, states, true, inspectedOnly, newest);
    }

    public SurveyQuery inspected() {
        return new SurveyQuery(round, beside, transfer, states, currentOnly, true, newest);
    }

    /** Of all these the ones that were opened last, still in the order in which they were opened. */
    public SurveyQuery newest(int count) {
        return new SurveyQuery(round, beside, transfer, states, currentOnly, inspectedOnly, OptionalInt.of(count));
    }
}
