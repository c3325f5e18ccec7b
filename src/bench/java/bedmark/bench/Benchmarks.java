package bedmark.bench;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** Runs the suites and writes their figures beside their budgets. */
public final class Benchmarks {
    private static final List<Suite> SUITES =
            List.of(
                    new AssessmentSuite(),
                    new ParallelSuite(),
                    new GrowthSuite(),
                    new ScreenSuite(),
                    new SaveSuite(),
                    new ReportSuite(),
                    new StartSuite(),
                    new ExportSuite(),
                    new WindowSuite(),
                    new OfficeSuite(),
                    new StoreGrowthSuite(),
                    new PlantGrowthSuite());

    private Benchmarks() {
    }

    /** @param arguments the file to write, and a regular expression for the names of the suites to run */
    public static void main(String[] arguments) throws Exception {
        Path file = Path.of(arguments[0]);
        List<String> lines = new ArrayList<>(List.of("# Benchmarks", "",
                "Java " + System.getProperty("java.version") + ", " + Runtime.getRuntime().availableProcessors()
                        + " processors, heap up to " + Runtime.getRuntime().maxMemory() / (1 << 20) + " MB.", "",
                "| what | measured | budget | |", "|---|---|---|---|"));
        boolean missed = false;
        Files.createDirectories(file.getParent());
        for (Suite suite : SUITES) {
            if (suite.name().matches(arguments[1])) {
                for (Row row : suite.run()) {
                    lines.add(row.text());
                    missed |= !row.passes();
                }
                // After each suite: what was measured for an hour outlasts a failure of the next one.
                Files.write(file, lines);
            }
        }
        lines.forEach(System.out::println);
        if (missed) {
            System.out.println("At least one budget was missed.");
        }
    }
}
