package bedmark.index.office;

import bedmark.survey.merge.ZoneId;
import java.util.Optional;

/**
 * A zone as it stands.
 *
 * @param verdict nothing while it was not judged, or could not be
 */
public record ZoneRow(ZoneNames names, Standing standing, Optional<Verdict> verdict) {
    public ZoneId zone() {
        return names.zone();
    }
}
