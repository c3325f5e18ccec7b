package bedmark.engine;

import bedmark.engine.bed.Section;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.AllowedDepth;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Rule;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;

/**
 * The constant depth at the boards at which each limit that a depth can break would just be reached: the inverse of the
 * formulas, with everything else as it is today. It is 0 where the limit is reached without any bed at the boards.
 */
final class AllowedDepths {
    private final FeedFacts today;
    private final ZoneFacts zone;
    private final double othersShare;

    /** @param othersShare of the rated power, for the skirts of the conveyor's other zones */
    AllowedDepths(FeedFacts today, double othersShare) {
        this.today = today;
        zone = today.zone();
        this.othersShare = othersShare;
    }

    List<AllowedDepth> all() {
        List<AllowedDepth> depths = new ArrayList<>(5);
        ofWhole(Rule.BED_OVER_BOARD, zone.height()).ifPresent(depths::add);
        ofWhole(Rule.BED_OVER_DESIGN, zone.referenceDepth()).ifPresent(depths::add);
        ofFlow().ifPresent(depths::add);
        ofRunningPower().ifPresent(depths::add);
        ofSkirtPower().ifPresent(depths::add);
        return depths;
    }

    private Optional<AllowedDepth> ofWhole(Rule rule, Deduced<Uncertain> whole) {
        return whole.isKnown() ? allowed(rule, limit -> limit * whole.get().value()) : Optional.empty();
    }

    /** From the fill by the area, at today's speed of the bed. */
    private Optional<AllowedDepth> ofFlow() {
        Deduced<Uncertain> fill = today.fill();
        if (!today.statedFlow().isKnown() || !fill.isKnown() || !today.area().isKnown() || fill.get().value() <= 0) {
            return Optional.empty();
        }
        double area = today.area().get().value();
        return allowed(Rule.FLOW_OVER_CAPACITY, limit -> depth(area * limit / fill.get().value()));
    }

    /** From the running power by what it leaves to the skirts. */
    private Optional<AllowedDepth> ofRunningPower() {
        Deduced<Uncertain> running = Observations.runningShaftPower(zone);
        Deduced<Uncertain> rated = zone.number(Datum.RATED_POWER);
        if (!running.isKnown() || !rated.isKnown() || !today.drivePower().isKnown() || !hasDepthOfDrag()) {
            return Optional.empty();
        }
        double rest = running.get().value() - today.drivePower().get().value();
        return allowed(Rule.DRIVE_NEAR_RATING, limit -> depthOfPower(limit * rated.get().value() - rest));
    }

    /** From the skirts' share of the rated power, less that of the conveyor's other zones; not below a hopper. */
    private Optional<AllowedDepth> ofSkirtPower() {
        Deduced<Uncertain> rated = zone.number(Datum.RATED_POWER);
        if (!rated.isKnown() || !today.drivePower().isKnown() || !hasDepthOfDrag()
                || zone.zone().is(LoadingZone.Mark.BELT_FEEDER)) {
            return Optional.empty();
        }
        return allowed(Rule.SKIRTS_OVER_BUDGET, limit -> depthOfPower((limit - othersShare) * rated.get().value()));
    }

    private Optional<AllowedDepth> allowed(Rule rule, DoubleUnaryOperator depth) {
        Limit limit = new Observations(today, today).limit(rule);
        boolean limited = limit.near().isPresent() || limit.overloaded().isPresent();
        return limit.on() && limited ? Optional.of(new AllowedDepth(rule, at(limit.near(), depth),
                at(limit.overloaded(), depth))) : Optional.empty();
    }

    private static OptionalDouble at(OptionalDouble limit, DoubleUnaryOperator depth) {
        return limit.isPresent() ? OptionalDouble.of(depth.applyAsDouble(limit.getAsDouble())) : limit;
    }

    /** Whether the drag tells of a depth: the one method that goes by the flow may know it without any bed. */
    private boolean hasDepthOfDrag() {
        return today.materialDrag().get().value() > 0 && zone.beltSpeed().get().value() > 0
                && (zone.method() != DragMethod.ISO_5048 || today.area().isKnown());
    }

    /** The depth at which the skirts take a power at the motor shaft (W). */
    private double depthOfPower(double power) {
        double force = power * zone.number(Datum.DRIVE_EFFICIENCY).get().value() / zone.beltSpeed().get().value();
        double drag = Math.max(0, force - zone.sealDrag().get().value());
        double share = drag / today.materialDrag().get().value();
        return zone.method() == DragMethod.ISO_5048 ? depth(today.area().get().value() * Math.sqrt(share))
                : Math.sqrt(share * today.integralOfSquare().get().value() / zone.length().get().value());
    }

    private double depth(double area) {
        Section section = zone.section().get();
        return Math.max(0, section.level(Uncertain.exact(area)).value());
    }
}
