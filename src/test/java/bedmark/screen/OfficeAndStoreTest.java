package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.index.Export;
import bedmark.index.Store;
import bedmark.index.StoreFolder;
import bedmark.index.StoreOptions;
import bedmark.index.SurveyQuery;
import bedmark.pack.DeviceKey;
import bedmark.pack.PackLimits;
import bedmark.pack.PackReader;
import bedmark.pack.ReadPack;
import bedmark.pack.Receipt;
import bedmark.pack.ReceiptWriter;
import bedmark.quantity.UnitSystem;
import bedmark.screen.start.UnlockModel;
import bedmark.screen.start.UnlockView;
import bedmark.screen.theme.Light;
import bedmark.screen.theme.Theme;
import bedmark.survey.QueueState;
import bedmark.vault.Passphrase;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import javafx.application.Platform;
import javafx.scene.Scene;
import javafx.scene.control.Label;
import javafx.scene.control.PasswordField;
import javafx.stage.Stage;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.testfx.api.FxRobot;
import org.testfx.util.WaitForAsyncUtils;

/**
 * What leaves, what the office confirms, and how the store does, by clicks; every state scanned in several looks, and
 * pictured in {@code target/pictures/store} with {@code -Dbedmark.pictures=true}.
 */
class OfficeAndStoreTest {
    private static final Path PICTURES = Path.of("target", "pictures", "store");
    private static final Locale SPANISH = Locale.forLanguageTag("es");
    private static final Clock CLOCK = Clock.fixed(Instant.parse("2026-09-22T14:20:00Z"), ZoneOffset.ofHours(2));

    @TempDir
    private Path temp;
    private Path stick;
    private TabletApp app;
    private final List<String> findings = new ArrayList<>();

    private record Look(Locale language, boolean night, boolean gloves) {
    }

    private static final List<Look> LOOKS = List.of(new Look(Locale.ENGLISH, false, false),
            new Look(SPANISH, true, false), new Look(SPANISH, false, true));

    @BeforeEach
    void prepare() throws Exception {
        stick = Files.createDirectory(temp.resolve("stick"));
    }

    private TabletApp open(String store, double width, double height) throws Exception {
        return new TabletApp(temp.resolve(store), Optional.of(Path.of("sample-surveys")), stick, CLOCK, width, height);
    }

    private void start() throws Exception {
        app.setOutOnDemo();
    }

    @Test
    void landscape() throws Exception {
        walk("landscape", 1280, 800);
    }

    @Test
    void portrait() throws Exception {
        walk("portrait", 800, 1280);
    }

    private void walk(String orientation, double width, double height) throws Exception {
        try (TabletApp opened = open("store", width, height)) {
            app = opened;
            start();
            app.click("to-queue");
            app.click("queue-all");
            app.click("export");
            app.until(() -> app.has("receipt"));
            sameAgain();
            receipts(orientation);
            store(orientation);
        }
        handOver(orientation, width, height);
        assertEquals(List.of(), findings);
    }

    private Path pack() throws Exception {
        try (Stream<Path> files = Files.list(stick)) {
            return files.filter(file -> file.toString().endsWith(".zip")).findFirst().orElseThrow();
        }
    }

    private void sameAgain() throws Exception {
        byte[] first = Files.readAllBytes(pack());
        Files.delete(pack());
        Export export = app.workplace().store().exports().get(0);
        app.click("again-" + export.sequence());
        app.until(() -> app.workplace().store().exports().size() == 2);
        assertArrayEquals(first, Files.readAllBytes(pack()));
    }

    private void receipts(String orientation) throws Exception {
        ReadPack read = PackReader.open(pack(), PackLimits.STANDARD);
        Export export = app.workplace().store().exports().get(0);
        List<Receipt.Item> items = new ArrayList<>(read.bundle().surveys().stream().map(Receipt.Item::of).toList());
        Receipt.Item first = items.get(0);
        items.set(0, new Receipt.Item(first.survey(), first.revision(), "00".repeat(32)));
        Receipt receipt = Receipt.of(UUID.randomUUID(), OffsetDateTime.now(CLOCK), new Receipt.Office(
                UUID.randomUUID(), "Plant office"), read.bundle().document().uuid("id").orElseThrow(),
                export.sha256(), items);
        ReceiptWriter.write(receipt, DeviceKey.of(temp.resolve("office")),
                stick.resolve(ReceiptWriter.fileName(receipt)));
        Files.writeString(stick.resolve("other.receipt.json"), "{}");
        app.click("read-receipts");
        app.until(() -> app.has("accept-office"));
        scan("office-unknown", orientation);
        assertEquals(0L, received(), "an office that is not known confirms nothing");
        app.click("accept-office");
        app.until(() -> app.has("received"));
        scan("receipts", orientation);
        assertEquals(items.size() - 1L, received());
        assertEquals(QueueState.EXPORTED, app.workplace().store().survey(first.survey()).orElseThrow().state());
    }

