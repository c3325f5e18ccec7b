package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.engine.Settings;
import bedmark.engine.flow.MaximumBeltSpeed;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealType;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.verdict.Rule;
import bedmark.json.ReferenceData.Finding;
import bedmark.words.Words;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ReferenceDataTest {
    @TempDir
    private Path temp;
    private Path folder;

    @BeforeEach
    void write() {
        folder = temp.resolve("reference");
        ReferenceData.write(folder);
    }

    private void edit(String file, String sought, String instead) throws IOException {
        Path path = folder.resolve(file);
        String text = Files.readString(path);
        assertTrue(text.contains(sought), sought);
        Files.writeString(path, text.replaceFirst(Pattern.quote(sought),
                Matcher.quoteReplacement(instead)));
    }

    private static Branch file(ReferenceFile file) {
        return JsonReader.read(file.shipped()).root();
    }

    private static Branch plant(String materials) {
        return JsonReader.read(("{\"materials\": " + materials + "}").getBytes(StandardCharsets.UTF_8)).root();
    }

    /** A link to nowhere is no file that is there, and still none can be made in its place. */
    @Test
    void whatCanNotAllBeWrittenLeavesNoPartOfIt() throws IOException {
        Path other = Files.createDirectory(temp.resolve("other"));
        Files.createSymbolicLink(other.resolve(ReferenceFile.values()[2].fileName()), temp.resolve("nowhere/x"));
        assertEquals("folder-unwritable",
                assertThrows(Refused.class, () -> ReferenceData.write(other)).defect().code());
        try (Stream<Path> files = Files.list(other)) {
            assertEquals(1, files.count());
        }
    }

    @Test
    void shippedFilesAreTheEnginesDefaults() {
        assertEquals(Settings.standard(), ReferenceData.shipped().settings());
        assertEquals(Settings.standard(), ReferenceData.read(folder).settings());
    }

    @Test
    void shippedFilesNameEveryRuleSealInstrumentAndClass() {
        assertEquals(Rule.values().length, file(ReferenceFile.LIMITS).branches("rules").size());
        assertEquals(SealType.values().length * SealCondition.values().length,
                file(ReferenceFile.SEAL_RATES).branches("multipliers").size());
        assertEquals(Instrument.values().length - 1, file(ReferenceFile.INSTRUMENTS).branches("instruments").size());
        assertEquals(SpeedClass.values().length, file(ReferenceFile.SPEED_CLASSES).branches("classes").size());
        for (Branch row : file(ReferenceFile.LIMITS).branches("rules")) {
            Rule rule = Rule.ofCode(row.text("rule").orElseThrow()).orElseThrow();
            assertEquals(rule.limit().source(), row.text("mark").orElseThrow());
        }
    }

    @Test
    void shippedFilesAreSoundAndTheSchemasAreBesideThem() throws IOException {
        assertEquals(List.of(), ReferenceData.check(folder));
        for (ReferenceFile file : ReferenceFile.values()) {
            assertTrue(Files.exists(folder.resolve(file.schemaName())));
        }
    }

    @Test
    void tableHoldsThePublishedFactorsAndSaysWhatItLeavesOut() {
        Branch materials = file(ReferenceFile.MATERIALS);
        assertEquals(32, materials.branches("factors").size());
        assertEquals("0.2760", factor(materials, "iron-ore-200-lb"));
        assertEquals("0.0086", factor(materials, "sawdust-dry"));
        assertEquals("magnesium-chloride", materials.branches("leftOut").get(0).text("id").orElseThrow());
        assertFalse(materials.branches("factors").stream().anyMatch(row ->
                row.text("id").orElseThrow().equals("magnesium-chloride")));
    }

    private static String factor(Branch materials, String id) {
        return materials.branches("factors").stream().filter(row -> row.text("id").orElseThrow().equals(id))
                .findFirst().orElseThrow().number("skirtFrictionFactor").orElseThrow().toPlainString();
    }

    @Test
    void everyRowHasSourceAndMark() {
        Set<String> marks = new HashSet<>();
        for (ReferenceFile file : ReferenceFile.values()) {
            file(file).members().keySet().stream().filter(key -> !key.equals("format") && !key.equals("version")
                    && !key.equals("rate") && !key.equals("certainty")).flatMap(key ->
                    file(file).branches(key).stream()).forEach(row -> {
                        assertFalse(row.text("source").orElseThrow().isBlank());
                        marks.add(row.text("mark").orElseThrow());
                    });
        }
        assertTrue(marks.containsAll(Set.of("S1", "S2", "S12", "R", "A", "C/A")), marks.toString());
    }

    @Test
    void editedFilesTakeThePlaceOfTheDefaults() throws IOException {
        edit("limits.json", "\"near\": 0.85, \"overloaded\": 1.00", "\"near\": 0.80, \"overloaded\": 0.95");
        edit("seal-rates.json", "{\"value\": 3, \"unit\": \"[lbf_av]/[ft_i]\"", "{\"value\": 60, \"unit\": \"N/m\"");
        edit("seal-rates.json", "\"condition\": \"worn\", \"multiplier\": 1", "\"condition\": \"worn\", \"multiplier\": 1.4");
        edit("speed-classes.json", "{\"value\": 500, \"unit\": \"[ft_i]/min\"}", "{\"value\": 2, \"unit\": \"m/s\"}");
        edit("instruments.json", "{\"value\": 5, \"unit\": \"mm\"}", "{\"value\": 1, \"unit\": \"cm\"}");
        edit("limits.json", "\"value\": 0.6, \"from\": 0.5, \"to\": 0.7", "\"value\": 0.5");
        Settings settings = ReferenceData.read(folder).settings();
        assertEquals(0.80, settings.limits().of(Rule.BED_OVER_BOARD).near().orElseThrow());
        assertEquals("site", settings.limits().of(Rule.BED_OVER_BOARD).source());
        assertTrue(settings.limits().of(Rule.BED_OVER_BOARD).assumption());
        assertEquals(60, settings.sealRates().rate());
        assertEquals(1.4, settings.sealRates().multiplier(SealType.VERTICAL, SealCondition.WORN));
        assertEquals(2, settings.maximumSpeeds().forBelt(SpeedClass.GRAIN_FREE_FLOWING, 0.45));
        assertEquals(0.01, settings.instruments().spread(Instrument.TAPE), 1e-15);
        assertEquals(0.5, settings.conventions().beltGrip().value());
        assertEquals(0, settings.conventions().beltGrip().standardUncertainty());
        assertEquals(MaximumBeltSpeed.of(SpeedClass.HEAVY_HARD_SHARP_COARSE, 1.2),
                settings.maximumSpeeds().forBelt(SpeedClass.HEAVY_HARD_SHARP_COARSE, 1.2), 1e-12);
    }

    @Test
    void aFileThatIsNotThereIsTheShippedOne() throws IOException {
        Files.delete(folder.resolve("limits.json"));
        edit("instruments.json", "\"relative\": 0.25", "\"relative\": 0.2");
        Settings settings = ReferenceData.read(folder).settings();
        assertEquals(Settings.standard().limits(), settings.limits());
        assertEquals(0.2, settings.instruments().spread(Instrument.SKIRT_FRICTION_FACTOR));
    }

    @Test
    void materialTakesFromTheTableWhatItDoesNotState() {
        Branch material = ReferenceData.shipped().filled(plant("[{\"id\": \"m\", \"reference\": "
                + "\"cement-clinker\", \"skirtFrictionFactor\": 0.2}]")).branches("materials").get(0);
        assertEquals("0.2", material.number("skirtFrictionFactor").orElseThrow().toPlainString());
        assertEquals("85", material.quantity("bulkDensity").orElseThrow().value().toPlainString());
        assertEquals(10 / Math.sqrt(3), material.quantity("bulkDensity").orElseThrow().standardUncertainty()
                .orElseThrow().doubleValue(), 1e-3);
        assertEquals("35", material.quantity("angleOfRepose").orElseThrow().value().toPlainString());
        assertEquals("25", material.quantity("surchargeAngle").orElseThrow().value().toPlainString());
    }

    @ParameterizedTest
    @CsvSource({"28, 10", "25, 10", "38, 25", "40, 30", "45, 30", "37, 25"})
    void surchargeFollowsFromRepose(int repose, String surcharge) throws IOException {
        edit("materials.json", "{\"value\": 38, \"unit\": \"deg\"}, \"to\": {\"value\": 38,",
                "{\"value\": " + repose + ", \"unit\": \"deg\"}, \"to\": {\"value\": " + repose + ",");
        assertEquals(surcharge, ReferenceData.read(folder).filled(plant(
                "[{\"id\": \"m\", \"reference\": \"coal-bituminous-mined\"}]")).branches("materials").get(0)
                .quantity("surchargeAngle").orElseThrow().value().toPlainString());
    }

    @ParameterizedTest
    @CsvSource({"magnesium-chloride, reference-material-left-out", "moon-dust, reference-material-unknown"})
    void materialThatTheTableLacksIsRefused(String id, String code) {
        Refused refused = assertThrows(Refused.class, () -> ReferenceData.shipped().filled(
                plant("[{\"id\": \"a\"}, {\"id\": \"m\", \"reference\": \"" + id + "\"}]")));
        assertEquals(code, refused.defect().code());
        assertEquals("/materials/1/reference", refused.defect().where());
        requireWords(new Finding("", 0, 0, "", refused.defect()));
    }

    private static void requireWords(Finding finding) {
        for (Locale language : Words.LANGUAGES) {
            Object[] arguments = Stream.concat(Stream.of(finding.defect().where()),
                    finding.defect().details().stream()).toArray();
            String sentence = new Words(language).text("defect." + finding.defect().code(), arguments);
            assertFalse(sentence.matches(".*\\{\\d}.*"), sentence);
        }
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "limits.json | ~\"near\": 0.85~ | ~\"near\": -1~ | number-negative",
        "limits.json | ~\"mark\": \"A\"~ | ~\"mark\": \"me\"~ | text-wrong",
        "limits.json | ~\"rule\": \"bed-over-design\"~ | ~\"rule\": \"bed-over-board\"~ | reference-row-twice",
        "limits.json | ~\"undecided\": 0.1~ | ~\"undecided\": 0.95~ | number-too-large",
        "limits.json | ~\"from\": 0.5~ | ~\"from\": 0.9~ | range-reversed",
        "limits.json | ~\"rule\": \"seal-defect\"~ | ~\"rule\": \"seals\"~ | word-wrong",
        "materials.json | ~\"skirtFrictionFactor\": 0.1210,~ | ~~ | key-absent",
        "materials.json | ~\"id\": \"borax\"~ | ~\"id\": \"cullet\"~ | reference-row-twice",
        "materials.json | ~\"value\": 55, \"unit\"~ | ~\"value\": 65, \"unit\"~ | range-reversed",
        "materials.json | ~\"value\": 30, \"unit\": \"deg\"}, \"to\": {\"value\": 44~ "
            + "| ~\"value\": 30, \"unit\": \"deg\"}, \"to\": {\"value\": 91~ | number-too-large",
        "materials.json | ~\"unit\": \"[lb_av]/[cft_i]\"~ | ~\"unit\": \"kg/m2\"~ | unit-wrong",
        "seal-rates.json | ~\"condition\": \"worn\"~ | ~\"condition\": \"sound\"~ | reference-row-twice",
        "seal-rates.json | ~\"multiplier\": 1~ | ~\"multiplier\": \"1\"~ | kind-wrong",
        "speed-classes.json | ~\"fromWidth\": {\"value\": 18~ "
            + "| ~\"aboveWidth\": {\"value\": 1, \"unit\": \"m\"}, \"fromWidth\": {\"value\": 18~ | speed-row-width",
        "speed-classes.json | ~\"format\": \"bedmark.reference.speed-classes\"~ | ~\"format\": \"x\"~ | word-wrong",
        "instruments.json | ~\"kind\": \"tachometer\"~ | ~\"kind\": \"tape\"~ | reference-row-twice",
        "instruments.json | ~\"relative\": 0.25~ | ~\"standardUncertainty\": {\"value\": 1, \"unit\": \"mm\"}~ | key-absent",
        "instruments.json | ~{\"value\": 3, \"unit\": \"deg\"}~ | ~{\"value\": 3, \"unit\": \"mm\"}~ | unit-of-wrong-kind"})
    void everyFaultIsNamedWithItsFileAndLine(String file, String sought, String instead, String code)
            throws IOException {
        edit(file, sought, instead);
        List<Finding> findings = ReferenceData.check(folder);
        findings.forEach(ReferenceDataTest::requireWords);
        assertTrue(findings.stream().anyMatch(finding -> finding.file().equals(file) && finding.line() > 1
                && finding.defect().code().equals(code)), findings.toString());
        Refused refused = assertThrows(Refused.class, () -> ReferenceData.read(folder));
        assertTrue(refused.defect().where().contains(file), refused.defect().where());
    }

    @Test
    void aClassWithoutASpeedIsNamed() throws IOException {
        Path path = folder.resolve("speed-classes.json");
        String text = Files.readString(path);
        int speeds = text.indexOf("\"speeds\"");
        Files.writeString(path, text.substring(0, speeds) + text.substring(speeds)
                .replace("\"heavy-hard-sharp-coarse\"", "\"grain-free-flowing\"").replace("\"value\": 18", "\"value\": 17"));
        assertTrue(ReferenceData.check(folder).stream().anyMatch(finding ->
                finding.defect().code().equals("speed-table-incomplete")));
    }

    @Test
    void unreadableAndStrangeFilesAreFindings() throws IOException {
        Files.writeString(folder.resolve("limits.json"), "{\n  \"format\",\n}");
        Files.writeString(folder.resolve("limit.json"), "{}");
        List<Finding> findings = ReferenceData.check(folder);
        findings.forEach(ReferenceDataTest::requireWords);
        assertEquals(List.of("reference-file-unknown", "json-unreadable"),
                findings.stream().map(finding -> finding.defect().code()).toList());
        assertEquals(2, findings.get(1).line());
    }

    @Test
    void emptyAndAbsentFolders() throws IOException {
        Path empty = Files.createDirectory(temp.resolve("empty"));
        assertEquals("reference-none", ReferenceData.check(empty).get(0).defect().code());
        assertEquals("reference-none",
                assertThrows(Refused.class, () -> ReferenceData.read(empty)).defect().code());
        assertEquals("folder-unreadable", assertThrows(Refused.class,
                () -> ReferenceData.check(temp.resolve("absent"))).defect().code());
    }

    @Test
    void nothingIsOverwritten() throws IOException {
        Path other = Files.createDirectory(temp.resolve("other"));
        Files.writeString(other.resolve("limits.json"), "mine");
        assertEquals("reference-file-exists",
                assertThrows(Refused.class, () -> ReferenceData.write(other)).defect().code());
        assertEquals("mine", Files.readString(other.resolve("limits.json")));
        assertFalse(Files.exists(other.resolve("materials.json")));
        Path taken = Files.writeString(temp.resolve("taken"), "a file");
        assertEquals("folder-unwritable",
                assertThrows(Refused.class, () -> ReferenceData.write(taken)).defect().code());
    }
}
