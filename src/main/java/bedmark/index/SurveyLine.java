package bedmark.index;

import bedmark.survey.InspectionStatus;
import bedmark.survey.QueueState;
import java.time.OffsetDateTime;
import java.util.Optional;
import java.util.UUID;

/**
 * One survey in a list.
 *
 * @param supersedes   the survey that this one corrects
 * @param supersededBy the survey that corrects this one, finished or not
 * @param level        the short judgement of {@link LevelOf}; may be empty
 * @param leftOpen     how many of its actions were not found done
 * @param first        sequence number of the entry that opened it
 * @param last         sequence number of the entry that changed it last
 */
public record SurveyLine(UUID id, int revision, Optional<UUID> supersedes, Optional<UUID> supersededBy,
                         Optional<String> round, String transfer, QueueState state, InspectionStatus inspectionStatus,
                         Optional<OffsetDateTime> startedAt, Optional<OffsetDateTime> completedAt, String level,
                         int leftOpen, long first, long last) {

    /** Whether no other revision stands in its place. */
    public boolean current() {
        return supersededBy.isEmpty();
    }
}
