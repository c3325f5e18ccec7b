package bedmark.office.trend;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.office.JudgedZone;
import bedmark.quantity.UnitSystem;
import bedmark.report.TrendTelling;
import bedmark.survey.Assessor;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Plants;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.Origin;
import bedmark.survey.merge.ZoneId;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.math.BigDecimal;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.UUID;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** One loading zone over time, from surveys that are judged as any other. */
class ZoneTrendTest {
    private static final ZoneId ZONE = new ZoneId("p", "t3");
    private static final Register REGISTER = register();

    private static Register register() {
        Branch plant = Plants.register("").document();
        List<Node> transfers = new ArrayList<>();
        plant.branches("transfers").forEach(transfer -> transfers.add(transfer.with("designBedDepth",
                Plants.read("{'value':200,'unit':'mm'}"))));
        return new Register(plant.with("transfers", new Node.Series(transfers)));
    }

    private static JudgedZone survey(LocalDate day, int depthMm, String more) {
        Survey survey = Plants.survey("t3", "'bedDepths':[{'position':{'value':3,'unit':'m'},'depth':{'value':"
                + depthMm + ",'unit':'mm'}}]" + more);
        long moment = day.atStartOfDay(ZoneOffset.UTC).toInstant().toEpochMilli();
        Copy copy = new Copy(day.toString() + depthMm, UUID.nameUUIDFromBytes(day.toString().getBytes()), 1,
                Optional.empty(), ZONE, "r", InspectionStatus.INSPECTED, OptionalLong.empty(), OptionalLong.of(moment),
                new Origin(moment, "x", "c2"), OptionalLong.empty());
        return new JudgedZone(ZONE, copy, survey, REGISTER, new Assessor(REGISTER).assess(survey, List.of()));
    }

    private static JudgedZone datedAhead(JudgedZone zone, LocalDate came) {
        return new JudgedZone(ZONE, zone.copy().receivedAt(came.atStartOfDay(ZoneOffset.UTC).toInstant()
                .toEpochMilli()), zone.survey(), REGISTER, zone.assessment());
    }

    private static List<JudgedZone> rising(int surveys) {
        List<JudgedZone> zones = new ArrayList<>();
        for (int i = 0; i < surveys; i++) {
            zones.add(survey(LocalDate.of(2025, 1, 1).plusMonths(i), 100 + 10 * i, ""));
        }
        return zones;
    }

    private static Series depth(ZoneTrend trend) {
        return trend.series().stream().filter(one -> one.measure() == Measure.DEPTH).findFirst().orElseThrow();
    }

    @Test
    void aRisingBedSaysWhenItWillBeOverloaded() {
        ZoneTrend trend = ZoneTrend.of(ZONE, rising(8), List.of(), List.of(), 0);
        Series depth = depth(trend);
        assertEquals(0.22, depth.near().getAsDouble(), 1e-12);
        assertEquals(0.25, depth.overloaded().getAsDouble(), 1e-12);
        Outlook.Trend outlook = assertInstanceOf(Outlook.Trend.class, depth.outlook());
        assertEquals(0.01 / 30.4, outlook.line().slope(), 2e-5);
        // 170 mm on 1 August, 10 mm a month: 220 mm in January, 250 mm in April.
        Outlook.Reached overloaded = outlook.overloaded().orElseThrow();
        assertTrue(Math.abs(day(overloaded.expected()).toEpochDay() - LocalDate.of(2026, 4, 1).toEpochDay()) < 10);
        assertTrue(!day(overloaded.earliest()).isAfter(day(overloaded.expected())));
        assertTrue(!day(overloaded.latest()).isBefore(day(overloaded.expected())));
        assertTrue(day(outlook.near().orElseThrow().expected()).isBefore(day(overloaded.expected())));
        assertEquals(Interval.Reason.HALF_OF_PF, trend.interval().reason());
        assertEquals(0.03 / outlook.line().upper(), trend.interval().pfDays().getAsDouble(), 1e-9);
        assertEquals((int) (trend.interval().pfDays().getAsDouble() / 2), trend.interval().days());
    }

    @Test
    void fourSurveysAreTooFewToSay() {
        ZoneTrend trend = ZoneTrend.of(ZONE, rising(4), List.of(), List.of(), 0);
        assertEquals(new Outlook.TooFew(4, 5), depth(trend).outlook());
        assertEquals(Interval.Reason.TOO_FEW, trend.interval().reason());
        assertEquals(Interval.MOST, trend.interval().days());
    }

