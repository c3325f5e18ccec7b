package bedmark.engine;

import bedmark.engine.bed.Section;
import bedmark.engine.flow.BoardPlacement;
import bedmark.engine.flow.MaximumBeltSpeed;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Rule;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What each rule observes of a zone at one feed. The power of the conveyor's skirts is not among them: it takes all of
 * its zones.
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

    /** The observed number of every rule; one that was not read, or does not apply, waits for nothing. */
    Map<Rule, Deduced<Uncertain>> all() {
        Map<Rule, Deduced<Uncertain>> all = new EnumMap<>(Rule.class);
        all.put(Rule.BED_OVER_BOARD, over(feed.deepest(), zone.height()));
        all.put(Rule.BED_OVER_DESIGN, bedOverDesign());
        all.put(Rule.FLOW_OVER_CAPACITY, feed.statedFlow().isKnown() ? feed.fill() : Deduced.nothing());
        all.put(Rule.DRIVE_NEAR_RATING, feed == today ? runningShare() : runningShareAtLeast());
        all.put(Rule.BED_BEHIND_BELT, today.bedSpeedRatio());
        all.put(Rule.READINGS_DISAGREE, today.bedSpeedRatio());
        all.put(Rule.ZONE_TOO_SHORT, over(zone.length(), zone.settlingLength()));
        all.put(Rule.BOARDS_TOO_WIDE, over(zone.spacing(), widestSpacing()));
        all.put(Rule.EDGE_TOO_SMALL, over(freeEdge(), leastEdge()));
        all.put(Rule.BOARD_TOO_LOW_FOR_LUMPS, Deduced.from(() -> zone.height().get().min(zone.spacing().get())
                .over(zone.number(Datum.LUMP_SIZE).get()),
                zone.height(), zone.spacing(), zone.number(Datum.LUMP_SIZE)));
        all.put(Rule.BELT_TOO_FAST, Deduced.from(zone.beltSpeed()::get, zone.beltSpeed(), tableSpeed()));
        all.put(Rule.BED_NOT_SETTLED, bedNotSettled());
        all.put(Rule.SEAL_DEFECT, sealDefects());
        return all;
    }

    /** The limits of a rule in the unit of what it observes. */
    Limit limit(Rule rule) {
        Limit limit = zone.settings().limits().of(rule);
        if (rule == Rule.BELT_TOO_FAST && tableSpeed().isKnown()) {
            double speed = tableSpeed().get();
            return new Limit(times(limit.near(), speed), times(limit.overloaded(), speed), limit.on(),
                    limit.source(), limit.assumption());
        }
        Optional<Double> budget = zone.zone().get(Datum.SKIRT_POWER_BUDGET).map(reading -> reading.value());
        if (rule == Rule.SKIRTS_OVER_BUDGET && budget.isPresent()) {
            return new Limit(limit.near(), OptionalDouble.of(budget.get()), limit.on(), limit.source(),
                    limit.assumption());
        }
        return limit;
    }

    private Deduced<Uncertain> bedOverDesign() {
        Deduced<Uncertain> meanSquare = feed.meanSquare();
        return Deduced.from(() -> meanSquare.get().squareRoot().over(zone.referenceDepth().get()),
                meanSquare, zone.referenceDepth());
    }

    /** Running shaft power over rated power; only with a running electrical power. */
    private Deduced<Uncertain> runningShare() {
        Deduced<Uncertain> shaft = runningShaftPower();
        return zone.number(Datum.RUNNING_POWER).isKnown() ? over(shaft, zone.number(Datum.RATED_POWER))
                : Deduced.nothing();
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
        Deduced<Uncertain> shaft = runningShaftPower();
        return Deduced.from(() -> shaft.get().plus(feed.drivePower().get()).minus(today.drivePower().get())
                .over(zone.number(Datum.RATED_POWER).get()),
                shaft, feed.drivePower(), today.drivePower(), zone.number(Datum.RATED_POWER));
    }

    private Deduced<Uncertain> runningShaftPower() {
        return runningShaftPower(zone);
    }

    /** Shaft power of the drive while it was read; the reading is electrical. */
    static Deduced<Uncertain> runningShaftPower(ZoneFacts zone) {
        Deduced<Uncertain> electrical = zone.number(Datum.RUNNING_POWER);
        Deduced<Uncertain> efficiency = zone.number(Datum.MOTOR_EFFICIENCY);
        return Deduced.from(() -> electrical.get().times(efficiency.get()), electrical, efficiency);
    }

    private Deduced<Uncertain> widestSpacing() {
        Deduced<Uncertain> belt = zone.number(Datum.BELT_WIDTH);
        return Deduced.from(() -> BoardPlacement.widestSpacing(belt.get(),
                zone.zone().is(LoadingZone.Mark.FREE_FLOWING)), belt);
    }

    private Deduced<Uncertain> leastEdge() {
        Deduced<Uncertain> belt = zone.number(Datum.BELT_WIDTH);
        return Deduced.from(() -> BoardPlacement.leastEdge(belt.get()), belt);
    }

    private Deduced<Uncertain> freeEdge() {
        Deduced<Uncertain> belt = zone.number(Datum.BELT_WIDTH);
        Deduced<Uncertain> trough = zone.number(Datum.TROUGH_ANGLE);
        return Deduced.from(() -> BoardPlacement.freeEdge(belt.get(), zone.centreRoll().get(), zone.spacing().get(),
                Section.wingRun(zone.spacing().get(), zone.centreRoll().get(), trough.get())),
                belt, zone.centreRoll(), zone.spacing(), trough);
    }

    private Deduced<Double> tableSpeed() {
        return zone.zone().speedClass().map(speedClass -> Deduced.from(() ->
                MaximumBeltSpeed.of(speedClass, zone.number(Datum.BELT_WIDTH).get().value()),
                zone.number(Datum.BELT_WIDTH))).orElseGet(() -> Deduced.waitingFor("/material/speedClass"));
    }

    /** Change over the last quarter over the mean depth; nothing from one station, or where the bed touches nowhere. */
    private Deduced<Uncertain> bedNotSettled() {
        Deduced<Uncertain> mean = feed.meanDepth();
        return Deduced.perhaps(() -> feed.profile().get().stations() < 2 || mean.get().value() == 0 ? Optional.empty()
                : Optional.of(feed.profile().get().changeOverLastQuarter().over(mean.get())), mean);
    }

    /** How many segments are not sound; a side that was not looked at may hide more, but takes none away. */
    private Deduced<Uncertain> sealDefects() {
        long defects = zone.zone().seals().stream().map(segment -> segment.condition())
                .filter(SealCondition::isDefect).count();
        return defects == 0 && !zone.sidesWithoutSeals().isEmpty() ? Deduced.waitingFor("/readings/seals")
                : Deduced.known(Uncertain.exact(defects));
    }

    private static Deduced<Uncertain> over(Deduced<Uncertain> part, Deduced<Uncertain> whole) {
        return Deduced.from(() -> part.get().over(whole.get()), part, whole);
    }

    private static OptionalDouble times(OptionalDouble limit, double factor) {
        return limit.isPresent() ? OptionalDouble.of(limit.getAsDouble() * factor) : limit;
    }
}
