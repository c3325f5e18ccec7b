package bedmark.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The exit codes of {@code assess}, each met by the surveys of the demo plant that are due it. */
class ExitCodesTest {
    private static final Path SAMPLES = Path.of("sample-surveys");
    private static final Path ROUND = SAMPLES.resolve("round-2026-03.json");

    @TempDir
    private Path temp;
    private Branch round;
    private List<String> levels;

    @BeforeEach
    void readTheLevels() throws IOException {
        round = JsonReader.read(Files.readAllBytes(ROUND)).root();
        List<Node> all = new ArrayList<>();
        for (String name : List.of("round-2025-09.json", "round-2026-03.json", "round-under-way.json")) {
            all.addAll(JsonReader.read(Files.readAllBytes(SAMPLES.resolve(name))).root().series("surveys"));
        }
        round = round.with("surveys", new Node.Series(all));
        Path file = Files.write(temp.resolve("all.json"), JsonWriter.indented(round));
        levels = json(file).branches("surveys").stream()
                .map(one -> one.branch("assessment").orElseThrow().text("level").orElseThrow()).toList();
    }

    private static Branch json(Path file) {
        String out = Terminal.run("assess", file.toString(), "--json").out();
        return JsonReader.read(out.getBytes(StandardCharsets.UTF_8)).root();
    }

    /** The round with the surveys of some levels alone. */
    private Path only(String... wanted) throws IOException {
        List<Branch> surveys = round.branches("surveys");
        assertTrue(levels.containsAll(List.of(wanted)), levels::toString);
        List<Node> kept = IntStream.range(0, surveys.size()).filter(i -> List.of(wanted).contains(levels.get(i)))
                .mapToObj(i -> (Node) surveys.get(i)).toList();
        return Files.write(temp.resolve("some.json"), JsonWriter.indented(round.with("surveys",
                new Node.Series(kept))));
    }

    @ParameterizedTest
    @CsvSource({"within, 0", "within near, 0", "overloaded, 1", "overloaded undecided incomplete within, 1",
        "undecided within, 4", "incomplete near, 4", "undecided incomplete, 4"})
    void worstSurveySetsTheCode(String wanted, int code) throws IOException {
        Path file = only(wanted.split(" "));
        for (String way : List.of("--json", "--csv", "--units=us")) {
            assertEquals(code, Terminal.run("assess", file.toString(), way).code(), way);
        }
    }

    @Test
    void badUseAndUnreadableInputHaveTheirOwn() {
        assertEquals(2, Terminal.run("assess", ROUND.toString(), "--units", "cubits").code());
        assertEquals(3, Terminal.run("assess", temp.resolve("gone.json").toString()).code());
    }
}
