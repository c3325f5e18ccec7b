package bedmark.engine;

import bedmark.engine.MethodSpread.Cause;
import bedmark.engine.MethodSpread.Reason;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.drag.RankinePressure;
import bedmark.engine.drag.TabulatedFactor;
import bedmark.engine.uncertainty.Uncertain;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Works out how far the methods lie apart, and why. */
final class Spread {
    private static final double GRAVITY = 9.806_65;
    private static final double OF_RECTANGLE = 2 * Math.sqrt(3);
    /** Ratios nearer to 1 than this are the same. */
    private static final double SAME = 0.01;

    private final FeedFacts feed;
    private final ZoneFacts zone;

    Spread(FeedFacts feed) {
        this.feed = feed;
        zone = feed.zone();
    }

    /**
     * What the disagreement of the methods brings into the material drag (see {@link MethodSpread}), for each m³ of the
     * integral of the square of the depth, to which all of those methods are proportional (N/m³).
     */
    static double perSquare(ZoneFacts zone) {
        boolean counts = zone.settings().conventions().spread()
                && (zone.method() == DragMethod.TABULATED || zone.method() == DragMethod.RANKINE);
        Deduced<Uncertain> factor = zone.number(Datum.SKIRT_FRICTION_FACTOR);
        Deduced<Uncertain> repose = zone.number(Datum.ANGLE_OF_REPOSE);
        Deduced<Uncertain> density = zone.number(Datum.BULK_DENSITY);
        if (!counts || !factor.isKnown() || !repose.isKnown() || !density.isKnown()) {
            return 0;
        }
        double tabulated = TabulatedFactor.drag(factor.get().certain(), Uncertain.ONE).value();
        double rankine = RankinePressure.drag(zone.sources().numberOr(Datum.WALL_FRICTION, 1).certain(),
                repose.get().certain(), density.get().certain(), Uncertain.ONE).value();
        return Math.abs(tabulated - rankine) / OF_RECTANGLE;
    }

    /** The spread of what could be computed; nothing where that is one method, or where the bed touches nothing. */
    Optional<MethodSpread> of(Map<DragMethod, Deduced<Uncertain>> methods) {
        DragMethod lowest = null;
        DragMethod highest = null;
        for (Map.Entry<DragMethod, Deduced<Uncertain>> entry : methods.entrySet()) {
            if (entry.getValue().isKnown()) {
                double drag = entry.getValue().get().value();
                lowest = lowest == null || drag < methods.get(lowest).get().value() ? entry.getKey() : lowest;
                highest = highest == null || drag > methods.get(highest).get().value() ? entry.getKey() : highest;
            }
        }
        if (lowest == highest || methods.get(lowest).get().value() <= 0
                || !zone.number(Datum.BULK_DENSITY).isKnown()) {
            return Optional.empty();
        }
        double least = methods.get(lowest).get().value();
        double most = methods.get(highest).get().value();
        return Optional.of(new MethodSpread(lowest, highest, most / least, reasons(lowest, least, highest, most),
                feed.spread()));
    }

    private List<Reason> reasons(DragMethod lowest, double least, DragMethod highest, double most) {
        double friction = friction(highest) / friction(lowest);
        double depth = depth(highest, most) / depth(lowest, least);
        double pressure = most / least / friction / depth;
        List<Reason> reasons = new ArrayList<>(3);
        for (Reason reason : List.of(new Reason(Cause.LATERAL_PRESSURE, pressure),
                new Reason(Cause.WALL_FRICTION, friction), new Reason(Cause.WHICH_DEPTH, depth))) {
            if (Math.abs(Math.log(reason.ratio())) > SAME) {
                reasons.add(reason);
            }
        }
        reasons.sort(Comparator.comparingDouble(reason -> -Math.abs(Math.log(reason.ratio()))));
        return reasons;
    }

    /** μ as the method takes it; a factor is taken as one of μ = 1, as CEMA's own expression behind its table [R]. */
    private double friction(DragMethod method) {
        return switch (method) {
            case TABULATED, SITE -> 1;
            case RANKINE -> zone.sources().numberOr(Datum.WALL_FRICTION, 1).value();
            case ISO_5048 -> zone.sources().boardGrip().value();
        };
    }

    /** The integral of the square of the depth that the method takes, over that of the depth at the board. */
    private double depth(DragMethod method, double drag) {
        return method != DragMethod.ISO_5048 ? 1 : drag / (zone.sources().boardGrip().value()
                * zone.number(Datum.BULK_DENSITY).get().value() * GRAVITY * squares());
    }

    private double squares() {
        return feed.integralOfSquare().get().value();
    }
}
