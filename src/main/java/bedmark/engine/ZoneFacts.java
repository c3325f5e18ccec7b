package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.bed.Section;
import bedmark.engine.bed.Station;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.flow.AccelerationLength;
import bedmark.engine.flow.BeltSpeed;
import bedmark.engine.flow.LengthConventions;
import bedmark.engine.flow.OpenBelt;
import bedmark.engine.flow.SettlingLength;
import bedmark.engine.seal.SealDrag;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Uncertain;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;

/** What follows from a zone's readings whatever the feed: geometry, speed, seals, capacity, design. */
final class ZoneFacts {
    /** The place of the bed depths. */
    static final String DEPTHS = "/readings/bedDepths";

    private static final double SHARE_OF_WIDTH = 0.10;

    private final Sources sources;
    private final Deduced<Uncertain> beltSpeed;
    private final Deduced<Uncertain> spacing;
    private final Deduced<Uncertain> height;
    private final Deduced<Uncertain> length;
    private final Deduced<Section> section;
    private final Deduced<Profile> profile;
    private final Deduced<Uncertain> sealDrag;
    private final Deduced<Uncertain> capacityArea;
    private final Deduced<Uncertain> designDepth;
    private final Deduced<Uncertain> referenceDepth;
    private final Deduced<Uncertain> accelerationLength;
    private final Deduced<Uncertain> settlingLength;
    private final double spreadPerSquare;

    ZoneFacts(Sources sources) {
        this.sources = sources;
        beltSpeed = findBeltSpeed();
        spacing = number(Datum.READ_SPACING).or(number(Datum.REGISTER_SPACING));
        height = number(Datum.READ_HEIGHT).or(number(Datum.REGISTER_HEIGHT));
        length = number(Datum.ZONE_LENGTH);
        section = section(spacing);
        profile = findProfile();
        sealDrag = sealDrag(zone().seals());
        capacityArea = findCapacityArea();
        designDepth = findDesignDepth();
        referenceDepth = number(Datum.DESIGN_BED_DEPTH).or(Deduced.from(designDepth, number(Datum.BELT_WIDTH),
                (depth, belt) -> depth.max(belt.times(SHARE_OF_WIDTH))));
        accelerationLength = findAccelerationLength();
        settlingLength = findSettlingLength();
        spreadPerSquare = Spread.perSquare(this);
    }

    /** The same zone with its numbers taken as they stand. */
    private ZoneFacts(ZoneFacts other) {
        sources = other.sources.certain();
        beltSpeed = other.beltSpeed.map(Uncertain::certain);
        spacing = other.spacing.map(Uncertain::certain);
        height = other.height.map(Uncertain::certain);
        length = number(Datum.ZONE_LENGTH);
        section = other.section.map(Section::certain);
        profile = other.profile.map(Profile::certain);
        sealDrag = other.sealDrag.map(Uncertain::certain);
        capacityArea = other.capacityArea.map(Uncertain::certain);
        designDepth = other.designDepth.map(Uncertain::certain);
        referenceDepth = other.referenceDepth.map(Uncertain::certain);
        accelerationLength = other.accelerationLength.map(Uncertain::certain);
        settlingLength = other.settlingLength.map(Uncertain::certain);
        spreadPerSquare = other.spreadPerSquare;
    }

    /** The same zone after a change of one thing; the bed that comes of it is the business of who changes. */
    private ZoneFacts(ZoneFacts other, Deduced<Uncertain> beltSpeed, Deduced<Uncertain> spacing,
            Deduced<Uncertain> length, Deduced<Uncertain> sealDrag) {
        this.beltSpeed = beltSpeed;
        this.spacing = spacing;
        this.length = length;
        this.sealDrag = sealDrag;
        sources = other.sources;
        height = other.height;
        section = spacing == other.spacing ? other.section : section(spacing);
        profile = other.profile;
        capacityArea = other.capacityArea;
        designDepth = other.designDepth;
        referenceDepth = other.referenceDepth;
        accelerationLength = beltSpeed == other.beltSpeed ? other.accelerationLength : findAccelerationLength();
        settlingLength = beltSpeed == other.beltSpeed ? other.settlingLength : findSettlingLength();
        spreadPerSquare = other.spreadPerSquare;
    }

