package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.Section;
import bedmark.engine.bed.Station;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Remedy;
import bedmark.engine.verdict.Rule;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import org.junit.jupiter.api.Test;

/**
 * Every remedy is done to the zone and the zone is assessed anew: what was told of the remedy must come of it, the same
 * material must pass, and only the rule that it was refused for may break.
 */
class RemedyPropertiesTest {
    private static final double EXACT = 1e-9;
    private static final Settings SITE = Zones.exactSettings().with(Zones.exactSettings().sealRates()
            .with(bedmark.engine.seal.SealType.VERTICAL, SealCondition.OVER_TIGHTENED, 3)
            .with(bedmark.engine.seal.SealType.OBLIQUE, SealCondition.WORN, 1.5));

    @Test
    void aRemedyThatIsDoneBringsWhatItTold() {
        Random random = new Random(61);
        Map<String, Integer> done = new HashMap<>();
        for (int i = 0; i < Zones.MANY; i++) {
            LoadingZone zone = atBoard(Zones.exact(Zones.random(random)));
            Assessment before = Engine.assess(zone, SITE);
            inOrder(before.remedies());
            for (Remedy remedy : before.remedies()) {
                LoadingZone after = done(zone, before, remedy);
                if (after.stations().stream().anyMatch(station -> station.raw().value() < 0)) {
                    continue;
                }
                done.merge(remedy.code(), 1, Integer::sum);
                Assessment then = Engine.assess(after, SITE);
                close(remedy.skirtPower(), then.get(Result.SKIRT_POWER).orElseThrow().value(), remedy.code());
                close(remedy.skirtDrag(), then.get(Result.SKIRT_DRAG).orElseThrow().value(), remedy.code());
                close(remedy.meanDepth(), then.get(Result.MEAN_DEPTH).orElseThrow().value(), remedy.code());
                remedy.driveShare().ifPresent(share ->
                        close(share, then.get(Result.DRIVE_SHARE).orElseThrow().value(), remedy.code()));
                flowGoesOn(remedy, before, then);
                refusedForWhatBreaks(remedy, before, then);
            }
        }
        assertTrue(done.keySet().containsAll(Set.of("free-bed", "lower-feed", "widen-boards", "shorten-zone",
                "faster-belt", "slower-belt", "adjust-seal", "renew-seal")), done::toString);
    }

    /** Refused ones last, of the others those not ranked last, a freed bed first, the greater saving before the less. */
    private static void inOrder(List<Remedy> remedies) {
        for (int i = 1; i < remedies.size(); i++) {
            Remedy before = remedies.get(i - 1);
            Remedy after = remedies.get(i);
            int refused = Boolean.compare(before.refusedBecause().isPresent(), after.refusedBecause().isPresent());
            int unranked = Boolean.compare(!before.ranked(), !after.ranked());
            int notFree = Boolean.compare(!before.code().equals("free-bed"), !after.code().equals("free-bed"));
            int place = refused != 0 ? refused : unranked != 0 ? unranked : notFree;
            boolean saved = before.savedWh().isPresent() && after.savedWh().isPresent();
            double less = saved ? after.savedWh().getAsDouble() - before.savedWh().getAsDouble()
                    : before.skirtPower() - after.skirtPower();
            assertTrue(place < 0 || place == 0 && less <= 0, before + " before " + after);
        }
    }

    /** The bed carries the flow that it carried: at belt speed, or at its own once it is freed; less where it is fed less. */
    private static void flowGoesOn(Remedy remedy, Assessment before, Assessment then) {
        double was = before.get(Result.IMPLIED_THROUGHPUT).orElseThrow().value();
        double is = then.get(Result.IMPLIED_THROUGHPUT).orElseThrow().value();
        switch (remedy.code()) {
            case "free-bed" -> close(was * before.get(Result.BED_SPEED_RATIO).orElseThrow().value(), is, "free-bed");
            case "lower-feed" -> close(was * remedy.change().orElseThrow(), is, "lower-feed");
            case "shorten-zone" -> assertTrue(is > 0 || was == 0);
            default -> close(was, is, remedy.code());
        }
    }

