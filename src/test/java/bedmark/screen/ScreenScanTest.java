package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.screen.part.CautionStrip;
import bedmark.screen.part.Named;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Light;
import bedmark.screen.theme.TextSize;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import javafx.scene.Node;
import javafx.scene.Scene;
import javafx.scene.control.Button;
import javafx.scene.control.ButtonBase;
import javafx.scene.control.Label;
import javafx.scene.control.TextField;
import javafx.scene.input.KeyCode;
import javafx.scene.layout.Pane;
import javafx.scene.layout.Region;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Every main screen in both orientations, lights and languages, for a bare hand and a gloved one. */
class ScreenScanTest {
    private static final Locale SPANISH = Locale.forLanguageTag("es");

    @TempDir
    private Path temp;

    private final List<String> findings = new ArrayList<>();
    private TabletApp app;

    /** How a screen is looked at; the glass is always 10.1 inches, with as many pixels as its density makes. */
    record Look(Locale language, boolean night, boolean gloves, double dpi, TextSize text) {
        double scale() {
            return dpi / Density.DEFAULT_DPI;
        }
    }

    /** Every two of language, light, hand and density meet in one of these, and both hands larger type; all meet at full size. */
    private static final List<Look> PAIRS = List.of(new Look(Locale.ENGLISH, false, false, 149, TextSize.STANDARD),
            new Look(SPANISH, true, true, 149, TextSize.STANDARD),
            new Look(SPANISH, false, false, 224, TextSize.STANDARD),
            new Look(Locale.ENGLISH, true, true, 224, TextSize.STANDARD),
            new Look(Locale.ENGLISH, false, true, 299, TextSize.STANDARD),
            new Look(SPANISH, true, false, 299, TextSize.STANDARD),
            new Look(SPANISH, false, false, 149, TextSize.LARGE),
            new Look(Locale.ENGLISH, true, true, 149, TextSize.LARGE));

    static final List<Look> LOOKS = Boolean.getBoolean("bedmark.scan.full") ? all() : PAIRS;

    private static List<Look> all() {
        List<Look> looks = new ArrayList<>();
        for (Locale language : List.of(Locale.ENGLISH, SPANISH)) {
            for (boolean night : List.of(false, true)) {
                for (boolean gloves : List.of(false, true)) {
                    for (double dpi : List.of(149.0, 224.0, 299.0)) {
                        for (TextSize text : TextSize.values()) {
                            looks.add(new Look(language, night, gloves, dpi, text));
                        }
                    }
                }
            }
        }
        return looks;
    }

    @Test
    void landscape() throws Exception {
        walk(1280, 800);
    }

    @Test
    void portrait() throws Exception {
        walk(800, 1280);
    }

    private void walk(double width, double height) throws Exception {
        try (TabletApp opened = new TabletApp(temp.resolve("store"), Optional.of(Path.of("sample-surveys")), temp,
                Clock.systemUTC(), width, height)) {
            app = opened;
            scan("empty", false);
            app.click("new-plant");
            app.until(() -> app.has("make-plant"));
            scan("new-plant", false);
            app.click("foot-back");
            app.until(() -> app.has("load-demo"));
            app.click("load-demo");
            app.until(() -> app.has("person"));
            app.click("person");
            app.type("A. Vale");
            app.click("caution-read");
            scan("start", false);
            app.click("to-settings");
            app.until(() -> app.has("settings-done"));
            scan("settings", false);
            app.click("settings-done");
            app.until(() -> app.has("start-walk"));
            app.click("start-walk");
            app.until(() -> app.has("search"));
            scan("round", true);
            scan("skip", false, "skip-TP-19");
            scan("propose", true, "propose");
            app.click("stop-TP-19");
            app.until(() -> app.has("verdict"));
            scan("fresh", true);
            app.click("foot-done");
            scan("gap", true);
            app.type("98");
            app.press(KeyCode.ENTER);
            scan("doubt", true);
            app.click("slot-permit");
            scan("text", true);
            app.click("slot-readings-beltSpeed-way");
            scan("choice", true);
            app.click("foot-round");
            app.click("stop-TP-05");
            app.until(() -> app.has("verdict"));
            scan("undecided", true);
            app.click("foot-round");
            app.click("stop-TP-08");
            app.until(() -> app.has("verdict"));
            scan("completed", true);
            app.click("correct");
            app.until(() -> !app.has("correct"));
            app.click("slot-readings-bedDepths-2-depth");
            scan("depth", true);
            scan("belt", true, "belt-state");
            scan("rules", true, "every-rule");
            scan("working", true, "every-rule", "show-working");
            app.click("slot-readings-seals-0-type");
            scan("seals", true);
            app.click("foot-notes");
            app.until(() -> app.has("to-readings"));
            scan("notes", true);
            scan("action", false, "action-1", "order-seal");
            scan("photo", false, "photo-0");
            app.click("foot-round");
            app.until(() -> app.has("to-finish"));
            app.click("to-finish");
            app.until(() -> app.has("sign-off"));
            scan("finish", true);
            app.click("foot-back");
            app.click("to-queue");
            scan("queue", false);
            app.click("to-store");
            app.until(() -> app.has("prove"));
            scan("store", false);
            app.click("foot-back");
            app.until(() -> app.has("queue-all"));
            app.click("queue-all");
            app.click("export");
            app.until(() -> app.has("receipt"));
            scan("receipt", false);
        }
        assertEquals(List.of(), findings);
    }

