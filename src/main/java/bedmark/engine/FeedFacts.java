package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.drag.RankinePressure;
import bedmark.engine.drag.SiteFactor;
import bedmark.engine.drag.SpecialResistance;
import bedmark.engine.drag.TabulatedFactor;
import bedmark.engine.flow.LoadingForce;
import bedmark.engine.uncertainty.Uncertain;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** What follows from a zone at one feed: today's, the design's, or that of a remedy. */
final class FeedFacts {
    private final ZoneFacts zone;
    private final Deduced<Profile> profile;
    private final Deduced<Uncertain> statedFlow;
    private final Deduced<Uncertain> integralOfSquare;
    private final Deduced<Uncertain> meanSquare;
    private final Deduced<Uncertain> meanDepth;
    private final Deduced<Uncertain> area;
    private final Deduced<Uncertain> impliedFlow;
    private final Deduced<Uncertain> flow;
    private final Deduced<Uncertain> materialDrag;
    private final Deduced<Uncertain> skirtDrag;
    private final Deduced<Uncertain> skirtPower;
    private final Deduced<Uncertain> drivePower;
    private final Deduced<Uncertain> driveShare;

    /**
     * @param profile    the bed at this feed
     * @param statedFlow the mass flow, where it is known other than from the bed
     */
    FeedFacts(ZoneFacts zone, Deduced<Profile> profile, Deduced<Uncertain> statedFlow) {
        this.zone = zone;
        this.profile = profile;
        this.statedFlow = statedFlow;
        Deduced<Uncertain> speed = zone.beltSpeed();
        integralOfSquare = Deduced.from(profile, Profile::integralOfSquare);
        meanSquare = Deduced.from(integralOfSquare, zone.length(), Uncertain::over);
        meanDepth = Deduced.from(profile, bed -> bed.integral().over(bed.length()));
        area = Deduced.from(profile, zone.section(), (bed, section) -> section.area(bed.meanLevel()));
        impliedFlow = Deduced.from(zone.number(Datum.BULK_DENSITY), speed, area,
                (density, v, bed) -> density.times(v).times(bed));
        flow = statedFlow.isKnown() ? statedFlow : impliedFlow;
        materialDrag = drag(method());
        skirtDrag = Deduced.from(materialDrag, zone.sealDrag(), Uncertain::plus);
        skirtPower = Deduced.from(skirtDrag, speed, Uncertain::times);
        drivePower = Deduced.from(skirtPower, zone.number(Datum.DRIVE_EFFICIENCY), Uncertain::over);
        driveShare = Deduced.from(drivePower, zone.number(Datum.RATED_POWER), Uncertain::over);
    }

    /** As it was read. */
    static FeedFacts today(ZoneFacts zone) {
        return new FeedFacts(zone, zone.profile(), zone.number(Datum.THROUGHPUT));
    }

    /**
     * At design throughput: the area of the bed at each station times design over read throughput, and the depth from
     * it. Known only with a belt scale.
     */
    static Deduced<FeedFacts> atDesign(ZoneFacts zone) {
        Deduced<Uncertain> design = zone.number(Datum.DESIGN_THROUGHPUT);
        return Deduced.flat(Deduced.from(design, zone.number(Datum.THROUGHPUT), zone.profile(), zone.section(),
                (wanted, read, bed, section) -> read.value() == 0 ? Optional.empty()
                        : Optional.of(new FeedFacts(zone, scaled(zone, wanted.over(read)), design))));
    }

    /** The bed with its area at each station multiplied. */
    static Deduced<Profile> scaled(ZoneFacts zone, Uncertain factor) {
        return Deduced.from(zone.profile(), zone.section(), (bed, section) -> {
            Uncertain carried = section.carriedDepth();
            return bed.map(level -> level.plus(carried).times(factor).minus(carried));
        });
    }

    /** The method in use: the site's, else the tabulated factor where the material has one, else Rankine's. */
    DragMethod method() {
        return zone.method();
    }

    ZoneFacts zone() {
        return zone;
    }

    Deduced<Profile> profile() {
        return profile;
    }

    /** The mass flow, where it is known other than from the bed. */
    Deduced<Uncertain> statedFlow() {
        return statedFlow;
    }

    Deduced<Uncertain> integralOfSquare() {
        return integralOfSquare;
    }

    Deduced<Uncertain> meanSquare() {
        return meanSquare;
    }

    Deduced<Uncertain> meanDepth() {
        return meanDepth;
    }

    Deduced<Uncertain> deepest() {
        return Deduced.from(profile, Profile::deepest);
    }

    /** (Mean depth)² over the mean of the square; nothing where the bed touches nowhere. */
    Deduced<Uncertain> squareOfMeanShare() {
        return Deduced.flat(Deduced.from(meanSquare, meanDepth, (square, mean) -> square.value() == 0
                ? Optional.empty() : Optional.of(mean.square().over(square))));
    }

    Deduced<Uncertain> area() {
        return area;
    }

    Deduced<Uncertain> impliedFlow() {
        return impliedFlow;
    }

