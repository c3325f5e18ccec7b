package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Defect;
import bedmark.screen.start.RefusedView;
import bedmark.screen.start.StartModel;
import bedmark.screen.start.StartView;
import bedmark.screen.start.UnlockModel;
import bedmark.screen.start.UnlockView;
import bedmark.wording.Wording;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.attribute.FileTime;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Function;
import javafx.application.Platform;
import javafx.scene.control.TextInputControl;
import javafx.scene.input.KeyCode;
import javafx.scene.layout.BorderPane;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Takes the pictures of every screen that {@code src/site/screens} shows, in both orientations. */
class ScreenPicturesTest {
    private static final Path PAGE = Path.of("src", "site", "screens", "README.md");
    private static final Path PICTURES = Path.of(System.getProperty("bedmark.screens", PAGE.getParent().toString()));
    private static final Path CAMERA = Path.of("target", "camera");
    private static final Path STICK = Path.of("target", "usb-stick");
    private static final Clock CLOCK = Clock.fixed(Instant.parse("2026-09-22T14:20:00Z"), ZoneOffset.ofHours(2));
    private static final Locale SPANISH = Locale.forLanguageTag("es");

    @TempDir
    private Path temp;

    private TabletApp app;
    private String orientation;

    @Test
    void landscape() throws Exception {
        walk("landscape", 1280, 800, Locale.ENGLISH, false);
    }

    @Test
    void portrait() throws Exception {
        walk("portrait", 800, 1280, SPANISH, true);
    }

    private void walk(String named, double width, double height, Locale language, boolean night) throws Exception {
        orientation = named;
        Files.createDirectories(STICK);
        try (TabletApp opened = new TabletApp(temp.resolve("store"), Optional.of(Path.of("sample-surveys")), STICK,
                CLOCK, width, height)) {
            app = opened;
            prefer(language, night, false);
            camera();
            start();
            settings();
            round();
            freshZone(language);
            overloadedZone();
            otherZones();
            notes();
            finish();
            queue();
        }
    }

    private void start() throws Exception {
        take("empty");
        app.click("new-plant");
        app.until(() -> app.has("make-plant"));
        take("new-plant");
        app.click("foot-back");
        app.until(() -> app.has("load-demo"));
        loading();
        withoutAStore();
        app.click("load-demo");
        app.until(() -> app.has("person"));
        app.click("person");
        app.type("A. Vale");
        app.click("caution-read");
        takeAll("start");
    }

    /** Two photos of the demo plant, as a camera app would have left them. */
    private void camera() throws Exception {
        Files.createDirectories(CAMERA);
        for (String photo : List.of("tp-21-caked-liner.jpg", "tp-10-torn-seal.png")) {
            Files.copy(Path.of("sample-surveys", "photos", photo), CAMERA.resolve(photo),
                    StandardCopyOption.REPLACE_EXISTING);
            Files.setLastModifiedTime(CAMERA.resolve(photo), FileTime.from(CLOCK.instant()));
        }
        Glass.on(() -> {
            app.workplace().preferencesProperty().set(app.workplace().preferences()
                    .withWatchedFolder(Optional.of(CAMERA.toString())));
            return null;
        });
    }

    private void settings() throws Exception {
        app.click("to-settings");
        app.until(() -> app.has("settings-done"));
        takeAll("settings");
        app.click("settings-done");
        app.until(() -> app.has("person"));
    }

    private void notes() throws Exception {
        open("TP-19");
        app.click("foot-notes");
        app.until(() -> app.has("shot-1"));
        pictured("shot-0", "shot-1");
        take("notes-fresh");
        app.click("foot-round");
        open("TP-08");
        app.click("foot-notes");
        app.until(() -> app.has("shot-1"));
        pictured("shot-0", "shot-1", "photo-0", "photo-1");
        takeAll("notes");
        app.click("action-1");
        app.click("order-seal");
        take("notes-action");
        app.click("action-cancel");
        app.click("photo-0");
        app.until(() -> !app.shell().scene().getRoot().lookupAll(".photo-editor .image-view").isEmpty());
        take("notes-photo");
        app.click("photo-keep");
        app.click("foot-round");
        app.until(() -> app.has("search"));
        app.click("propose");
        app.click("propose-tag");
        app.type("TP-19A");
        take("round-propose");
        app.click("propose-send");
        app.until(() -> app.has("search"));
    }

    /** Waits until the tiles show their photos. */
    private void pictured(String... tiles) throws Exception {
        for (String tile : tiles) {
            app.until(() -> Glass.on(() -> !app.node(tile).lookupAll(".image-view").isEmpty()));
        }
    }

    private void finish() throws Exception {
        app.click("to-finish");
        app.until(() -> app.has("sign-off"));
        takeAll("finish");
        app.click("foot-back");
        app.until(() -> app.has("search"));
    }

    /** Loading is over before a picture can be taken, so that the screen is shown with a model that stands still. */
    private void loading() throws Exception {
        Glass.on(() -> {
            StartModel model = new StartModel(app.workplace());
            model.loadingProperty().set(0.4);
            StartView view = new StartView(app.workplace(), model, app.shell());
            view.turned(orientation.equals("portrait"));
            BorderPane root = (BorderPane) app.shell().scene().getRoot();
            root.setTop(view.head());
            root.setCenter(view.body());
            root.setBottom(view.foot());
            return null;
        });
        take("loading");
        Glass.on(() -> {
            app.shell().toStart();
            return null;
        });
        app.settle();
    }

