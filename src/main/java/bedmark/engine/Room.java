package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.bed.Section;
import bedmark.engine.flow.BoardPlacement;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Rule;
import bedmark.engine.verdict.Sense;
import java.util.OptionalDouble;

/** How far a change must go for the rules on the bed that warn today just to warn no more. */
final class Room {
    private final ZoneFacts zone;
    private final FeedFacts now;
    private final Breaches breaches;

    /** @param now without uncertainty, its section and profile known */
    Room(FeedFacts now, Breaches breaches) {
        this.zone = now.zone();
        this.now = now;
        this.breaches = breaches;
    }

    /** The factor on the bed's area; 1 where no depth warns. */
    double areaFactor() {
        double factor = 1;
        if (breaches.contains(Rule.BED_OVER_BOARD)) {
            double allowed = near(Rule.BED_OVER_BOARD) * zone.height().get().value();
            Section section = zone.section().get();
            factor = section.area(Uncertain.exact(allowed)).value() / section.area(now.deepest().get()).value();
        }
        if (breaches.contains(Rule.BED_OVER_DESIGN)) {
            double allowed = near(Rule.BED_OVER_DESIGN) * zone.referenceDepth().get().value();
            factor = Math.min(factor, areaFactorOf(allowed * allowed));
        }
        return factor;
    }

    /** The factor on the bed's area at which the mean of the square of the depth is so large (m²); 1 where it is. */
    private double areaFactorOf(double meanSquare) {
        double carried = zone.section().get().carriedDepth().value();
        Profile profile = zone.profile().get();
        return Inversion.of(share -> profile.meanSquare(level -> share * (level + carried) - carried), meanSquare, 0, 1)
                .orElse(1);
    }

    /** The widest spacing of the boards that the belt bears (m). */
    double widestSpacing() {
        Uncertain belt = zone.number(Datum.BELT_WIDTH).get();
        double byWidth = near(Rule.BOARDS_TOO_WIDE) * BoardPlacement.widestSpacing(belt,
                zone.zone().is(LoadingZone.Mark.FREE_FLOWING)).value();
        double run = (belt.value() - centre()) / 2 - near(Rule.EDGE_TOO_SMALL) * BoardPlacement.leastEdge(belt).value();
        return Math.min(byWidth, centre() + 2 * run * cosine());
    }

    /** The spacing of the boards (m) that the depth needs; none where none does, or where the belt is too narrow. */
    OptionalDouble spacingForDepth() {
        if (!breaches.contains(Rule.BED_OVER_BOARD) && !breaches.contains(Rule.BED_OVER_DESIGN)) {
            return OptionalDouble.empty();
        }
        double reach = centre() + (zone.number(Datum.BELT_WIDTH).get().value() - centre()) * cosine();
        return Inversion.of(width -> depthToSpare(between(zone, zone.withSpacing(width)).get()), 0,
                zone.spacing().get().value(), reach);
    }

    /** The bed with its areas of today, between other boards. */
    static Deduced<Profile> between(ZoneFacts today, ZoneFacts other) {
        return Deduced.from(today.profile(), today.section(), other.section(), (bed, section, changed) ->
                bed.map(level -> changed.level(section.area(level))));
    }

    /** Where a rule starts to warn, or to overload; out of reach where it does neither. */
    double near(Rule rule) {
        Limit limit = zone.settings().limits().of(rule);
        return limit.near().orElse(limit.overloaded()
                .orElse(rule.sense() == Sense.OVER ? Double.POSITIVE_INFINITY : 0));
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
}
