package bedmark.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.command.Terminal.Result;
import bedmark.document.Branch;
import bedmark.json.JsonReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class CommandsTest {
    private static final String BUNDLE = "src/test/resources/bedmark/json/bundle.json";

    @TempDir
    private Path temp;

    private static void assertOneSentence(int code, Result result) {
        assertEquals(code, result.code(), result.err());
        assertEquals(1, result.err().lines().count(), result.err());
        assertTrue(result.err().startsWith("bedmark: "), result.err());
        assertFalse(result.err().contains("Exception"), result.err());
        assertEquals("", result.out());
    }

    private static Branch json(Result result) {
        return JsonReader.read(result.out().getBytes(StandardCharsets.UTF_8)).root();
    }

    @Test
    void assessPrintsEverySurveyInTheBundlesOrder() {
        Branch printed = json(Terminal.run("assess", BUNDLE, "--json"));
        assertEquals("bedmark.assessment", printed.text("format").orElseThrow());
        List<Branch> surveys = printed.branches("surveys");
        assertEquals(3, surveys.size());
        assertEquals("t1", surveys.get(0).text("transfer").orElseThrow());
        assertTrue(surveys.get(0).branch("assessment").orElseThrow().number("skirtPowerW").isPresent());
    }

    @Test
    void unitsNeverAlterJson() {
        assertEquals(Terminal.run("assess", BUNDLE, "--json"),
                Terminal.run("assess", BUNDLE, "--json", "--units", "us"));
    }

    @Test
    void unitsAlterTextAndCsv() {
        assertTrue(Terminal.run("assess", BUNDLE).out().contains("kW"));
        assertTrue(Terminal.run("assess", BUNDLE, "--units", "us").out().contains("hp"));
        assertTrue(Terminal.run("assess", BUNDLE, "--csv", "--units", "us").out().contains("skirtDrag [[lbf_av]]"));
    }

    @Test
    void nothingMeasuredIsToldAsCertain() {
        String told = Terminal.run("assess", "sample-surveys").out().replace('\u00a0', ' ');
        assertTrue(told.contains("> 99 % sure"), told);
        assertFalse(told.contains("100 % sure"), told);
    }

    @Test
    void whatALaterRevisionReplacesIsMarked() {
        List<String> marked = Terminal.run("assess", BUNDLE).out().lines()
                .filter(line -> line.contains("replaced by a later revision")).toList();
        assertEquals(1, marked.size());
        assertTrue(marked.get(0).startsWith("CV-1 tail  Jaw crusher > CV-1  [march]"), marked.get(0));
    }

    @Test
    void whatWasNotInspectedSaysSoAndWhy() throws Exception {
        Path bundle = temp.resolve("bundle.json");
        Files.writeString(bundle, Files.readString(Path.of(BUNDLE)).replace("\"not-accessible\",\n      \"readings\"",
                "\"not-accessible\", \"statusReason\": \"scaffold\",\n      \"readings\""));
        assertTrue(Terminal.run("assess", bundle.toString()).out().contains("Not accessible: scaffold"));
    }

    @Test
    void cautionStandsOnEverythingPrinted() {
        for (String way : List.of("--json", "--csv", "--units=metric")) {
            assertTrue(Terminal.run("assess", BUNDLE, way).out().contains("not a design"), way);
        }
    }

    @Test
    void csvHasAsManyCellsInEveryRow() {
        List<String> rows = Terminal.run("assess", BUNDLE, "--csv").out().lines().toList();
        assertEquals(4, rows.size());
        for (String row : rows) {
            assertEquals(cells(rows.get(0)), cells(row), row);
        }
    }

    private static long cells(String row) {
        return row.replaceAll("\"[^\"]*\"", "").chars().filter(sign -> sign == ',').count();
    }

    @Test
    void folderIsReadInTheOrderOfItsNames() throws Exception {
        Files.copy(Path.of(BUNDLE), temp.resolve("b.json"));
        Files.copy(Path.of(BUNDLE), temp.resolve("a.json"));
        assertEquals(6, json(Terminal.run("assess", temp.toString(), "--json")).branches("surveys").size());
    }

    @Test
    void unpackedPackIsReadAsThePackIs() throws Exception {
        Files.createDirectories(temp.resolve("bag/data"));
        Files.copy(Path.of(BUNDLE), temp.resolve("bag/data/bundle.json"));
        assertEquals(Terminal.run("assess", BUNDLE, "--json"),
                Terminal.run("assess", temp.resolve("bag").toString(), "--json"));
    }

    @ParameterizedTest
    @ValueSource(strings = {"--help", "assess --help", "pack --help", "pack verify --help", "pack make --help",
        "forms check --help", "store check --help", "store rebuild --help", "open --help", "--version"})
    void helpIsEverywhere(String words) {
        Result result = Terminal.run(words.split(" "));
        assertEquals(0, result.code());
        assertTrue(result.out().contains("bedmark"), result.out());
    }

    @ParameterizedTest
    @ValueSource(strings = {"assess", "assess a b", "assess --units furlong " + BUNDLE, "assess --json --csv " + BUNDLE,
        "pack", "pack unmake x", "forms", "store", "nonsense", "assess --wrong " + BUNDLE, "pack make " + BUNDLE})
    void badUseIsOneSentenceAndTwo(String words) {
        assertOneSentence(ExitCode.BAD_USE, Terminal.run(words.split(" ")));
    }

    @ParameterizedTest
    @CsvSource({"assess", "pack verify", "store check"})
    void missingInputIsOneSentenceAndThree(String words) {
        String[] call = (words + " " + temp.resolve("nowhere")).split(" ");
        Result result = Terminal.run(call);
        assertOneSentence(ExitCode.UNREADABLE, result);
        assertTrue(result.err().contains("nowhere"), result.err());
    }

    @Test
    void unreadableJsonNamesLineAndColumn() throws Exception {
        Path broken = temp.resolve("broken.json");
        Files.writeString(broken, "{\n  \"format\": \"bedmark.bundle\",\n  \"version\": 1,,\n}");
        Result result = Terminal.run("assess", broken.toString());
        assertOneSentence(ExitCode.UNREADABLE, result);
        assertTrue(result.err().contains("broken.json") && result.err().contains("3"), result.err());
    }

    @Test
    void impossibleReadingNamesItsPlace() throws Exception {
        Path broken = temp.resolve("broken.json");
        Files.writeString(broken, Files.readString(Path.of(BUNDLE))
                .replace("\"unit\": \"kg/m3\"", "\"unit\": \"kg/m2\""));
        Result result = Terminal.run("assess", broken.toString());
        assertOneSentence(ExitCode.UNREADABLE, result);
        assertTrue(result.err().contains("/plant/materials/0/bulkDensity"), result.err());
    }

    @Test
    void whatIsNoPackIsRefused() {
        assertOneSentence(ExitCode.UNREADABLE, Terminal.run("pack", "verify", BUNDLE));
    }

    @Test
    void shippedFormsAreSound() {
        Result result = Terminal.run("forms", "check", "field-forms");
        assertEquals(0, result.code(), result.err());
    }

    @Test
    void brokenFormNamesFileLineAndKey() throws Exception {
        Files.writeString(temp.resolve("odd.json"), Files.readString(Path.of("field-forms/loading-zone.json"))
                .replaceFirst("\"kind\": \"quantity\"", "\"kind\": \"quantitty\""));
        Result result = Terminal.run("forms", "check", temp.toString());
        assertEquals(ExitCode.UNREADABLE, result.code());
        assertTrue(result.err().matches("(?s)odd\\.json:\\d+:\\d+: .*loadingZoneLength.*"), result.err());
    }

    @Test
    void packGoesThereAndBack() throws Exception {
        Path bundle = temp.resolve("bundle.json");
        Files.writeString(bundle, Files.readString(Path.of(BUNDLE)).replaceAll("(?s)\"photos\": \\[.*?\\],", ""));
        Path pack = temp.resolve("round.zip");
        Result made = Terminal.run("pack", "make", bundle.toString(), "--photos", temp.toString(), "--out",
                pack.toString(), "--store", temp.resolve("store").toString());
        assertEquals(0, made.code(), made.err());
        Result verified = Terminal.run("pack", "verify", pack.toString());
        assertEquals(0, verified.code(), verified.err());
        assertEquals(json(Terminal.run("assess", bundle.toString(), "--json")),
                json(Terminal.run("assess", pack.toString(), "--json")));
    }
}
