package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.command.Terminal;
import bedmark.index.SurveyLine;
import bedmark.index.SurveyQuery;
import bedmark.quantity.Quantity;
import bedmark.screen.part.FieldBox;
import bedmark.screen.part.Named;
import bedmark.survey.InspectionStatus;
import bedmark.survey.QueueState;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import javafx.scene.Node;
import javafx.scene.control.ButtonBase;
import javafx.scene.input.KeyCode;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A round to its end, once with nothing but clicks and once with nothing but the keyboard. */
class WalkTest {
    private static final String ROUND = "2026-09";
    private static final List<String> SKIPPED = List.of("TP-12", "TP-18", "TP-19", "TP-23", "TP-24");
    private static final String SURVEYED = "TP-22";
    private static final int MOST_TABS = 150;

    @TempDir
    private Path temp;

    private TabletApp app;

    @BeforeEach
    void open() throws Exception {
        Files.createDirectories(temp.resolve("stick"));
        app = new TabletApp(temp.resolve("store"), Optional.of(Path.of("sample-surveys")), temp.resolve("stick"),
                Clock.systemUTC(), 1280, 800);
    }

    @AfterEach
    void close() {
        app.close();
    }

    private SurveyLine line(String transfer) {
        List<SurveyLine> lines = app.workplace().store().surveys(SurveyQuery.ALL.ofTransfer(transfer).ofRound(ROUND)
                .current());
        assertEquals(1, lines.size(), transfer);
        return lines.get(0);
    }

    private void everythingLeft() throws Exception {
        for (String transfer : SKIPPED) {
            assertEquals(QueueState.EXPORTED, line(transfer).state(), transfer);
            assertEquals(InspectionStatus.NOT_INSPECTED, line(transfer).inspectionStatus(), transfer);
        }
        assertEquals(QueueState.EXPORTED, line(SURVEYED).state());
        assertEquals(InspectionStatus.INSPECTED, line(SURVEYED).inspectionStatus());
        assertEquals("overloaded", line(SURVEYED).level());
        assertTrue(app.workplace().store().walk(ROUND).orElseThrow().finishedAt().isPresent());
        assertEquals("A. Vale", app.workplace().store().walk(ROUND).orElseThrow().person());
        try (Stream<Path> packs = Files.list(temp.resolve("stick"))) {
            assertEquals(0, Terminal.run("pack", "verify", packs.findFirst().orElseThrow().toString()).code());
        }
    }

    /** The name is there from yesterday; all the rest is pressed. */
    @Test
    void clicksAlone() throws Exception {
        Glass.on(() -> {
            app.workplace().preferencesProperty().set(app.workplace().preferences().withPerson("A. Vale"));
            app.shell().toStart();
            return null;
        });
        app.settle();
        app.click("load-demo");
        app.until(() -> app.has("caution-read"));
        app.click("caution-read");
        app.click("start-walk");
        app.until(() -> app.has("search"));
        for (String transfer : SKIPPED) {
            app.click("skip-" + transfer);
            app.click("reason-not-running");
            app.until(() -> !app.has("skip-" + transfer));
        }
        app.click("stop-" + SURVEYED);
        app.until(() -> app.has("verdict"));
        for (String length : List.of("5", "700", "300")) {
            number(length);
        }
        choice(0);
        number("1.8");
        choice(0);
        number("1");
        number("600");
        for (int seal = 0; seal < 2; seal++) {
            choice(seal);
            choice(0);
            choice(0);
            number("5");
            if (seal == 0) {
                app.click("add-seals");
            }
        }
        app.click("foot-notes");
        app.until(() -> app.has("action-add"));
        app.click("action-add");
        app.click("phrase-renew-seal");
        app.click("by-week");
        app.click("order-seal");
        app.click("seal-type-vertical");
        app.click("seal-width");
        number("200");
        number("15");
        number("6.5");
        number("2");
        app.click("action-keep");
        app.until(() -> app.has("action-0"));
        app.click("to-readings");
        app.until(() -> app.has("foot-done"));
        app.click("foot-done");
        app.until(() -> app.has("to-finish"));
        app.click("foot-next");
        app.until(() -> app.has("sign-off"));
        app.click("sign-off");
        app.click("finish-walk");
        app.until(() -> app.has("export"));
        app.click("export");
        app.until(() -> app.has("receipt"));
        everythingLeft();
        var action = app.workplace().store().history(line(SURVEYED).id()).orElseThrow().survey().document()
                .branches("actions").get(0);
        assertEquals("Renew the seal", action.text("what").orElseThrow());
        var seal = action.branch("seal").orElseThrow();
        assertEquals("200 mm 15 mm 6.5 m 2 vertical", String.join(" ", size(seal.quantity("width").orElseThrow()),
                size(seal.quantity("thickness").orElseThrow()), size(seal.quantity("length").orElseThrow()),
                seal.number("pieces").orElseThrow().toPlainString(), seal.text("type").orElseThrow()));
    }

