package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.bed.Section;
import bedmark.engine.flow.BoardPlacement;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Remedy;
import bedmark.engine.verdict.Rule;
import bedmark.engine.verdict.Sense;
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
    /** The factor on the bed's area at which the depth rules that warn today just stop warning; 1 where none does. */
    private final double depthFactor;

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
        depthFactor = zone.section().isKnown() && zone.profile().isKnown() ? findDepthFactor() : 1;
    }

    /** The remedies that the readings support: first those that may be ranked, the greatest saving ahead. */
    List<Remedy> all() {
        if (!now.skirtPower().isKnown() || !zone.section().isKnown()) {
            return List.of();
        }
        List<Remedy> remedies = new ArrayList<>();
        freeBed().ifPresent(remedies::add);
        lowerFeed().ifPresent(remedies::add);
        widerBoards().ifPresent(remedies::add);
        shorterZone().ifPresent(remedies::add);
        seals("adjust-seal", TIGHT).ifPresent(remedies::add);
        seals("renew-seal", SPENT).ifPresent(remedies::add);
        fasterBelt().ifPresent(remedies::add);
        remedies.sort(BEST_FIRST);
        return remedies;
    }

    /** A bed that lags is brought to belt speed: its area falls with the ratio of the two. */
    private Optional<Remedy> freeBed() {
        if (!breaches.contains(Rule.BED_BEHIND_BELT) || now.bedSpeedRatio().get().value() == 0) {
            return Optional.empty();
        }
        FeedFacts then = new FeedFacts(zone, FeedFacts.scaled(zone, now.bedSpeedRatio().get()), now.statedFlow());
        return Optional.of(remedy("free-bed", OptionalDouble.of(1), "1", then, 1, true, BED));
    }

    /** The feed is lowered until what it brings about warns no more; the belt runs longer for the same tonnes. */
    private Optional<Remedy> lowerFeed() {
        double factor = depthFactor;
        if (breaches.contains(Rule.FLOW_OVER_CAPACITY)) {
            factor = Math.min(factor, near(Rule.FLOW_OVER_CAPACITY) / now.fill().get().value());
        }
        if (factor <= 0 || factor >= 1) {
            return Optional.empty();
        }
        Uncertain share = Uncertain.exact(factor);
        FeedFacts then = new FeedFacts(zone, FeedFacts.scaled(zone, share),
                now.statedFlow().map(flow -> flow.times(share)));
        return Optional.of(remedy("lower-feed", OptionalDouble.of(factor), "1", then, 1 / factor, true, BED));
    }

    /** The belt is run faster until the depth warns no more. Idlers and belt ask for more then, so it is not ranked. */
    private Optional<Remedy> fasterBelt() {
        double factor = depthFactor;
        if (factor <= 0 || factor >= 1) {
            return Optional.empty();
        }
        double speed = zone.beltSpeed().get().value() / factor;
        FeedFacts then = new FeedFacts(zone.withBeltSpeed(speed), FeedFacts.scaled(zone, Uncertain.exact(factor)), now.statedFlow());
        return Optional.of(remedy("faster-belt", OptionalDouble.of(speed), "m/s", then, 1, false, SPEED));
    }

    /** The boards are set as wide apart as the belt bears, or as the depth would need. */
    private Optional<Remedy> widerBoards() {
        if (!zone.number(Datum.BELT_WIDTH).isKnown()) {
            return Optional.empty();
        }
        double spacing = zone.spacing().get().value();
        double widest = widestSpacing();
        double wanted = widest > spacing * (1 + WORTH_WHILE) ? widest : spacingForDepth().orElse(spacing);
        if (wanted <= spacing * (1 + WORTH_WHILE)) {
            return Optional.empty();
        }
        ZoneFacts wider = zone.withSpacing(wanted);
        FeedFacts then = new FeedFacts(wider, between(wider.section()), now.statedFlow());
        return Optional.of(remedy("widen-boards", OptionalDouble.of(wanted), "m", then, 1, true, BOARDS));
    }

    /** The zone is cut to the length that it needs to settle. */
    private Optional<Remedy> shorterZone() {
        if (!zone.settlingLength().isKnown()) {
            return Optional.empty();
        }
        double length = zone.length().get().value();
        double needed = zone.settlingLength().get().value() * near(Rule.ZONE_TOO_SHORT);
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

    /** The bed with the area of today, between other boards. */
    private Deduced<Profile> between(Deduced<Section> section) {
        Section today = zone.section().get();
        return Deduced.from(zone.profile(), section, (bed, other) -> bed.map(level -> other.level(today.area(level))));
    }

    private double findDepthFactor() {
        double factor = 1;
        if (breaches.contains(Rule.BED_OVER_BOARD)) {
            double allowed = near(Rule.BED_OVER_BOARD) * zone.height().get().value();
            Section section = zone.section().get();
            factor = section.area(Uncertain.exact(allowed)).value() / section.area(now.deepest().get()).value();
        }
        if (breaches.contains(Rule.BED_OVER_DESIGN)) {
            double allowed = near(Rule.BED_OVER_DESIGN) * zone.referenceDepth().get().value();
            double carried = zone.section().get().carriedDepth().value();
            Profile profile = zone.profile().get();
            factor = Math.min(factor, Inversion.of(
                    share -> profile.meanSquare(level -> share * (level + carried) - carried),
                    allowed * allowed, 0, 1).orElse(1));
        }
        return factor;
    }

    private double widestSpacing() {
        Uncertain belt = zone.number(Datum.BELT_WIDTH).get();
        double byWidth = near(Rule.BOARDS_TOO_WIDE) * BoardPlacement.widestSpacing(belt,
                zone.zone().is(LoadingZone.Mark.FREE_FLOWING)).value();
        double run = (belt.value() - centre()) / 2 - near(Rule.EDGE_TOO_SMALL) * BoardPlacement.leastEdge(belt).value();
        return Math.min(byWidth, centre() + 2 * run * cosine());
    }

    /** The spacing at which the depth rules that warn today just stop warning; none where the belt is too narrow. */
    private OptionalDouble spacingForDepth() {
        if (!breaches.contains(Rule.BED_OVER_BOARD) && !breaches.contains(Rule.BED_OVER_DESIGN)) {
            return OptionalDouble.empty();
        }
        double reach = centre() + (zone.number(Datum.BELT_WIDTH).get().value() - centre()) * cosine();
        double spacing = zone.spacing().get().value();
        return Inversion.of(width -> depthToSpare(between(zone.withSpacing(width).section()).get()),
                0, spacing, reach);
    }

    /** By how much (m) the nearest of the depth rules that warn today is kept; negative where it still warns. */
    private double depthToSpare(Profile profile) {
        double spare = Double.POSITIVE_INFINITY;
        if (breaches.contains(Rule.BED_OVER_BOARD)) {
            spare = near(Rule.BED_OVER_BOARD) * zone.height().get().value() - profile.deepest().value();
        }
        if (breaches.contains(Rule.BED_OVER_DESIGN)) {
            spare = Math.min(spare, near(Rule.BED_OVER_DESIGN) * zone.referenceDepth().get().value()
                    - Math.sqrt(profile.meanSquare(level -> level)));
        }
        return spare;
    }

    private double centre() {
        return zone.isFlat() ? 0 : zone.centreRoll().get().value();
    }

    private double cosine() {
        return Math.cos(zone.number(Datum.TROUGH_ANGLE).get().value());
    }

    /** Where a rule starts to warn, or to overload; out of reach where it does neither. */
    private double near(Rule rule) {
        Limit limit = zone.settings().limits().of(rule);
        return limit.near().orElse(limit.overloaded()
                .orElse(rule.sense() == Sense.OVER ? Double.POSITIVE_INFINITY : 0));
    }

    private static Set<Rule> rules(Rule... rules) {
        return Collections.unmodifiableSet(EnumSet.copyOf(List.of(rules)));
    }

    private Remedy remedy(String code, OptionalDouble change, String unit, FeedFacts then, double hours,
            boolean ranked, Set<Rule> touched) {
        OptionalDouble saved = ranked && now.energy().isKnown() ? OptionalDouble.of(
                now.energy().get().value() - then.energy().get().value() * hours) : OptionalDouble.empty();
        return new Remedy(code, change, unit, then.meanDepth().get().value(), then.skirtDrag().get().value(),
                then.skirtPower().get().value(), plain(then.drivePower()), plain(then.driveShare()), saved, ranked,
                breaches.worseIn(Breaches.of(then, touched, othersShare)));
    }

    private static OptionalDouble plain(Deduced<Uncertain> number) {
        return number.isKnown() ? OptionalDouble.of(number.get().value()) : OptionalDouble.empty();
    }
}
