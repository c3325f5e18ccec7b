package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import bedmark.command.Terminal;
import bedmark.document.Branch;
import bedmark.index.SurveyLine;
import bedmark.index.SurveyQuery;
import bedmark.json.JsonReader;
import bedmark.quantity.QuantityFormat;
import bedmark.quantity.Unit;
import bedmark.screen.part.FieldBox;
import bedmark.survey.QueueState;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipFile;
import javafx.scene.control.Label;
import javafx.scene.input.KeyCode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The main job from end to end, by clicks and keys alone. */
class WholeRoundTest {
    private static final Path SAMPLES = Path.of("sample-surveys");
    private static final String METRIC = "TP-22";
    private static final String US = "TP-23";
    private static final String LEFT_INCOMPLETE = "TP-24";
    private static final int MOST_UNITS = 6;

    @TempDir
    private Path temp;

    private TabletApp open() throws Exception {
        Files.createDirectories(temp.resolve("stick"));
        return new TabletApp(temp.resolve("store"), Optional.of(SAMPLES), temp.resolve("stick"), Clock.systemUTC(),
                1280, 800);
    }

    @Test
    void roundIsWalkedExportedAndProvedFromOutside() throws Exception {
        Map<String, String> drags = new HashMap<>();
        try (TabletApp app = open()) {
            app.click("load-demo");
            app.until(() -> app.has("person"));
            startWalk(app);

            app.click("stop-" + METRIC);
            app.until(() -> app.has("verdict"));
            answer(app, List.of("5", "0.7", "0.3"), "1.8", "120");
            levelFollowsTheTyping(app);
            drags.put(METRIC, figure(app, 0));
            complete(app);

            app.until(() -> app.has("foot-round"));
            app.click("foot-round");
            app.click("stop-" + US);
            app.until(() -> app.has("verdict"));
            answer(app, List.of("5", "0.7", "0.3"), "1.5", "100");
            depthInInches(app);
            drags.put(US, figure(app, 0));
            complete(app);

            app.click("foot-round");
            app.click("stop-" + LEFT_INCOMPLETE);
            app.until(() -> app.has("verdict"));
            app.type("4.2");
            app.press(KeyCode.ENTER);
            app.click("foot-done");
            assertTrue(app.has("verdict"), "an incomplete survey stays open");
            assertTrue(app.shell().scene().getRoot().lookupAll(".message").stream()
                    .anyMatch(node -> ((Label) node).getText().contains("still to be answered")));

            app.click("foot-round");
            app.click("to-queue");
            app.click("queue-all");
            app.click("export");
            app.until(() -> app.has("receipt"));
        }
        Path pack = packOn(temp.resolve("stick"));
        everythingIsThereAfterARestart();
        proveWithOutsideProgram(pack);
        commandsAgreeWithTheScreen(pack, drags);
        assertEquals(0, Terminal.run("store", "check", temp.resolve("store").toString()).code());
    }

    private static void startWalk(TabletApp app) throws Exception {
        app.click("person");
        app.type("A. Vale");
        app.click("caution-read");
        app.click("start-walk");
        app.until(() -> app.has("search"));
    }

    /** Fills a survey in as a person does who has only the keys: each answer ends with Enter. */
    private static void answer(TabletApp app, List<String> geometry, String speed, String depth) throws Exception {
        for (String length : geometry) {
            inMetres(app);
            enter(app, length);
        }
        app.type("1");
        enter(app, speed);
        app.type("1");
        inMetres(app);
        enter(app, "1");
        enter(app, depth);
        seal(app, "1", geometry.get(0));
        app.click("add-seals");
        seal(app, "2", geometry.get(0));
    }

    private static void inMetres(TabletApp app) throws Exception {
        switchTo(app, "m");
    }

    /** Goes on with the key for the unit until the active number is asked in that one. */
    private static void switchTo(TabletApp app, String wanted) throws Exception {
        for (int i = 0; i < MOST_UNITS && !unit(app).equals(wanted); i++) {
            app.press(KeyCode.U);
        }
        assertEquals(wanted, unit(app));
    }

    private static String unit(TabletApp app) {
        return app.shell().scene().getRoot().lookupAll(".field-box").stream().map(FieldBox.class::cast)
                .filter(box -> box.activeProperty().get()).map(box -> box.unitProperty().get()).findFirst()
                .orElseThrow();
    }

    private static void enter(TabletApp app, String number) throws Exception {
        app.type(number);
        app.press(KeyCode.ENTER);
    }

    private static void seal(TabletApp app, String side, String length) throws Exception {
        app.type(side);
        app.type("1");
        app.type("1");
        inMetres(app);
        enter(app, length);
    }

    private static void levelFollowsTheTyping(TabletApp app) throws Exception {
        String before = sentence(app);
        app.click("slot-readings-bedDepths-0-depth");
        app.type("6");
        String first = sentence(app);
        app.type("00");
        String overloaded = sentence(app);
        assertNotEquals(first, overloaded);
        assertTrue(overloaded.startsWith("Overloaded"), overloaded);
        assertTrue(app.has("verdict"), "nothing had to be left for that");
        app.press(KeyCode.CONTROL, KeyCode.Z);
        assertEquals(before, sentence(app));
    }