    /** @param presses what leads to a part of the screen that is not kept where the screen is shown anew */
    private void scan(String screen, boolean caution, String... presses) throws Exception {
        app.settle();
        Glass.on(() -> {
            for (Look look : LOOKS) {
                prefer(look);
                String where = screen + " " + look + ": ";
                Scene scene = app.shell().scene();
                for (String press : presses) {
                    scene.getRoot().applyCss();
                    scene.getRoot().layout();
                    ((ButtonBase) Named.find(scene.getRoot(), press).orElseThrow()).fire();
                }
                Density density = Shell.density(app.workplace().preferences());
                ScreenScan.of(scene.getRoot(), density, Math.rint(scene.getWidth() * look.scale()),
                        Math.rint(scene.getHeight() * look.scale()))
                        .forEach(finding -> findings.add("\n" + where + finding));
                if (caution && !ScreenScan.hasCaution(scene)) {
                    findings.add("\n" + where + "the caution is absent");
                }
            }
            prefer(PAIRS.get(0));
            app.shell().scene().getRoot().resize(app.shell().scene().getWidth(), app.shell().scene().getHeight());
            return null;
        });
        app.settle();
    }

    /** A tablet that is turned: what was wide becomes narrow without being made anew. */
    @Test
    void turnedRoundIsNarrowAgain() throws Exception {
        try (TabletApp opened = new TabletApp(temp.resolve("store"), Optional.of(Path.of("sample-surveys")), temp,
                Clock.systemUTC(), 1280, 800)) {
            app = opened;
            app.setOutOnDemo();
            Glass.on(() -> {
                Scene scene = app.shell().scene();
                Density density = Shell.density(app.workplace().preferences());
                assertEquals(List.of(), ScreenScan.of(scene.getRoot(), density, 1280, 800));
                app.shell().screen().turned(true);
                assertEquals(List.of(), ScreenScan.of(scene.getRoot(), density, 800, 1280));
                app.shell().screen().turned(false);
                assertEquals(List.of(), ScreenScan.of(scene.getRoot(), density, 1280, 800));
                return null;
            });
        }
    }

    private void prefer(Look look) {
        app.workplace().preferencesProperty().set(app.workplace().preferences().withLocale(look.language())
                .withNight(look.night()).withGloves(look.gloves()).withDpi(look.dpi()).withText(look.text()));
    }

    private static List<String> scanOf(Node... nodes) throws Exception {
        return Glass.on(() -> {
            Scene scene = Glass.show(new Pane(nodes), Light.DAY, Density.standard(), 400, 300);
            List<String> found = ScreenScan.of(scene, Density.standard());
            scene.getWindow().hide();
            return found;
        });
    }

    private static void assertFound(String what, List<String> found) {
        assertEquals(1, found.size(), found.toString());
        assertTrue(found.get(0).startsWith(what), found.toString());
    }

    @Test
    void scanFindsAButtonThatIsTooLow() throws Exception {
        Button low = Glass.on(() -> new Button("low"));
        Glass.on(() -> {
            low.setStyle("-fx-min-height: 60px; -fx-max-height: 60px;");
            return null;
        });
        assertFound("too low", scanOf(low));
    }

    @Test
    void scanFindsATextThatIsCut() throws Exception {
        Label cut = Glass.on(() -> new Label("far too long for its room"));
        cut.setPrefWidth(60);
        assertFound("cut", scanOf(cut));
    }

    @Test
    void scanFindsTextsOverEachOther() throws Exception {
        Label one = Glass.on(() -> new Label("one"));
        Label other = Glass.on(() -> new Label("other"));
        assertFound("over each other", scanOf(one, other));
    }

    @Test
    void scanFindsAControlWithoutAName() throws Exception {
        Region nameless = Glass.on(Region::new);
        nameless.setFocusTraversable(true);
        assertFound("no name", scanOf(nameless));
    }

    @Test
    void scanFindsATextThatIsTooFaint() throws Exception {
        Label faint = Glass.on(() -> new Label("faint"));
        faint.setStyle("-fx-text-fill: #999999;");
        assertFound("too faint", scanOf(faint));
    }

    @Test
    void scanFindsAButtonBelowTheGlass() throws Exception {
        Button sunk = Glass.on(() -> new Button("sunk"));
        sunk.setLayoutY(280);
        assertFound("out of sight", scanOf(sunk));
    }

    @Test
    void scanFindsTypedTextThatIsTooFaint() throws Exception {
        TextField faint = Glass.on(() -> new TextField("faint"));
        faint.setAccessibleText("faint");
        faint.setStyle("-fx-text-fill: #999999;");
        assertFound("too faint", scanOf(faint));
    }

    @Test
    void scanMissesTheCautionWhereThereIsNone() throws Exception {
        Glass.on(() -> {
            Scene with = Glass.show(new Pane(new CautionStrip("Stay outside.")), Light.DAY,
                    Density.standard(), 400, 300);
            assertTrue(ScreenScan.hasCaution(with));
            with.getWindow().hide();
            Scene without = Glass.show(new Pane(new CautionStrip("")), Light.DAY, Density.standard(), 400, 300);
            assertFalse(ScreenScan.hasCaution(without));
            without.getWindow().hide();
            return null;
        });
    }
}
