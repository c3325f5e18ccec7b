package bedmark.index;

import bedmark.survey.QueueState;
import java.util.EnumSet;
import java.util.Optional;
import java.util.Set;

/**
 * Which surveys a list holds; all conditions together.
 *
 * @param states      the states wanted; none for any
 * @param currentOnly leaves out what another revision stands in the place of
 */
public record SurveyQuery(Optional<String> round, Optional<String> transfer, Set<QueueState> states,
                          boolean currentOnly) {

    /** Every survey of the store. */
    public static final SurveyQuery ALL = new SurveyQuery(Optional.empty(), Optional.empty(), Set.of(), false);

    public SurveyQuery {
        states = Set.copyOf(states);
    }

    public SurveyQuery ofRound(String id) {
        return new SurveyQuery(Optional.of(id), transfer, states, currentOnly);
    }

    public SurveyQuery ofTransfer(String id) {
        return new SurveyQuery(round, Optional.of(id), states, currentOnly);
    }

    public SurveyQuery in(QueueState first, QueueState... more) {
        return new SurveyQuery(round, transfer, EnumSet.of(first, more), currentOnly);
    }

    public SurveyQuery current() {
        return new SurveyQuery(round, transfer, states, true);
    }
}
