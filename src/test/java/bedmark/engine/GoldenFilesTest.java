package bedmark.engine;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.engine.GoldenCase.Expectation;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Remedy;
import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.TreeSet;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;

/** Every file of {@code golden/} is a case; a new case is a new file and no code. */
class GoldenFilesTest {
    private static final Pattern MARK = Pattern.compile("(S1[0-4]|S[1-9]|R|C|A|D)(/(S1[0-4]|S[1-9]|R|C|A|D))*");
    private static final Pattern PUBLISHED = Pattern.compile("S[0-9]+");

    @TestFactory
    Stream<DynamicTest> everyFileHolds() {
        return files().stream().map(GoldenCase::read)
                .map(golden -> DynamicTest.dynamicTest(golden.file(), () -> check(golden)));
    }

    @Test
    void everyFormulaIsTried() {
        TreeSet<String> untried = new TreeSet<>(GoldenFormulas.names());
        untried.removeAll(files().stream().map(GoldenCase::read).map(golden -> golden.text("formula"))
                .collect(Collectors.toSet()));
        assertEquals(new TreeSet<String>(), untried);
    }

    @Test
    void enoughOfThemRestOnPublishedTablesAndExamples() {
        List<GoldenCase> cases = files().stream().map(GoldenCase::read).toList();
        assertTrue(cases.size() >= 60, cases.size() + " cases");
        long published = cases.stream().filter(golden -> PUBLISHED.matcher(golden.text("mark")).lookingAt()
                || golden.text("mark").endsWith("/S1") && golden.text("source").contains("Table 6-7")).count();
        assertTrue(published >= 25, published + " published");
    }

    @Test
    void anEmptyOrUnsourcedFileFails(@TempDir Path folder) throws IOException {
        for (String text : List.of("", "{}", "{\"title\": \"x\", \"mark\": \"D\", \"expect\": [{}]}",
                "{\"title\": \"x\", \"source\": \"a source to be found\", \"mark\": \"D\", \"expect\": []}",
                "{\"title\": \"x\", \"source\": \"a source to be found\", \"mark\": \"?\", \"expect\": [{}]}")) {
            GoldenCase golden = GoldenCase.read(Files.writeString(folder.resolve("case.json"), text));
            assertThrows(AssertionError.class, () -> check(golden), text);
        }
    }

    private static void check(GoldenCase golden) {
        assertFalse(golden.text("title").isEmpty(), "a title");
        assertTrue(golden.text("source").length() > 10, "a source that can be found again");
        assertTrue(MARK.matcher(golden.text("mark")).matches(), "a mark of the engineering page");
        assertFalse(golden.expectations().isEmpty(), "something that is expected");
        if (golden.isFormula()) {
            Expectation only = golden.expectations().get(0);
            assertEquals(1, golden.expectations().size(), "one value of a formula");
            close(only, GoldenFormulas.evaluate(golden.text("formula"), golden.arguments()));
        } else {
            Assessment assessment = Engine.assess(golden.zone(), golden.settings());
            assertAll(golden.expectations().stream().map(expected -> () -> check(expected, assessment)));
        }
    }

    private static void check(Expectation expected, Assessment assessment) {
        String[] path = expected.result().split("/");
        switch (path[0]) {
            case "level" -> assertEquals(expected.value(), assessment.level().code());
            case "levelAtDesignFeed" -> assertEquals(expected.value(),
                    assessment.levelAtDesignFeed().orElseThrow().code());
            case "uncertainty" -> close(expected, result(assessment, path[1]).standardUncertainty());
            case "methods" -> close(expected,
                    assessment.methods().get(DragMethod.ofCode(path[1]).orElseThrow()).value());
            case "findings" -> finding(expected, path[2], finding(assessment.findings(), path[1]));
            case "findingsAtDesign" -> finding(expected, path[2], finding(assessment.findingsAtDesign(), path[1]));
            case "remedies" -> remedy(expected, path[2], assessment.remedies().stream()
                    .filter(remedy -> remedy.code().equals(path[1])).findFirst().orElseThrow());
            case "missing" -> assertTrue(assessment.missing().contains(expected.value()),
                    () -> expected.value() + " in " + assessment.missing());
            case "assumptions" -> assertTrue(assessment.assumptions().stream()
                    .anyMatch(assumption -> assumption.code().equals(expected.value())), expected.value());
            default -> close(expected, result(assessment, path[0]).value());
        }
    }

    private static void finding(Expectation expected, String key, Finding finding) {
        switch (key) {
            case "level" -> assertEquals(expected.value(), finding.level().code());
            case "observed" -> close(expected, finding.observed());
            case "near" -> close(expected, finding.near().orElseThrow());
            case "overloaded" -> close(expected, finding.overloaded().orElseThrow());
            case "probabilityNear" -> close(expected, finding.probabilityNear().orElseThrow());
            case "probabilityOverloaded" -> close(expected, finding.probabilityOverloaded().orElseThrow());
            default -> throw new IllegalArgumentException("no such part of a finding: " + key);
        }
    }

    private static void remedy(Expectation expected, String key, Remedy remedy) {
        switch (key) {
            case "change" -> close(expected, remedy.change().orElseThrow());
            case "meanDepthM" -> close(expected, remedy.meanDepth());
            case "skirtPowerW" -> close(expected, remedy.skirtPower());
            case "savedWhPerYear" -> close(expected, remedy.savedWh().orElseThrow());
            case "refusedBecause" -> assertEquals(expected.value(), remedy.refusedBecause().orElseThrow().code());
            default -> throw new IllegalArgumentException("no such part of a remedy: " + key);
        }
    }

    private static Estimate result(Assessment assessment, String key) {
        return assessment.get(Result.ofKey(key).orElseThrow(() -> new IllegalArgumentException("no result " + key)))
                .orElseThrow(() -> new AssertionError(key + " was not computed"));
    }

    private static Finding finding(List<Finding> findings, String code) {
        return findings.stream().filter(finding -> finding.code().equals(code)).findFirst()
                .orElseThrow(() -> new AssertionError(code + " was not evaluated"));
    }

    /** Tolerances are relative, but for an expected 0. */
    private static void close(Expectation expected, double actual) {
        double value = GoldenUnits.si(expected.value());
        assertTrue(expected.tolerance() > 0 && expected.tolerance() <= 0.35, "a tolerance");
        assertEquals(value, actual, expected.tolerance() * (value == 0 ? 1 : Math.abs(value)),
                () -> expected.result() + " " + expected.value());
    }

    private static List<Path> files() {
        try (Stream<Path> files = Files.list(Path.of(Objects.requireNonNull(
                GoldenFilesTest.class.getResource("golden")).toURI()))) {
            List<Path> cases = files.filter(file -> file.toString().endsWith(".json")).sorted().toList();
            assertFalse(cases.isEmpty(), "golden files");
            return cases;
        } catch (IOException | URISyntaxException e) {
            throw new AssertionError(e);
        }
    }
}
