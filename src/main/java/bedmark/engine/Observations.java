package bedmark.engine;

import bedmark.engine.bed.Section;
import bedmark.engine.flow.BoardPlacement;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Rule;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What each rule observes of a zone at one feed. Of the power of the conveyor's skirts it is this zone's part: the sum
 * takes all of its zones.
 */
final class Observations {
    private final ZoneFacts zone;
    private final FeedFacts today;
    private final FeedFacts feed;

    /**
     * @param today as it was read
     * @param feed  the feed to judge: today's, or a stated one beside a stated one of today
     */
    Observations(FeedFacts today, FeedFacts feed) {
        zone = feed.zone();
        this.today = today;
        this.feed = feed;
    }

    /** Whether what a rule observes changes with the feed. */
    static boolean changesWithFeed(Rule rule) {
        return switch (rule) {
            case BED_OVER_BOARD, BED_OVER_DESIGN, FLOW_OVER_CAPACITY, DRIVE_NEAR_RATING, SKIRTS_OVER_BUDGET,
                    BED_NOT_SETTLED -> true;
            default -> false;
        };
    }

    /** The observed number of a rule; one that was not read, or does not apply, waits for nothing. */
    Deduced<Uncertain> of(Rule rule) {
        return switch (rule) {
            case BED_OVER_BOARD -> over(feed.deepest(), zone.height());
            case BED_OVER_DESIGN -> bedOverDesign();
            case FLOW_OVER_CAPACITY -> feed.statedFlow().isKnown() ? feed.fill() : Deduced.nothing();
            case DRIVE_NEAR_RATING -> feed == today ? runningShare() : runningShareAtLeast();
            case SKIRTS_OVER_BUDGET -> feed.driveShare();
            case BED_BEHIND_BELT, READINGS_DISAGREE -> today.bedSpeedRatio();
            case ZONE_TOO_SHORT -> zone.settlingLength().value().filter(needed -> needed.value() <= 0).isPresent()
                    ? Deduced.nothing() : over(zone.length(), zone.settlingLength());
            case BOARDS_TOO_WIDE -> over(zone.spacing(), widestSpacing());
            case EDGE_TOO_SMALL -> over(freeEdge(), leastEdge());
            case BOARD_TOO_LOW_FOR_LUMPS -> boardOverLumps();
            case BELT_TOO_FAST -> Deduced.from(zone.beltSpeed(), tableSpeed(), (speed, highest) -> speed);
            case BED_NOT_SETTLED -> bedNotSettled();
            case SEAL_DEFECT -> sealDefects();
        };
    }

    /**
     * Why a rule that was read for cannot be judged: the code of an assumption. The belt of a feeder bears its hopper,
     * of which no reading tells; a conveyor that is skirted all along has no open belt to carry the flow. A feeder that
     * is not skirted all along lays its flow on an open belt like any other, hopper or not, so that the rule on that
     * flow holds for it; where it is, the mark for that says so.
     */
    Optional<String> outsideTheMethods(Rule rule) {
        if (rule == Rule.FLOW_OVER_CAPACITY && zone.zone().is(LoadingZone.Mark.FULLY_SKIRTED)
                && feed.statedFlow().isKnown()) {
            return Optional.of("no-open-belt");
        }
        return rule == Rule.DRIVE_NEAR_RATING && feed != today && zone.zone().is(LoadingZone.Mark.BELT_FEEDER)
                && runningShareAtLeast().isKnown() ? Optional.of("hopper-load-outside") : Optional.empty();
    }

    /** What the disagreement of the drag methods brings into the observed number of a rule on this zone alone. */
    double spread(Rule rule) {
        return rule == Rule.DRIVE_NEAR_RATING && feed != today
                ? Math.abs(feed.spreadOfShare() - today.spreadOfShare()) : 0;
    }

    /** The limits of a rule in the unit of what it observes. */
    Limit limit(Rule rule) {
        Limit limit = zone.settings().limits().of(rule);
        if (rule == Rule.BELT_TOO_FAST && tableSpeed().isKnown()) {
            double speed = tableSpeed().get();
            return new Limit(Findings.times(limit.near(), speed), Findings.times(limit.overloaded(), speed), limit.on(),
                    limit.source(), limit.assumption());
        }
        return rule == Rule.SKIRTS_OVER_BUDGET ? budgeted(limit) : limit;
    }

