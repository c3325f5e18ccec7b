package bedmark.engine;

import bedmark.engine.bed.Station;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Reading;
import java.util.List;
import java.util.Optional;

/** What a loading zone cannot be, so that every formula may rely on it. */
final class Checks {
    /** Room for the rounding of units, as a share. */
    private static final double ROUNDING = 1e-9;
    private static final double SEAL_TOLERANCE = 0.01;

    private final LoadingZone zone;

    Checks(LoadingZone zone) {
        this.zone = zone;
    }

    /** @throws ImpossibleReading with the first reason */
    void run() {
        zone.data().forEach((datum, reading) -> datum.domain().check(reading));
        for (Station station : zone.stations()) {
            Domain.NOT_NEGATIVE.check(station.position());
            Domain.NOT_NEGATIVE.check(station.raw());
        }
        for (SealSegment segment : zone.seals()) {
            Domain.POSITIVE.check(segment.length());
        }
        centreRoll();
        board(Datum.READ_SPACING);
        board(Datum.REGISTER_SPACING);
        stations();
        zone.get(Datum.ZONE_LENGTH).ifPresent(length -> {
            seals(Side.LEFT, length.value());
            seals(Side.RIGHT, length.value());
        });
    }

    private boolean isTroughed() {
        return zone.get(Datum.TROUGH_ANGLE).filter(angle -> angle.value() > 0).isPresent();
    }

    private void centreRoll() {
        Optional<Reading> roll = zone.get(Datum.CENTRE_ROLL);
        Optional<Reading> belt = zone.get(Datum.BELT_WIDTH);
        if (isTroughed() && roll.isPresent() && belt.isPresent() && roll.get().value() >= belt.get().value()) {
            throw new ImpossibleReading("centre-roll-beyond-belt", roll.get().name(),
                    Double.toString(roll.get().value()), Double.toString(belt.get().value()));
        }
    }

    /** A board stands on the belt: on a troughed one no farther out than the wing rolls reach, (B − l3)/2 each. */
    private void board(Datum datum) {
        Optional<Reading> spacing = zone.get(datum);
        Optional<Reading> belt = zone.get(Datum.BELT_WIDTH);
        Optional<Reading> roll = zone.get(Datum.CENTRE_ROLL);
        Optional<Reading> angle = zone.get(Datum.TROUGH_ANGLE);
        if (spacing.isEmpty() || belt.isEmpty() || angle.isEmpty() || (isTroughed() && roll.isEmpty())) {
            return;
        }
        double width = belt.get().value();
        double centre = isTroughed() ? roll.get().value() : 0;
        double widest = centre + (width - centre) * Math.cos(angle.get().value());
        if (spacing.get().value() > widest * (1 + ROUNDING)) {
            throw new ImpossibleReading("board-beyond-wing-rolls", spacing.get().name(),
                    Double.toString(spacing.get().value()), Double.toString(widest));
        }
    }

    private void stations() {
        List<Station> stations = zone.stations();
        double length = zone.get(Datum.ZONE_LENGTH).map(Reading::value).orElse(Double.POSITIVE_INFINITY);
        for (int i = 0; i < stations.size(); i++) {
            Reading position = stations.get(i).position();
            if (i > 0 && position.value() == stations.get(i - 1).position().value()) {
                throw new ImpossibleReading("station-twice", position.name(), Double.toString(position.value()));
            }
            if (position.value() > length * (1 + ROUNDING)) {
                throw new ImpossibleReading("station-outside-zone", position.name(),
                        Double.toString(position.value()), Double.toString(length));
            }
        }
    }

    private void seals(Side side, double length) {
        boolean recorded = false;
        double sum = 0;
        for (SealSegment segment : zone.seals()) {
            if (segment.side() == side) {
                recorded = true;
                sum += segment.length().value();
            }
        }
        if (recorded && Math.abs(sum - length) > length * (SEAL_TOLERANCE + ROUNDING)) {
            throw new ImpossibleReading("seal-lengths-disagree", "/readings/seals", side.code(),
                    Double.toString(sum), Double.toString(length));
        }
    }
}
