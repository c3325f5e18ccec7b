package bedmark.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.journal.Progress;
import bedmark.office.OfficeStore;
import bedmark.office.Offices;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class OfficeReportCommandTest {
    @TempDir
    static Path folder;

    @BeforeAll
    static void receive() {
        Path tablet = folder.resolve("tablet");
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), tablet)) {
            store.receive(List.of(Offices.pack(Offices.sample("round-2026-03"), tablet, folder.resolve("round.zip"))),
                    "Ida Marsh", Progress.NONE);
        }
    }

    private static Terminal.Result report(Path out, String... more) {
        return Terminal.run(Stream.concat(Stream.of("office", "report", "--store", folder.resolve("office").toString(),
                "--out", out.toString()), Arrays.stream(more)).toArray(String[]::new));
    }

    private static String start(Path file) throws IOException {
        return new String(Files.readAllBytes(file), 0, 4, StandardCharsets.ISO_8859_1);
    }

    @Test
    void theEndingOfTheFileSaysWhatIsWritten() throws IOException {
        for (String[] kind : new String[][] {{"report.pdf", "%PDF"}, {"report.XLSX", "PK\u0003\u0004"},
            {"report.csv", "rank"}}) {
            Path out = folder.resolve(kind[0]);
            Terminal.Result result = report(out, "--language", "es", "--units", "us", "--paper", "letter");
            assertEquals(0, result.code(), result.err());
            assertTrue(result.out().contains("24"), result.out());
            assertEquals(kind[1], start(out));
        }
        try (Stream<Path> files = Files.list(folder)) {
            assertFalse(files.anyMatch(file -> file.toString().endsWith(".part")));
        }
    }

    @Test
    void badUseIsToldInOneLine() {
        for (String[] bad : new String[][] {{"report.doc"}, {"r.pdf", "--paper", "a0"}, {"r.pdf", "--units", "imperial"},
            {"r.pdf", "--language", "xx"}, {"r.pdf", "--stale-after", "0"}}) {
            Terminal.Result result = report(folder.resolve(bad[0]), Arrays.copyOfRange(bad, 1, bad.length));
            assertEquals(2, result.code(), result.err());
            assertEquals(1, result.err().lines().count(), result.err());
        }
    }

    @Test
    void aPlaceThatCannotBeWrittenIsNamed() {
        Terminal.Result result = report(folder.resolve("gone").resolve("report.pdf"));
        assertEquals(3, result.code());
        assertEquals(1, result.err().lines().count(), result.err());
        assertTrue(result.err().contains("gone"), result.err());
    }

    @Test
    void oneAreaAloneIsReported() throws IOException {
        Path out = folder.resolve("area.csv");
        assertEquals(0, report(out, "--area", "Biomass yard").code());
        List<String> rows = Files.readAllLines(out);
        assertTrue(rows.size() > 2 && rows.size() < 10, rows::toString);
        assertTrue(rows.stream().skip(1).allMatch(row -> row.contains("Biomass yard")));
    }
}