    private static LocalDate day(Outlook.When when) {
        return when.day().orElseThrow();
    }

    private static Outlook.Reached overloaded(double... depths) {
        List<Observation> observations = new ArrayList<>();
        for (double depth : depths) {
            observations.add(new Observation(LocalDate.of(2020 + observations.size(), 1, 1)
                    .atStartOfDay(ZoneOffset.UTC).toInstant(), depth, 0, new UUID(0, observations.size()), 1, false));
        }
        return assertInstanceOf(Outlook.Trend.class, Series.of(Measure.DEPTH, observations, Instant.EPOCH,
                OptionalDouble.empty(), OptionalDouble.of(0.19)).outlook()).overloaded().orElseThrow();
    }

    @Test
    void eachEndSaysThatItLiesBeyondTenYearsOrIsNever() {
        Outlook.Reached late = overloaded(0.1, 0.101, 0.108, 0.109, 0.125, 0.126, 0.127);
        assertInstanceOf(Outlook.On.class, late.earliest(), "an early end that is near is not kept back");
        assertInstanceOf(Outlook.Beyond.class, late.expected());
        assertInstanceOf(Outlook.Beyond.class, late.latest(), "beyond ten years, and not without an end");
        assertInstanceOf(Outlook.Beyond.class, overloaded(0.1, 0.101, 0.102, 0.103, 0.104, 0.105).earliest());
    }

