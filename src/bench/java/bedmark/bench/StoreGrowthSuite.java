package bedmark.bench;

import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.index.Store;
import bedmark.index.SurveyQuery;
import bedmark.screen.BedmarkApp;
import bedmark.survey.Act;
import bedmark.survey.QueueState;
import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.time.Clock;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Random;
import java.util.UUID;
import java.util.stream.Stream;

/**
 * How a tablet's store grows with the surveys, entries and photos in it, in three steps of ten times as many, up to
 * {@code -Dbench.growth.surveys} and {@code -Dbench.growth.photos}; each step against the one before.
 */
final class StoreGrowthSuite implements Suite {
    private static final int SURVEYS = Integer.getInteger("bench.growth.surveys", 5_000);
    private static final int PHOTOS = Integer.getInteger("bench.growth.photos", 500);
    private static final int LISTS = 20;
    /** What the register of the sample plant takes, once (kB). */
    private static final double REGISTER = 250;

    /** What one size of store cost. */
    private record Step(int surveys, double filled, double opened, double listed, double history, double heap,
                        double journal, double index) {
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
            rows.add(new Row(of + "journal for each survey", step.journal() / step.surveys(), "kB",
                    5 + REGISTER / step.surveys(), true));
            rows.add(new Row(of + "index for each survey", step.index() / step.surveys(), "kB",
                    40 + REGISTER / step.surveys(), true));
            before = step;
        }
        for (int count = SURVEYS / 100; count <= SURVEYS; count *= 10) {
            entries(rows, count);
        }
        for (int count = PHOTOS / 100; count <= PHOTOS; count *= 10) {
            photos(rows, count);
        }
        return rows;
    }

    /** One survey that somebody answers again and again. */
    private static void entries(List<Row> rows, int count) throws IOException {
        String of = String.format(Locale.ROOT, "one survey of %,d entries: ", count);
        try (BenchFolder folder = BenchFolder.make("entry-growth")) {
            BenchStore.fill(folder.path(), 1);
            UUID open;
            try (Store store = Store.open(folder.path(), BedmarkApp.options(Clock.systemUTC()))) {
                open = store.surveys(SurveyQuery.ALL.in(QueueState.OPEN)).get(0).id();
                long start = System.nanoTime();
                for (int i = 0; i < count; i++) {
                    store.append("A. Vale", new Act.AnswerSet(open, Pointer.of("notes"),
                            Optional.of(Node.text("said " + i))));
                }
                rows.add(new Row(of + "saved, each", (System.nanoTime() - start) / 1e6 / count, "ms", 20, true));
            }
            long start = System.nanoTime();
            try (Store store = Store.open(folder.path(), BedmarkApp.options(Clock.systemUTC()))) {
                if (!store.history(open).orElseThrow().survey().document().text("notes")
                        .equals(Optional.of("said " + (count - 1)))) {
                    throw new IllegalStateException("not the last answer");
                }
                rows.add(new Row(of + "store opened and the survey folded", (System.nanoTime() - start) / 1e6, "ms",
                        1000, true));
            }
        }
    }

    /** Photos of one survey, each with bytes of its own. */
    private static void photos(List<Row> rows, int count) throws IOException {
        String of = String.format(Locale.ROOT, "%,d photos of 300 kB: ", count);
        byte[] sample = Files.readAllBytes(Path.of("sample-surveys/photos/tp-03-spillage.jpg"));
        try (BenchFolder folder = BenchFolder.make("photo-growth")) {
            Path home = folder.path().resolve("store");
            BenchStore.fill(home, 1);
            try (Store store = Store.open(home, BedmarkApp.options(Clock.systemUTC()))) {
                UUID open = store.surveys(SurveyQuery.ALL.in(QueueState.OPEN)).get(0).id();
                Random random = new Random(5);
                double taken = 0;
                for (int i = 0; i < count; i++) {
                    byte[] more = new byte[300_000];
                    random.nextBytes(more);
                    Path photo = folder.path().resolve("p.jpg");
                    Files.write(photo, sample);
                    Files.write(photo, more, StandardOpenOption.APPEND);
                    long start = System.nanoTime();
                    store.attachPhoto(photo, open, "A. Vale", OffsetDateTime.now(Clock.systemUTC()), "");
                    taken += (System.nanoTime() - start) / 1e6;
                }
                rows.add(new Row(of + "attached, each", taken / count, "ms", 200, true));
                rows.add(new Row(of + "heap", heap(), "MB", 120, true));
            }
            long start = System.nanoTime();
            try (Store store = Store.open(home, BedmarkApp.options(Clock.systemUTC()))) {
                if (!store.opening().found().isEmpty()) {
                    throw new IllegalStateException("the store is not sound");
                }
                rows.add(new Row(of + "store opened", (System.nanoTime() - start) / 1e6, "ms", 1000, true));
            }
            rows.add(new Row(of + "disk for each", kilobytes(home.resolve("photos")) / count, "kB", 400, true));
        }
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
            return new Step(surveys, filled, opened, listed, history, heap(), kilobytes(folder.resolve("journal")),
                    kilobytes(folder.resolve("index")));
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
