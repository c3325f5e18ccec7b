package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.bed.Section;
import bedmark.engine.bed.Station;
import bedmark.engine.flow.AccelerationLength;
import bedmark.engine.flow.BeltSpeed;
import bedmark.engine.flow.OpenBelt;
import bedmark.engine.flow.SettlingLength;
import bedmark.engine.seal.SealDrag;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Uncertain;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;

/** What follows from a zone's readings whatever the feed: geometry, speed, seals, capacity, design. */
final class ZoneFacts {
    /** The place of the bed depths. */
    static final String DEPTHS = "/readings/bedDepths";

    private static final double SHARE_OF_WIDTH = 0.10;

    private final Sources sources;
    private final Deduced<Uncertain> beltSpeed;
    private final Deduced<Uncertain> spacing;
    private final Deduced<Uncertain> height;
    private final Deduced<Uncertain> centreRoll;
    private final Deduced<Section> section;
    private final Deduced<Profile> profile;
    private final Deduced<Uncertain> sealDrag;
    private final Deduced<Uncertain> capacityArea;
    private final Deduced<Uncertain> designDepth;
    private final Deduced<Uncertain> referenceDepth;
    private final Deduced<Uncertain> accelerationLength;
    private final Deduced<Uncertain> settlingLength;

    ZoneFacts(Sources sources) {
        this.sources = sources;
        beltSpeed = findBeltSpeed();
        spacing = number(Datum.READ_SPACING).or(number(Datum.REGISTER_SPACING));
        height = number(Datum.READ_HEIGHT).or(number(Datum.REGISTER_HEIGHT));
        centreRoll = isFlat() ? spacing : number(Datum.CENTRE_ROLL);
        section = section(spacing);
        profile = findProfile();
        sealDrag = findSealDrag();
        Deduced<Uncertain> usable = Deduced.perhaps(() -> OpenBelt.usableWidth(number(Datum.BELT_WIDTH).get()),
                number(Datum.BELT_WIDTH));
        Deduced<Uncertain> centre = isFlat() ? usable : centreRoll;
        capacityArea = Deduced.from(() -> OpenBelt.area(usable.get(), centre.get(),
                number(Datum.TROUGH_ANGLE).get(), number(Datum.SURCHARGE_ANGLE).get()),
                usable, centre, number(Datum.TROUGH_ANGLE), number(Datum.SURCHARGE_ANGLE));
        designDepth = findDesignDepth();
        referenceDepth = number(Datum.DESIGN_BED_DEPTH).or(Deduced.from(
                () -> designDepth.get().max(number(Datum.BELT_WIDTH).get().times(SHARE_OF_WIDTH)),
                designDepth, number(Datum.BELT_WIDTH)));
        accelerationLength = Deduced.perhaps(() -> AccelerationLength.of(beltSpeed.get(), feedVelocity(),
                sources.beltGrip(), sources.numberOr(Datum.INCLINE, 0)), beltSpeed);
        settlingLength = Deduced.from(() -> SettlingLength.of(sources.numberOr(Datum.IMPACT_LENGTH, 0),
                beltSpeed.get(), accelerationLength.value().orElse(Uncertain.ZERO),
                zone().is(LoadingZone.Mark.HIGH_AIR_FLOW)), beltSpeed);
    }

    Sources sources() {
        return sources;
    }

    LoadingZone zone() {
        return sources.zone();
    }

    Settings settings() {
        return sources.settings();
    }

    Deduced<Uncertain> number(Datum datum) {
        return sources.number(datum);
    }

    Deduced<Uncertain> length() {
        return number(Datum.ZONE_LENGTH);
    }

    Deduced<Uncertain> beltSpeed() {
        return beltSpeed;
    }

    /** v0, taken as 0 where it is not registered. */
    Uncertain feedVelocity() {
        return sources.numberOr(Datum.FEED_VELOCITY, 0);
    }

    Deduced<Uncertain> spacing() {
        return spacing;
    }

    Deduced<Uncertain> height() {
        return height;
    }

    Deduced<Uncertain> centreRoll() {
        return centreRoll;
    }

    Deduced<Section> section() {
        return section;
    }

    Deduced<Profile> profile() {
        return profile;
    }

    Deduced<Uncertain> sealDrag() {
        return sealDrag;
    }

    /** Area of the open belt after the boards. */
    Deduced<Uncertain> capacityArea() {
        return capacityArea;
    }

    Deduced<Uncertain> designDepth() {
        return designDepth;
    }

    Deduced<Uncertain> referenceDepth() {
        return referenceDepth;
    }

    Deduced<Uncertain> accelerationLength() {
        return accelerationLength;
    }

    Deduced<Uncertain> settlingLength() {
        return settlingLength;
    }

    boolean isFlat() {
        return zone().get(Datum.TROUGH_ANGLE).filter(angle -> angle.value() == 0).isPresent();
    }