    private long received() {
        return app.workplace().store().surveys(SurveyQuery.ALL.in(QueueState.RECEIVED)).stream()
                .filter(line -> app.workplace().store().exports().get(0).surveys().contains(line.id())).count();
    }

    private void store(String orientation) throws Exception {
        app.click("to-store");
        scan("store", orientation);
        app.click("prove");
        app.until(() -> app.has("outcome") && words("outcome").startsWith("All is sound"));
        scan("store-proved", orientation);
        app.exportsTo(temp.resolve("no-stick"));
        app.click("back-up");
        app.until(() -> has("put the stick back"));
        scan("backup-failed", orientation);
        app.exportsTo(stick);
        app.click("back-up");
        app.until(() -> app.has("outcome") && words("outcome").startsWith("The backup is in"));
        assertTrue(words("last-backup").contains("nothing was saved since"), words("last-backup"));
        scan("backed-up", orientation);
        app.click("foot-back");
        app.until(() -> app.has("read-receipts"));
    }

    private void handOver(String orientation, double width, double height) throws Exception {
        try (TabletApp other = open("other", width, height)) {
            app = other;
            app.click("to-store");
            app.click("take-over");
            app.until(() -> app.has("outcome") && words("outcome").contains("surveys were taken over"));
            scan("taken-over", orientation);
            app.click("take-over");
            app.until(() -> app.has("outcome") && words("outcome").startsWith("Nothing new"));
            app.click("foot-back");
            app.until(() -> app.has("person"));
            assertTrue(app.workplace().site().rounds().size() > 0, "the walk goes on here");
        }
    }

    private String words(String id) {
        return app.words(id);
    }

    private boolean has(String text) throws Exception {
        return Glass.on(() -> app.shell().scene().getRoot().lookupAll(".trouble-text").stream()
                .anyMatch(node -> ((Label) node).getText().contains(text)));
    }

    private void scan(String name, String orientation) throws Exception {
        for (Look look : LOOKS) {
            prefer(look);
            if (Boolean.getBoolean("bedmark.pictures")) {
                app.picture(PICTURES.resolve(name + "-" + orientation + "-" + look.language()
                        + (look.night() ? "-night" : "-day") + (look.gloves() ? "-gloves" : "") + ".png"));
            }
            Glass.on(() -> findings.addAll(ScreenScan.of(app.shell().scene(),
                    Shell.density(app.workplace().preferences())).stream().map(finding -> "\n" + name + " "
                            + orientation + " " + look + ": " + finding).toList()));
        }
        prefer(LOOKS.get(0));
    }

    private void prefer(Look look) throws Exception {
        Glass.on(() -> {
            app.workplace().preferencesProperty().set(app.workplace().preferences().withLocale(look.language())
                    .withNight(look.night()).withGloves(look.gloves()));
            return null;
        });
        app.settle();
    }

    @Test
    void anEncryptedStoreIsOpenedByItsPassphraseAlone() throws Exception {
        Path home = temp.resolve("sealed");
        new StoreFolder(home, StoreOptions.of("tablet")).seal(Passphrase.chosen("skirt and board"));
        CompletableFuture<Store> opened = new CompletableFuture<>();
        FxRobot robot = new FxRobot();
        Scene scene = Glass.on(() -> {
            UnlockModel model = new UnlockModel(passphrase -> Store.open(home, StoreOptions.of("tablet")
                    .withPassphrase(Optional.of(passphrase))), Platform::runLater);
            UnlockView view = new UnlockView(new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC), model,
                    opened::complete);
            Stage stage = new Stage();
            Scene made = new Scene(view, 1280, 800);
            Theme.apply(made, Light.DAY, Shell.density(Preferences.standard()));
            stage.setScene(made);
            stage.show();
            view.focus();
            return made;
        });
        WaitForAsyncUtils.waitForFxEvents();
        robot.write("skirt or board");
        robot.clickOn("#unlock");
        Label trouble = (Label) scene.lookup("#unlock-trouble");
        WaitForAsyncUtils.waitFor(30, TimeUnit.SECONDS, trouble::isVisible);
        WaitForAsyncUtils.waitForFxEvents();
        assertTrue(trouble.getText().contains("not the right one"), trouble.getText());
        assertFalse(opened.isDone());
        Glass.on(() -> {
            Glass.write(PICTURES.resolve("unlock-landscape-en-day.png"), scene);
            findings.addAll(ScreenScan.of(scene, Shell.density(Preferences.standard())));
            ((PasswordField) scene.lookup("#passphrase")).setText("skirt and board");
            return null;
        });
        robot.clickOn("#show-passphrase");
        robot.clickOn("#unlock");
        try (Store store = opened.get(30, TimeUnit.SECONDS)) {
            assertTrue(store.sealed());
        }
        Glass.on(() -> {
            scene.getWindow().hide();
            return null;
        });
        assertEquals(List.of(), findings);
    }
}
