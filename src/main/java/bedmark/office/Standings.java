package bedmark.office;

import bedmark.index.office.Standing;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.MergedZone;
import java.util.Optional;
import java.util.OptionalLong;

/** What a merged zone comes to in a row. */
final class Standings {
    private Standings() {
    }

    static Standing of(MergedZone zone) {
        Optional<Copy> last = zone.last();
        Optional<Copy> newest = zone.newest();
        return new Standing(zone.zone(), last.map(Copy::digest), last.map(Copy::status), moment(last),
                newest.map(Copy::digest), moment(newest), zone.clashes().size(),
                zone.visits().stream().anyMatch(copy -> copy.clockWrong() || copy.datedAhead()));
    }

    private static OptionalLong moment(Optional<Copy> copy) {
        return copy.isPresent() ? OptionalLong.of(copy.get().moment()) : OptionalLong.empty();
    }
}