    /** The sides of which no seal was recorded. */
    List<Side> sidesWithoutSeals() {
        return Stream.of(Side.values())
                .filter(side -> zone().seals().stream().noneMatch(segment -> segment.side() == side)).toList();
    }

    private Deduced<Uncertain> findBeltSpeed() {
        Deduced<Uncertain> read = number(Datum.BELT_SPEED);
        if (read.isKnown()) {
            return read;
        }
        if (begun(Datum.TIMED_REVOLUTIONS, Datum.TIMED_ELAPSED, Datum.TIMED_BELT_LENGTH)) {
            Deduced<Uncertain> belt = number(Datum.TIMED_BELT_LENGTH).or(number(Datum.BELT_LENGTH));
            return Deduced.from(() -> BeltSpeed.timed(belt.get(), number(Datum.TIMED_REVOLUTIONS).get(),
                    number(Datum.TIMED_ELAPSED).get()),
                    belt, number(Datum.TIMED_REVOLUTIONS), number(Datum.TIMED_ELAPSED));
        }
        if (begun(Datum.PULLEY_DIAMETER, Datum.PULLEY_ROTATION)) {
            return Deduced.from(() -> BeltSpeed.atPulley(number(Datum.PULLEY_DIAMETER).get(),
                    number(Datum.PULLEY_ROTATION).get()),
                    number(Datum.PULLEY_DIAMETER), number(Datum.PULLEY_ROTATION));
        }
        return read;
    }

    private boolean begun(Datum... parts) {
        return Stream.of(parts).anyMatch(part -> number(part).isKnown());
    }

    private Deduced<Section> section(Deduced<Uncertain> width) {
        Deduced<Uncertain> surcharge = number(Datum.SURCHARGE_ANGLE);
        if (isFlat()) {
            return Deduced.from(() -> Section.flat(width.get(), surcharge.get()), width, surcharge);
        }
        Deduced<Uncertain> trough = number(Datum.TROUGH_ANGLE);
        return Deduced.from(() -> Section.troughed(width.get(), number(Datum.CENTRE_ROLL).get(), trough.get(),
                surcharge.get()), width, number(Datum.CENTRE_ROLL), trough, surcharge);
    }

    private Deduced<Profile> findProfile() {
        List<Station> stations = zone().stations();
        List<Deduced<Uncertain>> levels = stations.stream().map(this::level).toList();
        List<Deduced<?>> inputs = new ArrayList<>(levels);
        inputs.add(length());
        if (stations.isEmpty()) {
            inputs.add(Deduced.waitingFor(DEPTHS));
        }
        return Deduced.from(() -> new Profile(length().get(),
                stations.stream().map(station -> sources.take(station.position())).toList(),
                levels.stream().map(Deduced::get).toList()), inputs.toArray(Deduced<?>[]::new));
    }

    /** The level after a reading: one at the board needs no section, one from the board's top only below the board. */
    private Deduced<Uncertain> level(Station station) {
        Uncertain raw = sources.take(station.raw());
        return switch (station.method()) {
            case AT_BOARD, WEAR_LINE -> Deduced.known(raw);
            case AT_CENTRE -> Deduced.from(() -> section.get().levelOfCentreDepth(raw), section);
            case FROM_BOARD_TOP -> {
                Deduced<Uncertain> depth = Deduced.from(() -> height.get().minus(raw), height);
                boolean below = depth.value().filter(known -> known.value() < 0).isPresent();
                yield below ? Deduced.from(() -> section.get().levelUnderBoardLine(raw.minus(height.get())), section)
                        : depth;
            }
        };
    }

    private Deduced<Uncertain> findSealDrag() {
        if (!sidesWithoutSeals().isEmpty()) {
            return Deduced.waitingFor("/readings/seals");
        }
        Uncertain rate = sources.sealRate();
        Uncertain sum = Uncertain.ZERO;
        for (SealSegment segment : zone().seals()) {
            double multiplier = settings().sealRates().multiplier(segment.type(), segment.condition());
            sum = sum.plus(SealDrag.of(rate, multiplier, sources.take(segment.length())));
        }
        return Deduced.known(sum);
    }

    /** Depth at design throughput, design speed and registered geometry; 0 where trough and crown carry it. */
    private Deduced<Uncertain> findDesignDepth() {
        Deduced<Section> registered = section(number(Datum.REGISTER_SPACING));
        return Deduced.from(() -> registered.get().level(number(Datum.DESIGN_THROUGHPUT).get()
                .over(number(Datum.BULK_DENSITY).get()).over(number(Datum.DESIGN_SPEED).get())).max(Uncertain.ZERO),
                registered, number(Datum.DESIGN_THROUGHPUT), number(Datum.BULK_DENSITY), number(Datum.DESIGN_SPEED));
    }
}
