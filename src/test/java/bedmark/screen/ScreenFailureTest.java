package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.index.SurveyQuery;
import java.nio.file.Path;
import java.time.Clock;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import javafx.application.Platform;
import javafx.scene.control.Label;
import javafx.scene.control.ToggleButton;
import javafx.scene.input.KeyCode;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.testfx.util.WaitForAsyncUtils;

/** Whatever fails on the screen's thread: what was typed is kept, the person is told in words and goes on. */
class ScreenFailureTest {
    @TempDir
    private Path temp;

    private TabletApp app;

    @BeforeEach
    void open() throws Exception {
        app = new TabletApp(temp.resolve("store"), Optional.of(Path.of("sample-surveys")), temp, Clock.systemUTC(),
                1280, 800);
        WaitForAsyncUtils.autoCheckException = false;
        Glass.on(() -> {
            Thread.currentThread().setUncaughtExceptionHandler((thread, failure) -> app.shell().failed(failure));
            return null;
        });
        app.setOutOnDemo();
    }

    @AfterEach
    void close() throws Exception {
        Glass.on(() -> {
            Thread.currentThread().setUncaughtExceptionHandler(null);
            return null;
        });
        WaitForAsyncUtils.clearExceptions();
        WaitForAsyncUtils.autoCheckException = true;
        app.close();
    }

    private void fail() throws Exception {
        Platform.runLater(() -> {
            throw new IllegalStateException("a defect of the program");
        });
        app.settle();
    }

    private String trouble() {
        return app.shell().scene().getRoot().lookupAll(".trouble .label").stream()
                .map(node -> ((Label) node).getText()).filter(text -> !text.isBlank()).findFirst().orElse("");
    }

    private Branch readings(String transfer) {
        return app.workplace().store().history(app.workplace().store().surveys(
                SurveyQuery.ALL.ofTransfer(transfer).ofRound("2026-09").current()).get(0).id())
                .orElseThrow().survey().readings();
    }

    @Test
    void whatWasTypedIsSavedAndThePersonIsToldInTheirLanguage() throws Exception {
        for (Locale language : List.of(Locale.ENGLISH, Locale.forLanguageTag("es"))) {
            Glass.on(() -> {
                app.workplace().preferencesProperty().set(app.workplace().preferences().withLocale(language));
                return null;
            });
            app.until(() -> app.has("search"));
            app.click("stop-TP-19");
            app.until(() -> app.has("verdict"));
            app.click("slot-readings-loadingZoneLength");
            String length = language.equals(Locale.ENGLISH) ? "5.2" : "5,3";
            app.type(length);
            fail();
            app.until(() -> app.has("search"));
            assertEquals(length.replace(',', '.'), readings("TP-19").quantity("loadingZoneLength").orElseThrow().value()
                    .toPlainString());
            assertEquals(app.workplace().wording().text("defect.screen-failed", "/", "IllegalStateException"),
                    trouble());
        }
    }

    @Test
    void theSurveyGoesOnAfterwards() throws Exception {
        app.click("stop-TP-19");
        app.until(() -> app.has("verdict"));
        fail();
        app.until(() -> app.has("search"));
        app.click("stop-TP-19");
        app.until(() -> app.has("verdict"));
        app.click("slot-readings-loadingZoneLength");
        app.type("6.1");
        app.press(KeyCode.ENTER);
        assertEquals("6.1", readings("TP-19").quantity("loadingZoneLength").orElseThrow().value().toPlainString());
        assertEquals("", shownTrouble(), "what is saved afterwards takes the trouble away");
    }

    private String shownTrouble() {
        return app.shell().scene().getRoot().lookupAll(".trouble").stream().filter(node -> node.isVisible())
                .map(node -> trouble()).findFirst().orElse("");
    }

    @Test
    void failuresInARowEndAtTheStartAndNotInACircle() throws Exception {
        app.click("stop-TP-19");
        app.until(() -> app.has("verdict"));
        Glass.on(() -> {
            app.shell().failed(new IllegalStateException("first"));
            app.shell().failed(new IllegalStateException("on the way back"));
            return null;
        });
        app.until(() -> app.has("person"));
        assertFalse(trouble().isBlank());
        assertTrue(((ToggleButton) app.node("caution-read")).isSelected(),
                "the walk is under way and its caution is read");
        app.click("start-walk");
        app.until(() -> app.has("search"));
    }
}
