package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/** What other programs read: every key that the data page promises, of its kind, by the published schema. */
class AssessmentWriterTest {
    private static final SchemaCheck SCHEMA = new SchemaCheck("assessment.schema.json");
    private static final List<String> NUMBERS = List.of("meanSquareDepthM2", "materialDragN", "sealDragN",
            "skirtDragN", "loadingForceN", "skirtPowerW", "drivePowerW", "driveShare", "impliedThroughputKgPerS",
            "fill", "bedSpeedRatio", "designDepthM", "referenceDepthM", "energyWhPerYear");
    private static final List<String> WORDS = List.of("method", "energyIs", "level", "levelAtDesignFeed");
    private static final List<String> LISTS = List.of("methods", "findings", "remedies", "assumptions", "missing");
    private static final List<Branch> LISTED = new ArrayList<>();
    private static final List<Branch> ALL = new ArrayList<>();

    @BeforeAll
    static void assessTheDemoPlant() throws IOException {
        List<Path> files;
        try (Stream<Path> folder = Files.list(Path.of("sample-surveys"))) {
            files = folder.filter(file -> file.toString().endsWith(".json")).sorted().toList();
        }
        for (Path file : files) {
            Bundle bundle = BundleReader.read(Files.readAllBytes(file));
            Assessor.Judged judged = new Assessor(bundle.register()).judge(bundle.surveys());
            Branch list = AssessmentWriter.list(judged.surveys(), judged.conveyors(), "A notice.");
            LISTED.add(JsonReader.read(JsonWriter.indented(list)).root());
        }
        LISTED.forEach(list -> list.branches("surveys")
                .forEach(one -> ALL.add(one.branch("assessment").orElseThrow())));
    }

    @Test
    void everyListFollowsItsSchema() {
        assertFalse(LISTED.isEmpty());
        for (Branch list : LISTED) {
            assertEquals(List.of(), SCHEMA.check(JsonReader.read(JsonWriter.compact(list))));
        }
    }

    @Test
    void everyPromisedKeyIsWrittenAndOfItsKind() {
        Set<String> met = new HashSet<>();
        for (Branch assessment : ALL) {
            assessment.members().forEach((key, value) -> {
                met.add(key);
                assertTrue(!NUMBERS.contains(key) || value instanceof Node.Decimal, key);
                assertTrue(!WORDS.contains(key) || value instanceof Node.Text, key);
                assertTrue(!LISTS.contains(key) || value instanceof Node.Series, key);
            });
        }
        Stream.of(NUMBERS, WORDS, LISTS, List.of("uncertainty")).flatMap(List::stream)
                .forEach(key -> assertTrue(met.contains(key), key));
    }

    @Test
    void everyResultHasItsUncertainty() {
        for (Branch assessment : ALL) {
            Branch uncertainty = assessment.branch("uncertainty").orElseThrow();
            NUMBERS.stream().filter(assessment::has).forEach(key ->
                    assertTrue(uncertainty.number(key).isPresent(), key));
        }
    }

    @Test
    void findingsAndRemediesHaveThePromisedKeys() {
        Set<String> findings = new HashSet<>();
        Set<String> remedies = new HashSet<>();
        for (Branch assessment : ALL) {
            List<String> codes = new ArrayList<>();
            for (Branch finding : assessment.branches("findings")) {
                findings.addAll(finding.members().keySet());
                codes.add(finding.text("code").orElseThrow());
            }
            assertEquals(codes.size(), Set.copyOf(codes).size(), "every rule once");
            assessment.branches("remedies").forEach(remedy -> remedies.addAll(remedy.members().keySet()));
            assessment.branches("methods").forEach(method ->
                    assertTrue(method.text("method").isPresent() && method.number("materialDragN").isPresent()));
        }
        assertTrue(findings.containsAll(List.of("code", "level", "observed", "unit", "near", "overloaded",
                "probabilityNear", "probabilityOverloaded", "action", "source", "assumption")), findings::toString);
        assertTrue(remedies.containsAll(List.of("code", "change", "skirtPowerW", "savedWhPerYear", "refusedBecause")),
                remedies::toString);
    }

    @Test
    void whatIsMissingIsNamedByAPlaceAndNeverAZero() {
        for (Branch assessment : ALL) {
            for (Node missing : assessment.series("missing")) {
                assertFalse(Pointer.parse(((Node.Text) missing).value()).isRoot());
            }
            assertTrue(assessment.has("sealDragN") || assessment.series("missing").stream()
                    .anyMatch(one -> ((Node.Text) one).value().startsWith("/readings/")), assessment::toString);
        }
    }
}
