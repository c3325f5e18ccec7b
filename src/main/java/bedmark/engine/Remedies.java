package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.bed.Section;
import bedmark.engine.flow.BoardPlacement;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Judgement;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Remedy;
import bedmark.engine.verdict.Rule;
import bedmark.engine.verdict.Sense;
import java.util.Comparator;
import java.util.EnumSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Stream;

/**
 * What would lower the skirt power of a zone. Each remedy is the same zone with one thing changed, computed by the same
 * formulas, at constant flow (the bed keeps its area at each station, or that area times the change of speed) and
 * constant yearly tonnes. The readings are taken as they stand. A remedy that would break a rule which holds today is
 * refused and names it.
 */
final class Remedies {
    /** A change of less than this share is none. */
    private static final double WORTH_WHILE = 0.01;

    private final ZoneFacts zone;
    private final FeedFacts now;
    private final EnumSet<Rule> broken;

    Remedies(LoadingZone surveyed, Settings settings) {
        zone = new ZoneFacts(Sources.certain(surveyed, settings));
        now = FeedFacts.today(zone);
        broken = broken(now);
    }

    /** The remedies that the readings support: first those that may be ranked, the greatest saving ahead. */
    List<Remedy> all() {
        if (!now.skirtPower().isKnown() || !zone.section().isKnown()) {
            return List.of();
        }
        return Stream.of(freeBed(), lowerFeed(), widerBoards(), shorterZone(),
                        seals("adjust-seal", EnumSet.of(SealCondition.OVER_TIGHTENED)),
                        seals("renew-seal", EnumSet.of(SealCondition.WORN, SealCondition.HARDENED, SealCondition.TORN)),
                        fasterBelt())
                .flatMap(Optional::stream)
                .sorted(Comparator.comparing((Remedy remedy) -> remedy.refusedBecause().isPresent())
                        .thenComparing(remedy -> !remedy.ranked())
                        .thenComparing(remedy -> !remedy.code().equals("free-bed"))
                        .thenComparing(remedy -> -remedy.savedWh().orElse(now.skirtPower().get().value()
                                - remedy.skirtPower())))
                .toList();
    }

    /** A bed that lags is brought to belt speed: its area falls with the ratio of the two. */
    private Optional<Remedy> freeBed() {
        if (!broken.contains(Rule.BED_BEHIND_BELT) || now.bedSpeedRatio().get().value() == 0) {
            return Optional.empty();
        }
        FeedFacts then = new FeedFacts(zone, FeedFacts.scaled(zone, now.bedSpeedRatio().get()), now.statedFlow());
        return Optional.of(remedy("free-bed", OptionalDouble.of(1), "1", then, 1, true));
    }

    /** The feed is lowered until what it brings about warns no more; the belt runs longer for the same tonnes. */
    private Optional<Remedy> lowerFeed() {
        double factor = depthFactor();
        if (broken.contains(Rule.FLOW_OVER_CAPACITY)) {
            factor = Math.min(factor, near(Rule.FLOW_OVER_CAPACITY) / now.fill().get().value());
        }
        if (factor <= 0 || factor >= 1) {
            return Optional.empty();
        }
        Uncertain share = Uncertain.exact(factor);
        FeedFacts then = new FeedFacts(zone, FeedFacts.scaled(zone, share),
                Deduced.from(() -> now.statedFlow().get().times(share), now.statedFlow()));
        return Optional.of(remedy("lower-feed", OptionalDouble.of(factor), "1", then, 1 / factor, true));
    }

    /** The belt is run faster until the depth warns no more. Idlers and belt ask for more then, so it is not ranked. */
    private Optional<Remedy> fasterBelt() {
        double factor = depthFactor();
        if (factor <= 0 || factor >= 1) {
            return Optional.empty();
        }
        double speed = zone.beltSpeed().get().value() / factor;
        ZoneFacts faster = changed(zone.zone().with(Datum.BELT_SPEED, speed, 0).withStations(List.of()));
        FeedFacts then = new FeedFacts(faster, FeedFacts.scaled(zone, Uncertain.exact(factor)), now.statedFlow());
        return Optional.of(remedy("faster-belt", OptionalDouble.of(speed), "m/s", then, 1, false));
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
        ZoneFacts wider = changed(zone.zone().with(Datum.READ_SPACING, wanted, 0).withStations(List.of()));
        FeedFacts then = new FeedFacts(wider, between(wider.section()), now.statedFlow());
        return Optional.of(remedy("widen-boards", OptionalDouble.of(wanted), "m", then, 1, true));
    }

    /** The zone is cut to the length that it needs to settle. */
    private Optional<Remedy> shorterZone() {
        double length = zone.length().get().value();
        double needed = zone.settlingLength().get().value() * near(Rule.ZONE_TOO_SHORT);
        if (needed == 0 || needed >= length * (1 - WORTH_WHILE)) {
            return Optional.empty();
        }
        List<SealSegment> seals = zone.zone().seals().stream().map(segment -> new SealSegment(segment.side(),
                segment.type(), segment.condition(), Reading.exact(segment.length().name(),
                        segment.length().value() * needed / length))).toList();
        ZoneFacts shorter = changed(zone.zone().with(Datum.ZONE_LENGTH, needed, 0).withStations(List.of())
                .withSeals(seals));
        FeedFacts then = new FeedFacts(shorter,
                Deduced.known(zone.profile().get().upTo(Uncertain.exact(needed))), now.statedFlow());
        return Optional.of(remedy("shorten-zone", OptionalDouble.of(needed), "m", then, 1, true));
    }

