package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.index.SurveyQuery;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import bedmark.office.RoundDesk;
import bedmark.survey.QueueState;
import bedmark.survey.RoundIntake;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The office's round file taken in on a tablet that is in the middle of a round. */
class RoundTakingTest {
    @TempDir
    private Path folder;

    @Test
    void theRoundIsTakenInAndWhatIsUnderWayGoesOn() throws Exception {
        Path stick = Files.createDirectories(folder.resolve("stick"));
        Path pack = Offices.pack(Offices.sample("round-2026-03"), folder.resolve("other"), folder.resolve("a.zip"));
        try (OfficeStore office = Offices.trusting(folder.resolve("office"), folder.resolve("other"))) {
            office.receive(pack, "Ida Marsh");
            new RoundDesk(office).send("ostermere", List.of(), stick.resolve("next.round.json"),
                    OffsetDateTime.parse("2026-09-30T08:00:00Z"), "Ida Marsh");
        }
        try (TabletApp app = new TabletApp(folder.resolve("store"), Optional.of(Path.of("sample-surveys")), stick,
                Offices.NOW, 1280, 800)) {
            app.click("load-demo");
            app.until(() -> app.shell().scene().lookup("#round-2026-09") != null);
            Set<String> open = open(app);
            assertTrue(!open.isEmpty());
            app.click("take-round");
            app.until(() -> app.shell().scene().lookup("#accept-office") != null);
            app.click("accept-office");
            app.until(() -> app.shell().scene().lookup("#round-2026-03") != null);
            assertEquals(open, open(app));
            assertTrue(app.shell().scene().lookup("#round-2026-09") != null, "the round under way goes on");
            assertTrue(RoundIntake.trusts(app.workplace().store().register(),
                    Offices.fingerprint(folder.resolve("office"))));
        }
    }

    private static Set<String> open(TabletApp app) {
        return app.workplace().store().surveys(SurveyQuery.ALL.in(QueueState.OPEN, QueueState.COMPLETED)).stream()
                .map(line -> line.id() + " " + line.last()).collect(Collectors.toSet());
    }
}
