package bedmark.screen.arrival;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.office.RoundDesk;
import bedmark.screen.Glass;
import bedmark.survey.Bundle;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import javafx.scene.control.ListView;
import javafx.scene.input.KeyCode;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The window of a file that came, driven by clicks and keys on a headless glass. */
class ArrivalWindowTest {
    @TempDir
    private Path folder;

    private Path home;
    private Path pack;

    @BeforeEach
    void pack() throws Exception {
        home = Files.createDirectories(folder.resolve("home"));
        pack = Offices.pack(Offices.sample("round-under-way"), folder.resolve("tablet"),
                folder.resolve("stick/round.zip"));
    }

    private ArrivalWindow window(Path file) throws Exception {
        return new ArrivalWindow(file, home, 1280, 800);
    }

    private static ListView<?> surveys(ArrivalWindow window) throws Exception {
        return (ListView<?>) window.node("surveys");
    }

    @Test
    void packIsShownWithItsDeviceItsPlantAndTheWorstSurveyFirst() throws Exception {
        Bundle bundle = Offices.sample("round-under-way");
        try (ArrivalWindow window = window(pack)) {
            ArrivedSurvey worst = (ArrivedSurvey) surveys(window).getItems().get(0);
            assertEquals(bundle.surveys().size(), surveys(window).getItems().size());
            String words = window.words();
            for (String told : List.of(bundle.document().branch("device").flatMap(device -> device.text("name"))
                    .orElseThrow(), bundle.register().name(), worst.point(), "Overloaded: ",
                    "at design feed: Overloaded", "Stay outside the guards", "valid: nothing was changed since")) {
                assertTrue(words.contains(told), told + " in " + words);
            }
            assertTrue(words.replace("\n", "").contains(Offices.fingerprint(folder.resolve("tablet"))), words);
        }
    }

    @Test
    void unknownTabletIsAskedAboutAndThenThePackIsIn() throws Exception {
        Path office = Files.createDirectories(folder.resolve("office"));
        try (ArrivalWindow window = window(pack)) {
            window.chooses(office);
            window.click("receive");
            assertTrue(window.words().contains("does not trust yet"), window.words());
            assertFalse(window.has("receive"), "the question stands beside the fingerprint");
            window.click("trust");
            assertTrue(window.words().contains("new surveys"), window.words());
            assertTrue(window.words().contains("Receipt beside the pack: "), window.words());
            window.click("open-office");
            assertEquals(1, window.toOffice());
            assertEquals(1, window.asked());
        }
        try (Stream<Path> files = Files.list(pack.getParent())) {
            assertEquals(1, files.filter(file -> file.toString().endsWith(".receipt.json")).count());
        }
    }

    @Test
    void officeIsRememberedAndTheSamePackChangesNothing() throws Exception {
        Path office = folder.resolve("office");
        Offices.trusting(office, folder.resolve("tablet")).close();
        try (ArrivalWindow window = window(pack)) {
            window.chooses(office);
            window.click("receive");
            assertTrue(window.has("open-office"));
        }
        try (ArrivalWindow window = window(pack)) {
            assertTrue(window.words().contains(office.toString()), window.words());
            window.press(KeyCode.ENTER);
            assertTrue(window.words().contains("received before, nothing changed"), window.words());
            assertEquals(0, window.asked());
            window.press(KeyCode.ESCAPE);
            assertEquals(1, window.closings());
        }
    }

    @Test
    void openedOfficeGoesOnInItsOwnWindow() throws Exception {
        Offices.trusting(home.resolve(OfficeStore.USUAL_FOLDER), folder.resolve("tablet")).close();
        try (ArrivalWindow window = window(pack)) {
            window.click("receive");
            assertEquals(0, window.asked(), "the office in the person's home is known");
            OfficeStore store = Glass.on(() -> window.model().handOver().orElseThrow().store());
            assertEquals(1, store.packs().size());
            store.close();
        }
    }

    @Test
    void changedPackShowsTheOneSentenceAndCanBeLookedAtAgain() throws Exception {
        byte[] sound = Files.readAllBytes(pack);
        byte[] changed = sound.clone();
        changed[changed.length / 2] ^= 1;
        Files.write(pack, changed);
        try (ArrivalWindow window = window(pack)) {
            assertTrue(window.words().contains("its checksum is wrong; copy the pack again"), window.words());
            assertFalse(window.has("receive"));
            Files.write(pack, sound);
            window.click("again");
            assertTrue(window.has("receive"));
        }
    }

    @Test
    void folderThatHoldsOtherThingsBecomesNoOffice() throws Exception {
        try (ArrivalWindow window = window(pack)) {
            window.chooses(pack.getParent());
            window.click("receive");
            assertTrue(window.words().contains("holds other files and no office"), window.words());
            assertTrue(window.has("receive"), "another folder can be chosen");
        }
        assertFalse(OfficeStore.isOffice(pack.getParent()));
    }

    @Test
    void roundFileAndReceiptSayWhereTheyBelong() throws Exception {
        Path round = folder.resolve("next.round.json");
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            store.receive(pack, "Ida Marsh").confirmed().ifPresent(receipt -> store.write(receipt, home));
            new RoundDesk(store).send("ostermere", List.of(), round, OffsetDateTime.now(Offices.NOW), "Ida Marsh");
        }
        try (ArrivalWindow window = window(round)) {
            assertTrue(window.words().contains("“Take in the office's round”"), window.words());
            assertFalse(window.has("receive"));
        }
        Path receipt;
        try (Stream<Path> files = Files.list(home)) {
            receipt = files.filter(file -> file.toString().endsWith(".receipt.json")).findFirst().orElseThrow();
        }
        try (ArrivalWindow window = window(receipt)) {
            assertTrue(window.words().contains("“Read the office's receipts"), window.words());
        }
    }

    @Test
    void windowIsShownAnewInAnotherLanguageAndRemembersIt() throws Exception {
        try (ArrivalWindow window = window(pack)) {
            window.click("language");
            assertTrue(window.words().contains("Un paquete de una tableta"), window.words());
            window.click("light");
        }
        try (ArrivalWindow window = window(pack)) {
            assertEquals(Locale.forLanguageTag("es"), window.model().preferences().locale());
            assertTrue(window.model().preferences().night());
        }
    }

    @Test
    void surveyThatCannotBeJudgedHidesNoOther() throws Exception {
        Bundle bundle = Offices.sample("round-under-way");
        List<Branch> surveys = bundle.document().branches("surveys").stream().map(survey ->
                survey.text("transfer").orElseThrow().equals("TP-08") ? survey.with("readings",
                        survey.branch("readings").orElseThrow().with("skirtSpacing", Branch.EMPTY
                                .with("value", Node.number(9000)).with("unit", "mm"))) : survey).toList();
        Path odd = Offices.pack(Offices.with(bundle, "odd", "2026-09-22T17:00:00+02:00", surveys),
                folder.resolve("tablet"), folder.resolve("stick/odd.zip"));
        try (ArrivalWindow window = window(odd)) {
            List<ArrivedSurvey> shown = surveys(window).getItems().stream().map(ArrivedSurvey.class::cast).toList();
            assertEquals(surveys.size(), shown.size());
            assertEquals(List.of("TP-08"), shown.stream().filter(one -> one.impossible().isPresent())
                    .map(ArrivedSurvey::point).toList());
            assertTrue(window.words().contains("No verdict: "), window.words());
        }
    }
}
