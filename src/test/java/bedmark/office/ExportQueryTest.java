package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import bedmark.journal.Progress;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The export read by an engine of somebody else's. */
@Tag("outside-tool")
class ExportQueryTest {
    @TempDir
    private Path folder;

    @Test
    void sqliteAddsTheEnergyUpAsTheOfficeDoes() throws Exception {
        assumeTrue(runs("sqlite3", "--version"), "needs sqlite3");
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            store.receive(Offices.pack(Offices.sample("round-2026-03"), folder.resolve("tablet"),
                    folder.resolve("a.zip")), "Ida Marsh");
            new OfficeExport(store).write(folder.resolve("export"), Progress.NONE);
            Process query = new ProcessBuilder("sqlite3", ":memory:", "-cmd", ".mode csv", "-cmd",
                    ".import table/plant=ostermere/month=2026-03/surveys.csv surveys",
                    "select conveyor, count(*), round(sum(energyWhPerYear) / 1e6, 1) as mwh from surveys "
                            + "where counts = 'true' and level <> '' group by conveyor order by mwh desc, conveyor")
                    .directory(folder.resolve("export").toFile()).redirectErrorStream(true).start();
            List<String> lines = new String(query.getInputStream().readAllBytes(), StandardCharsets.UTF_8).lines()
                    .toList();
            List<PlantEnergy.Bar> bars = PlantEnergy.byConveyor(store.rank()).stream().filter(bar -> bar.zones() > 0)
                    .toList();
            assertEquals(bars.size(), lines.size(), lines::toString);
            assertEquals(String.format(Locale.ROOT, "%s,%d,%.1f", bars.get(0).name(), bars.get(0).zones(),
                    bars.get(0).wh() / 1e6), lines.get(0));
        }
    }

    private static boolean runs(String... command) throws IOException, InterruptedException {
        try {
            Process process = new ProcessBuilder(command).redirectOutput(ProcessBuilder.Redirect.DISCARD)
                    .redirectError(ProcessBuilder.Redirect.DISCARD).start();
            return process.waitFor(10, TimeUnit.SECONDS) && process.exitValue() == 0;
        } catch (IOException e) {
            return false;
        }
    }
}