    private static void refusedForWhatBreaks(Remedy remedy, Assessment before, Assessment then) {
        Set<Rule> worse = EnumSet.noneOf(Rule.class);
        for (Finding finding : then.findings()) {
            boolean ofReadings = finding.rule() == Rule.BED_BEHIND_BELT || finding.rule() == Rule.READINGS_DISAGREE
                    || finding.rule() == Rule.DRIVE_NEAR_RATING;
            Level was = before.findings().stream().filter(found -> found.rule() == finding.rule()).findFirst()
                    .map(Finding::level).orElse(Level.WITHIN);
            if (!ofReadings && finding.level().compareTo(was) > 0) {
                worse.add(finding.rule());
            }
        }
        if (remedy.refusedBecause().isPresent()) {
            Rule because = remedy.refusedBecause().get();
            assertTrue(worse.contains(because) || isOnTheLimit(then, because),
                    () -> remedy.code() + " refused for " + because + " where " + worse + " breaks");
        } else {
            worse.removeIf(rule -> isOnTheLimit(then, rule));
            assertEquals(Set.of(), worse, remedy.code());
        }
    }

    private static boolean isOnTheLimit(Assessment assessment, Rule rule) {
        return assessment.findings().stream().filter(finding -> finding.rule() == rule).anyMatch(finding ->
                near(finding.observed(), finding.near().orElse(-1))
                        || near(finding.observed(), finding.overloaded().orElse(-1)));
    }

    private static boolean near(double one, double other) {
        return Math.abs(one - other) <= EXACT * Math.max(1, Math.abs(other));
    }

    private static LoadingZone done(LoadingZone zone, Assessment before, Remedy remedy) {
        double change = remedy.change().orElse(1);
        double speed = before.get(Result.BELT_SPEED).orElseThrow().value();
        return switch (remedy.code()) {
            case "free-bed" -> freed(zone, before.get(Result.BED_AREA).orElseThrow().value()
                    * before.get(Result.BED_SPEED_RATIO).orElseThrow().value());
            case "lower-feed" -> zone.get(Datum.THROUGHPUT).map(flow -> scaled(zone, change)
                    .with(Datum.THROUGHPUT, flow.value() * change, 0)).orElseGet(() -> scaled(zone, change));
            case "faster-belt", "slower-belt" -> scaled(zone, speed / change).with(Datum.BELT_SPEED, change, 0);
            case "widen-boards" -> widened(zone, change);
            case "shorten-zone" -> shortened(zone, change);
            default -> mended(zone, remedy.code().equals("adjust-seal") ? EnumSet.of(SealCondition.OVER_TIGHTENED)
                    : EnumSet.of(SealCondition.WORN, SealCondition.HARDENED, SealCondition.TORN));
        };
    }

    private static LoadingZone scaled(LoadingZone zone, double factor) {
        Section section = section(zone, spacing(zone));
        return levels(zone, level -> section.level(section.area(level).times(factor)));
    }

    /** At belt speed everywhere the flow has the same area everywhere. */
    private static LoadingZone freed(LoadingZone zone, double area) {
        double level = section(zone, spacing(zone)).level(Uncertain.exact(area)).value();
        return levels(zone, lagging -> Uncertain.exact(level));
    }

    private static LoadingZone widened(LoadingZone zone, double spacing) {
        Section from = section(zone, spacing(zone));
        Section to = section(zone, spacing);
        return levels(zone, level -> to.level(from.area(level))).with(Datum.READ_SPACING, spacing, 0);
    }

    private static LoadingZone shortened(LoadingZone zone, double length) {
        double share = length / zone.get(Datum.ZONE_LENGTH).orElseThrow().value();
        List<Station> kept = new ArrayList<>();
        List<Station> all = zone.stations();
        for (Station station : all) {
            if (station.position().value() < length) {
                kept.add(station);
            }
        }
        if (kept.size() < all.size()) {
            Station next = all.get(kept.size());
            double depth = next.raw().value();
            if (!kept.isEmpty()) {
                Station last = kept.get(kept.size() - 1);
                double part = (length - last.position().value()) / (next.position().value() - last.position().value());
                depth = last.raw().value() + part * (next.raw().value() - last.raw().value());
            }
            kept.add(new Station(Reading.exact("/end", length), Reading.exact("/end/depth", depth),
                    DepthMethod.AT_BOARD));
        } else {
            Station last = all.get(all.size() - 1);
            kept.add(new Station(Reading.exact("/end", length), last.raw(), DepthMethod.AT_BOARD));
        }
        return zone.with(Datum.ZONE_LENGTH, length, 0).withStations(kept).withSeals(zone.seals().stream()
                .map(segment -> new SealSegment(segment.side(), segment.type(), segment.condition(),
                        Reading.exact(segment.length().name(), segment.length().value() * share))).toList());
    }

