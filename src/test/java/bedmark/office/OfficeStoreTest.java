package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.engine.verdict.Level;
import bedmark.journal.Progress;
import bedmark.office.trend.Interval;
import bedmark.office.trend.Outlook;
import bedmark.office.trend.ZoneTrend;
import bedmark.survey.OfficeDeed;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.Clash;
import bedmark.survey.merge.ZoneId;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.TreeMap;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Packs of the demo plant received in an office. */
class OfficeStoreTest {
    private static final ZoneId HEALTHY = new ZoneId("ostermere", "TP-14");

    @TempDir
    private Path folder;

    private Path tablet() {
        return folder.resolve("tablet");
    }

    private Path packOf(String sample) {
        return Offices.pack(Offices.sample(sample), tablet(), folder.resolve("packs-out").resolve(sample + ".zip"));
    }

    @Test
    void everySurveyOfAPackIsTakenInAndJudgedAsTheEngineJudgesIt() {
        Path pack = packOf("round-2026-03");
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet())) {
            Received.Taken taken = assertInstanceOf(Received.Taken.class, store.receive(pack, "Ida Marsh"));
            Bundle bundle = Offices.sample("round-2026-03");
            assertEquals(bundle.surveys().size(), taken.fresh());
            assertEquals(0, taken.known());
            assertEquals(List.of(), taken.clashes());
            Map<String, Level> expected = new TreeMap<>();
            new Assessor(bundle.register()).assess(bundle.surveys()).stream()
                    .filter(one -> one.survey().inspectionStatus() == InspectionStatus.INSPECTED)
                    .forEach(one -> expected.put(one.survey().transfer(), one.assessment().worstLevel()));
            Map<String, Level> ranked = store.rank().stream().filter(zone -> zone.level().isPresent()).collect(
                    Collectors.toMap(zone -> zone.zone().transfer(), zone -> zone.level().get(), (one, two) -> one,
                            TreeMap::new));
            assertEquals(expected, ranked);
            assertEquals(bundle.register().transfers().size(), store.rank().size());
        }
    }

    @Test
    void theListIsWorstFirstAndWhatNobodySawNeverLooksHealthy() {
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet())) {
            store.receive(packOf("round-2026-03"), "Ida Marsh");
            List<RankedZone> ranked = store.rank();
            for (int i = 1; i < ranked.size(); i++) {
                RankedZone before = ranked.get(i - 1);
                RankedZone after = ranked.get(i);
                assertTrue(before.place().compareTo(after.place()) <= 0);
                assertTrue(before.place() != after.place()
                        || before.driveShare().orElse(-1) >= after.driveShare().orElse(-1));
            }
            RankedZone barred = store.ranked(new ZoneId("ostermere", "TP-17")).orElseThrow();
            assertEquals(Place.NOT_INSPECTED, barred.place());
            assertEquals(InspectionStatus.NOT_ACCESSIBLE, barred.visitStatus().orElseThrow());
            assertTrue(ranked.stream().filter(zone -> zone.place() == Place.WITHIN).allMatch(zone ->
                    zone.visitStatus().equals(Optional.of(InspectionStatus.INSPECTED)) && !zone.stale()));
        }
    }

    @Test
    void aSurveyThatAFastClockDatedAheadIsNeverHealthyAndNamesTheClock() {
        Bundle bundle = Offices.sample("round-2026-03");
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet())) {
            RankedZone ahead = received(store, bundle, survey(bundle, HEALTHY), "2036-03-18", HEALTHY);
            assertEquals(Place.STALE, ahead.place());
            assertEquals(Optional.of(Level.WITHIN), ahead.level());
            assertTrue(ahead.stale());
            assertTrue(ahead.clockWrong());
            assertEquals(Optional.empty(), ahead.age());
            assertEquals(1, store.trend(HEALTHY).undated());
            assertEquals(List.of(), store.trend(HEALTHY).series());
        }
    }

    @Test
    void aSurveyThatAFastClockDatedAheadHidesNoneWhoseDateCanBeBelieved() {
        Bundle bundle = Offices.sample("round-2026-03");
        Branch healthy = survey(bundle, HEALTHY);
        Branch heaped = healthy.with("readings", heaped(healthy.branch("readings").orElseThrow()));
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet())) {
            assertEquals(Place.OVERLOADED, received(store, bundle, heaped, "2026-03-20", HEALTHY).place());
            RankedZone hidden = received(store, bundle, healthy, "2036-03-18", HEALTHY);
            assertEquals(Place.OVERLOADED, hidden.place());
            assertEquals(Optional.of(Level.OVERLOADED), hidden.level());
            assertEquals(Optional.of(Instant.parse("2026-03-20T11:20:00Z")), hidden.surveyed());
            assertTrue(hidden.clockWrong());
            assertEquals(hidden, store.worst(RankQuery.ALL, 1, Progress.NONE).get(0));
            assertEquals(hidden.survey(), store.judged(HEALTHY).map(one -> one.copy().digest()));
            assertEquals(hidden.survey(), store.judgedToday(HEALTHY).map(one -> one.copy().digest()));
            ZoneTrend trend = store.trend(HEALTHY);
            assertEquals(1, trend.undated());
            assertFalse(trend.series().isEmpty());
            assertTrue(trend.series().stream().allMatch(series -> series.observations().size() == 1));
            RankedZone mended = received(store, bundle, healthy, "2026-10-01", HEALTHY);
            assertEquals(Place.WITHIN, mended.place());
            assertTrue(mended.clockWrong());
        }
    }

    @Test
    void aZoneIsAsBadAsASurveyDatedAheadThatMayBeNewerUntilOneIsMadeAfterThatCame() {
        Bundle bundle = Offices.sample("round-2026-03");
        Branch healthy = survey(bundle, HEALTHY);
        Branch heaped = healthy.with("readings", heaped(healthy.branch("readings").orElseThrow()));
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet())) {
            assertEquals(Place.WITHIN, received(store, bundle, healthy, "2026-03-20", HEALTHY).place());
            RankedZone worse = received(store, bundle, heaped, "2026-10-09", HEALTHY);
            assertEquals(Place.OVERLOADED, worse.place());
            assertEquals(Optional.of(Instant.parse("2026-03-20T11:20:00Z")), worse.surveyed());
            assertEquals(Interval.Reason.OVERLOADED, store.trend(HEALTHY).interval().reason());
            RankedZone newer = received(store, bundle, healthy, "2026-10-01", HEALTHY);
            assertEquals(Place.WITHIN, newer.place());
            assertEquals(Optional.of(Level.WITHIN), newer.level());
            assertNotEquals(Interval.Reason.OVERLOADED, store.trend(HEALTHY).interval().reason());
            assertEquals(newer, store.ranked(HEALTHY).orElseThrow());
        }
        try (OfficeStore later = OfficeStore.rebuild(folder.resolve("office"),
                OfficeOptions.of(Clock.offset(Offices.NOW, Duration.ofDays(30))))) {
            assertEquals(Place.WITHIN, later.ranked(HEALTHY).orElseThrow().place(),
                    "its date being past does not make it believed");
        }
    }

    /** A visit that says nothing of its time is as old as the bundle that it left in. */
    @Test
    void aVisitWithoutATimeIsBelievedOnceABundleBringsItWhoseTimeCanBe() {
        Bundle bundle = Offices.sample("round-2026-03");
        Branch barred = barred(bundle);
        List<Path> packs = Stream.of("2036-03-18", "2026-03-20").map(day -> Offices.pack(Offices.with(bundle, day,
                day + "T14:00:00+01:00", List.of(barred)), tablet(), folder.resolve(day + ".zip"))).toList();
        for (List<Path> order : List.of(packs, List.of(packs.get(1), packs.get(0)))) {
            Path office = folder.resolve("office" + packs.indexOf(order.get(0)));
            try (OfficeStore store = Offices.trusting(office, tablet())) {
                store.receive(order.get(0), "Ida Marsh");
                assertEquals(order == packs, store.ranked(HEALTHY).orElseThrow().clockWrong());
                store.receive(order.get(1), "Ida Marsh");
                assertFalse(store.ranked(HEALTHY).orElseThrow().clockWrong());
            }
            try (OfficeStore anew = OfficeStore.rebuild(office, OfficeOptions.of(Offices.NOW))) {
                assertFalse(anew.ranked(HEALTHY).orElseThrow().clockWrong());
            }
        }
    }

    /** Whoever brings it again later does not make it older than it was when it first came. */
    @Test
    void aVisitWithoutATimeStaysDoubtedWhereABundleMadeAfterItsFirstReceiptBringsItAgain() {
        Bundle bundle = Offices.sample("round-2026-03");
        Branch barred = barred(bundle);
        Clock monthLater = Clock.offset(Offices.NOW, Duration.ofDays(30));
        List<Path> packs = Stream.of("2036-03-18", LocalDate.now(monthLater).toString()).map(day -> Offices.pack(
                Offices.with(bundle, day, day + "T00:00:00+00:00", List.of(barred)), tablet(),
                folder.resolve(day + ".zip"))).toList();
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet())) {
            store.receive(packs.get(0), "Ida Marsh");
            assertTrue(store.ranked(HEALTHY).orElseThrow().clockWrong());
        }
        try (OfficeStore later = OfficeStore.open(folder.resolve("office"), OfficeOptions.of(monthLater))) {
            later.receive(packs.get(1), "Ida Marsh");
            assertTrue(later.ranked(HEALTHY).orElseThrow().clockWrong());
        }
        try (OfficeStore anew = OfficeStore.rebuild(folder.resolve("office"), OfficeOptions.of(monthLater))) {
            assertTrue(anew.ranked(HEALTHY).orElseThrow().clockWrong());
        }
        try (OfficeStore store = OfficeStore.open(folder.resolve("late"), OfficeOptions.of(monthLater))) {
            store.trust(Offices.fingerprint(tablet()), "", "Ida Marsh");
            store.receive(packs.get(1), "Ida Marsh");
            assertFalse(store.ranked(HEALTHY).orElseThrow().clockWrong(), "what never came before is believed");
        }
    }

    /** A visit to a zone that nobody could get at, without a time. */
    private static Branch barred(Bundle bundle) {
        return Tablets.fresh(survey(bundle, HEALTHY), "2026-03-20").without("startedAt").without("completedAt")
                .with("inspectionStatus", "not-accessible").with("statusReason", "barred");
    }

    private static Branch survey(Bundle bundle, ZoneId zone) {
        return bundle.document().branches("surveys").stream().filter(one -> one.text("transfer")
                .equals(Optional.of(zone.transfer()))).findFirst().orElseThrow();
    }

    /** The bed as high as the boards. */
    private static Branch heaped(Branch readings) {
        assertEquals(Optional.of("from-board-top"), readings.text("depthMethod"));
        return readings.with("bedDepths", new Node.Series(readings.branches("bedDepths").stream().<Node>map(station ->
                station.with("depth", station.branch("depth").orElseThrow().with("value", Node.number(1)))).toList()));
    }

    private RankedZone received(OfficeStore store, Bundle bundle, Branch survey, String day, ZoneId zone) {
        store.receive(Offices.pack(Offices.with(bundle, day, day + "T14:00:00+01:00",
                List.of(Tablets.fresh(survey, day))), tablet(), folder.resolve(day + ".zip")), "Ida Marsh");
        return store.ranked(zone).orElseThrow();
    }

    @Test
    void theHeadOfTheListIsReadAloneAndIsTheSame() {
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet())) {
            store.receive(packOf("round-2026-03"), "Ida Marsh");
            for (RankedZone zone : store.rank().subList(0, 2)) {
                for (FindingLine line : zone.findings()) {
                    new Findings(store).answer(zone.zone(), line.rule(), OfficeDeed.Answer.ACCEPTED, "known",
                            "Ida Marsh", Optional.empty(), LocalDate.ofInstant(Offices.NOW.instant(), ZoneOffset.UTC));
                }
            }
            RankedZone some = store.rank().get(3);
            assertTrue(store.rank().stream().anyMatch(zone -> !zone.answers().isEmpty()));
            for (RankQuery query : List.of(RankQuery.ALL, RankQuery.ALL.ofArea(Optional.of(some.names().area())),
                    RankQuery.ALL.ofMaterial(Optional.of(some.names().material())),
                    RankQuery.ALL.with(Optional.of(some.findings().get(0).rule())),
                    RankQuery.ALL.olderThan(some.age()), RankQuery.ALL.staleAfter(Duration.ZERO),
                    RankQuery.ALL.ofPlant(Optional.of("elsewhere")))) {
                List<RankedZone> all = store.rank(query, Progress.NONE);
                for (int most = 1; most <= all.size() + 1; most++) {
                    assertEquals(all.stream().limit(most).toList(), store.worst(query, most, Progress.NONE));
                }
            }
        }
    }

    @Test
    void receivingAPackAgainChangesNothing() {
        Path pack = packOf("round-2026-03");
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet())) {
            store.receive(pack, "Ida Marsh");
            String told = Offices.told(store);
            assertInstanceOf(Received.AlreadyHere.class, store.receive(pack, "Ida Marsh"));
            assertEquals(told, Offices.told(store));
            assertEquals(1, store.packs().size());
        }
    }

    @Test
    void aPackOfAnUnknownDeviceIsRefusedAndTheStoreIsByteIdentical() throws IOException {
        Path pack = packOf("round-2026-03");
        Path office = folder.resolve("office");
        OfficeStore.open(office, OfficeOptions.of(Offices.NOW)).close();
        Map<String, String> before = files(office);
        try (OfficeStore store = OfficeStore.open(office, OfficeOptions.of(Offices.NOW))) {
            Received.Turned turned = assertInstanceOf(Received.Turned.class, store.receive(pack, "Ida Marsh"));
            assertEquals("device-untrusted", turned.why().code());
            assertEquals(Offices.fingerprint(tablet()), turned.fingerprint().orElseThrow());
            Path broken = Files.write(folder.resolve("broken.zip"), new byte[] {1, 2, 3});
            assertInstanceOf(Received.Turned.class, store.receive(broken, "Ida Marsh"));
            assertInstanceOf(Received.Turned.class, store.receive(folder.resolve("absent.zip"), "Ida Marsh"));
        }
        assertEquals(before, files(office));
    }

    /** The truth: every file but those of the index, which is a database that may write as it likes. */
    private static Map<String, String> files(Path office) throws IOException {
        Map<String, String> digests = Offices.files(office);
        digests.keySet().removeIf(name -> name.startsWith("index"));
        return digests;
    }

    /** A database server would take neither, and say so in words of its own; the folder's tables would take both. */
    @Test
    void anIdThatNotEveryDatabaseHoldsIsRefusedInOneSentence() {
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet())) {
            new IdBounds(store, tablet(), folder).prove();
        }
    }

    @Test
    void anOfficeIsBegunOnlyWhereNothingElseIs() throws IOException {
        Path other = Files.createDirectories(folder.resolve("other"));
        Path file = Files.writeString(other.resolve("plan.txt"), "a plan");
        Path tablets = Files.createDirectories(folder.resolve("tablets"));
        Files.writeString(tablets.resolve("device.json"), "{}");
        assertEquals("office-folder-other", refusal(other));
        assertEquals("store-is-file", refusal(file));
        assertEquals("store-of-tablet", refusal(tablets));
        assertEquals(List.of("plan.txt"), names(other));
        assertEquals(List.of("device.json"), names(tablets));
    }

    @Test
    void anOpeningThatWasCutOffIsBegunAnew() throws IOException {
        Path office = Files.createDirectories(folder.resolve("office").resolve("packs")).getParent();
        Files.writeString(office.resolve("store.lock"), "");
        Files.writeString(office.resolve("office.json.part"), "{");
        OfficeStore.open(office, OfficeOptions.of(Clock.systemUTC())).close();
        assertTrue(OfficeStore.isOffice(office));
    }

    private static String refusal(Path office) {
        return assertThrows(Refused.class, () -> OfficeStore.open(office, OfficeOptions.of(Clock.systemUTC())))
                .defect().code();
    }

    private static List<String> names(Path folder) throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.map(file -> file.getFileName().toString()).toList();
        }
    }

    @Test
    void theTablesAreMadeAnewFromJournalAndPacks() throws IOException {
        Path office = folder.resolve("office");
        String told;
        try (OfficeStore store = Offices.trusting(office, tablet())) {
            store.receive(packOf("round-2025-09"), "Ida Marsh");
            store.receive(packOf("round-2026-03"), "Ida Marsh");
            told = Offices.told(store);
        }
        try (OfficeStore store = OfficeStore.rebuild(office, OfficeOptions.of(Offices.NOW))) {
            assertEquals(told, Offices.told(store));
        }
        try (Stream<Path> index = Files.list(office.resolve("index"))) {
            for (Path file : index.toList()) {
                Files.write(file, new byte[] {7, 7, 7});
            }
        }
        try (OfficeStore store = OfficeStore.open(office, OfficeOptions.of(Offices.NOW))) {
            assertEquals(told, Offices.told(store));
        }
    }

    @Test
    void sameRevisionWithOtherContentStandsSideBySideAndAPersonDecides() {
        Bundle bundle = Offices.sample("round-2026-03");
        List<Branch> surveys = bundle.document().branches("surveys");
        Branch original = surveys.get(0);
        Branch altered = original.with("notes", "the same visit, told otherwise");
        Path one = Offices.pack(bundle, tablet(), folder.resolve("one.zip"));
        Path two = Offices.pack(Offices.with(bundle, "two", "2026-03-18T14:00:00+01:00", List.of(altered)),
                folder.resolve("other"), folder.resolve("two.zip"));
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet(), folder.resolve("other"))) {
            store.receive(one, "Ida Marsh");
            Received.Taken taken = assertInstanceOf(Received.Taken.class, store.receive(two, "Ida Marsh"));
            assertEquals(1, taken.clashes().size());
            Clash clash = taken.clashes().get(0);
            assertEquals(Clash.Kind.SAME_REVISION, clash.kind());
            assertEquals(2, clash.sides().size());
            ZoneId zone = clash.sides().get(0).zone();
            assertEquals(1, store.ranked(zone).orElseThrow().clashes());
            assertEquals(1, store.trend(zone).clashes());
            store.trend(zone).series().forEach(series -> {
                assertEquals(1, series.observations().size(), "two sides are one survey");
                assertEquals(new Outlook.TooFew(1, 5), series.outlook());
            });
            store.act("Ida Marsh", new OfficeDeed.ClashSettled(zone,
                    List.of(clash.sides().get(1).digest()), "the first one was signed off"));
            assertEquals(0, store.ranked(zone).orElseThrow().clashes());
            assertEquals(0, store.trend(zone).clashes());
            assertEquals(clash.sides().get(0).digest(), store.ranked(zone).orElseThrow().survey().orElseThrow());
        }
    }

    @Test
    void theOrderInWhichPacksComeDoesNotMatter() {
        List<Path> packs = new ArrayList<>(List.of(packOf("round-2025-09"), packOf("round-2026-03"),
                packOf("round-under-way")));
        Random random = new Random(6);
        List<String> told = new ArrayList<>();
        for (int i = 0; i < 3; i++) {
            Collections.shuffle(packs, random);
            try (OfficeStore store = Offices.trusting(folder.resolve("office" + i), tablet())) {
                packs.forEach(pack -> assertInstanceOf(Received.Taken.class, store.receive(pack, "Ida Marsh")));
                told.add(Offices.told(store));
            }
        }
        assertEquals(1, told.stream().distinct().count());
    }

    @Test
    void aPersonMayStopBetweenTwoPacksAndNothingIsLeftBehind() throws IOException {
        List<Path> packs = List.of(packOf("round-2025-09"), packOf("round-2026-03"), packOf("round-under-way"));
        Path office = folder.resolve("office");
        try (OfficeStore store = Offices.trusting(office, tablet())) {
            List<Received> received = store.receive(packs, "Ida Marsh", new Progress() {
                private long told;

                @Override
                public void at(long done, long total) {
                    told++;
                }

                @Override
                public boolean cancelled() {
                    return told > 0;
                }
            });
            assertEquals(1, received.size());
            assertEquals(1, store.packs().size());
            try (Stream<Path> files = Files.list(office.resolve("packs"))) {
                assertEquals(1, files.count());
            }
            assertEquals(3, store.receive(packs, "Ida Marsh", Progress.NONE).size());
            assertEquals(3, store.packs().size());
        }
    }
}
