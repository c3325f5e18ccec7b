package bedmark.bench;

import bedmark.index.Store;
import bedmark.index.SurveyQuery;
import bedmark.screen.BedmarkApp;
import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.UUID;
import java.util.stream.Stream;

/**
 * How a tablet's store grows with the surveys in it, and each step against the one before: a tenth part, the whole, ten
 * times as many. The steps are powers of ten below {@code -Dbench.growth.surveys}.
 */
final class StoreGrowthSuite implements Suite {
    private static final int SURVEYS = Integer.getInteger("bench.growth.surveys", 5_000);
    private static final int LISTS = 20;

    /** What one size of store cost. */
    private record Step(int surveys, double filled, double opened, double listed, double history, double heap,
                        double disk) {
    }

    @Override
    public String name() {
        return "store-growth";
    }

    @Override
    public List<Row> run() throws Exception {
        List<Step> steps = new ArrayList<>();
        for (int surveys = SURVEYS / 100; surveys <= SURVEYS; surveys *= 10) {
            try (BenchFolder folder = BenchFolder.make("store-growth")) {
                steps.add(measure(folder.path(), surveys));
            }
        }
        List<Row> rows = new ArrayList<>();
        Step before = steps.get(0);
        for (Step step : steps) {
            double more = (double) step.surveys() / before.surveys();
            String of = String.format(Locale.ROOT, "tablet store of %,d surveys: ", step.surveys());
            rows.add(new Row(of + "filled", step.filled(), "s", Math.max(1, before.filled()) * more * 1.5, true));
            rows.add(new Row(of + "opened", step.opened(), "ms", Math.max(500, before.opened() * more), true));
            rows.add(new Row(of + "a round listed", step.listed(), "ms", Math.max(30, before.listed() * more), true));
            rows.add(new Row(of + "one survey's history", step.history(), "ms", 10, true));
            rows.add(new Row(of + "heap when open", step.heap(), "MB", 120, true));
            rows.add(new Row(of + "disk for each survey", step.disk() / step.surveys(), "kB", 40, true));
            before = step;
        }
        return rows;
    }

    private static Step measure(Path folder, int surveys) throws IOException {
        long start = System.nanoTime();
        BenchStore.fill(folder, surveys);
        double filled = (System.nanoTime() - start) / 1e9;
        start = System.nanoTime();
        try (Store store = Store.open(folder, BedmarkApp.options(Clock.systemUTC()))) {
            double opened = (System.nanoTime() - start) / 1e6;
            UUID some = store.surveys(SurveyQuery.ALL.newest(1)).get(0).id();
            double listed = Timing.best(LISTS, () -> store.surveys(SurveyQuery.ALL.ofRound("2026-09").current()).size(), 1)
                    * 1e3;
            double history = Timing.best(LISTS, () -> store.history(some).orElseThrow().survey().revision(), 1) * 1e3;
            return new Step(surveys, filled, opened, listed, history, heap(), kilobytes(folder));
        }
    }

    /** What stays after the garbage is gone (MB). */
    private static double heap() {
        System.gc();
        Runtime runtime = Runtime.getRuntime();
        return (runtime.totalMemory() - runtime.freeMemory()) / (double) (1 << 20);
    }

    private static double kilobytes(Path folder) throws IOException {
        try (Stream<Path> files = Files.walk(folder)) {
            return files.map(Path::toFile).filter(File::isFile).mapToLong(File::length).sum() / 1024.0;
        }
    }
}
