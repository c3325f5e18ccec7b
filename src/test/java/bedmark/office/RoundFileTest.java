package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.engine.verdict.Rule;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.journal.Progress;
import bedmark.json.RoundText;
import bedmark.office.register.RegisterDesk;
import bedmark.office.trend.TrendDocument;
import bedmark.pack.RoundFile;
import bedmark.report.Examined;
import bedmark.report.ReportContent;
import bedmark.survey.Act;
import bedmark.survey.OfficeDeed;
import bedmark.survey.PlannedAction;
import bedmark.survey.QueueState;
import bedmark.survey.Register;
import bedmark.survey.RoundIntake;
import bedmark.survey.Survey;
import bedmark.survey.merge.ZoneId;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The round file, from the office to a tablet that is in the middle of its work. */
class RoundFileTest {
    private static final OffsetDateTime NOW = OffsetDateTime.parse("2026-10-01T08:00:00Z");

    @TempDir
    private Path folder;

    private Path sent() {
        Path pack = Offices.pack(Offices.sample("round-2026-03"), folder.resolve("tablet"), folder.resolve("a.zip"));
        Path out = folder.resolve("next.round.json");
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            store.receive(pack, "Ida Marsh");
            ZoneId zone = new ZoneId("ostermere", "TP-08");
            new Actions(store).add(zone, "seal-defect", "Renew the left seal", "Otto Vane",
                    Optional.of(LocalDate.parse("2026-11-01")), "WO-4711", "Ida Marsh");
            RankedZone worst = store.rank().get(0);
            new Findings(store).answer(worst.zone(), worst.findings().get(0).rule(), OfficeDeed.Answer.SHELVED,
                    "boards are on order", "Ida Marsh", Optional.of(LocalDate.parse("2026-12-01")),
                    LocalDate.parse("2026-10-01"));
            new RoundDesk(store).send("ostermere", List.of(), out, NOW, "Ida Marsh");
        }
        return out;
    }

    @Test
    void carriesRegisterFormsLastResultsAndNotes() {
        RoundFile file = RoundFile.read(sent());
        assertEquals(Offices.fingerprint(folder.resolve("office")), file.fingerprint().text());
        Branch document = file.document();
        assertEquals(24, document.branch("plant").orElseThrow().branches("transfers").size());
        assertEquals(1, document.branches("forms").size());
        assertEquals(21, document.branches("lastResults").size());
        assertEquals(List.of("action", "shelved"), document.branches("notes").stream()
                .map(note -> note.text("kind").orElseThrow()).toList());
        assertEquals("WO-4711", document.branches("notes").get(0).text("workOrder").orElseThrow());
    }

    @Test
    void aChangedFileIsRefused() throws IOException {
        Path file = sent();
        String text = Files.readString(file);
        Files.writeString(file, text.replace("Renew the left seal", "Renew the right seal"));
        assertEquals("signed-signature-wrong", assertThrows(Refused.class, () -> RoundFile.read(file)).defect().code());
        Files.writeString(file, text + "\n");
        assertEquals("signed-signature-wrong", assertThrows(Refused.class, () -> RoundFile.read(file)).defect().code());
        byte[] other = text.replace("\"TP-08\",\n      \"kind\"", "\"TP-99\",\n      \"kind\"")
                .getBytes(StandardCharsets.UTF_8);
        assertEquals("transfer-unknown", assertThrows(Refused.class, () -> RoundText.read(other)).defect().code());
    }

    @Test
    void aTabletTakesItInWithoutLosingASurveyUnderWay() {
        Branch file = RoundFile.read(sent()).document();
        // The office gave up the zone that is being surveyed, its conveyor and its round meanwhile.
        Branch plant = file.branch("plant").orElseThrow();
        Branch lean = file.with("plant", plant
                .with("transfers", without(plant.branches("transfers"), "id", "TP-07"))
                .with("conveyors", without(plant.branches("conveyors"), "id", "C6")))
                .with("rounds", Node.Series.of(Branch.EMPTY.with("id", "2027-03").with("points",
                        Node.Series.of(Branch.EMPTY.with("transfer", "TP-01")))))
                .with("lastResults", without(file.branches("lastResults"), "transfer", "TP-07"));
        Branch before = Branch.EMPTY.with("plant", plant).with("forms", file.get("forms").orElseThrow())
                .with("rounds", Offices.sample("round-2026-03").document().get("rounds").orElseThrow());
        UUID survey = UUID.randomUUID();
        try (Store tablet = Store.open(folder.resolve("tablet-store"), StoreOptions.of("Tablet 9"))) {
            tablet.append("", new Act.RegisterTaken(before));
            tablet.append("Mira", new Act.SurveyOpened(survey, Survey.begin(survey, "2026-03", "TP-07", "loading-zone",
                    1, "Mira", NOW).document()));
            tablet.append("Mira", new Act.AnswerSet(survey, Pointer.of("notes"), Optional.of(Node.text("half way"))));
            List<Act> acts = RoundIntake.acts(lean, "f", tablet.register(), List.of(tablet.history(survey).get()
                    .survey()), id -> tablet.survey(id).isPresent());
            acts.forEach(act -> tablet.append("Mira", act));
            assertEquals("half way", tablet.history(survey).orElseThrow().survey().document().text("notes").get());
            assertEquals(QueueState.OPEN, tablet.history(survey).orElseThrow().state());
            Branch head = tablet.register().orElseThrow();
            Register register = new Register(head.branch("plant").orElseThrow());
            assertTrue(register.transfer("TP-07").isPresent(), "the zone under way stays");
            assertTrue(register.conveyors().containsKey("C6"), "with its conveyor");
            assertEquals(List.of("2027-03", "2026-03"), head.branches("rounds").stream()
                    .map(round -> round.text("id").orElseThrow()).toList());
            assertEquals("Renew the left seal", PlannedAction.of(register.transfer("TP-08").orElseThrow().document(),
                    RoundIntake.ACTIONS).get(0).what());
            assertEquals(1, register.transfers().values().stream().mapToInt(transfer -> transfer.document()
                    .series(RoundIntake.NOTES).size()).sum());
            assertTrue(tablet.latestFinished("TP-08", Optional.empty()).isPresent(), "last results are here");
            assertEquals("round-file-older", assertThrows(Refused.class, () -> RoundIntake.acts(lean.with("createdAt",
                    "2026-09-01T08:00:00Z"), "f", tablet.register(), List.of(), id -> true)).defect().code());
            assertEquals("round-of-other-plant", assertThrows(Refused.class, () -> RoundIntake.acts(lean.with("plant",
                    plant.with("id", "elsewhere")), "f", tablet.register(), List.of(tablet.history(survey).get()
                    .survey()), id -> true)).defect().code());
            assertTrue(RoundIntake.trusts(tablet.register(), "f"));
            assertFalse(RoundIntake.trusts(tablet.register(), "g"));
        }
    }

    private static Node without(List<Branch> rows, String key, String value) {
        return new Node.Series(rows.stream().filter(row -> !row.text(key).equals(Optional.of(value)))
                .map(row -> (Node) row).toList());
    }

    private static List<String> codes(Branch trend, String key) {
        return trend.branch(key).orElseThrow().branches("findings").stream()
                .map(line -> line.text("code").orElseThrow() + line.branch("today").flatMap(seen ->
                        seen.text("level"))).toList();
    }

    private static String level(Branch trend, String key) {
        return trend.branch(key).orElseThrow().text("level").orElseThrow();
    }

    @Test
    void anOldSurveyIsJudgedByItsOwnRegisterAndByTodays() {
        sent();
        ZoneId zone = new ZoneId("ostermere", "TP-08");
        try (OfficeStore store = OfficeStore.open(folder.resolve("office"), OfficeOptions.of(Offices.NOW))) {
            JudgedZone own = store.judged(zone).orElseThrow();
            Branch head = store.head("ostermere").orElseThrow();
            Branch plant = head.branch("plant").orElseThrow();
            Branch strict = Branch.EMPTY.with("near", Node.number(1)).with("overloaded", Node.number(100));
            new RegisterDesk(store).take(head.with("plant", plant.with("limits",
                    Branch.EMPTY.with("bed-over-design", strict))), "wider limit", "Ida Marsh");
            assertEquals(own.assessment(), store.judged(zone).orElseThrow().assessment());
            JudgedZone today = store.judgedToday(zone).orElseThrow();
            assertEquals(100, today.assessment().findings().stream().filter(finding ->
                    finding.rule() == Rule.BED_OVER_DESIGN).findFirst().orElseThrow().overloaded().getAsDouble());
            assertEquals(own.copy().digest(), today.copy().digest());
            Branch told = TrendDocument.of(store.trend(zone), Optional.of(own), Optional.of(today));
            assertNotEquals(codes(told, "judgedByOwnRegister") + level(told, "judgedByOwnRegister"),
                    codes(told, "judgedByTodaysRegister") + level(told, "judgedByTodaysRegister"));
            Examined examined = ReportContent.of(store, RankQuery.ALL, NOW, Progress.NONE)
                    .orElseThrow().examined().stream().map(one -> one.examined().orElseThrow())
                    .filter(one -> one.judged().zone().equals(zone)).findFirst().orElseThrow();
            assertEquals(Rule.BED_OVER_DESIGN, examined.rejudged().orElseThrow().turns().get(0).rule());
        }
    }
}
