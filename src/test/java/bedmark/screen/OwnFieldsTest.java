package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.index.SurveyLine;
import bedmark.index.SurveyQuery;
import bedmark.json.BundleReader;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import bedmark.screen.part.FieldBox;
import bedmark.survey.Bundle;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import java.util.zip.ZipFile;
import javafx.scene.control.Labeled;
import javafx.scene.input.KeyCode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A site adds fields of its own to a copy of the form, and nothing has to be built anew for them. */
class OwnFieldsTest {
    private static final String TRANSFER = "TP-08";
    private static final String SECTION = """
            {"key": "own", "title": {"en": "Our own", "es": "Lo nuestro"}, "fields": [
              {"key": "scraperTag", "kind": "text", "group": "observations", "longest": 40,
               "label": {"en": "Scraper tag", "es": "Etiqueta del rascador"}},
              {"key": "airCannons", "kind": "number", "group": "observations",
               "label": {"en": "Air cannons that work", "es": "Cañones de aire que funcionan"},
               "count": {"step": 1, "plausible": {"from": 0, "to": 12}, "possible": {"from": 0, "to": 99}}},
              {"key": "chuteDoor", "kind": "choice", "group": "observations",
               "label": {"en": "Chute door", "es": "Puerta del chute"},
               "choices": [{"code": "shut", "label": {"en": "Shut", "es": "Cerrada"}},
                           {"code": "ajar", "label": {"en": "Ajar", "es": "Entreabierta"}}]}]}
            """;

    @TempDir
    private Path temp;

    private TabletApp app;

    @Test
    void fieldsOfTheSiteAreFoundOnTheScreenInTheJournalInTheBundleAndBack() throws Exception {
        Path samples = samplesWithOwnFields();
        Path stick = Files.createDirectory(temp.resolve("stick"));
        try (TabletApp opened = new TabletApp(temp.resolve("store"), Optional.of(samples), stick, Clock.systemUTC(),
                1280, 800)) {
            app = opened;
            app.setOutOnDemo();
            app.click("stop-" + TRANSFER);
            app.click("correct");
            app.until(() -> !app.has("correct"));
            fill();
            assertAnswers(history(QueueState.OPEN));
            app.click("foot-done");
            app.click("foot-round");
            app.click("to-queue");
            app.click("queue-all");
            app.click("export");
            app.until(() -> app.has("receipt"));
            assertAnswers(history(QueueState.EXPORTED));
        }
        assertAnswers(readBack(stick));
    }

    private void fill() throws Exception {
        app.click(slot("scraperTag"));
        app.type("SC-4 left");
        app.press(KeyCode.ENTER);
        // Enter leads to the next field of the form.
        app.until(() -> box("airCannons").activeProperty().get());
        app.type("3");
        app.press(KeyCode.ENTER);
        assertEquals("Shut", ((Labeled) app.node("choice-shut")).getText());
        app.click("choice-ajar");
        assertEquals("SC-4 left", box("scraperTag").valueProperty().get());
        assertEquals("3", box("airCannons").valueProperty().get());
        assertEquals("Ajar", box("chuteDoor").valueProperty().get());
        assertEquals("Chute door", box("chuteDoor").nameProperty().get());
    }

    private static String slot(String key) {
        return "slot-observations-" + key;
    }

    private FieldBox box(String key) {
        return (FieldBox) app.node(slot(key));
    }

    private Survey history(QueueState state) {
        SurveyLine line = app.workplace().store().surveys(SurveyQuery.ALL.ofTransfer(TRANSFER).ofRound("2026-09")
                .current().in(state)).get(0);
        return app.workplace().store().history(line.id()).orElseThrow().survey();
    }

    private static void assertAnswers(Survey survey) {
        Branch seen = survey.document().branch("observations").orElseThrow();
        assertEquals("SC-4 left", seen.text("scraperTag").orElseThrow());
        assertEquals("3", seen.number("airCannons").orElseThrow().toPlainString());
        assertEquals("ajar", seen.text("chuteDoor").orElseThrow());
    }

    /** The survey as whoever receives the pack reads it, with the form that asks for its fields. */
    private static Survey readBack(Path stick) throws IOException {
        Path pack;
        try (Stream<Path> files = Files.list(stick)) {
            pack = files.findFirst().orElseThrow();
        }
        try (ZipFile zip = new ZipFile(pack.toFile())) {
            Bundle bundle = BundleReader.read(zip.getInputStream(zip.stream()
                    .filter(entry -> entry.getName().endsWith(".json")).findFirst().orElseThrow()).readAllBytes());
            assertFalse(bundle.document().branches("forms").isEmpty());
            assertTrue(bundle.document().branches("forms").stream().anyMatch(form -> form.branches("sections").stream()
                    .anyMatch(section -> section.text("key").equals(Optional.of("own")))));
            return bundle.surveys().stream().filter(survey -> survey.transfer().equals(TRANSFER)).findFirst()
                    .orElseThrow();
        }
    }

    private Path samplesWithOwnFields() throws IOException {
        Branch section = JsonReader.read(SECTION.getBytes(StandardCharsets.UTF_8)).root();
        Path folder = Files.createDirectories(temp.resolve("samples").resolve("photos")).getParent();
        Path given = Path.of("sample-surveys");
        try (Stream<Path> photos = Files.list(given.resolve("photos"))) {
            for (Path photo : photos.toList()) {
                Files.copy(photo, folder.resolve("photos").resolve(photo.getFileName()));
            }
        }
        try (Stream<Path> bundles = Files.list(given)) {
            for (Path file : bundles.filter(one -> one.toString().endsWith(".json")).toList()) {
                Branch bundle = JsonReader.read(Files.readAllBytes(file)).root();
                Files.write(folder.resolve(file.getFileName()), JsonWriter.indented(with(bundle, section)));
            }
        }
        return folder;
    }

    private static Branch with(Branch bundle, Branch section) {
        List<Node> forms = new ArrayList<>();
        for (Branch form : bundle.branches("forms")) {
            List<Node> sections = new ArrayList<>(form.branches("sections"));
            sections.add(section);
            forms.add(form.with(Pointer.of("sections"), new Node.Series(sections)));
        }
        return bundle.with(Pointer.of("forms"), new Node.Series(forms));
    }
}
