package bedmark.screen.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.engine.verdict.Rule;
import bedmark.journal.Progress;
import bedmark.office.Answered;
import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.office.RankQuery;
import bedmark.office.RankedZone;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.screen.Glass;
import bedmark.screen.Lighting;
import bedmark.survey.Bundle;
import bedmark.survey.OfficeDeed;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.ZoneId;
import java.math.BigDecimal;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicReference;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import javafx.scene.Node;
import javafx.scene.control.ComboBox;
import javafx.scene.control.DatePicker;
import javafx.scene.control.Label;
import javafx.scene.control.ListView;
import javafx.scene.control.TableColumn;
import javafx.scene.control.TableView;
import javafx.scene.control.TextField;
import javafx.scene.control.skin.DatePickerSkin;
import javafx.scene.input.KeyCode;
import javafx.scene.layout.Region;
import javafx.scene.paint.Paint;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.common.PDRectangle;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.testfx.util.WaitForAsyncUtils;

/** The office's screens, driven by clicks and keys on a headless glass. */
class OfficeWindowTest {
    @TempDir
    private Path folder;

    private Path packs;

    @BeforeEach
    void packs() {
        packs = folder.resolve("packs");
        for (String sample : List.of("round-2025-09", "round-2026-03", "round-under-way")) {
            Offices.pack(Offices.sample(sample), folder.resolve("tablet"), packs.resolve(sample + ".zip"));
        }
    }

    private OfficeWindow window(double width, double height) throws Exception {
        return new OfficeWindow(folder.resolve("office"), width, height);
    }

    private void receiveAll(OfficeWindow window) throws Exception {
        window.desk().store().trust(Offices.fingerprint(folder.resolve("tablet")), "", "Ida Marsh");
        window.click("room-receive");
        window.chooses(packs);
        window.click("receive-folder");
    }

    @Test
    void theLightFollowsTheClockWhereThatWasChosen() throws Exception {
        AtomicReference<Instant> now = new AtomicReference<>(Offices.NOW.instant());
        InstantSource watch = now::get;
        try (OfficeWindow window = new OfficeWindow(folder.resolve("office"), watch.withZone(ZoneOffset.UTC), 1280,
                800)) {
            Paint day = ground(window);
            window.click("light");
            assertNotEquals(day, ground(window));
            window.click("light");
            assertEquals(Lighting.CLOCK, window.desk().preferences().lighting());
            assertEquals(day, ground(window));
            now.set(Instant.parse("2026-10-01T20:00:00Z"));
            window.ticks();
            assertNotEquals(day, ground(window));
            now.set(Instant.parse("2026-10-02T08:00:00Z"));
            window.ticks();
            assertEquals(day, ground(window));
            window.click("light");
            assertEquals(Lighting.DAY, window.desk().preferences().lighting());
        }
    }

    private static Paint ground(OfficeWindow window) throws Exception {
        window.settle();
        return Glass.on(() -> ((Region) window.shell().scene().getRoot()).getBackground().getFills().get(0).getFill());
    }

