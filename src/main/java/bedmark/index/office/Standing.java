package bedmark.index.office;

import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.ZoneId;
import java.util.Optional;
import java.util.OptionalLong;

/**
 * What counts of a zone's surveys.
 *
 * @param visit       digest of the last visit's content
 * @param visitStatus what came of that visit; a visit that is still under way is one that was not inspected
 * @param visited     when it was (ms since 1970)
 * @param latest      digest of the content that the zone is judged by
 * @param moment      when that was completed (ms since 1970)
 * @param clashes     contents that can't all be right, and wait for a person
 * @param clockWrong  whether the tablet's clock can't have been right
 */
public record Standing(ZoneId zone, Optional<String> visit, Optional<InspectionStatus> visitStatus,
                       OptionalLong visited, Optional<String> latest, OptionalLong moment, int clashes,
                       boolean clockWrong) {

    /** Of a zone that nobody came to. */
    static Standing none(ZoneId zone) {
        return new Standing(zone, Optional.empty(), Optional.empty(), OptionalLong.empty(), Optional.empty(),
                OptionalLong.empty(), 0, false);
    }
}