    private static String size(Quantity quantity) {
        return quantity.value().toPlainString() + " " + quantity.unit().code();
    }

    private void number(String number) throws Exception {
        for (char sign : number.toCharArray()) {
            app.click(sign == '.' ? "pad-decimal" : "pad-digit-" + sign);
        }
        String cell = active();
        app.click("pad-next");
        if (!cell.isEmpty() && active().equals(cell)) {
            // It was questioned once; the second press says that it is meant.
            app.click("pad-next");
        }
    }

    /** The id of the box that the pad types into. */
    private String active() throws Exception {
        return Glass.on(() -> app.shell().scene().getRoot().lookupAll(".field-box").stream()
                .map(FieldBox.class::cast).filter(box -> box.activeProperty().get()).map(FieldBox::getId).findFirst()
                .orElse(""));
    }

    private void choice(int place) throws Exception {
        Node choice = app.shell().scene().getRoot().lookupAll(".choice").stream().skip(place).findFirst()
                .orElseThrow();
        app.robot().clickOn(choice);
        app.settle();
    }

    @Test
    void keyboardAlone() throws Exception {
        press("load-demo");
        app.until(() -> app.has("person"));
        tabTo("person");
        app.type("A. Vale");
        press("caution-read");
        press("start-walk");
        app.until(() -> app.has("search"));
        for (String transfer : SKIPPED) {
            tabTo("search");
            app.press(KeyCode.CONTROL, KeyCode.A);
            app.type(transfer.substring(3));
            press("skip-" + transfer);
            press("reason-not-running");
            app.until(() -> !app.has("skip-" + transfer));
        }
        tabTo("search");
        app.press(KeyCode.CONTROL, KeyCode.A);
        app.type(SURVEYED.substring(3));
        press("stop-" + SURVEYED);
        app.until(() -> app.has("verdict"));
        for (String length : List.of("5", "700", "300")) {
            enter(length);
        }
        app.type("1");
        enter("1.8");
        app.type("1");
        enter("1");
        enter("600");
        for (String side : List.of("1", "2")) {
            app.type(side);
            app.type("1");
            app.type("1");
            enter("5");
            if (side.equals("1")) {
                tabTo("add-seals", KeyCode.SHIFT, KeyCode.TAB);
                app.press(KeyCode.SPACE);
            }
        }
        press("foot-done");
        app.until(() -> app.has("to-finish"));
        press("foot-next");
        app.until(() -> app.has("sign-off"));
        press("sign-off");
        press("finish-walk");
        app.until(() -> app.has("export"));
        press("export");
        app.until(() -> app.has("receipt"));
        everythingLeft();
    }

    private void enter(String number) throws Exception {
        app.type(number);
        String cell = active();
        app.press(KeyCode.ENTER);
        if (active().equals(cell)) {
            app.press(KeyCode.ENTER);
        }
    }

    /** Goes to a button by Tab, sees its ring, and presses it by the space bar. */
    private void press(String id) throws Exception {
        tabTo(id);
        Node focused = app.shell().scene().getFocusOwner();
        assertTrue(focused instanceof ButtonBase, id);
        app.press(KeyCode.SPACE);
    }

    private void tabTo(String id) throws Exception {
        tabTo(id, KeyCode.TAB);
    }

    private void tabTo(String id, KeyCode... step) throws Exception {
        for (int i = 0; i < MOST_TABS; i++) {
            Node focused = app.shell().scene().getFocusOwner();
            if (focused != null && Named.is(focused, id)) {
                return;
            }
            app.press(step);
        }
        throw new AssertionError("Tab does not lead to " + id);
    }
}