    /**
     * The register's budget is the limit of overload. The warning stays where it is, since it is about what skirts take
     * as a rule; only one beyond the budget, which would never be heard, is drawn in to it.
     */
    private Limit budgeted(Limit limit) {
        Deduced<Uncertain> budget = zone.number(Datum.SKIRT_POWER_BUDGET);
        if (!budget.isKnown()) {
            return limit;
        }
        double most = budget.get().value();
        OptionalDouble near = limit.near().isEmpty() ? limit.near()
                : OptionalDouble.of(Math.min(limit.near().getAsDouble(), most));
        return new Limit(near, OptionalDouble.of(most), limit.on(), limit.source(), limit.assumption());
    }

    private Deduced<Uncertain> boardOverLumps() {
        return Deduced.from(zone.height(), zone.spacing(), zone.number(Datum.LUMP_SIZE),
                (height, spacing, lumps) -> height.min(spacing).over(lumps));
    }

    private Deduced<Uncertain> bedOverDesign() {
        return Deduced.from(feed.meanSquare(), zone.referenceDepth(),
                (square, reference) -> square.squareRoot().over(reference));
    }

    /** Running shaft power over rated power; only with a running electrical power. */
    private Deduced<Uncertain> runningShare() {
        return zone.number(Datum.RUNNING_POWER).isKnown()
                ? over(runningShaftPower(zone), zone.number(Datum.RATED_POWER)) : Deduced.nothing();
    }

    /**
     * The same at a feed that is not less than today's, on a belt that does not fall: today's running power and what
     * the skirts ask for beyond it. The rest of the belt would ask for more too, so that it is a lower bound.
     */
    private Deduced<Uncertain> runningShareAtLeast() {
        boolean rises = zone.sources().numberOr(Datum.INCLINE, 0).value() >= 0;
        if (!zone.number(Datum.RUNNING_POWER).isKnown() || !rises
                || feed.statedFlow().get().value() < today.statedFlow().get().value()) {
            return Deduced.nothing();
        }
        return Deduced.from(runningShaftPower(zone), feed.drivePower(), today.drivePower(),
                zone.number(Datum.RATED_POWER),
                (shaft, then, now, rated) -> shaft.plus(then).minus(now).over(rated));
    }

    /** Shaft power of the drive while it was read; the reading is electrical. */
    static Deduced<Uncertain> runningShaftPower(ZoneFacts zone) {
        return Deduced.from(zone.number(Datum.RUNNING_POWER), zone.number(Datum.MOTOR_EFFICIENCY), Uncertain::times);
    }

    private Deduced<Uncertain> widestSpacing() {
        return Deduced.from(zone.number(Datum.BELT_WIDTH), belt -> BoardPlacement.widestSpacing(belt,
                zone.zone().is(LoadingZone.Mark.FREE_FLOWING)));
    }

    private Deduced<Uncertain> leastEdge() {
        return Deduced.from(zone.number(Datum.BELT_WIDTH), BoardPlacement::leastEdge);
    }

    private Deduced<Uncertain> freeEdge() {
        return Deduced.from(zone.number(Datum.BELT_WIDTH), zone.centreRoll(), zone.spacing(),
                zone.number(Datum.TROUGH_ANGLE), (belt, roll, spacing, trough) -> BoardPlacement.freeEdge(belt, roll,
                        spacing, Section.wingRun(spacing, roll, trough)));
    }

    private Deduced<Double> tableSpeed() {
        Optional<SpeedClass> material = zone.zone().speedClass();
        return material.isEmpty() ? Deduced.waitingFor("/material/speedClass") : Deduced.from(
                zone.number(Datum.BELT_WIDTH), belt -> zone.settings().maximumSpeeds()
                        .forBelt(material.get(), belt.value()));
    }

    /** Change over the last quarter over the mean depth; nothing from one station, or where the bed touches nowhere. */
    private Deduced<Uncertain> bedNotSettled() {
        return Deduced.flat(Deduced.from(feed.profile(), feed.meanDepth(), (bed, mean) -> bed.stations() < 2
                || mean.value() == 0 ? Optional.empty() : Optional.of(bed.changeOverLastQuarter().over(mean))));
    }

    /** How many segments are not sound; a side that was not looked at may hide more, but takes none away. */
    private Deduced<Uncertain> sealDefects() {
        int defects = 0;
        for (SealSegment segment : zone.zone().seals()) {
            defects += segment.condition().isDefect() ? 1 : 0;
        }
        return defects == 0 && !zone.sidesWithoutSeals().isEmpty() ? Deduced.waitingFor("/readings/seals")
                : Deduced.known(Uncertain.exact(defects));
    }

    private static Deduced<Uncertain> over(Deduced<Uncertain> part, Deduced<Uncertain> whole) {
        return Deduced.from(part, whole, Uncertain::over);
    }
}
