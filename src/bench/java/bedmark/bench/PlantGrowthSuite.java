package bedmark.bench;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import bedmark.office.OfficeExport;
import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import bedmark.office.RankedZone;
import bedmark.office.Received;
import bedmark.pack.DeviceKey;
import bedmark.pack.PackWriter;
import bedmark.pack.PhotoSource;
import bedmark.survey.Bundle;
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
 * How an office grows with its plants, each with tablets of its own that send a round of all its zones: what it takes
 * to receive, to rank, to export for analysis, and on disk. The steps are powers of ten up to
 * {@code -Dbench.growth.plants}, with {@code -Dbench.growth.tablets} at each plant.
 */
final class PlantGrowthSuite implements Suite {
    private static final int PLANTS = Integer.getInteger("bench.growth.plants", 100);
    private static final int TABLETS = Integer.getInteger("bench.growth.tablets", 1);

    /** What one size of office cost. */
    private record Step(int plants, int surveys, double received, double ranked, double exported, double heap,
                        double disk) {
    }

    @Override
    public String name() {
        return "plant-growth";
    }

    @Override
    public List<Row> run() throws Exception {
        // The first office of a process pays for its code; it does not count.
        try (BenchFolder folder = BenchFolder.make("plant-growth")) {
            measure(folder.path(), 1);
        }
        List<Step> steps = new ArrayList<>();
        for (int plants = Math.max(1, PLANTS / 100); plants <= PLANTS; plants *= 10) {
            try (BenchFolder folder = BenchFolder.make("plant-growth")) {
                steps.add(measure(folder.path(), plants));
            }
        }
        List<Row> rows = new ArrayList<>();
        Step before = steps.get(0);
        for (Step step : steps) {
            double more = (double) step.plants() / before.plants();
            String of = String.format(Locale.ROOT, "office of %d plants, %d tablets, %,d surveys: ", step.plants(),
                    step.plants() * TABLETS, step.surveys());
            rows.add(new Row(of + "received, each", step.received() * 1e3 / step.surveys(), "ms",
                    step == before ? 100 : before.received() * 1e3 / before.surveys() * 1.5, true));
            rows.add(new Row(of + "ranked", step.ranked() * 1e3, "ms", Math.max(200, before.ranked() * 1e3 * more),
                    true));
            rows.add(new Row(of + "exported for analysis, each", step.exported() * 1e3 / step.surveys(), "ms", 20,
                    true));
            rows.add(new Row(of + "heap when open", step.heap(), "MB", 256, true));
            rows.add(new Row(of + "disk for each survey", step.disk() / step.surveys(), "kB", 60, true));
            before = step;
        }
        return rows;
    }

    private static Step measure(Path folder, int plants) throws IOException {
        Branch sample = BundleReader.read(Files.readAllBytes(Path.of("sample-surveys/round-2026-03.json"))).document();
        Path office = folder.resolve("office");
        int surveys = 0;
        double received = 0;
        try (OfficeStore store = OfficeStore.open(office, OfficeOptions.of(Clock.systemUTC()))) {
            for (int tablet = 0; tablet < plants * TABLETS; tablet++) {
                DeviceKey key = DeviceKey.of(Files.createDirectories(folder.resolve("tablets/" + tablet)));
                Path pack = pack(sample, tablet, key, folder);
                store.trust(key.fingerprint().text(), "", "bench");
                long start = System.nanoTime();
                Received got = store.receive(List.of(pack), "bench", Progress.NONE).get(0);
                received += (System.nanoTime() - start) / 1e9;
                if (!(got instanceof Received.Taken taken)) {
                    throw new IllegalStateException("not received");
                }
                surveys += taken.fresh();
                Files.delete(pack);
            }
        }
        try (OfficeStore store = OfficeStore.open(office, OfficeOptions.of(Clock.systemUTC()))) {
            int[] zones = new int[1];
            double ranked = Timing.best(6, () -> {
                List<RankedZone> all = store.rank();
                zones[0] = all.size();
                return all.size();
            }, 1);
            if (zones[0] != plants * sample.branch("plant").orElseThrow().branches("transfers").size()) {
                throw new IllegalStateException("ranked " + zones[0]);
            }
            long start = System.nanoTime();
            long written = new OfficeExport(store).write(folder.resolve("analysis"), Progress.NONE);
            double exported = (System.nanoTime() - start) / 1e9;
            if (written != surveys) {
                throw new IllegalStateException("exported " + written);
            }
            return new Step(plants, surveys, received, ranked, exported, heap(), kilobytes(office));
        }
    }

    /** A round that one tablet walked at its plant. */
    private static Path pack(Branch sample, int tablet, DeviceKey key, Path folder) throws IOException {
        int plant = tablet / TABLETS;
        List<Node> surveys = new ArrayList<>();
        for (Branch survey : sample.branches("surveys")) {
            if (!survey.has("supersedes")) {
                surveys.add(survey.without("photos").with("id", new UUID(tablet, surveys.size()).toString())
                        .with("round", "round-" + tablet));
            }
        }
        Branch named = sample.with("id", new UUID(9, tablet).toString())
                .with("plant", sample.branch("plant").orElseThrow().with("id", "plant-" + plant)
                        .with("name", "Plant " + plant))
                .with("surveys", new Node.Series(surveys));
        Path out = folder.resolve("pack-" + tablet + ".zip");
        PackWriter.write(new Bundle(named), PhotoSource.folder(folder), key, out, Progress.NONE);
        return out;
    }

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
