package bedmark.bench;

import bedmark.index.LongStore;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.index.Walk;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.UUID;

/**
 * Starts a program on the store of ten years and on an empty one, turn by turn, each until the first screen has what it
 * asks for; and makes the index anew from a tenth of that journal and from all of it.
 */
final class StartSuite implements Suite {
    private static final long ENTRIES = Long.getLong("bench.entries", 500_000);
    private static final int PHOTOS = 20_000;
    private static final int STARTS = Integer.getInteger("bench.starts", 15);

    @Override
    public String name() {
        return "start";
    }

    /** What the started program does. */
    public static void main(String[] arguments) {
        long start = System.nanoTime();
        try (Store store = Store.open(Path.of(arguments[0]), StoreOptions.of("tablet"))) {
            List<Walk> walks = store.walks();
            boolean register = store.register().isPresent();
            System.out.println(store.counts() + " " + walks.size() + " " + register + " opened in "
                    + (System.nanoTime() - start) / 1_000 + " µs");
        }
    }

    @Override
    public List<Row> run() throws IOException, InterruptedException {
        try (BenchFolder folder = BenchFolder.make("start")) {
            Path many = folder.path().resolve("many");
            LongStore.journal(folder.path().resolve("some"), ENTRIES / 10);
            LongStore.journal(many, ENTRIES);
            double some = rebuilt(folder.path().resolve("some"));
            double all = rebuilt(many);
            Path none = folder.path().resolve("none");
            Store.open(none, StoreOptions.of("tablet")).close();
            photos(many);
            List<Long> longStarts = new ArrayList<>();
            List<Long> emptyStarts = new ArrayList<>();
            for (int i = 0; i < STARTS; i++) {
                longStarts.add(started(many));
                emptyStarts.add(started(none));
            }
            return List.of(row(median(longStarts), median(emptyStarts)),
                    new Row(String.format(Locale.ROOT, "index made anew from %d entries, time", ENTRIES), all, "s", 300,
                            true),
                    new Row(String.format(Locale.ROOT, "the same over that of a tenth of them (%.1f s): exponent",
                            some), Math.log10(all / some), "", 1.1, true));
        }
    }

    private static Row row(long many, long none) {
        return new Row(String.format(Locale.ROOT, "start on %d entries and %d photos over start on none, median (%d "
                + "over %d ms)", ENTRIES, PHOTOS, many / 1_000_000, none / 1_000_000), (double) many / none, "", 1.3,
                true);
    }

    private static double rebuilt(Path store) {
        long start = System.nanoTime();
        Store.rebuild(store, StoreOptions.of("tablet"));
        return (System.nanoTime() - start) / 1e9;
    }

    private static void photos(Path store) throws IOException {
        for (int i = 0; i < PHOTOS; i++) {
            Files.write(store.resolve("photos").resolve(new UUID(7, i).toString().replace("-", "").repeat(2) + ".jpg"),
                    new byte[] {(byte) 0xFF, (byte) 0xD8, (byte) 0xFF});
        }
    }

    private static long started(Path store) throws IOException, InterruptedException {
        long start = System.nanoTime();
        Process program = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-XX:+UseSerialGC", "-cp", System.getProperty("java.class.path"), StartSuite.class.getName(),
                store.toString()).redirectError(ProcessBuilder.Redirect.INHERIT).start();
        String said = new String(program.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        if (program.waitFor() != 0 || !said.contains("opened")) {
            throw new IOException("the program did not start: " + said);
        }
        return System.nanoTime() - start;
    }

    private static long median(List<Long> times) {
        return times.stream().sorted().toList().get(times.size() / 2);
    }
}
