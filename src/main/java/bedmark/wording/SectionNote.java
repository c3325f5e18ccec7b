package bedmark.wording;

import bedmark.engine.Datum;
import bedmark.engine.LoadingZone;
import bedmark.engine.bed.Section;
import bedmark.engine.flow.BoardPlacement;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Uncertain;
import java.util.List;
import java.util.Optional;
import java.util.function.DoubleFunction;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** What stands under the cross-section: the seals at that place, side by side, and the free edge of the belt. */
final class SectionNote {
    private final Wording wording;
    private final DoubleFunction<String> small;

    /** @param small a length (m) as a bare number of the small unit */
    SectionNote(Wording wording, DoubleFunction<String> small) {
        this.wording = wording;
        this.small = small;
    }

    /** @param position where the zone is cut (m) */
    String of(LoadingZone zone, double position) {
        return Stream.of(Optional.of(seals(zone, position)), edge(zone)).flatMap(Optional::stream)
                .collect(Collectors.joining("\n"));
    }

    private String seals(LoadingZone zone, double position) {
        if (zone.seals().isEmpty()) {
            return wording.text("screen.picture.seals-unknown");
        }
        String left = at(zone.seals(), Side.LEFT, position);
        String right = at(zone.seals(), Side.RIGHT, position);
        return left.equals(right) ? wording.text("zone.seals-both", left)
                : wording.text("zone.seals-sides", left, right);
    }

    /** The condition of the segment that covers a position. */
    private String at(List<SealSegment> seals, Side side, double position) {
        double end = 0;
        Optional<SealSegment> found = Optional.empty();
        for (SealSegment segment : seals) {
            if (segment.side() == side && (found.isEmpty() || end <= position)) {
                found = Optional.of(segment);
                end += segment.length().value();
            }
        }
        return found.map(segment -> segment.condition().isDefect()
                ? wording.text("screen.seal." + segment.condition().code()) : wording.text("zone.seal.sound"))
                .orElseGet(() -> wording.text("zone.seal.unread"));
    }

    /** Nothing where the belt is not known, or the boards stand beyond it. */
    private Optional<String> edge(LoadingZone zone) {
        Optional<Double> belt = number(zone, Datum.BELT_WIDTH);
        Optional<Double> trough = number(zone, Datum.TROUGH_ANGLE);
        Optional<Double> spacing = number(zone, Datum.READ_SPACING).or(() -> number(zone, Datum.REGISTER_SPACING));
        Optional<Double> roll = number(zone, Datum.CENTRE_ROLL)
                .or(() -> trough.filter(angle -> angle == 0).flatMap(angle -> spacing));
        if (belt.isEmpty() || trough.isEmpty() || spacing.isEmpty() || roll.isEmpty()) {
            return Optional.empty();
        }
        Uncertain width = Uncertain.exact(spacing.get());
        Uncertain centre = Uncertain.exact(roll.get());
        double edge = BoardPlacement.freeEdge(Uncertain.exact(belt.get()), centre, width,
                Section.wingRun(width, centre, Uncertain.exact(trough.get()))).value();
        return edge > 0 ? Optional.of(wording.text("zone.free-edge", small.apply(edge))) : Optional.empty();
    }

    private static Optional<Double> number(LoadingZone zone, Datum datum) {
        return zone.get(datum).map(Reading::value);
    }
}
