package bedmark.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.command.Terminal.Result;
import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Whole bundles through {@code assess --json} against values worked out elsewhere. A case is a file: {@code title},
 * {@code mark} and {@code source}, a {@code bundle} of one survey, and what to {@code expect}: the pointer of a number
 * in the assessment, its value (in SI, or with a unit of its own) and a relative tolerance.
 */
class GoldenBundlesTest {
    private static final Path FOLDER = Path.of("src/test/resources/bedmark/command/golden");

    @TempDir
    private Path temp;

    static List<Path> cases() throws IOException {
        try (Stream<Path> files = Files.list(FOLDER)) {
            return files.filter(file -> file.toString().endsWith(".json")).sorted().toList();
        }
    }

    private static String said(Branch golden, String key) {
        String text = golden.text(key).orElse("").strip();
        assertFalse(text.isEmpty(), () -> "a golden file names its " + key);
        return text;
    }

    private static double expected(Branch row) {
        return row.has("unit") ? row.without("key").without("tolerance").asQuantity().si()
                : row.number("value").orElseThrow().doubleValue();
    }

    @Test
    void bothUnitSystemsHaveCases() throws IOException {
        List<String> texts = cases().stream().map(GoldenBundlesTest::text).toList();
        assertTrue(texts.stream().anyMatch(text -> text.contains("\"[ft_i]/min\"")));
        assertTrue(texts.stream().anyMatch(text -> text.contains("\"m/s\"")));
    }

    private static String text(Path file) {
        try {
            return Files.readString(file);
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
    }

    @ParameterizedTest
    @MethodSource("cases")
    void assessGivesTheWorkedValues(Path file) throws IOException {
        Branch golden = JsonReader.read(Files.readAllBytes(file)).root();
        said(golden, "title");
        said(golden, "mark");
        said(golden, "source");
        List<Branch> expect = golden.branches("expect");
        assertFalse(expect.isEmpty(), "a golden file expects something");
        Path bundle = Files.write(temp.resolve("bundle.json"),
                JsonWriter.indented(golden.branch("bundle").orElseThrow()));
        Result result = Terminal.run("assess", bundle.toString(), "--json");
        Branch assessment = JsonReader.read(result.out().getBytes(StandardCharsets.UTF_8)).root()
                .branches("surveys").get(0).branch("assessment").orElseThrow();
        for (Branch row : expect) {
            String key = said(row, "key");
            double tolerance = row.number("tolerance").orElseThrow().doubleValue();
            assertTrue(tolerance > 0 && tolerance <= 0.01, key);
            Node met = assessment.at(Pointer.parse(key)).orElseThrow(() -> new AssertionError(key + " is absent"));
            double value = expected(row);
            assertEquals(value, ((Node.Decimal) met).value().doubleValue(), tolerance * Math.abs(value), key);
        }
    }
}