    /** The material drag by every method, the one in use among them. */
    Map<DragMethod, Deduced<Uncertain>> methods() {
        Map<DragMethod, Deduced<Uncertain>> methods = new EnumMap<>(DragMethod.class);
        for (DragMethod method : DragMethod.values()) {
            methods.put(method, method == method() ? materialDrag : alternative(method));
        }
        return methods;
    }

    private Deduced<Uncertain> drag(DragMethod method) {
        return switch (method) {
            case TABULATED -> tabulated();
            case RANKINE -> rankine();
            case ISO_5048 -> specialResistance();
            case SITE -> Deduced.from(zone.number(Datum.SITE_FACTOR), integralOfSquare, SiteFactor::drag);
        };
    }

    /** By a method that does not decide; only where the site's own does is its factor waited for. */
    private Deduced<Uncertain> alternative(DragMethod method) {
        return method == DragMethod.SITE && !zone.number(Datum.SITE_FACTOR).isKnown() ? Deduced.nothing()
                : drag(method);
    }

    Deduced<Uncertain> materialDrag() {
        return materialDrag;
    }

    Deduced<Uncertain> skirtDrag() {
        return skirtDrag;
    }

    Deduced<Uncertain> skirtPower() {
        return skirtPower;
    }

    Deduced<Uncertain> drivePower() {
        return drivePower;
    }

    Deduced<Uncertain> driveShare() {
        return driveShare;
    }

    /** What the disagreement of the drag methods brings into the material drag (N); 0 where it does not count. */
    double spread() {
        return integralOfSquare.isKnown() ? zone.spreadPerSquare() * integralOfSquare.get().value() : 0;
    }

    /** The same in the drive's share. */
    double spreadOfShare() {
        return driveShare.isKnown() && skirtDrag.get().value() > 0
                ? spread() * driveShare.get().value() / skirtDrag.get().value() : 0;
    }

    /** Energy of the skirts in a year (Wh): electrical where the motor's efficiency is known, else the shaft's. */
    Deduced<Uncertain> energy() {
        Uncertain motor = zone.sources().numberOr(Datum.MOTOR_EFFICIENCY, 1);
        return Deduced.from(drivePower, zone.number(Datum.LOADED_HOURS),
                (power, hours) -> power.over(motor).times(hours));
    }

    /** What comes with each kWh of the skirts' electricity in a year; nothing where that is not known. */
    Deduced<Uncertain> electricity(OptionalDouble perKilowattHour) {
        return perKilowattHour.isEmpty() ? Deduced.nothing() : Deduced.from(drivePower,
                zone.number(Datum.MOTOR_EFFICIENCY), zone.number(Datum.LOADED_HOURS), (power, motor, hours) ->
                        power.over(motor).times(hours).times(perKilowattHour.getAsDouble() / 1000));
    }

    Deduced<Uncertain> loadingForce() {
        return Deduced.from(flow, zone.beltSpeed(),
                (passing, speed) -> LoadingForce.of(passing, speed, zone.feedVelocity()));
    }

    /** Flow over the capacity of the open belt; nothing on a belt that stands. */
    Deduced<Uncertain> fill() {
        return Deduced.flat(Deduced.from(flow, zone.number(Datum.BULK_DENSITY), zone.capacityArea(), zone.beltSpeed(),
                (passing, density, open, speed) -> {
                    Uncertain capacity = density.times(open).times(speed);
                    return capacity.value() == 0 ? Optional.empty() : Optional.of(passing.over(capacity));
                }));
    }

    /** Stated over implied flow; nothing without a stated one, or where nothing can flow. */
    Deduced<Uncertain> bedSpeedRatio() {
        return statedFlow.isKnown() ? Deduced.flat(Deduced.from(impliedFlow, implied -> implied.value() == 0
                ? Optional.empty() : Optional.of(statedFlow.get().over(implied)))) : Deduced.nothing();
    }

    private Deduced<Uncertain> tabulated() {
        return Deduced.from(zone.number(Datum.SKIRT_FRICTION_FACTOR), integralOfSquare, TabulatedFactor::drag);
    }

    private Deduced<Uncertain> rankine() {
        return Deduced.from(zone.number(Datum.ANGLE_OF_REPOSE), zone.number(Datum.BULK_DENSITY), integralOfSquare,
                (repose, density, square) -> RankinePressure.drag(
                        zone.sources().numberOr(Datum.WALL_FRICTION, 1), repose, density, square));
    }

    private Deduced<Uncertain> specialResistance() {
        Deduced<Uncertain> density = zone.number(Datum.BULK_DENSITY);
        Deduced<Uncertain> speed = zone.beltSpeed();
        Deduced<Uncertain> spacing = zone.spacing();
        Deduced<Uncertain> acceleration = zone.accelerationLength();
        Deduced<Uncertain> length = zone.length();
        return Deduced.flat(Deduced.fromAll(() -> {
            Uncertain feed = zone.feedVelocity();
            return speed.get().value() == 0 || speed.get().value() + feed.value() <= 0 ? Optional.empty()
                    : Optional.of(SpecialResistance.drag(zone.sources().boardGrip(), flow.get().over(density.get()),
                            density.get(), speed.get(), feed, spacing.get(), acceleration.get(), length.get()));
        }, flow, density, speed, spacing, acceleration, length));
    }
}
