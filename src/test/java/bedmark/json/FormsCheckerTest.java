package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Refused;
import bedmark.json.FormsChecker.Finding;
import bedmark.words.Words;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FormsCheckerTest {
    @TempDir
    private Path folder;

    static String sound() throws IOException {
        try (InputStream text = FormsCheckerTest.class.getResourceAsStream("forms/sound.json")) {
            return new String(text.readAllBytes(), StandardCharsets.UTF_8);
        }
    }

    private List<Finding> check(String file, String text) throws IOException {
        Files.writeString(folder.resolve(file), text);
        return FormsChecker.check(folder);
    }

    private static void requireWords(Finding finding) {
        for (Locale language : Words.LANGUAGES) {
            Object[] arguments = Stream.concat(Stream.of(finding.defect().where()),
                    finding.defect().details().stream()).toArray();
            String sentence = new Words(language).text("defect." + finding.defect().code(), arguments);
            assertTrue(!sentence.matches(".*\\{\\d}.*"), sentence);
        }
    }

    @Test
    void soundFormHasNoFindings() throws IOException {
        assertEquals(List.of(), check("sound.json", sound()));
    }

    @Test
    void formsThatShipAreSound() {
        assertEquals(List.of(), FormsChecker.check(Path.of("field-forms")));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "~\"kind\": \"flag\"~ | ~\"kind\": \"slider\"~ | 88 | isolated | word-wrong",
        "~\"group\": \"readings\",\n          \"label\": {\"en\": \"Moisture\"~ "
            + "| ~\"label\": {\"en\": \"Moisture\"~ | 12 | moisture | key-absent",
        "~\"version\": 1,\n  \"title\"~ | ~\"version\": 0,\n  \"title\"~ | 5 | version | number-too-small",
        "~\"step\": 0.5~ | ~\"step\": 0~ | 21 | moisture | number-not-positive",
        "~\"is\": \"dense\"~ | ~\"is\": \"dense\", \"present\": true~ | 55 | dustAt | condition-wrong",
        "~\"possible\": {\"from\": 0}~ | ~\"possible\": {\"from\": 0, \"above\": 0}~ | 31 | drips "
            + "| range-with-two-starts",
        "~\"key\": \"second\"~ | ~\"key\": \"first\"~ | 36 | first | section-twice",
        "~\"key\": \"isolated\"~ | ~\"key\": \"dust\"~ | 87 | dust | field-twice",
        "~\"Dust\", \"es\": \"Polvo\"~ | ~\"Dust\"~ | 44 | dust | language-missing",
        "~\"Look.\", \"es\": \"Mire.\"~ | ~\"Look.\"~ | 38 | second | language-missing",
        "~\"Dense\", \"es\": \"Denso\"~ | ~\"Dense\"~ | 47 | dust | language-missing",
        "~\"to\": {\"value\": 30~ | ~\"to\": {\"value\": 101~ | 22 | moisture | plausible-outside-possible",
        "~\"to\": 9}~ | ~\"to\": -1}~ | 31 | drips | range-reversed",
        "~\"value\": 100, \"unit\": \"%\"~ | ~\"value\": 100, \"unit\": \"mm\"~ | 23 | moisture | unit-wrong",
        "~{\"unit\": \"%\", \"step\": 0.5}~ | ~{\"unit\": \"%\", \"step\": 1}, {\"unit\": \"kW\", \"step\": 1}~ "
            + "| 21 | moisture | unit-wrong",
        "~{\"unit\": \"%\", \"step\": 0.5}~ | ~{\"unit\": \"%\", \"step\": 1}, {\"unit\": \"%\", \"step\": 1}~ "
            + "| 21 | moisture | unit-twice",
        "~\"value\": 30, \"unit\": \"%\"~ | ~\"value\": 30, \"unit\": \"ppm\"~ | 22 | moisture | unit-unknown",
        "~\"us\": \"%\"~ | ~\"us\": \"1/min\"~ | 20 | moisture | unit-not-offered",
        "~\"field\": \"dust\"~ | ~\"field\": \"rust\"~ | 55 | dustAt | condition-field-unknown",
        "~\"field\": \"drips\"~ | ~\"field\": \"drops\"~ | 56 | dustAt | condition-field-unknown",
        "~\"field\": \"moisture\"~ | ~\"field\": \"dustAt\"~ | 56 | dustAt | condition-on-itself",
        "~\"is\": \"dense\"~ | ~\"is\": \"thick\"~ | 55 | dustAt | condition-value-wrong",
        "~\"isOneOf\": [1, 2]~ | ~\"isOneOf\": [1, \"2\"]~ | 56 | dustAt | condition-value-wrong",
        "~{\"code\": \"dense\"~ | ~{\"code\": \"none\"~ | 47 | dust | choice-twice",
        "~{\"code\": \"torn\"~ | ~{\"code\": \"ripped\"~ | 75 | seals | choice-absent",
        "~\"key\": \"moisture\"~ | ~\"key\": \"throughput\"~ | 18 | throughput | dimension-wrong",
        "~\"key\": \"isolated\"~ | ~\"key\": \"skirtHeight\"~ | 88 | skirtHeight | field-kind-wrong",
        "~\"key\": \"seals\"~ | ~\"key\": \"gaskets\"~ | 59 | gaskets | field-key-wrong",
        "~\"dimension\": \"length\"~ | ~\"dimension\": \"time\"~ | 83 | seals | dimension-wrong",
        "~\"above\": {\"value\": 0~ | ~\"from\": {\"value\": 0~ | 84 | seals | possible-holds-zero",
        "~\"above\": {\"value\": 0~ | ~\"to\": {\"value\": 9~ | 84 | seals | possible-below-zero",
        "~\"title\": {\"en\": \"Sound\", \"es\": \"Sano\"}~ | ~\"title\": {\"es\": \"Sano\"}~ "
            + "| 6 | title | key-absent"})
    void everyFaultIsNamedWithFileLineAndKey(String sought, String instead, int line, String key, String code)
            throws IOException {
        String text = sound();
        assertEquals(2, text.split(java.util.regex.Pattern.quote(sought), -1).length, "seeded once: " + sought);
        List<Finding> findings = check("broken.json", text.replace(sought, instead));
        findings.forEach(FormsCheckerTest::requireWords);
        assertTrue(findings.stream().anyMatch(finding -> finding.file().equals("broken.json")
                && finding.line() == line && finding.key().equals(key)
                && finding.defect().code().equals(code)), findings.toString());
    }

    @ParameterizedTest
    @CsvSource({"photos, survey, key-taken", "depthMethod, readings, key-taken", "moisture, observations, group-wrong",
        "notes, survey, field-kind-wrong"})
    void keysThatMeanSomethingElsewhereAreHeld(String key, String group, String code) throws IOException {
        String text = sound().replace("\"key\": \"moisture\"", "\"key\": \"other\"")
                .replace("\"field\": \"moisture\"", "\"field\": \"other\"")
                .replace("\"key\": \"isolated\"", "\"key\": \"" + key + "\"")
                .replace("\"group\": \"observations\",\n          \"label\": {\"en\": \"Isolated\"",
                        "\"group\": \"" + group + "\",\n          \"label\": {\"en\": \"Isolated\"");
        List<Finding> findings = check("broken.json", text);
        findings.forEach(FormsCheckerTest::requireWords);
        assertTrue(findings.stream().anyMatch(finding -> finding.defect().code().equals(code)
                && finding.key().equals(key)), findings.toString());
    }

    @Test
    void unreadableJsonIsNamedWithLineAndColumn() throws IOException {
        Finding finding = check("broken.json", "{\n  \"format\": \"bedmark.field-form\",\n}").get(0);
        assertEquals(List.of("broken.json", 3, "json-unreadable"),
                List.of(finding.file(), finding.line(), finding.defect().code()));
        requireWords(finding);
    }

    @Test
    void emptyFolderIsAFinding() throws IOException {
        Files.writeString(folder.resolve("readme.txt"), "no form");
        Files.writeString(folder.resolve("field-form.schema.json"), "{}");
        Finding finding = FormsChecker.check(folder).get(0);
        assertEquals("forms-none", finding.defect().code());
        requireWords(finding);
    }

    @Test
    void oneFormInTwoFilesIsAFinding() throws IOException {
        Files.writeString(folder.resolve("a.json"), sound());
        List<Finding> findings = check("b.json", sound());
        assertEquals(List.of("form-twice"), findings.stream().map(finding -> finding.defect().code()).toList());
        assertEquals(List.of("b.json", 4, "id"),
                List.of(findings.get(0).file(), findings.get(0).line(), findings.get(0).key()));
        requireWords(findings.get(0));
    }

    @Test
    void fileThatIsNoFileIsAFinding() throws IOException {
        Files.createDirectory(folder.resolve("folder.json"));
        Finding finding = FormsChecker.check(folder).get(0);
        assertEquals("file-unreadable", finding.defect().code());
        requireWords(finding);
    }

    @Test
    void folderThatIsNotThereIsRefused() {
        assertEquals("folder-unreadable", assertThrows(Refused.class,
                () -> FormsChecker.check(folder.resolve("absent"))).defect().code());
    }

    @Test
    void allFaultsAreFoundInTextOrder() throws IOException {
        String text = sound().replace(", \"es\": \"Polvo\"", "").replace("\"to\": 9}", "\"to\": -1}")
                .replace("\"field\": \"dust\"", "\"field\": \"rust\"");
        assertEquals(List.of("range-reversed", "language-missing", "condition-field-unknown"),
                check("broken.json", text).stream().map(finding -> finding.defect().code()).toList());
    }
}
