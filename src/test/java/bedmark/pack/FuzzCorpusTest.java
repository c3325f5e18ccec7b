package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.Consumer;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.Timeout;

/**
 * What fuzzing starts from and what it found before, run through the same targets; {@code mvn -B -Pfuzz verify} looks
 * for more. A file that once crashed a target or hung in it stays here.
 */
class FuzzCorpusTest {
    private static final Path CORPUS = Path.of("src/test/resources/bedmark/fuzz");
    private static final Map<String, Consumer<byte[]>> TARGETS = new TreeMap<>(Map.of(
            "pack", PackFuzz::fuzzerTestOneInput, "bag", BagFuzz::fuzzerTestOneInput,
            "bundle", BundleFuzz::fuzzerTestOneInput));

    @TestFactory
    @Timeout(120)
    Stream<DynamicTest> noInputOfTheCorpusDoesAnythingButBeReadOrRefused() {
        return TARGETS.entrySet().stream().map(target -> DynamicTest.dynamicTest(target.getKey(), () -> {
            List<Path> inputs = inputs(CORPUS.resolve(target.getKey()));
            assertTrue(inputs.size() >= 3, () -> "the corpus is there: " + inputs);
            for (Path input : inputs) {
                byte[] bytes = Files.readAllBytes(input);
                try {
                    target.getValue().accept(bytes);
                } catch (RuntimeException | StackOverflowError | OutOfMemoryError e) {
                    throw new AssertionError(input.toString(), e);
                }
            }
        }));
    }

    private static List<Path> inputs(Path folder) throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.sorted().toList();
        }
    }
}