    @Test
    void packsOfAnUnknownTabletAreAskedAboutOnceThenReceivedWithReceipts() throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            window.click("room-receive");
            window.chooses(packs);
            window.click("receive-folder");
            assertTrue(window.words().contains("does not trust yet"), window.words());
            named(window, "Ostermere works");
            window.click("trust");
            window.click("receive-folder");
            assertEquals(3, window.desk().store().packs().size());
            assertTrue(window.words().contains("25 new surveys"), window.words());
            try (Stream<Path> files = Files.list(packs)) {
                List<Path> receipts = files.filter(file -> file.toString().endsWith(".receipt.json")).toList();
                assertEquals(3, receipts.size());
                for (Path receipt : receipts) {
                    assertTrue(window.words().contains("Receipt beside the pack: packs/" + receipt.getFileName()),
                            window.words());
                    assertTrue(Files.readString(receipt).contains("Ostermere works"));
                }
            }
            theNameIsNotLostAndCanBeTakenBack(window);
        }
    }

    private static void named(OfficeWindow window, String name) throws Exception {
        window.click("office-name");
        window.robot().push(KeyCode.SHORTCUT, KeyCode.A);
        window.robot().push(KeyCode.DELETE);
        window.type(name);
        window.click("office-name-save");
    }

    private static String name(OfficeWindow window) {
        return window.desk().store().device().name();
    }

    private void theNameIsNotLostAndCanBeTakenBack(OfficeWindow window) throws Exception {
        assertTrue(window.node("office-name-save").isDisabled(), "nothing else is typed");
        named(window, " ");
        assertTrue(window.words().contains("The office's name is empty"), window.words());
        window.click("office-name");
        window.type("Ostermere works");
        assertFalse(window.words().contains("The office's name is empty"), "typed back by hand");
        named(window, "o".repeat(81));
        assertTrue(window.words().contains("81 characters"), window.words());
        assertEquals("Ostermere works", name(window));
        window.click("language");
        window.until(() -> window.words().contains("81 caracteres"));
        assertEquals(81, ((TextField) window.node("office-name")).getText().length());
        named(window, "Westerly");
        assertEquals("Westerly", name(window));
        assertTrue(window.words().contains("dicen Westerly"), window.words());
        window.click("office-name-back");
        assertEquals("Ostermere works", name(window));
        window.click("office-name");
        window.type("x");
        window.robot().push(KeyCode.ESCAPE);
        assertEquals("Ostermere works", ((TextField) window.node("office-name")).getText());
    }

    @Test
    void whatWasRefusedAtNightIsShownInTheMorningAndTrustedThere() throws Exception {
        Path cut = Files.write(folder.resolve("cut.zip"), new byte[] {'P', 'K', 3, 4, 5});
        try (OfficeStore store = OfficeStore.open(folder.resolve("office"), OfficeOptions.of(Offices.NOW))) {
            store.receive(List.of(packs.resolve("round-under-way.zip"), cut), "night", Progress.NONE);
        }
        try (OfficeWindow window = window(1280, 800)) {
            assertTrue(window.words().contains("Receive (2)"), window.words());
            window.click("room-receive");
            String words = window.words();
            assertTrue(words.contains("Refused, and not in yet"), words);
            assertTrue(words.contains("cut.zip") && words.contains("Nothing proves which tablet it is from."), words);
            assertTrue(words.contains("Refused 1 Oct 2026, 08:00, from " + packs), words);
            window.click("language");
            window.until(() -> window.words().contains("Nada prueba de qué tableta es."));
            assertTrue(window.words().contains("aún no confía"), window.words());
            window.click("trust");
            window.until(() -> !window.desk().store().packs().isEmpty());
            assertFalse(window.words().contains("aún no confía"), window.words());
            assertTrue(window.words().contains("cut.zip"), window.words());
            assertTrue(window.words().contains("Recibir (1)"), window.words());
            window.click("put-away");
            assertFalse(window.words().contains("cut.zip") || window.words().contains("Recibir ("), window.words());
        }
    }

    @Test
    void aWatchedFolderIsReceivedOncePacksAreWhole() throws Exception {
        Path inbox = Files.createDirectories(folder.resolve("inbox"));
        try (OfficeWindow window = window(1280, 800)) {
            window.desk().store().trust(Offices.fingerprint(folder.resolve("tablet")), "", "Ida Marsh");
            window.click("room-receive");
            window.chooses(inbox);
            window.click("watch-folder");
            Files.copy(packs.resolve("round-2026-03.zip"), inbox.resolve("a.zip"));
            window.until(() -> window.words().contains("25 new surveys"));
            assertEquals(1, window.desk().store().packs().size());
            window.click("room-energy");
            window.until(() -> window.words().contains("; most at "));
            assertTrue(window.words().matches("(?s).*remedies save [^;]*\u00A0MWh \\([^;]*\u00A0EUR\\); most "
                    + "at TP-[0-9]+: (free the bed|set the boards wider|lower the feed|renew the worn seals), "
                    + ".*\u00A0MWh .*"), window.words());
            assertTrue(window.words().contains("C1"), window.words());
            window.click("by-area");
            List<String> areas = plant(window).branches("areas").stream().map(area -> area.text("name").orElseThrow())
                    .toList();
            Set<String> bars = Glass.on(() -> window.shell().scene().getRoot().lookupAll(".bars .zone-name").stream()
                    .map(name -> ((Label) name).getText()).collect(Collectors.toSet()));
            assertEquals(Set.copyOf(areas), bars);
            String before = window.words();
            Files.copy(packs.resolve("round-under-way.zip"), inbox.resolve("b.zip"));
            window.until(() -> !window.words().equals(before));
            assertEquals(2, window.desk().store().packs().size());
        }
    }

    @Test
    void whatWasNotAsItWasWrittenIsSaidUntilSomebodyHasReadIt() throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            receiveAll(window);
            assertFalse(window.node("found-seen").getParent().isVisible());
        }
        Path tables = folder.resolve("office").resolve("index").resolve("office.mv.db");
        Files.write(tables, new byte[] {1, 2, 3});
        try (OfficeWindow window = window(1280, 800)) {
            assertTrue(window.words().contains(tables.getParent().toString()), window.words());
            window.click("found-seen");
            assertFalse(window.node("found-seen").getParent().isVisible());
            assertEquals(3, window.desk().store().packs().size());
            window.click("room-receive");
            assertTrue(window.words().contains("round-under-way.zip\nFrom Tablet 3, received "), window.words());
        }
    }

    @Test
    void theWorstZoneIsOpenedAndItsFindingAccepted() throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            receiveAll(window);
            window.click("room-worst");
            ListView<?> list = (ListView<?>) window.node("zones");
            window.until(() -> list.getItems().size() == 24);
            RankedZone worst = (RankedZone) list.getItems().get(0);
            eachFilterNarrowsTheListAlone(window);
            Glass.on(() -> {
                window.shell().zone(worst.zone());
                return null;
            });
            window.until(() -> window.words().contains("Too few surveys to say"));
            assertTrue(window.words().contains("full line: limit of overload"), window.words());
            assertTrue(window.words().contains("Latest survey: Overloaded, both by the register"), window.words());
            String rule = worst.findings().get(0).rule().code();
            window.click("accept-" + rule);
            assertTrue(window.words().contains("needs a reason"), window.words());
            window.click("reason");
            window.type("boards are on order");
            window.click("accept-" + rule);
            assertTrue(window.words().contains("Accepted by Ida Marsh"), window.words());
            window.click("reopen-" + rule);
            assertEquals(List.of(), answers(window, worst));
            window.click("until");
            window.type("2027-01-31");
            window.click("shelve-" + rule);
            assertTrue(window.words().contains("Shelved by Ida Marsh, until 31 Jan 2027: boards are on order"),
                    window.words());
            assertEquals(OfficeDeed.Answer.SHELVED, answers(window, worst).get(0).answer());
            window.click("action-text");
            window.type("Set the boards wider");
            window.click("action-add");
            OfficeDeed.ActionSet added = window.desk().store().actions().get(0);
            assertEquals("Set the boards wider", added.text());
            window.click("done-" + added.action());
            assertTrue(window.desk().store().actions().get(0).done());
            assertFalse(window.words().contains("Set the boards wider"), window.words());
            window.click("back");
            assertFalse(answers(window, worst).isEmpty());
        }
    }

    private static void eachFilterNarrowsTheListAlone(OfficeWindow window) throws Exception {
        Map<String, Function<Object, RankQuery>> filters = Map.of(
                "filter-area", area -> RankQuery.ALL.ofArea(Optional.of((String) area)),
                "filter-material", material -> RankQuery.ALL.ofMaterial(Optional.of((String) material)),
                "filter-finding", rule -> RankQuery.ALL.with(Optional.of((Rule) rule)),
                "filter-age", days -> RankQuery.ALL.olderThan(Optional.of(Duration.ofDays((Integer) days))));
        for (Map.Entry<String, Function<Object, RankQuery>> filter : filters.entrySet()) {
            ComboBox<?> box = (ComboBox<?>) window.node(filter.getKey());
            RankQuery query = filter.getValue().apply(((Optional<?>) box.getItems().get(2)).orElseThrow());
            List<ZoneId> wanted = zones(window.desk().store().rank(query, Progress.NONE));
            assertTrue(wanted.size() < 24, filter.getKey());
            pick(window, filter.getKey(), 2);
            window.until(() -> zones(listed(window)).equals(wanted));
            pick(window, filter.getKey(), 0);
            window.until(() -> listed(window).size() == 24);
        }
    }

    private static List<RankedZone> listed(OfficeWindow window) throws Exception {
        return ((ListView<?>) window.node("zones")).getItems().stream().map(RankedZone.class::cast).toList();
    }

    private static List<ZoneId> zones(List<RankedZone> ranked) {
        return ranked.stream().map(RankedZone::zone).toList();
    }

    private static void pick(OfficeWindow window, String id, int choice) throws Exception {
        ComboBox<?> box = (ComboBox<?>) window.node(id);
        Glass.on(() -> {
            box.getSelectionModel().select(choice);
            return null;
        });
        window.settle();
    }

    private RankedZone worst(OfficeWindow window) throws Exception {
        receiveAll(window);
        RankedZone worst = window.desk().store().rank().get(0);
        Glass.on(() -> {
            window.shell().zone(worst.zone());
            return null;
        });
        window.until(() -> window.words().contains("Too few surveys to say"));
        return worst;
    }

    private static List<Answered> answers(OfficeWindow window, RankedZone zone) {
        return window.desk().store().ranked(zone.zone()).orElseThrow().answers();
    }

    @ParameterizedTest
    @ValueSource(strings = {"2027-01-31", "31.1.2027", "31 Jan 2027"})
    void aTypedDayCountsWithoutBeingConfirmedFirst(String typed) throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            RankedZone worst = worst(window);
            window.click("reason");
            window.type("boards are on order");
            window.click("until");
            window.type(typed);
            window.click("accept-" + worst.findings().get(0).rule().code());
            assertEquals(Optional.of(LocalDate.of(2027, 1, 31)), answers(window, worst).get(0).until());
            assertTrue(window.words().contains("Accepted by Ida Marsh, until 31 Jan 2027"), window.words());
            window.click("action-text");
            window.type("Set the boards wider");
            window.click("action-due");
            window.type(typed);
            window.click("action-add");
            assertEquals(Optional.of(LocalDate.of(2027, 1, 31)), window.desk().store().actions().get(0).due());
            assertTrue(window.words().contains("due 31 Jan 2027"), window.words());
        }
    }

    @Test
    void whatIsTypedForAnActionStaysWhileAFindingIsAnswered() throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            RankedZone worst = worst(window);
            window.click("action-text");
            window.type("Set the boards wider");
            window.click("action-due");
            window.type("2027-01-31");
            window.click("reason");
            window.type("boards are on order");
            window.click("accept-" + worst.findings().get(0).rule().code());
            assertTrue(window.words().contains("Accepted by Ida Marsh"), window.words());
            assertEquals("Set the boards wider", ((TextField) window.node("action-text")).getText());
            window.click("reason");
            window.type("again");
            window.click("language");
            window.until(() -> window.words().contains("Añadir acción"));
            window.click("light");
            assertTrue(((TextField) window.node("reason")).getText().endsWith("again"));
            window.click("language");
            window.until(() -> window.words().contains("Add action"));
            assertEquals("Set the boards wider", ((TextField) window.node("action-text")).getText());
            assertEquals("2027-01-31", ((TextField) window.node("action-due")).getText());
            window.click("action-add");
            assertTrue(window.words().contains("due 31 Jan 2027"), window.words());
            assertEquals("", ((TextField) window.node("action-text")).getText());
            assertEquals("", ((TextField) window.node("action-due")).getText());
        }
    }

    @Test
    void theCalendarSpeaksTheLanguageOfTheProgramAndNotThatOfTheMachine() throws Exception {
        Locale machine = Locale.getDefault();
        Locale.setDefault(Locale.forLanguageTag("ar-EG-u-nu-arab"));
        try (OfficeWindow window = window(1280, 800)) {
            worst(window);
            window.click("until");
            window.type("2027-01-31");
            List<String> english = calendar(window);
            assertTrue(english.containsAll(List.of("January", "2027", "31")), english::toString);
            assertTrue(english.indexOf("Mon") < english.indexOf("Tue"), english::toString);
            assertTrue(english.indexOf("Mon") < english.indexOf("Sun"), english::toString);
            window.click("language");
            List<String> spanish = calendar(window);
            assertTrue(spanish.containsAll(List.of("Enero", "2027", "31")), spanish::toString);
            assertTrue(spanish.indexOf("Lun") < spanish.indexOf("Dom"), spanish::toString);
        } finally {
            Locale.setDefault(machine);
        }
    }

    /** What is written in the calendar at the field for the end of an acceptance. */
    private static List<String> calendar(OfficeWindow window) throws Exception {
        DatePicker picker = (DatePicker) window.node("until-calendar");
        Glass.on(() -> {
            picker.show();
            return null;
        });
        window.settle();
        return Glass.on(() -> {
            List<String> words = Glass.words(((DatePickerSkin) picker.getSkin()).getPopupContent()).lines().toList();
            picker.hide();
            return words;
        });
    }

    @Test
    void whatIsNoDayIsRefusedAtItsFieldAndNothingIsAccepted() throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            RankedZone worst = worst(window);
            String rule = worst.findings().get(0).rule().code();
            window.click("reason");
            window.type("boards are on order");
            window.click("until");
            window.type("next week");
            window.robot().push(KeyCode.ENTER);
            window.click("accept-" + rule);
            assertTrue(window.words().contains("\"next week\" is no day that can be read here"), window.words());
            assertEquals("next week", ((TextField) window.node("until")).getText());
            assertTrue(answers(window, worst).isEmpty());
            window.click("until");
            window.robot().push(KeyCode.SHORTCUT, KeyCode.A);
            window.robot().push(KeyCode.DELETE);
            window.click("accept-" + rule);
            assertTrue(window.words().contains("Accepted by Ida Marsh, without an end"), window.words());
        }
    }

    @Test
    void aConflictIsShownSideBySideAndDecided() throws Exception {
        Bundle bundle = Offices.sample("round-under-way");
        Branch held = bundle.document().branches("surveys").stream().filter(one -> one.text("transfer").get()
                .equals("TP-08")).findFirst().orElseThrow();
        Branch survey = held.with("notes", "told otherwise").without("photos").with("readings", held.branch("readings")
                .orElseThrow().with("loadingZoneLength", Quantity.of(new BigDecimal("9.75"), Unit.METRE)));
        Offices.pack(Offices.with(bundle, "other", "2026-09-22T17:00:00+02:00", List.of(survey)),
                folder.resolve("tablet"), packs.resolve("z.zip"));
        try (OfficeWindow window = window(1280, 800)) {
            receiveAll(window);
            RankedZone zone = window.desk().store().rank().stream().filter(one -> one.clashes() > 0).findFirst()
                    .orElseThrow();
            Glass.on(() -> {
                window.shell().zone(zone.zone());
                return null;
            });
            window.until(() -> window.words().contains("This one counts"));
            for (String told : List.of("told otherwise", "9.75", "skirted length", "drag of the skirts",
                    "By Mira Tolland, from ")) {
                assertTrue(window.words().contains(told), told + ": " + window.words());
            }
            window.click("clash-reason");
            window.type("the first was signed off");
            List<String> sides = window.desk().store().merged(zone.zone()).clashes().get(0).sides().stream()
                    .map(Copy::digest).toList();
            window.click("settle-" + sides.get(0).substring(0, 12));
            assertEquals(0, window.desk().store().ranked(zone.zone()).orElseThrow().clashes());
            List<String> counting = window.desk().store().merged(zone.zone()).visits().stream().map(Copy::digest)
                    .toList();
            assertTrue(counting.contains(sides.get(0)) && !counting.contains(sides.get(1)), "the side that was chosen");
        }
    }

    @Test
    void aCellOfTheRegisterIsEditedInPlaceAndABadOneRefused() throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            receiveAll(window);
            window.click("room-register");
            window.node("register-table");
            window.chooses(Files.createDirectories(folder.resolve("out")));
            window.click("export");
            assertTrue(Files.readString(folder.resolve("out/conveyors.csv")).startsWith("id,tag,assetId"));
            Files.writeString(folder.resolve("out/transfers.csv"), "id,conveyor,skirtSpacing\nTP-01,C1,never\n");
            window.click("import");
            window.until(() -> window.words().contains("is no number"));
            window.click("leave-draft");
            assertFalse(window.words().contains("is no number"), window.words());
            Files.writeString(folder.resolve("out/transfers.csv"), "id,conveyor,skirtSpacing\nTP-01,C1,870 mm\n");
            window.click("import");
            window.click("take-draft");
            assertEquals("870", window.desk().store().registers().get("ostermere").transfer("TP-01").orElseThrow()
                    .quantity("skirtSpacing").orElseThrow().value().toPlainString());
            window.click("send-round");
            try (Stream<Path> files = Files.list(folder.resolve("out"))) {
                assertEquals(1, files.filter(file -> file.toString().endsWith(".round.json")).count());
            }
        }
    }

    @Test
    void aTableWithHeadsOfItsOwnIsTakenOnceItsColumnsAreChosen() throws Exception {
        Path out = Files.createDirectories(folder.resolve("out"));
        Files.writeString(out.resolve("points.csv"), "Point,Belt,Gap,Colour\nTP-01,C1,871,red\n");
        try (OfficeWindow window = window(1280, 800)) {
            receiveAll(window);
            window.click("room-register");
            window.chooses(out);
            window.click("import");
            window.until(() -> window.words().contains("none of a register's lists"));
            choose(window, "table-points-csv", "Loading zones");
            choose(window, "column-points-csv-Point", "Id");
            choose(window, "column-points-csv-Belt", "Conveyor");
            choose(window, "column-points-csv-Gap", "Spacing");
            window.until(() -> window.words().contains("871 has no unit"));
            choose(window, "unit-points-csv-Gap", "mm");
            window.click("take-draft");
            window.until(() -> spacing(window).equals("871"));
        }
    }

    @Test
    void aTableThatNobodyKnowsCanBeLeftOutAtOnceAndWhatWasWrittenIsToldOnlyUntilThen() throws Exception {
        Path out = Files.createDirectories(folder.resolve("out"));
        try (OfficeWindow window = window(1280, 800)) {
            receiveAll(window);
            window.click("room-register");
            window.chooses(out);
            window.click("send-round");
            assertTrue(window.words().contains("Written to"), window.words());
            Files.writeString(out.resolve("spares.csv"), "part,shelf\nbelt clamp,7\n");
            window.click("import");
            window.until(() -> window.words().contains("none of a register's lists"));
            assertFalse(window.words().contains("Written to"), window.words());
            choose(window, "table-spares-csv", "not taken in");
            window.until(() -> window.words().contains("Would be taken in: 0 new"));
        }
    }

    private static void choose(OfficeWindow window, String id, String text) throws Exception {
        ComboBox<?> box = (ComboBox<?>) window.node(id);
        Glass.on(() -> {
            box.getSelectionModel().select(box.getItems().stream().map(Object::toString).toList().indexOf(text));
            return null;
        });
        window.settle();
    }

    @Test
    void aCellThatIsRefusedStaysWithItsReasonUntilItIsMendedOrTakenBack() throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            receiveAll(window);
            window.click("room-register");
            edit(window, 0, "skirtSpacing", "865 mm", KeyCode.ENTER);
            window.until(() -> spacing(window).equals("865"));
            edit(window, 0, "skirtSpacing", "wide", KeyCode.ENTER);
            String refused = "Loading zones, TP-01, Spacing: \"wide\" is no number";
            window.until(() -> window.words().contains(refused));
            assertEquals("865", spacing(window));
            edit(window, 1, "skirtSpacing", "broad", KeyCode.ENTER);
            window.until(() -> window.words().contains("Loading zones, TP-02, Spacing: \"broad\" is no number"));
            assertTrue(window.words().contains(refused), "one refusal does not hide another");
            window.click("room-worst");
            window.click("language");
            window.click("room-register");
            window.until(() -> window.words().contains("TP-01, ") && window.words().contains("wide"));
            window.click("list-materials");
            window.until(() -> window.words().contains(" lb/pie³"));
            window.click("language");
            window.until(() -> window.words().contains(" lb/ft³"));
            window.click("list-transfers");
            edit(window, 0, "skirtSpacing", "866 mm", KeyCode.ENTER);
            window.until(() -> spacing(window).equals("866"));
            assertFalse(window.words().contains("wide"), window.words());
            window.click("row-revert");
            assertFalse(window.words().contains("broad"), window.words());
        }
    }

    @Test
    void whatIsTypedIsTakenHoweverTheCellIsLeft() throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            receiveAll(window);
            window.click("room-register");
            edit(window, 0, "skirtSpacing", "871 mm", KeyCode.TAB);
            window.until(() -> spacing(window).equals("871"));
            edit(window, 0, "skirtSpacing", "872 mm", KeyCode.ESCAPE);
            edit(window, 0, "tag", "TP-01 north", null);
            window.click("room-report");
            window.until(() -> zone(window).text("tag").equals(Optional.of("TP-01 north")));
            assertEquals("871", spacing(window), "Escape takes back");
            window.click("room-register");
            edit(window, 0, "skirtSpacing", "873 mm", null);
            window.click("language");
            window.until(() -> spacing(window).equals("873"));
            edit(window, 0, "designBedDepth", "", KeyCode.ENTER);
            window.until(() -> !zone(window).has("designBedDepth"));
        }
    }

    @Test
    void aRowIsAddedAndTakenAwayAndThePlantItselfEdited() throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            receiveAll(window);
            window.click("room-register");
            window.click("list-materials");
            window.until(() -> window.words().contains("Friction factor"));
            int held = rows(window);
            window.click("row-add");
            window.type("dross");
            edit(window, held, "bulkDensity", "heavy", KeyCode.ENTER);
            window.until(() -> window.words().contains("dross"));
            edit(window, held, "id", "", KeyCode.ENTER);
            window.click("row-add-take");
            window.until(() -> window.words().contains("Materials, the new row, Id: the cell is empty"));
            edit(window, held, "id", "slag", KeyCode.ENTER);
            window.click("row-add-take");
            window.until(() -> window.words().contains("Materials, the new row, Bulk density: \"heavy\" is no number"));
            edit(window, held, "bulkDensity", "1200 kg/m3", KeyCode.ENTER);
            window.click("row-add-take");
            window.until(() -> plant(window).branches("materials").size() == held + 1);
            window.until(() -> rows(window) == held + 1);
            select(window, held);
            window.click("row-remove");
            assertTrue(window.words().contains("Remove slag?"), window.words());
            window.click("row-remove-yes");
            window.until(() -> plant(window).branches("materials").size() == held);
            select(window, 0);
            window.click("row-remove");
            window.click("row-remove-yes");
            window.until(() -> window.words().contains("is still named by TP-"));
            window.click("list-plant");
            window.until(() -> window.words().contains("Price of a kWh"));
            edit(window, 0, "name", "Ostermere North", KeyCode.ENTER);
            window.until(() -> plant(window).text("name").equals(Optional.of("Ostermere North")));
        }
    }

    private static int rows(OfficeWindow window) throws Exception {
        return ((TableView<?>) window.node("register-table")).getItems().size();
    }

    private static void select(OfficeWindow window, int row) throws Exception {
        TableView<?> table = (TableView<?>) window.node("register-table");
        Glass.on(() -> {
            table.getSelectionModel().clearAndSelect(row);
            return null;
        });
        window.settle();
    }

    private static Branch plant(OfficeWindow window) {
        return window.desk().store().registers().get("ostermere").document();
    }

    private static Branch zone(OfficeWindow window) {
        return plant(window).branches("transfers").get(0);
    }

    private static String spacing(OfficeWindow window) {
        return zone(window).quantity("skirtSpacing").orElseThrow().value().toPlainString();
    }

    /** @param end the key that leaves the cell; nothing where something else does */
    private static void edit(OfficeWindow window, int row, String key, String text, KeyCode end) throws Exception {
        TableView<?> table = (TableView<?>) window.node("register-table");
        Glass.on(() -> {
            TableColumn<?, ?> column = table.getColumns().stream().filter(one -> one.getId()
                    .equals("column-" + key)).findFirst().orElseThrow();
            table.scrollToColumnIndex(table.getColumns().indexOf(column));
            table.scrollTo(row);
            table.layout();
            startEdit(table, row, column);
            return null;
        });
        window.settle();
        window.robot().push(KeyCode.SHORTCUT, KeyCode.A);
        window.robot().push(KeyCode.DELETE);
        window.type(text);
        if (end != null) {
            window.robot().push(end);
        }
        window.settle();
    }

    @SuppressWarnings("unchecked")
    private static <T> void startEdit(TableView<T> table, int row, TableColumn<?, ?> column) {
        table.requestFocus();
        table.edit(row, (TableColumn<T, ?>) column);
    }

    @Test
    void theReportIsWrittenAsChosen() throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            receiveAll(window);
            window.click("room-report");
            window.chooses(Files.createDirectories(folder.resolve("out")));
            window.click("report-kind-csv");
            window.click("report-language-es");
            assertTrue(window.node("report-paper-letter").isDisabled(), "paper is for pages");
            window.click("report-write");
            window.until(() -> window.words().contains("-es.csv"));
            window.click("report-kind-pdf");
            window.click("report-paper-letter");
            window.click("report-write");
            window.until(() -> window.words().contains("-es.pdf"));
        }
        try (Stream<Path> files = Files.list(folder.resolve("out"))) {
            List<Path> written = files.sorted().toList();
            assertEquals(2, written.size());
            assertTrue(Files.readString(written.get(0)).contains("TP-01"));
            try (PDDocument pages = Loader.loadPDF(written.get(1).toFile())) {
                assertTrue(pages.getDocumentCatalog().getLanguage().startsWith("es"), "the language that was chosen");
                assertEquals(PDRectangle.LETTER.getWidth(), pages.getPage(0).getMediaBox().getWidth(), 0.5);
            }
        }
    }

    @Test
    void packsDroppedOntoTheWindowAreReceived() throws Exception {
        try (OfficeWindow window = window(1280, 800)) {
            window.desk().store().trust(Offices.fingerprint(folder.resolve("tablet")), "", "Ida Marsh");
            window.click("room-receive");
            Node place = window.node("drop-place");
            List<Path> dropped = List.of(packs.resolve("round-2025-09.zip"), packs.resolve("round-2026-03.zip"));
            Glass.on(() -> {
                DroppedFiles.onto(place, dropped);
                return null;
            });
            window.until(() -> window.desk().store().packs().size() == 2);
            workUnderWayIsStoppedByItsButton(window);
        }
    }

    private static void workUnderWayIsStoppedByItsButton(OfficeWindow window) throws Exception {
        CompletableFuture<Boolean> stopped = new CompletableFuture<>();
        Glass.on(() -> {
            window.desk().ask(progress -> {
                progress.at(1, 2);
                while (!progress.cancelled()) {
                    Thread.onSpinWait();
                }
                return true;
            }, stopped::complete);
            return null;
        });
        Node button = window.shell().scene().lookup("#cancel");
        WaitForAsyncUtils.waitFor(1, TimeUnit.MINUTES, () -> button.getParent().isVisible());
        WaitForAsyncUtils.waitForFxEvents();
        window.robot().clickOn(button);
        assertTrue(stopped.get(1, TimeUnit.MINUTES));
        window.settle();
        assertFalse(button.getParent().isVisible(), "nothing is under way any more");
    }
}
