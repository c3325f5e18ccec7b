package bedmark.screen;

import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class LookTest {
    @Test
    void look(@TempDir Path temp) throws Exception {
        Path out = Path.of("/tmp/bm/look");
        Clock clock = Clock.fixed(Instant.parse("2026-03-12T09:42:07Z"), ZoneOffset.UTC);
        try (TabletApp app = new TabletApp(temp.resolve("store"), Optional.of(Path.of("/tmp/bm/look/samples")), temp, clock, 1280, 800)) {
            app.picture(out.resolve("start-empty.png"));
            app.click("load-demo");
            app.until(() -> app.has("person"));
            app.click("person");
            app.type("A. Vale");
            app.picture(out.resolve("start.png"));
            app.click("caution-read");
            app.click("start-walk");
            app.until(() -> app.has("search"));
            app.picture(out.resolve("round.png"));
            app.click("foot-next");
            app.until(() -> app.has("verdict"));
            app.picture(out.resolve("zone.png"));
            app.click("foot-round");
            app.click("to-queue");
            app.picture(out.resolve("queue.png"));
        }
    }
}
