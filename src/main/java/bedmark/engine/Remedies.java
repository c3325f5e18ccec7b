package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Remedy;
import bedmark.engine.verdict.Rule;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Collections;
import java.util.Comparator;
import java.util.EnumSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * What would lower the skirt power of a zone. Each remedy is the same zone with one thing changed, computed by the same
 * formulas, at constant flow (the bed keeps its area at each station, or that area times the change of speed) and
 * constant yearly tonnes. The readings are taken as they stand. A remedy that would break a rule which holds today is
 * refused and names it.
 */
final class Remedies {
    /** A change of less than this share is none. */
    private static final double WORTH_WHILE = 0.01;
    private static final Set<SealCondition> TIGHT = EnumSet.of(SealCondition.OVER_TIGHTENED);
    private static final Set<SealCondition> SPENT =
            EnumSet.of(SealCondition.WORN, SealCondition.HARDENED, SealCondition.TORN);
    /** Those that are not refused, of them those that may be ranked, a bed set free ahead of all, the rest by saving. */
    private static final Comparator<Remedy> BEST_FIRST =
            Comparator.comparing((Remedy remedy) -> remedy.refusedBecause().isPresent())
                    .thenComparing(remedy -> !remedy.ranked())
                    .thenComparing(remedy -> !remedy.code().equals("free-bed"))
                    .thenComparingDouble(remedy -> -remedy.savedWh().orElse(-remedy.skirtPower()));
    /** The rules that a change of the bed alone may break. How the readings agree is no business of a change. */
    private static final Set<Rule> BED = rules(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN, Rule.FLOW_OVER_CAPACITY,
            Rule.SKIRTS_OVER_BUDGET, Rule.BED_NOT_SETTLED);
    private static final Set<Rule> LENGTH = rules(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN, Rule.SKIRTS_OVER_BUDGET,
            Rule.BED_NOT_SETTLED, Rule.ZONE_TOO_SHORT);
    private static final Set<Rule> SPEED = rules(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN, Rule.FLOW_OVER_CAPACITY,
            Rule.SKIRTS_OVER_BUDGET, Rule.BED_NOT_SETTLED, Rule.ZONE_TOO_SHORT, Rule.BELT_TOO_FAST);
    private static final Set<Rule> BOARDS = rules(Rule.BED_OVER_BOARD, Rule.BED_OVER_DESIGN, Rule.SKIRTS_OVER_BUDGET,
            Rule.BED_NOT_SETTLED, Rule.BOARDS_TOO_WIDE, Rule.EDGE_TOO_SMALL, Rule.BOARD_TOO_LOW_FOR_LUMPS);

    private final ZoneFacts zone;
    private final FeedFacts now;
    private final Breaches breaches;
    private final double othersShare;
    private final Room room;

    /**
     * @param uncertain   the zone; it is taken as it stands
     * @param findings    how it stands today
     * @param othersShare of the rated power, for the skirts of the conveyor's other zones
     */
    Remedies(ZoneFacts uncertain, Collection<Finding> findings, double othersShare) {
        zone = uncertain.certain();
        now = FeedFacts.today(zone);
        this.othersShare = othersShare;
        breaches = Breaches.of(findings);
        room = new Room(now, breaches);
    }

    /** The remedies that the readings support: first those that may be ranked, the greatest saving ahead. */
    List<Remedy> all() {
        if (!now.skirtPower().isKnown() || !zone.section().isKnown() || !zone.profile().isKnown()) {
            return List.of();
        }
        List<Remedy> remedies = new ArrayList<>();
        double areaFactor = room.areaFactor();
        freeBed().ifPresent(remedies::add);
        lowerFeed(areaFactor).ifPresent(remedies::add);
        widerBoards().ifPresent(remedies::add);
        shorterZone().ifPresent(remedies::add);
        seals("adjust-seal", TIGHT).ifPresent(remedies::add);
        seals("renew-seal", SPENT).ifPresent(remedies::add);
        fasterBelt(areaFactor).ifPresent(remedies::add);
        slowerBelt().ifPresent(remedies::add);
        remedies.sort(BEST_FIRST);
        return remedies;
    }

    /**
     * A bed that lags is brought to belt speed, all along the zone: the same flow at one speed has one area, and with
     * it one depth, whatever its shape was while it lagged. The mean area falls with the ratio of the two speeds.
     */
    private Optional<Remedy> freeBed() {
        if (!breaches.contains(Rule.BED_BEHIND_BELT) || now.bedSpeedRatio().get().value() == 0) {
            return Optional.empty();
        }
        Deduced<Profile> level = FeedFacts.scaled(zone, now.bedSpeedRatio().get()).map(bed -> {
            Uncertain mean = bed.meanLevel();
            return bed.map(lagging -> mean);
        });
        FeedFacts then = new FeedFacts(zone, level, now.statedFlow());
        return Optional.of(remedy("free-bed", OptionalDouble.of(1), "1", then, 1, true, BED));
    }

    /** The feed is lowered until what it brings about warns no more; the belt runs longer for the same tonnes. */
    private Optional<Remedy> lowerFeed(double areaFactor) {
        double factor = areaFactor;
        if (breaches.contains(Rule.FLOW_OVER_CAPACITY)) {
            factor = Math.min(factor, room.near(Rule.FLOW_OVER_CAPACITY) / now.fill().get().value());
        }
        if (factor <= 0 || factor >= 1) {
            return Optional.empty();
        }
        Uncertain share = Uncertain.exact(factor);
        FeedFacts then = new FeedFacts(zone, FeedFacts.scaled(zone, share),
                now.statedFlow().map(flow -> flow.times(share)));
        return Optional.of(remedy("lower-feed", OptionalDouble.of(factor), "1", then, 1 / factor, true, BED));
    }