    /** Seals in those conditions are made sound: worth something only where the site knows that they drag more. */
    private Optional<Remedy> seals(String code, Set<SealCondition> conditions) {
        List<SealSegment> mended = zone.zone().seals().stream().map(segment -> conditions.contains(segment.condition())
                ? new SealSegment(segment.side(), segment.type(), SealCondition.SOUND, segment.length())
                : segment).toList();
        ZoneFacts sound = changed(zone.zone().withSeals(mended).withStations(List.of()));
        if (!(sound.sealDrag().get().value() < zone.sealDrag().get().value())) {
            return Optional.empty();
        }
        FeedFacts then = new FeedFacts(sound, now.profile(), now.statedFlow());
        return Optional.of(remedy(code, OptionalDouble.empty(), "1", then, 1, true));
    }

    private ZoneFacts changed(LoadingZone other) {
        return new ZoneFacts(Sources.certain(other, zone.settings()));
    }

    /** The bed with the area of today, between other boards. */
    private Deduced<Profile> between(Deduced<Section> section) {
        return Deduced.from(() -> zone.profile().get().map(level ->
                section.get().level(zone.section().get().area(level))), section);
    }

    /** The factor on the bed's area at which the depth rules that warn today just stop warning; 1 where none does. */
    private double depthFactor() {
        double factor = 1;
        if (broken.contains(Rule.BED_OVER_BOARD)) {
            double allowed = near(Rule.BED_OVER_BOARD) * zone.height().get().value();
            Section section = zone.section().get();
            factor = section.area(Uncertain.exact(allowed)).value() / section.area(now.deepest().get()).value();
        }
        if (broken.contains(Rule.BED_OVER_DESIGN)) {
            double allowed = near(Rule.BED_OVER_DESIGN) * zone.referenceDepth().get().value();
            factor = Math.min(factor, Inversion.of(
                    share -> meanSquare(FeedFacts.scaled(zone, Uncertain.exact(share)).get()),
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
        if (!broken.contains(Rule.BED_OVER_BOARD) && !broken.contains(Rule.BED_OVER_DESIGN)) {
            return OptionalDouble.empty();
        }
        double reach = centre() + (zone.number(Datum.BELT_WIDTH).get().value() - centre()) * cosine();
        double spacing = zone.spacing().get().value();
        return Inversion.of(width -> depthToSpare(between(
                changed(zone.zone().with(Datum.READ_SPACING, width, 0).withStations(List.of())).section()).get()),
                0, spacing, reach);
    }

    /** By how much (m) the nearest of the depth rules that warn today is kept; negative where it still warns. */
    private double depthToSpare(Profile profile) {
        double spare = Double.POSITIVE_INFINITY;
        if (broken.contains(Rule.BED_OVER_BOARD)) {
            spare = near(Rule.BED_OVER_BOARD) * zone.height().get().value() - profile.deepest().value();
        }
        if (broken.contains(Rule.BED_OVER_DESIGN)) {
            spare = Math.min(spare, near(Rule.BED_OVER_DESIGN) * zone.referenceDepth().get().value()
                    - Math.sqrt(meanSquare(profile)));
        }
        return spare;
    }

    private static double meanSquare(Profile profile) {
        return profile.integralOfSquare().value() / profile.length().value();
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

    private Remedy remedy(String code, OptionalDouble change, String unit, FeedFacts then, double hours,
            boolean ranked) {
        OptionalDouble saved = ranked && now.energy().isKnown() ? OptionalDouble.of(
                now.energy().get().value() - then.energy().get().value() * hours) : OptionalDouble.empty();
        Set<Rule> newly = broken(then);
        newly.removeAll(broken);
        return new Remedy(code, change, unit, then.meanDepth().get().value(), then.skirtDrag().get().value(),
                then.skirtPower().get().value(), plain(then.drivePower()), plain(then.driveShare()), saved, ranked,
                newly.stream().findFirst());
    }

    private static EnumSet<Rule> broken(FeedFacts feed) {
        Observations observations = new Observations(feed, feed);
        EnumSet<Rule> broken = EnumSet.noneOf(Rule.class);
        observations.all().forEach((rule, observed) -> {
            if (observed.isKnown() && observations.limit(rule).on()
                    && Judgement.isBroken(rule, observed.get().value(), observations.limit(rule))) {
                broken.add(rule);
            }
        });
        return broken;
    }

    private static OptionalDouble plain(Deduced<Uncertain> number) {
        return number.isKnown() ? OptionalDouble.of(number.get().value()) : OptionalDouble.empty();
    }
}
