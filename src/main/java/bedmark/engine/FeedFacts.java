package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.drag.RankinePressure;
import bedmark.engine.drag.SpecialResistance;
import bedmark.engine.drag.TabulatedFactor;
import bedmark.engine.flow.LoadingForce;
import bedmark.engine.uncertainty.Uncertain;
import java.util.Map;
import java.util.Optional;

/** What follows from a zone at one feed: today's, the design's, or that of a remedy. */
final class FeedFacts {
    private final ZoneFacts zone;
    private final Deduced<Profile> profile;
    private final Deduced<Uncertain> statedFlow;
    private final Deduced<Uncertain> integralOfSquare;
    private final Deduced<Uncertain> meanDepth;
    private final Deduced<Uncertain> area;
    private final Deduced<Uncertain> impliedFlow;
    private final Deduced<Uncertain> flow;
    private final Map<DragMethod, Deduced<Uncertain>> methods;
    private final Deduced<Uncertain> materialDrag;
    private final Deduced<Uncertain> skirtDrag;
    private final Deduced<Uncertain> skirtPower;
    private final Deduced<Uncertain> drivePower;

    /**
     * @param profile    the bed at this feed
     * @param statedFlow the mass flow, where it is known other than from the bed
     */
    FeedFacts(ZoneFacts zone, Deduced<Profile> profile, Deduced<Uncertain> statedFlow) {
        this.zone = zone;
        this.profile = profile;
        this.statedFlow = statedFlow;
        Deduced<Uncertain> speed = zone.beltSpeed();
        Deduced<Uncertain> density = zone.number(Datum.BULK_DENSITY);
        integralOfSquare = Deduced.from(() -> profile.get().integralOfSquare(), profile);
        meanDepth = Deduced.from(() -> profile.get().integral().over(profile.get().length()), profile);
        area = Deduced.from(() -> zone.section().get().area(profile.get().meanLevel()), profile, zone.section());
        impliedFlow = Deduced.from(() -> density.get().times(speed.get()).times(area.get()), density, speed, area);
        flow = statedFlow.isKnown() ? statedFlow : impliedFlow;
        methods = Map.of(DragMethod.TABULATED, tabulated(), DragMethod.RANKINE, rankine(density),
                DragMethod.ISO_5048, specialResistance(speed, density));
        materialDrag = methods.get(method());
        skirtDrag = Deduced.from(() -> materialDrag.get().plus(zone.sealDrag().get()), materialDrag, zone.sealDrag());
        skirtPower = Deduced.from(() -> skirtDrag.get().times(speed.get()), skirtDrag, speed);
        Deduced<Uncertain> efficiency = zone.number(Datum.DRIVE_EFFICIENCY);
        drivePower = Deduced.from(() -> skirtPower.get().over(efficiency.get()), skirtPower, efficiency);
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
        Deduced<Uncertain> read = zone.number(Datum.THROUGHPUT);
        return Deduced.perhaps(() -> read.get().value() == 0 ? Optional.empty()
                : Optional.of(new FeedFacts(zone, scaled(zone, design.get().over(read.get())), design)),
                design, read, zone.profile(), zone.section());
    }

    /** The bed with its area at each station multiplied. */
    static Deduced<Profile> scaled(ZoneFacts zone, Uncertain factor) {
        return Deduced.from(() -> zone.profile().get().map(level ->
                zone.section().get().level(zone.section().get().area(level).times(factor))),
                zone.profile(), zone.section());
    }

