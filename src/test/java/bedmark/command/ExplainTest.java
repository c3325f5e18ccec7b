package bedmark.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.command.Terminal.Result;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ExplainTest {
    private static final String BUNDLE = "src/test/resources/bedmark/json/bundle.json";

    @TempDir
    private Path temp;

    private static int count(String text, String part) {
        return text.split(Pattern.quote(part), -1).length - 1;
    }

    @Test
    void eachSurveyHasASheetWithHeadFindingsAndCaution() {
        Result result = Terminal.run("assess", BUNDLE, "--explain");
        assertEquals(Terminal.run("assess", BUNDLE).code(), result.code());
        assertEquals(3, count(result.out(), "CALCULATION SHEET"));
        assertEquals(3, count(result.out(), "not a design"));
        for (String part : new String[] {"inspector", "material", "WORKING", "FINDINGS", "[S1]", "F = Fm + Fs"}) {
            assertTrue(result.out().contains(part), part);
        }
    }

    @Test
    void sheetsOfTheDemoPlantKeepTheirWidth() {
        Result result = Terminal.run("assess", "sample-surveys/round-2026-03.json", "--explain", "--units", "us");
        assertEquals(Terminal.run("assess", "sample-surveys/round-2026-03.json").code(), result.code());
        result.out().lines().forEach(line -> assertTrue(line.length() <= 100, line));
    }

    @ParameterizedTest
    @ValueSource(strings = {"assess --explain --json " + BUNDLE, "assess --explain --csv " + BUNDLE, "reference",
        "reference write", "reference check", "assess --reference"})
    void badUseIsTwo(String words) {
        Result result = Terminal.run(words.split(" "));
        assertEquals(ExitCode.BAD_USE, result.code());
        assertEquals(1, result.err().lines().count(), result.err());
    }

    @ParameterizedTest
    @ValueSource(strings = {"reference --help", "reference check --help", "reference write --help"})
    void helpIsThere(String words) {
        Result result = Terminal.run(words.split(" "));
        assertEquals(0, result.code());
        assertTrue(result.out().contains("bedmark reference"), result.out());
    }

    @Test
    void referenceIsWrittenCheckedAndUsed() throws Exception {
        String folder = temp.resolve("reference").toString();
        Result written = Terminal.run("reference", "write", folder);
        assertEquals(0, written.code(), written.err());
        assertEquals(10, written.out().lines().count());
        assertEquals(0, Terminal.run("reference", "check", folder).code());
        String shipped = Terminal.run("assess", BUNDLE, "--json").out();
        assertEquals(shipped, Terminal.run("assess", BUNDLE, "--json", "--reference", folder).out());
        Path instruments = Path.of(folder, "instruments.json");
        Files.writeString(instruments, Files.readString(instruments).replace("\"relative\": 0.05", "\"relative\": 0.2"));
        String edited = Terminal.run("assess", BUNDLE, "--json", "--reference", folder).out();
        assertTrue(!edited.equals(shipped), "a density that is less sure makes results less sure");
    }

    @Test
    void whatThePlantDecidesWins() throws Exception {
        Path folder = temp.resolve("reference");
        Terminal.run("reference", "write", folder.toString());
        Path limits = folder.resolve("limits.json");
        Files.writeString(limits, Files.readString(limits)
                .replace("\"rule\": \"skirts-over-budget\", \"near\": 0.10", "\"rule\": \"skirts-over-budget\", \"near\": 0.33")
                .replace("\"rule\": \"zone-too-short\", \"near\": 1,", "\"rule\": \"zone-too-short\", \"near\": 1.77,"));
        String text = Terminal.run("assess", "sample-surveys/round-2026-03.json", "--json", "--reference",
                folder.toString()).out();
        assertTrue(text.contains("\"near\" : 1.77") || text.contains("\"near\": 1.77"), "the file's limit counts");
        assertTrue(!text.contains("0.33,"), "the plant's own limit stands");
    }

    @Test
    void brokenReferenceNamesFileLineAndKey() throws Exception {
        Path folder = temp.resolve("reference");
        Terminal.run("reference", "write", folder.toString());
        Path limits = folder.resolve("limits.json");
        Files.writeString(limits, Files.readString(limits).replaceFirst("\"near\": 0.85", "\"near\": \"high\""));
        Result checked = Terminal.run("reference", "check", folder.toString());
        assertEquals(ExitCode.UNREADABLE, checked.code());
        assertTrue(checked.err().matches("(?s)limits\\.json:5:\\d+: near: .*"), checked.err());
        Result assessed = Terminal.run("assess", BUNDLE, "--reference", folder.toString());
        assertEquals(ExitCode.UNREADABLE, assessed.code());
        assertTrue(assessed.err().startsWith("bedmark: ") && assessed.err().contains("limits.json"), assessed.err());
        assertEquals(ExitCode.UNREADABLE, Terminal.run("reference", "write", folder.toString()).code());
        assertEquals(ExitCode.UNREADABLE, Terminal.run("reference", "check", temp.resolve("no").toString()).code());
    }
}
