package bedmark.bench;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The transfer point in a store of 5,000 surveys: how long it takes to open, and what a key costs the screen's thread,
 * in a process of its own with a headless glass and the launcher's options.
 */
final class ScreenSuite implements Suite {
    private static final int SURVEYS = Integer.getInteger("bench.screen.surveys", 5_000);
    private static final int OPENS = Integer.getInteger("bench.screen.opens", 200);
    private static final int KEYS = Integer.getInteger("bench.screen.keys", 2_000);

    @Override
    public String name() {
        return "screen";
    }

    @Override
    public List<Row> run() throws IOException, InterruptedException {
        try (BenchFolder folder = BenchFolder.make("screen")) {
            Path store = folder.path().resolve("store");
            BenchStore.fill(store, SURVEYS);
            String said = said(store);
            double[] open = numbers(said, "open");
            double[] openWork = numbers(said, "open-work");
            double[] keyWork = numbers(said, "key-work");
            double[] key = numbers(said, "key");
            double[] label = numbers(said, "label");
            double[] missed = numbers(said, "missed");
            return List.of(
                    new Row(String.format("transfer point opens in a store of %d surveys, p95 (median %.0f ms; "
                            + "median of the thread's own work %.0f ms)", SURVEYS, open[0], openWork[0]), open[1], "ms", 150,
                            true),
                    new Row(String.format("work on the screen's thread for a key, p99 of %d (median %.2f ms; p99 of "
                            + "the thread's own work %.2f ms; a bare label %.2f ms)", KEYS, key[0], keyWork[2],
                            label[0]), key[2], "ms", 8, true),
                    new Row(String.format("frames missed behind a key, over the %.1f %% behind a bare label",
                            missed[1]), missed[0] - missed[1], "%", 1, true),
                    new Row("form of 200 fields opens, over one of 20 that shows as many", numbers(said, "form")[0],
                            "×", 2, true));
        }
    }

    private static String said(Path store) throws IOException, InterruptedException {
        List<String> command = new ArrayList<>();
        command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
        command.addAll(StartedProgram.launcherOptions());
        command.addAll(List.of("-Dglass.platform=Monocle", "-Dmonocle.platform=Headless", "-Dprism.order=sw",
                "-Dheadless.geometry=1280x800-32", "-cp", System.getProperty("java.class.path"),
                ScreenProbe.class.getName(), store.toString(), Integer.toString(OPENS), Integer.toString(KEYS)));
        Process process = new ProcessBuilder(command).redirectErrorStream(true).start();
        String said = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        if (process.waitFor() != 0) {
            throw new IOException(said);
        }
        return said;
    }

    private static double[] numbers(String said, String what) throws IOException {
        String line = said.lines().filter(each -> each.startsWith(what + " ")).findFirst()
                .orElseThrow(() -> new IOException(said));
        return Arrays.stream(line.split(" ")).skip(1).mapToDouble(Double::parseDouble).toArray();
    }
}
