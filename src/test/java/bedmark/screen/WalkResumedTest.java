package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.screen.part.CautionStrip;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.Optional;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A tablet that went out in the midst of a walk goes on with it. */
class WalkResumedTest {
    private static final Instant MORNING = Instant.parse("2026-09-14T07:00:00Z");

    @TempDir
    private Path temp;

    private TabletApp app;

    @BeforeEach
    void setOut() throws Exception {
        open(Duration.ZERO);
        app.setOutOnDemo();
    }

    private void open(Duration later) throws Exception {
        app = new TabletApp(temp.resolve("store"), Optional.of(Path.of("sample-surveys")), temp,
                Clock.fixed(MORNING.plus(later), ZoneOffset.UTC), 1280, 800);
    }

    private void restart(Duration later) throws Exception {
        app.close();
        open(later);
    }

    @AfterEach
    void close() {
        app.close();
    }

    @Test
    void theRoundIsOpenAtOnceWithItsCaution() throws Exception {
        app.click("skip-TP-12");
        app.click("reason-not-running");
        app.until(() -> !app.has("skip-TP-12"));
        restart(Duration.ofHours(2));
        assertTrue(app.has("search"));
        assertFalse(app.has("skip-TP-12"));
        assertTrue(app.shell().scene().getRoot().lookup(".caution") instanceof CautionStrip);
        app.click("foot-next");
        app.until(() -> app.has("verdict"));
    }

    @Test
    void theWayBackLeadsToTheStartAndEndsIt() throws Exception {
        restart(Duration.ofHours(2));
        app.click("foot-back");
        app.until(() -> app.has("start-walk"));
        restart(Duration.ofHours(3));
        assertTrue(app.has("start-walk"));
        app.click("start-walk");
        app.until(() -> app.has("search"));
        restart(Duration.ofHours(4));
        assertTrue(app.has("search"));
    }

    @Test
    void whatFailsOnceTheWindowIsClosedDoesNotEndIt() throws Exception {
        Shell closed = app.shell();
        app.close();
        Glass.on(() -> {
            closed.failed(new IllegalStateException("too late"));
            return null;
        });
        open(Duration.ofHours(1));
        assertTrue(app.has("search"));
    }

    @Test
    void theNextDayBeginsWithTheSafetyCard() throws Exception {
        restart(Duration.ofHours(24));
        assertTrue(app.has("start-walk"));
        assertTrue(app.has("caution-read"));
    }

    @Test
    void aFinishedWalkIsNotOpened() throws Exception {
        app.click("to-finish");
        app.until(() -> app.has("sign-off"));
        app.click("sign-off");
        app.click("finish-walk");
        app.until(() -> app.workplace().store().walk("2026-09").orElseThrow().finishedAt().isPresent());
        assertFalse(Files.exists(temp.resolve("store").resolve(WalkMemory.FILE)));
        restart(Duration.ofHours(1));
        assertTrue(app.has("start-walk"));
    }

    @Test
    void anotherPersonIsAskedForTheCard() throws Exception {
        Glass.on(() -> {
            app.workplace().preferencesProperty().set(app.workplace().preferences().withPerson("B. Ortiz"));
            return null;
        });
        restart(Duration.ofHours(1));
        assertTrue(app.has("start-walk"));
    }

    @Test
    void aDamagedFileIsAnOrdinaryStart() throws Exception {
        app.close();
        Files.writeString(temp.resolve("store").resolve(WalkMemory.FILE), "{\"round\":");
        open(Duration.ofHours(1));
        assertTrue(app.has("start-walk"));
        assertEquals("A. Vale", app.workplace().preferences().person());
    }
}