    private static LoadingZone mended(LoadingZone zone, Set<SealCondition> conditions) {
        return zone.withSeals(zone.seals().stream().map(segment -> conditions.contains(segment.condition())
                ? new SealSegment(segment.side(), segment.type(), SealCondition.SOUND, segment.length())
                : segment).toList());
    }

    private interface Change {
        Uncertain of(Uncertain level);
    }

    /** The same stations with other levels; one under the board line cannot be read as a depth at the board. */
    private static LoadingZone levels(LoadingZone zone, Change change) {
        List<Station> stations = new ArrayList<>();
        for (Station station : zone.stations()) {
            double level = change.of(Uncertain.exact(station.raw().value())).value();
            stations.add(new Station(station.position(), Reading.exact(station.raw().name(), level),
                    DepthMethod.AT_BOARD));
        }
        return zone.withStations(stations);
    }

    private static double spacing(LoadingZone zone) {
        return zone.get(Datum.READ_SPACING).orElseThrow().value();
    }

    private static Section section(LoadingZone zone, double spacing) {
        Uncertain width = Uncertain.exact(spacing);
        Uncertain surcharge = Uncertain.exact(zone.get(Datum.SURCHARGE_ANGLE).orElseThrow().value());
        double trough = zone.get(Datum.TROUGH_ANGLE).orElseThrow().value();
        return trough == 0 ? Section.flat(width, surcharge) : Section.troughed(width,
                Uncertain.exact(zone.get(Datum.CENTRE_ROLL).orElseThrow().value()), Uncertain.exact(trough), surcharge);
    }

    private static LoadingZone atBoard(LoadingZone zone) {
        return zone.withStations(zone.stations().stream().map(station -> new Station(station.position(),
                station.raw(), DepthMethod.AT_BOARD)).toList());
    }

    private static void close(double expected, double actual, String what) {
        assertEquals(expected, actual, EXACT * Math.max(1e-3, Math.abs(expected)), what);
    }

    @Test
    void moneyAndCarbonFollowTheElectricityThatIsSaved() {
        Settings priced = Settings.standard().with(new Prices(java.util.OptionalDouble.of(0.25), Optional.of("EUR"),
                java.util.OptionalDouble.of(0.4)));
        LoadingZone zone = Zones.healthy();
        Assessment assessment = Engine.assess(zone, priced);
        double energy = assessment.get(Result.ENERGY).orElseThrow().value();
        assertEquals(energy / 1000 * 0.25, assessment.get(Result.COST).orElseThrow().value(), 1e-9);
        assertEquals(energy / 1000 * 0.4, assessment.get(Result.CO2).orElseThrow().value(), 1e-9);
        assertEquals(Optional.of("EUR"), assessment.currency());
        assertFalse(assessment.remedies().isEmpty());
        for (Remedy remedy : assessment.remedies()) {
            assertEquals(remedy.savedWh().orElseThrow() / 4000, remedy.savedCost().orElseThrow(), 1e-9);
            assertEquals(remedy.savedWh().orElseThrow() / 2500, remedy.savedCo2().orElseThrow(), 1e-9);
        }
        Assessment shaft = Engine.assess(zone.without(Datum.MOTOR_EFFICIENCY), priced);
        assertFalse(shaft.results().containsKey(Result.COST), "shaft energy is not what is paid for");
        assertTrue(shaft.missing().contains("/conveyor/motorEfficiency"));
        assertTrue(shaft.remedies().stream().allMatch(remedy -> remedy.savedCost().isEmpty()
                && remedy.savedCo2().isEmpty() && remedy.savedWh().isPresent()));
        Assessment unpriced = Engine.assess(zone, Settings.standard());
        assertFalse(unpriced.results().containsKey(Result.COST) || unpriced.results().containsKey(Result.CO2));
        assertTrue(unpriced.remedies().stream().allMatch(remedy -> remedy.savedCost().isEmpty()));
    }

    @Test
    void rankedRemediesGoBySaving() {
        Random random = new Random(62);
        for (int i = 0; i < 500; i++) {
            double before = Double.POSITIVE_INFINITY;
            boolean refused = false;
            for (Remedy remedy : Engine.assess(Zones.random(random), SITE).remedies()) {
                assertFalse(refused && remedy.refusedBecause().isEmpty(), "refused ones come last");
                refused = remedy.refusedBecause().isPresent();
                if (remedy.ranked() && !refused && !remedy.code().equals("free-bed")
                        && remedy.savedWh().isPresent()) {
                    assertTrue(remedy.savedWh().getAsDouble() <= before);
                    before = remedy.savedWh().getAsDouble();
                }
            }
        }
    }
}
