package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.screen.part.CautionStrip;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Light;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import javafx.scene.Node;
import javafx.scene.Scene;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
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

    private record Look(Locale language, boolean night, boolean gloves) {
    }

    private static final List<Look> LOOKS = List.of(new Look(Locale.ENGLISH, false, false),
            new Look(SPANISH, true, false), new Look(Locale.ENGLISH, true, true), new Look(SPANISH, false, true));

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
            app.click("load-demo");
            app.until(() -> app.has("person"));
            app.click("person");
            app.type("A. Vale");
            app.click("caution-read");
            scan("start", false);
            app.click("start-walk");
            app.until(() -> app.has("search"));
            scan("round", false);
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
            app.click("every-rule");
            scan("rules", true);
            app.click("every-rule");
            app.click("show-working");
            scan("working", true);
            app.click("slot-readings-seals-0-type");
            scan("seals", true);
            app.click("foot-round");
            app.click("to-queue");
            scan("queue", false);
            app.click("queue-all");
            app.click("export");
            app.until(() -> app.has("receipt"));
            scan("receipt", false);
        }
        assertEquals(List.of(), findings);
    }

    private void scan(String screen, boolean caution) throws Exception {
        for (Look look : LOOKS) {
            Glass.on(() -> {
                app.workplace().preferencesProperty().set(app.workplace().preferences().withLocale(look.language())
                        .withNight(look.night()).withGloves(look.gloves()));
                return null;
            });
            app.settle();
            Glass.on(() -> {
                String where = screen + " " + look + ": ";
                ScreenScan.of(app.shell().scene(), Shell.density(app.workplace().preferences()))
                        .forEach(finding -> findings.add("\n" + where + finding));
                if (caution && !ScreenScan.hasCaution(app.shell().scene())) {
                    findings.add("\n" + where + "the caution is absent");
                }
                return null;
            });
        }
        Look first = LOOKS.get(0);
        Glass.on(() -> {
            app.workplace().preferencesProperty().set(app.workplace().preferences().withLocale(first.language())
                    .withNight(first.night()).withGloves(first.gloves()));
            return null;
        });
        app.settle();
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