    private static void depthInInches(TabletApp app) throws Exception {
        app.click("slot-readings-bedDepths-0-depth");
        switchTo(app, "in");
        app.click("pad-digit-3");
        app.click("pad-fraction");
        app.click("pad-fraction");
        app.press(KeyCode.ENTER);
    }

    private static void complete(TabletApp app) throws Exception {
        app.click("foot-done");
    }

    private static String sentence(TabletApp app) {
        return ((Label) app.node("verdict").lookup(".sentence")).getText();
    }

    private static String figure(TabletApp app, int index) {
        return app.node("verdict").lookupAll(".figure .value").stream().skip(index).findFirst()
                .map(node -> ((Label) node).getText()).orElseThrow();
    }

    private void everythingIsThereAfterARestart() throws Exception {
        try (TabletApp app = open()) {
            assertEquals("A. Vale", app.workplace().preferences().person());
            SurveyLine metric = line(app, METRIC);
            assertEquals(QueueState.EXPORTED, metric.state());
            assertEquals(QueueState.EXPORTED, line(app, US).state());
            assertEquals(QueueState.OPEN, line(app, LEFT_INCOMPLETE).state());
            Branch depth = app.workplace().store().history(line(app, US).id()).orElseThrow().survey().readings()
                    .branches("bedDepths").get(0).branch("depth").orElseThrow();
            assertEquals("3.5", depth.number("value").orElseThrow().toPlainString());
            assertEquals("3 1/2", depth.text("entered").orElseThrow());
            assertEquals(Unit.INCH.code(), depth.text("unit").orElseThrow());
            // The walk goes on: its card is read.
            app.until(() -> app.has("search"));
            app.click("search");
            app.type(LEFT_INCOMPLETE.substring(3));
            app.click("stop-" + LEFT_INCOMPLETE);
            app.until(() -> app.has("verdict"));
            assertEquals("4.2", value(app, "slot-readings-loadingZoneLength"));
        }
    }

    private static String value(TabletApp app, String id) {
        return ((FieldBox) app.node(id)).valueProperty().get();
    }

    private static SurveyLine line(TabletApp app, String transfer) {
        List<SurveyLine> lines = app.workplace().store().surveys(SurveyQuery.ALL.ofTransfer(transfer)
                .in(QueueState.OPEN, QueueState.COMPLETED, QueueState.QUEUED, QueueState.EXPORTED));
        assertEquals(1, lines.size(), transfer);
        return lines.get(0);
    }

    private static Path packOn(Path stick) throws IOException {
        try (Stream<Path> files = Files.list(stick)) {
            List<Path> packs = files.toList();
            assertEquals(1, packs.size(), packs.toString());
            return packs.get(0);
        }
    }

    /** The program of every Unix that knows digests; nothing of ours takes part. */
    private void proveWithOutsideProgram(Path pack) throws Exception {
        Path folder = Files.createDirectory(temp.resolve("unpacked"));
        try (ZipFile zip = new ZipFile(pack.toFile())) {
            for (ZipEntry entry : zip.stream().toList()) {
                Path file = folder.resolve(entry.getName());
                Files.createDirectories(file.getParent());
                Files.copy(zip.getInputStream(entry), file);
            }
        }
        assumeTrue(Files.isExecutable(Path.of("/usr/bin/sha256sum")), "sha256sum is not on this machine");
        for (String manifest : List.of("manifest-sha256.txt", "tagmanifest-sha256.txt")) {
            Process process = new ProcessBuilder("/usr/bin/sha256sum", "--strict", "-c", manifest)
                    .directory(folder.toFile()).redirectErrorStream(true).start();
            String said = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
            assertTrue(process.waitFor(60, TimeUnit.SECONDS));
            assertEquals(0, process.exitValue(), said);
            assertFalse(said.contains("FAILED"), said);
        }
    }

    private void commandsAgreeWithTheScreen(Path pack, Map<String, String> drags) throws Exception {
        assertEquals(0, Terminal.run("pack", "verify", pack.toString()).code());
        Branch printed = JsonReader.read(Terminal.run("assess", pack.toString(), "--json").out()
                .getBytes(StandardCharsets.UTF_8)).root();
        int compared = 0;
        for (Branch survey : printed.branches("surveys")) {
            String shown = drags.get(survey.text("transfer").orElseThrow());
            if (shown != null) {
                double drag = survey.branch("assessment").orElseThrow().number("skirtDragN").orElseThrow()
                        .doubleValue();
                assertEquals(shown, new QuantityFormat(Locale.ENGLISH)
                        .computed(drag, Unit.NEWTON));
                compared++;
            }
        }
        assertEquals(drags.size(), compared);
    }
}