    /** The method in use: the site's, else the tabulated factor where the material has one, else Rankine's. */
    DragMethod method() {
        return zone.settings().method().orElse(
                zone.number(Datum.SKIRT_FRICTION_FACTOR).isKnown() ? DragMethod.TABULATED : DragMethod.RANKINE);
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

    Deduced<Uncertain> meanSquare() {
        return Deduced.from(() -> integralOfSquare.get().over(zone.length().get()), integralOfSquare, zone.length());
    }

    Deduced<Uncertain> meanDepth() {
        return meanDepth;
    }

    Deduced<Uncertain> deepest() {
        return Deduced.from(() -> profile.get().deepest(), profile);
    }

    /** (Mean depth)² over the mean of the square; nothing where the bed touches nowhere. */
    Deduced<Uncertain> squareOfMeanShare() {
        Deduced<Uncertain> meanSquare = meanSquare();
        return Deduced.perhaps(() -> meanSquare.get().value() == 0 ? Optional.empty()
                : Optional.of(meanDepth.get().square().over(meanSquare.get())), meanSquare, meanDepth);
    }

    Deduced<Uncertain> area() {
        return area;
    }

    Deduced<Uncertain> impliedFlow() {
        return impliedFlow;
    }

    Map<DragMethod, Deduced<Uncertain>> methods() {
        return methods;
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
        Deduced<Uncertain> rated = zone.number(Datum.RATED_POWER);
        return Deduced.from(() -> drivePower.get().over(rated.get()), drivePower, rated);
    }

    /** Energy of the skirts in a year (Wh): electrical where the motor's efficiency is known, else the shaft's. */
    Deduced<Uncertain> energy() {
        Deduced<Uncertain> hours = zone.number(Datum.LOADED_HOURS);
        Uncertain motor = zone.sources().numberOr(Datum.MOTOR_EFFICIENCY, 1);
        return Deduced.from(() -> drivePower.get().over(motor).times(hours.get()), drivePower, hours);
    }

    Deduced<Uncertain> loadingForce() {
        return Deduced.from(() -> LoadingForce.of(flow.get(), zone.beltSpeed().get(), zone.feedVelocity()),
                flow, zone.beltSpeed());
    }

    /** Flow over the capacity of the open belt; nothing on a belt that stands. */
    Deduced<Uncertain> fill() {
        Deduced<Uncertain> density = zone.number(Datum.BULK_DENSITY);
        Deduced<Uncertain> speed = zone.beltSpeed();
        return Deduced.perhaps(() -> {
            Uncertain capacity = density.get().times(zone.capacityArea().get()).times(speed.get());
            return capacity.value() == 0 ? Optional.empty() : Optional.of(flow.get().over(capacity));
        }, flow, density, zone.capacityArea(), speed);
    }

    /** Stated over implied flow; nothing without a stated one, or where nothing can flow. */
    Deduced<Uncertain> bedSpeedRatio() {
        return statedFlow.isKnown() ? Deduced.perhaps(() -> impliedFlow.get().value() == 0 ? Optional.empty()
                : Optional.of(statedFlow.get().over(impliedFlow.get())), impliedFlow) : Deduced.nothing();
    }

    private Deduced<Uncertain> tabulated() {
        Deduced<Uncertain> factor = zone.number(Datum.SKIRT_FRICTION_FACTOR);
        return Deduced.from(() -> TabulatedFactor.drag(factor.get(), integralOfSquare.get()),
                factor, integralOfSquare);
    }

    private Deduced<Uncertain> rankine(Deduced<Uncertain> density) {
        Deduced<Uncertain> repose = zone.number(Datum.ANGLE_OF_REPOSE);
        return Deduced.from(() -> RankinePressure.drag(zone.sources().numberOr(Datum.WALL_FRICTION, 1), repose.get(),
                density.get(), integralOfSquare.get()), repose, density, integralOfSquare);
    }

    private Deduced<Uncertain> specialResistance(Deduced<Uncertain> speed, Deduced<Uncertain> density) {
        Deduced<Uncertain> acceleration = zone.accelerationLength();
        return Deduced.perhaps(() -> {
            Uncertain feed = zone.feedVelocity();
            if (speed.get().value() == 0 || speed.get().plus(feed).value() <= 0) {
                return Optional.empty();
            }
            return Optional.of(SpecialResistance.drag(zone.sources().boardGrip(),
                    flow.get().over(density.get()), density.get(), speed.get(), feed, zone.spacing().get(),
                    acceleration.get(), zone.length().get()));
        }, flow, density, speed, zone.spacing(), acceleration, zone.length());
    }
}
