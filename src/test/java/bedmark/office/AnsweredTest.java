package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Rule;
import bedmark.office.FindingLine.Seen;
import bedmark.survey.Bundle;
import bedmark.survey.OfficeDeed;
import bedmark.survey.Plants;
import bedmark.survey.merge.ZoneId;
import java.math.BigDecimal;
import java.nio.file.Path;
import java.time.Clock;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** When a finding that was accepted or shelved comes back. */
class AnsweredTest {
    private static final LocalDate TODAY = LocalDate.ofInstant(Offices.NOW.instant(), ZoneOffset.UTC);
    private static final Bundle BUNDLE = Offices.sample("round-2026-03");

    @TempDir
    private Path folder;

    private static FindingLine line(Seen today, Seen atDesign) {
        return new FindingLine(Rule.BED_OVER_DESIGN, Optional.ofNullable(today), Optional.ofNullable(atDesign));
    }

    private static Seen seen(Level level, double observed) {
        return new Seen(level, observed, 0.01);
    }

    private static Seen over(double observed) {
        return seen(Level.OVERLOADED, observed);
    }

    @Test
    void worseAtEitherFeedIsWorse() {
        assertTrue(line(over(1.50), null).worseThan(line(seen(Level.NEAR, 1.12), over(1.60))));
        assertTrue(line(over(1.50), over(2.50)).worseThan(line(over(1.50), over(1.60))));
        assertTrue(line(over(1.60), over(1.60)).worseThan(line(over(1.50), over(1.60))));
        assertTrue(line(seen(Level.NEAR, 1.12), over(1.60)).worseThan(line(null, over(1.60))));
        assertFalse(line(over(1.51), over(1.61)).worseThan(line(over(1.50), over(1.60))));
        assertFalse(line(seen(Level.NEAR, 1.2), over(1.2)).worseThan(line(over(1.50), over(1.60))));
        assertFalse(line(over(1.50), null).worseThan(line(over(1.50), over(1.60))));
    }

    @Test
    void bothFeedsAreKeptInTextAndInTheDeed() {
        List<FindingLine> lines = List.of(line(seen(Level.NEAR, 1.12), over(1.60)), line(null, over(1.60)),
                line(over(1.60), null));
        assertEquals(lines, FindingLine.read(FindingLine.write(lines)));
        lines.forEach(one -> assertEquals(one, FindingLine.of(one.rule(), one.document())));
        assertEquals(1.60, lines.get(0).observed());
        assertEquals(Level.OVERLOADED, lines.get(0).level());
    }

    @Test
    void whatAnEarlierProgramKeptStandsForBothFeeds() {
        FindingLine before = FindingLine.of(Rule.BED_OVER_DESIGN,
                Plants.read("{'level':'overloaded','observed':1.60,'standardUncertainty':0.01}"));
        assertEquals(line(over(1.60), over(1.60)), before);
        assertEquals(List.of(before), FindingLine.read("bed-over-design overloaded 1.6 0.01"));
        assertTrue(line(over(2.50), over(1.60)).worseThan(before));
        assertFalse(line(seen(Level.NEAR, 1.12), over(1.60)).worseThan(before));
    }

    @Test
    void anAcceptedFindingComesBackWithASurveyThatIsWorseAndNotWithOneThatIsTheSame() {
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            store.receive(pack("round", BUNDLE), "Ida Marsh");
            RankedZone zone = found(store);
            Rule rule = Rule.BED_OVER_DESIGN;
            new Findings(store).answer(zone.zone(), rule, OfficeDeed.Answer.ACCEPTED, "boards are on order",
                    "Ida Marsh", Optional.empty(), TODAY);
            assertEquals(List.of(rule), answered(store, zone.zone()));
            store.receive(pack("same", later(zone.zone(), "2026-04-18", 1.0)), "Ida Marsh");
            assertEquals(List.of(rule), answered(store, zone.zone()));
            store.receive(pack("worse", later(zone.zone(), "2026-05-18", 1.5)), "Ida Marsh");
            assertEquals(List.of(), answered(store, zone.zone()));
            assertTrue(store.ranked(zone.zone()).orElseThrow().open().stream().anyMatch(one -> one.rule() == rule));
        }
    }

    @Test
    void aShelvedFindingStaysAwayThroughItsDayAndComesBackOnTheNext() {
        ZoneId zone;
        LocalDate until = TODAY.plusDays(10);
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            store.receive(pack("round", BUNDLE), "Ida Marsh");
            zone = found(store).zone();
            new Findings(store).answer(zone, Rule.BED_OVER_DESIGN, OfficeDeed.Answer.SHELVED, "looked at in summer",
                    "Ida Marsh", Optional.of(until), TODAY);
        }
        assertEquals(List.of(Rule.BED_OVER_DESIGN), answeredOn(until, zone));
        assertEquals(List.of(), answeredOn(until.plusDays(1), zone));
    }

    private List<Rule> answeredOn(LocalDate day, ZoneId zone) {
        Clock clock = Clock.fixed(day.atTime(12, 0).toInstant(ZoneOffset.UTC), ZoneOffset.UTC);
        try (OfficeStore store = OfficeStore.open(folder.resolve("office"), OfficeOptions.of(clock))) {
            return answered(store, zone);
        }
    }

    private static List<Rule> answered(OfficeStore store, ZoneId zone) {
        return store.ranked(zone).orElseThrow().answers().stream().map(Answered::rule).toList();
    }

    private static RankedZone found(OfficeStore store) {
        return store.rank().stream().filter(zone -> zone.findings().stream().anyMatch(one ->
                one.rule() == Rule.BED_OVER_DESIGN)).findFirst().orElseThrow();
    }

    private Path pack(String name, Bundle bundle) {
        return Offices.pack(bundle, folder.resolve("tablet"), folder.resolve(name + ".zip"));
    }

    /** The zone's last survey made once more, with a bed so many times as deep. */
    private static Bundle later(ZoneId zone, String day, double deeper) {
        Branch last = BUNDLE.document().branches("surveys").stream()
                .filter(survey -> survey.text("transfer").equals(Optional.of(zone.transfer())))
                .reduce((one, other) -> other).orElseThrow();
        Branch readings = last.branch("readings").orElseThrow();
        List<Node> depths = readings.branches("bedDepths").stream().map(station -> (Node) station.with("depth",
                deeper(station.branch("depth").orElseThrow(), deeper))).toList();
        Branch survey = Tablets.fresh(last, day).with("readings", readings.with("bedDepths",
                new Node.Series(depths)));
        return Offices.with(BUNDLE, day, day + "T14:00:00+01:00", List.of(survey));
    }

    private static Branch deeper(Branch depth, double times) {
        return depth.with("value", Node.number(depth.number("value").orElseThrow()
                .multiply(BigDecimal.valueOf(times)).stripTrailingZeros())).without("entered");
    }
}