    /** The zone without uncertainty, from which a change can be computed at little cost. */
    ZoneFacts certain() {
        return new ZoneFacts(this);
    }

    ZoneFacts withBeltSpeed(double speed) {
        return new ZoneFacts(this, Deduced.known(Uncertain.exact(speed)), spacing, length, sealDrag);
    }

    ZoneFacts withSpacing(double width) {
        return new ZoneFacts(this, beltSpeed, Deduced.known(Uncertain.exact(width)), length, sealDrag);
    }

    /** Seals are cut with the zone, each side in proportion. */
    ZoneFacts withLength(double shorter) {
        double share = shorter / length.get().value();
        return new ZoneFacts(this, beltSpeed, spacing, Deduced.known(Uncertain.exact(shorter)),
                sealDrag.map(drag -> drag.times(share)));
    }

    ZoneFacts withSeals(List<SealSegment> seals) {
        return new ZoneFacts(this, beltSpeed, spacing, length, sealDrag(seals));
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
        return length;
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

    /** l3, all of the width between the boards on a flat belt. */
    Deduced<Uncertain> centreRoll() {
        return isFlat() ? spacing : number(Datum.CENTRE_ROLL);
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

    /** See {@link Spread#perSquare}. */
    double spreadPerSquare() {
        return spreadPerSquare;
    }

    /** The method in use: the site's, else the tabulated factor where the material has one, else Rankine's. */
    DragMethod method() {
        return settings().method().orElse(
                number(Datum.SKIRT_FRICTION_FACTOR).isKnown() ? DragMethod.TABULATED : DragMethod.RANKINE);
    }

    boolean isFlat() {
        return zone().get(Datum.TROUGH_ANGLE).filter(angle -> angle.value() == 0).isPresent();
    }

    /** The sides of which no seal was recorded. */
    List<Side> sidesWithoutSeals() {
        Set<Side> without = EnumSet.allOf(Side.class);
        zone().seals().forEach(segment -> without.remove(segment.side()));
        return List.copyOf(without);
    }

    private Deduced<Uncertain> findBeltSpeed() {
        Deduced<Uncertain> read = number(Datum.BELT_SPEED);
        if (read.isKnown()) {
            return read;
        }
        if (begun(Datum.TIMED_REVOLUTIONS, Datum.TIMED_ELAPSED, Datum.TIMED_BELT_LENGTH)) {
            Deduced<Uncertain> belt = number(Datum.TIMED_BELT_LENGTH).or(number(Datum.BELT_LENGTH));
            return Deduced.from(belt, number(Datum.TIMED_REVOLUTIONS), number(Datum.TIMED_ELAPSED), BeltSpeed::timed);
        }
        if (begun(Datum.PULLEY_DIAMETER, Datum.PULLEY_ROTATION)) {
            return Deduced.from(number(Datum.PULLEY_DIAMETER), number(Datum.PULLEY_ROTATION), BeltSpeed::atPulley);
        }
        return read;
    }

    private boolean begun(Datum... parts) {
        for (Datum part : parts) {
            if (number(part).isKnown()) {
                return true;
            }
        }
        return false;
    }

    private Deduced<Section> section(Deduced<Uncertain> width) {
        Deduced<Uncertain> surcharge = number(Datum.SURCHARGE_ANGLE);
        if (isFlat()) {
            return Deduced.from(width, surcharge, Section::flat);
        }
        return Deduced.from(width, number(Datum.CENTRE_ROLL), number(Datum.TROUGH_ANGLE), surcharge,
                Section::troughed);
    }

    private Deduced<Profile> findProfile() {
        List<Station> stations = zone().stations();
        List<Deduced<?>> inputs = new ArrayList<>(stations.size() + 1);
        List<Uncertain> levels = new ArrayList<>(stations.size());
        for (Station station : stations) {
            Deduced<Uncertain> level = level(station);
            inputs.add(level);
            level.value().ifPresent(levels::add);
        }
        inputs.add(length);
        if (stations.isEmpty()) {
            inputs.add(Deduced.waitingFor(DEPTHS));
        }
        return Deduced.fromAll(() -> Profile.of(length.get(), positions(stations), levels),
                inputs.toArray(new Deduced<?>[0]));
    }

    /** Ascending within the zone, as they were found; only drawn ones could have come to lie otherwise. */
    private List<Uncertain> positions(List<Station> stations) {
        List<Uncertain> positions = new ArrayList<>(stations.size());
        Uncertain before = Uncertain.ZERO;
        for (Station station : stations) {
            before = sources.take(station.position()).max(before).min(length.get());
            positions.add(before);
        }
        return positions;
    }

    /** The level after a reading: one at the board needs no section, one from the board's top only below the board. */
    private Deduced<Uncertain> level(Station station) {
        Uncertain raw = sources.take(station.raw());
        return switch (station.method()) {
            case AT_BOARD, WEAR_LINE -> Deduced.known(raw);
            case AT_CENTRE -> Deduced.from(section, space -> space.levelOfCentreDepth(raw));
            case FROM_BOARD_TOP -> {
                Deduced<Uncertain> depth = Deduced.from(height, board -> board.minus(raw));
                yield depth.isKnown() && depth.get().value() < 0 ? Deduced.from(section,
                        space -> space.levelUnderBoardLine(raw.minus(height.get()))) : depth;
            }
        };
    }

    /** The rate that the site fitted where its own method decides, else that of its table. */
    Uncertain sealRate() {
        Deduced<Uncertain> fitted = number(Datum.SITE_SEAL_RATE);
        return method() == DragMethod.SITE && fitted.isKnown() ? fitted.get() : sources.sealRate();
    }

    private Deduced<Uncertain> sealDrag(List<SealSegment> seals) {
        if (!sidesWithoutSeals().isEmpty()) {
            return Deduced.waitingFor("/readings/seals");
        }
        Uncertain rate = sealRate();
        Uncertain sum = Uncertain.ZERO;
        for (SealSegment segment : seals) {
            double multiplier = settings().sealRates().multiplier(segment.type(), segment.condition());
            sum = sum.plus(SealDrag.of(rate, multiplier, sources.take(segment.length())));
        }
        return Deduced.known(sum);
    }

    /** Nothing where the boards never end. */
    private Deduced<Uncertain> findCapacityArea() {
        if (zone().is(LoadingZone.Mark.FULLY_SKIRTED)) {
            return Deduced.nothing();
        }
        Deduced<Uncertain> usable = Deduced.flat(Deduced.from(number(Datum.BELT_WIDTH), OpenBelt::usableWidth));
        return Deduced.from(usable, isFlat() ? usable : number(Datum.CENTRE_ROLL), number(Datum.TROUGH_ANGLE),
                number(Datum.SURCHARGE_ANGLE), OpenBelt::area);
    }

    private Deduced<Uncertain> findAccelerationLength() {
        Uncertain incline = settings().conventions().incline() ? sources.numberOr(Datum.INCLINE, 0) : Uncertain.ZERO;
        return Deduced.flat(Deduced.from(beltSpeed,
                speed -> AccelerationLength.of(speed, feedVelocity(), sources.beltGrip(), incline)));
    }

    /** Nothing where the site goes by no convention for it. */
    private Deduced<Uncertain> findSettlingLength() {
        LengthConventions lengths = settings().conventions().lengths();
        return lengths.none() ? Deduced.nothing() : Deduced.from(beltSpeed, speed -> SettlingLength.of(lengths,
                sources.numberOr(Datum.IMPACT_LENGTH, 0), speed,
                accelerationLength.isKnown() ? accelerationLength.get() : Uncertain.ZERO,
                zone().is(LoadingZone.Mark.HIGH_AIR_FLOW)));
    }

    /** Between the boards as they are registered. */
    Deduced<Section> registeredSection() {
        return section(number(Datum.REGISTER_SPACING));
    }

    /** Depth at design throughput, design speed and registered geometry; 0 where trough and crown carry it. */
    private Deduced<Uncertain> findDesignDepth() {
        return Deduced.from(registeredSection(), number(Datum.DESIGN_THROUGHPUT),
                number(Datum.BULK_DENSITY), number(Datum.DESIGN_SPEED), (registered, flow, density, speed) ->
                        registered.level(flow.over(density).over(speed)).max(Uncertain.ZERO));
    }
}