    @Test
    void theEndsOfADateStandInTheDocumentAndInWords() {
        Series series = new Series(Measure.DEPTH, List.of(), Instant.EPOCH, OptionalDouble.of(0.22),
                OptionalDouble.of(0.25), new Outlook.Trend(TheilSen.of(rise(), 0.95), MannKendall.of(rise()),
                Optional.of(new Outlook.Reached(new Outlook.On(LocalDate.of(2027, 1, 2)), new Outlook.On(
                LocalDate.of(2026, 1, 2)), new Outlook.Never())), Optional.of(new Outlook.Reached(
                new Outlook.Beyond(), new Outlook.On(LocalDate.of(2027, 5, 6)), new Outlook.Beyond()))));
        ZoneTrend trend = new ZoneTrend(ZONE, List.of(series), List.of(), new Interval(7, Interval.Reason.OVERLOADED,
                OptionalDouble.empty()), 0, 0);
        Branch outlook = TrendDocument.of(trend, Optional.empty(), Optional.empty()).branches("series").get(0)
                .branch("outlook").orElseThrow();
        assertEquals(Plants.read("{'expected':'2027-01-02','earliest':'2026-01-02','latestIs':'never'}"),
                outlook.branch("nearReached").orElseThrow());
        assertEquals(Plants.read("{'expectedIs':'beyond-ten-years','earliest':'2027-05-06',"
                + "'latestIs':'beyond-ten-years'}"), outlook.branch("overloadedReached").orElseThrow());
        TrendTelling telling = new TrendTelling(new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC));
        String told = String.join("\n", telling.lines(trend, Optional.empty(), Optional.empty()));
        assertTrue(told.contains("near limit: 220") && told.contains("limit of overload: 250"), told);
        assertTrue(told.contains("about 2027-01-02, at the earliest 2026-01-02, at the latest never."), told);
        assertTrue(told.contains("Overloaded most likely beyond ten years, at the earliest 2027-05-06, at the latest "
                + "beyond ten years."), told);
        assertEquals("Depth at the board (root mean square) · full line: limit of overload, "
                + telling.value(Measure.DEPTH, 0.25) + " · dashed line: near limit, "
                + telling.value(Measure.DEPTH, 0.22) + " · sloping line: the trend", telling.drawn(series, List.of()));
    }

    private static List<TimedValue> rise() {
        return Stream.of(1, 2, 3, 4, 5).map(day -> new TimedValue(day, day)).toList();
    }

    private static Interval interval(int... depthsMm) {
        List<JudgedZone> zones = new ArrayList<>();
        for (int depth : depthsMm) {
            zones.add(survey(LocalDate.of(2025, 1, 1).plusMonths(zones.size()), depth, ""));
        }
        return ZoneTrend.of(ZONE, zones, List.of(), List.of(), 0).interval();
    }

    @Test
    void aZoneThatIsOverloadedIsLookedAtMostOften() {
        Interval shortest = new Interval(Interval.LEAST, Interval.Reason.OVERLOADED, OptionalDouble.empty());
        assertEquals(shortest, interval(280), "one survey is enough to say so");
        assertEquals(shortest, interval(280, 281, 279, 280, 282, 278), "with no trend as well");
        assertEquals(shortest, interval(340, 330, 320, 310, 300, 290), "even where it falls");
        assertEquals(Interval.Reason.OVERLOADED, interval(230, 240, 250, 260, 270, 280).reason());
        assertEquals(Interval.Reason.TOO_FEW, interval(280, 150).reason(), "but not where it was mended");
    }

    @Test
    void aZoneThatIsNearALimitDoesNotWaitAsLongAsSitesGo() {
        Interval half = new Interval(91, Interval.Reason.NEAR_A_LIMIT, OptionalDouble.empty());
        assertEquals(half, interval(230));
        assertEquals(half, interval(230, 229, 231, 230, 228, 232));
    }

    @Test
    void anotherMaterialBeginsAnotherStory() {
        List<JudgedZone> zones = rising(7);
        zones.add(survey(LocalDate.of(2025, 8, 1), 60, ",'materialRunning':'coal'"));
        zones.add(survey(LocalDate.of(2025, 9, 1), 62, ",'materialRunning':'coal'"));
        ZoneTrend trend = ZoneTrend.of(ZONE, zones, List.of(), List.of(), 0);
        assertEquals(List.of(Change.Kind.MATERIAL), trend.changes().stream().map(Change::kind).toList());
        assertEquals(new Outlook.TooFew(2, 5), depth(trend).outlook());
        assertEquals(9, depth(trend).observations().size(), "what was before is still shown");
    }

    @Test
    void anotherSpeedOrOtherSealsAreMarked() {
        List<JudgedZone> zones = rising(2);
        zones.add(survey(LocalDate.of(2025, 8, 1), 110, ",'beltSpeed':{'value':3,'unit':'m/s'}"));
        zones.add(survey(LocalDate.of(2025, 9, 1), 110, ",'beltSpeed':{'value':3,'unit':'m/s'},'seals':[{'side':'left',"
                + "'type':'oblique','condition':'sound','length':{'value':6,'unit':'m'}},{'side':'right',"
                + "'type':'oblique','condition':'worn','length':{'value':6,'unit':'m'}}]"));
        zones.add(survey(LocalDate.of(2025, 10, 1), 110, ",'beltSpeed':{'value':3.1,'unit':'m/s'},'seals':[{'side':"
                + "'left','type':'oblique','condition':'sound','length':{'value':6,'unit':'m'}},{'side':'right',"
                + "'type':'oblique','condition':'sound','length':{'value':6,'unit':'m'}}],"
                + "'skirtSpacing':{'value':800,'unit':'mm'}"));
        ZoneTrend trend = ZoneTrend.of(ZONE, zones, List.of(), List.of(), 0);
        assertEquals(List.of(Change.Kind.SPEED, Change.Kind.SEALS, Change.Kind.SEALS, Change.Kind.BOARDS),
                trend.changes().stream().map(Change::kind).toList());
    }

    private static List<Change> changes(List<JudgedZone> zones) {
        return ZoneTrend.of(ZONE, zones, List.of(), List.of(), 0).changes();
    }

    private static List<JudgedZone> months(List<String> readings) {
        List<JudgedZone> zones = new ArrayList<>();
        for (String more : readings) {
            zones.add(survey(LocalDate.of(2025, 1, 1).plusMonths(zones.size()), 120, more));
        }
        return zones;
    }

    @Test
    void aTapeThatIsLaidAgainChangesNoBoardAndNoSeal() {
        assertEquals(List.of(), changes(months(Stream.of(800, 798, 803, 799, 801, 802, 798, 803)
                .map(spacing -> ",'skirtSpacing':{'value':" + spacing + ",'unit':'mm'}").toList())));
        assertEquals(List.of(), changes(months(Stream.of("2.00", "1.97", "2.01", "1.98").map(ZoneTrendTest::worn)
                .toList())));
    }

    @Test
    void aReadingThatIsMoreCertainTellsASmallerChange() {
        String exact = ",'skirtSpacing':{'value':%s,'unit':'mm','standardUncertainty':0.5}";
        assertEquals(List.of(), changes(months(List.of(exact.formatted("800"), exact.formatted("804")))));
        assertEquals(1, changes(months(List.of(exact.formatted("800"), exact.formatted("806")))).size());
    }

    private static String worn(String metres) {
        return ",'seals':[{'side':'left','type':'vertical','condition':'sound','length':{'value':"
                + new BigDecimal("6").subtract(new BigDecimal(metres)) + ",'unit':'m'}},{'side':'left',"
                + "'type':'vertical','condition':'worn','length':{'value':" + metres + ",'unit':'m'}},"
                + "{'side':'right','type':'vertical','condition':'sound','length':{'value':6,'unit':'m'}}]";
    }

    @Test
    void sealsThatWearSlowlyAndAreRenewedInPartSayHowMuch() {
        List<Change> changes = changes(months(Stream.of("0.50", "1.50", "2.50", "1.90", "0.40")
                .map(ZoneTrendTest::worn).toList()));
        assertEquals(1, changes.size());
        assertEquals(Change.Kind.SEALS, changes.get(0).kind());
        assertEquals("vertical:sound vertical:worn 21 %", changes.get(0).from());
        assertEquals("vertical:sound vertical:worn 3 %", changes.get(0).to());
    }

    @Test
    void aSpeedThatCreepsIsMarkedWhereItComesToAChange() {
        List<Change> changes = changes(months(Stream.of("2.00", "2.08", "2.16", "2.24", "2.32", "2.40")
                .map(speed -> ",'beltSpeed':{'value':" + speed + ",'unit':'m/s'}").toList()));
        assertEquals(List.of("2.0 2.16", "2.16 2.32"), changes.stream().map(one -> one.from() + " " + one.to())
                .toList());
    }

    @Test
    void aMaterialThatIsRenamedIsTheSame() {
        List<JudgedZone> zones = new ArrayList<>(months(List.of("", "")));
        Branch plant = REGISTER.document();
        Register renamed = new Register(plant.with("materials", new Node.Series(plant.branches("materials").stream()
                .map(material -> (Node) material.with("name", "another name")).toList())));
        JudgedZone last = zones.get(1);
        zones.set(1, new JudgedZone(last.zone(), last.copy(), last.survey(), renamed, last.assessment()));
        assertEquals(List.of(), changes(zones));
    }

    @Test
    void aBedThatStaysHasNoTrendAndAFallingOneNoDate() {
        List<JudgedZone> steady = new ArrayList<>();
        List<JudgedZone> falling = new ArrayList<>();
        int[] depths = {120, 118, 122, 119, 121, 120, 118};
        for (int i = 0; i < depths.length; i++) {
            steady.add(survey(LocalDate.of(2025, 1, 1).plusMonths(i), depths[i], ""));
            falling.add(survey(LocalDate.of(2025, 1, 1).plusMonths(i), 200 - 10 * i, ""));
        }
        assertInstanceOf(Outlook.Level.class, depth(ZoneTrend.of(ZONE, steady, List.of(), List.of(), 0)).outlook());
        Outlook.Trend trend = assertInstanceOf(Outlook.Trend.class,
                depth(ZoneTrend.of(ZONE, falling, List.of(), List.of(), 0)).outlook());
        assertTrue(trend.line().slope() < 0);
        assertTrue(trend.overloaded().isEmpty());
        assertEquals(Interval.Reason.NO_TREND,
                ZoneTrend.of(ZONE, falling, List.of(), List.of(), 0).interval().reason());
    }

    @Test
    void aZoneIsLookedAtAsOftenAsTheLastSurveyDatedAheadAsksFor() {
        JudgedZone heaped = datedAhead(survey(LocalDate.of(2035, 1, 1), 400, ""), LocalDate.of(2025, 3, 1));
        JudgedZone dug = datedAhead(survey(LocalDate.of(2036, 1, 1), 60, ""), LocalDate.of(2025, 4, 1));
        List<JudgedZone> believed = List.of(survey(LocalDate.of(2025, 1, 1), 60, ""));
        assertEquals(Interval.Reason.OVERLOADED,
                ZoneTrend.of(ZONE, believed, List.of(), List.of(heaped), 0).interval().reason());
        ZoneTrend mended = ZoneTrend.of(ZONE, believed, List.of(), List.of(heaped, dug), 0);
        assertEquals(Interval.Reason.TOO_FEW, mended.interval().reason(), "as the list has it");
        assertEquals(2, mended.undated());
    }

    @Test
    void aReplacedSurveyIsShownAndNotCounted() {
        ZoneTrend trend = ZoneTrend.of(ZONE, rising(5), List.of(survey(LocalDate.of(2025, 3, 2), 400, "")), List.of(),
                0);
        assertEquals(6, depth(trend).observations().size());
        Outlook.Trend outlook = assertInstanceOf(Outlook.Trend.class, depth(trend).outlook());
        assertEquals(10, outlook.test().s());
    }
}