    /** A store that takes a passphrase asks for it before there is a shell, and one that opens nowhere says why. */
    private void withoutAStore() throws Exception {
        UnlockModel locked = new UnlockModel(passphrase -> app.workplace().store(), Platform::runLater);
        inPlaceOfTheShell("unlock", wording -> new UnlockView(wording, locked, store -> { }));
        Defect open = Defect.in("/home/survey/.bedmark", "store-locked");
        inPlaceOfTheShell("refused", wording -> new RefusedView(wording, open, () -> { }));
    }

    private void inPlaceOfTheShell(String name, Function<Wording, BorderPane> view) throws Exception {
        Glass.on(() -> {
            BorderPane root = (BorderPane) app.shell().scene().getRoot();
            root.setTop(null);
            root.setCenter(view.apply(app.workplace().wording()));
            root.setBottom(null);
            return null;
        });
        take(name);
        Glass.on(() -> {
            app.shell().toStart();
            return null;
        });
        app.settle();
    }

    private void round() throws Exception {
        app.click("start-walk");
        app.until(() -> app.has("search"));
        takeAll("round");
        app.click("search");
        app.type("bunker");
        take("round-searched");
        app.click("skip-TP-19");
        take("round-skip");
        app.click("reason-cancel");
        app.click("search");
        app.press(KeyCode.CONTROL, KeyCode.A);
        app.press(KeyCode.DELETE);
    }

    private void freshZone(Locale language) throws Exception {
        open("TP-19");
        take("zone-fresh");
        app.click("foot-done");
        take("zone-gap");
        app.type("0");
        app.press(KeyCode.ENTER);
        app.press(KeyCode.SHIFT, KeyCode.ENTER);
        take("zone-refused");
        app.type("98");
        app.press(KeyCode.ENTER);
        take("zone-doubt");
        app.type(language.equals(SPANISH) ? "5,2" : "5.2");
        app.click("pad-decimal");
        take("zone-length");
        app.press(KeyCode.ENTER);
        app.click("slot-readings-skirtSpacing");
        app.click("slot-readings-beltSpeed-way");
        take("zone-speed");
        app.click("belt-state");
        take("zone-belt-state");
        app.click("belt-running-loaded");
        app.click("slot-permit");
        app.type("LOTO 4417");
        take("zone-text");
        app.click("foot-round");
        app.until(() -> app.has("search"));
    }

    private void overloadedZone() throws Exception {
        open("TP-08");
        take("zone-completed");
        app.click("correct");
        app.until(() -> !app.has("correct"));
        app.click("slot-readings-bedDepths-2-depth");
        takeAll("zone-overloaded");
        gloves("zone-overloaded");
        app.click("every-rule");
        take("zone-rules");
        app.click("show-working");
        take("zone-working");
        app.click("working-close");
        app.click("rules-close");
        app.click("slot-readings-seals-0-type");
        take("zone-seals");
        app.click("foot-round");
        app.until(() -> app.has("search"));
    }

    private void otherZones() throws Exception {
        open("TP-05");
        take("zone-undecided");
        app.click("foot-round");
        open("TP-18");
        take("zone-incomplete");
        app.click("foot-round");
    }

    private void queue() throws Exception {
        app.click("to-queue");
        takeAll("queue");
        app.click("to-store");
        app.until(() -> app.has("prove"));
        take("store");
        app.click("prove");
        app.until(() -> app.has("prove") && app.has("outcome"));
        take("store-proved");
        app.click("foot-back");
        app.until(() -> app.has("queue-all"));
        app.click("queue-all");
        app.exportsTo(Path.of("/media/usb-stick"));
        app.click("export");
        app.until(() -> app.has("trouble"));
        take("export-failed");
        app.exportsTo(STICK);
        app.click("export");
        app.until(() -> app.has("receipt"));
        take("export-receipt");
        for (Path pack : Files.list(STICK).toList()) {
            Files.delete(pack);
        }
        Files.delete(STICK);
    }

    private void open(String tag) throws Exception {
        app.click("stop-" + tag);
        app.until(() -> app.has("verdict"));
    }

    private void prefer(Locale language, boolean night, boolean gloves) throws Exception {
        Glass.on(() -> {
            Preferences now = app.workplace().preferences();
            app.workplace().preferencesProperty().set(now.withLocale(language).withNight(night).withGloves(gloves));
            return null;
        });
        app.settle();
    }

    /** A screen in both lights and both languages. */
    private void takeAll(String name) throws Exception {
        Preferences before = app.workplace().preferences();
        for (Locale language : List.of(Locale.ENGLISH, SPANISH)) {
            for (boolean night : List.of(false, true)) {
                prefer(language, night, false);
                take(name);
            }
        }
        prefer(before.locale(), before.night(), before.gloves());
    }

    private void gloves(String name) throws Exception {
        Preferences before = app.workplace().preferences();
        prefer(before.locale(), before.night(), true);
        take(name);
        prefer(before.locale(), before.night(), false);
    }

    private void take(String name) throws Exception {
        Glass.on(() -> {
            // A caret that blinks would make every second picture another one.
            app.shell().scene().getRoot().lookupAll(".text-input").forEach(node ->
                    ((TextInputControl) node).setStyle("-fx-display-caret: false;"));
            return null;
        });
        Preferences now = app.workplace().preferences();
        String file = name + "-" + orientation + (now.night() ? "-night" : "-day") + "-"
                + now.locale().getLanguage() + (now.gloves() ? "-gloved" : "") + ".png";
        app.picture(PICTURES.resolve(file));
        assertTrue(Files.readString(PAGE).contains("(" + file + ")"),
                () -> file + " is not on the page of the pictures");
    }
}