    /** The belt is run faster until the depth warns no more. */
    private Optional<Remedy> fasterBelt(double areaFactor) {
        return areaFactor <= 0 || areaFactor >= 1 ? Optional.empty()
                : Optional.of(otherSpeed("faster-belt", areaFactor));
    }

    /** The belt is slowed to what its material bears. */
    private Optional<Remedy> slowerBelt() {
        if (!breaches.contains(Rule.BELT_TOO_FAST)) {
            return Optional.empty();
        }
        Limit limit = new Observations(now, now).limit(Rule.BELT_TOO_FAST);
        double borne = limit.near().orElse(limit.overloaded().orElse(0));
        return borne <= 0 ? Optional.empty()
                : Optional.of(otherSpeed("slower-belt", zone.beltSpeed().get().value() / borne));
    }

    /** Idlers and belt ask for more or less then, which is outside the methods: it is not ranked. */
    private Remedy otherSpeed(String code, double areaFactor) {
        double speed = zone.beltSpeed().get().value() / areaFactor;
        FeedFacts then = new FeedFacts(zone.withBeltSpeed(speed), FeedFacts.scaled(zone, Uncertain.exact(areaFactor)),
                now.statedFlow());
        return remedy(code, OptionalDouble.of(speed), "m/s", then, 1, false, SPEED);
    }

    /** The boards are set as wide apart as the belt bears, or as the depth would need. */
    private Optional<Remedy> widerBoards() {
        if (!zone.number(Datum.BELT_WIDTH).isKnown()) {
            return Optional.empty();
        }
        double spacing = zone.spacing().get().value();
        double widest = room.widestSpacing();
        double wanted = widest > spacing * (1 + WORTH_WHILE) ? widest : room.spacingForDepth().orElse(spacing);
        if (wanted <= spacing * (1 + WORTH_WHILE)) {
            return Optional.empty();
        }
        ZoneFacts wider = zone.withSpacing(wanted);
        FeedFacts then = new FeedFacts(wider, Room.between(zone, wider), now.statedFlow());
        return Optional.of(remedy("widen-boards", OptionalDouble.of(wanted), "m", then, 1, true, BOARDS));
    }

    /** The zone is cut to the length that it needs to settle. */
    private Optional<Remedy> shorterZone() {
        if (!zone.settlingLength().isKnown() || zone.zone().is(LoadingZone.Mark.FULLY_SKIRTED)) {
            return Optional.empty();
        }
        double length = zone.length().get().value();
        double needed = zone.settlingLength().get().value() * room.near(Rule.ZONE_TOO_SHORT);
        if (needed <= 0 || needed >= length * (1 - WORTH_WHILE)) {
            return Optional.empty();
        }
        ZoneFacts shorter = zone.withLength(needed);
        FeedFacts then = new FeedFacts(shorter,
                Deduced.known(zone.profile().get().upTo(Uncertain.exact(needed))), now.statedFlow());
        return Optional.of(remedy("shorten-zone", OptionalDouble.of(needed), "m", then, 1, true, LENGTH));
    }

    /** Seals in those conditions are made sound: worth something only where the site knows that they drag more. */
    private Optional<Remedy> seals(String code, Set<SealCondition> conditions) {
        if (!zone.zone().hasSeals(conditions)) {
            return Optional.empty();
        }
        List<SealSegment> mended = zone.zone().seals().stream().map(segment -> conditions.contains(segment.condition())
                ? new SealSegment(segment.side(), segment.type(), SealCondition.SOUND, segment.length())
                : segment).toList();
        ZoneFacts sound = zone.withSeals(mended);
        if (!(sound.sealDrag().get().value() < zone.sealDrag().get().value())) {
            return Optional.empty();
        }
        FeedFacts then = new FeedFacts(sound, now.profile(), now.statedFlow());
        return Optional.of(remedy(code, OptionalDouble.empty(), "1", then, 1, true, Set.of()));
    }

    private static Set<Rule> rules(Rule... rules) {
        return Collections.unmodifiableSet(EnumSet.copyOf(List.of(rules)));
    }

    private Remedy remedy(String code, OptionalDouble change, String unit, FeedFacts then, double hours,
            boolean ranked, Set<Rule> touched) {
        OptionalDouble saved = ranked && now.energy().isKnown() ? OptionalDouble.of(
                now.energy().get().value() - then.energy().get().value() * hours) : OptionalDouble.empty();
        OptionalDouble savedElectrical = zone.number(Datum.MOTOR_EFFICIENCY).isKnown() ? saved : OptionalDouble.empty();
        Prices prices = zone.settings().prices();
        return new Remedy(code, change, unit, then.meanDepth().get().value(), then.skirtDrag().get().value(),
                then.skirtPower().get().value(), plain(then.drivePower()), plain(then.driveShare()), saved,
                times(savedElectrical, prices.energy()), times(savedElectrical, prices.co2()), ranked,
                breaches.worseIn(Breaches.of(then, touched, othersShare)));
    }

    /** Of an energy (Wh) and something for each kWh. */
    private static OptionalDouble times(OptionalDouble energy, OptionalDouble perKilowattHour) {
        return energy.isPresent() && perKilowattHour.isPresent()
                ? OptionalDouble.of(energy.getAsDouble() / 1000 * perKilowattHour.getAsDouble())
                : OptionalDouble.empty();
    }

    private static OptionalDouble plain(Deduced<Uncertain> number) {
        return number.isKnown() ? OptionalDouble.of(number.get().value()) : OptionalDouble.empty();
    }
}
