package bedmark.bench;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;

/**
 * From the start of the virtual machine to a round that can be worked on, in a store of 5,000 surveys, against a bare
 * window with the same flags: each a process of its own with an archive of its own classes, turn by turn. Three
 * times: a walk that goes on, the same after the battery died in its midst, and the start of a walk.
 */
final class WindowSuite implements Suite {
    private static final int SURVEYS = Integer.getInteger("bench.window.surveys", 5_000);
    private static final int TURNS = Integer.getInteger("bench.window.turns", 7);

    @Override
    public String name() {
        return "window";
    }

    @Override
    public List<Row> run() throws IOException, InterruptedException {
        try (BenchFolder folder = BenchFolder.make("start"); BenchDisplay display = BenchDisplay.find()) {
            Path store = folder.path().resolve(".bedmark");
            BenchStore.fill(store, SURVEYS);
            StartedProgram bare = StartedProgram.make(folder.path(), display, "bare", "bare");
            // The first time the card is read and the walk begun; from then on it goes on.
            StartedProgram round = StartedProgram.make(folder.path(), display, "app", "search");
            StartedProgram cut = StartedProgram.make(folder.path(), display, "app", "search", "cut");
            endWalk(store);
            StartedProgram start = StartedProgram.make(folder.path(), display, "app", "start-walk");
            Figures bares = new Figures();
            Figures rounds = new Figures();
            Figures cuts = new Figures();
            Figures starts = new Figures();
            for (int turn = 0; turn < TURNS; turn++) {
                bares.take(turn, bare.start());
                round.start();
                rounds.take(turn, round.start());
                cut.start();
                cuts.take(turn, cut.start());
                round.start();
                endWalk(store);
                starts.take(turn, start.start());
            }
            return List.of(row("start to the round that is walked", rounds, bares, display),
                    row("the same after the battery died", cuts, bares, display),
                    row("start to the start of a walk", starts, bares, display),
                    new Row("heap in use at the round", rounds.heap / (1 << 20), "MB", 120, true));
        }
    }

    /** So that the next start is one of a walk. */
    private static void endWalk(Path store) throws IOException {
        Files.deleteIfExists(store.resolve("walk.json"));
    }

    private static Row row(String what, Figures figures, Figures bares, BenchDisplay display) {
        return new Row(String.format("%s in a store of %d surveys (median %.0f ms, %.0f ms of processor), over a bare "
                + "window (median %.0f ms, %.0f ms); %s", what, SURVEYS, median(figures.millis),
                median(figures.busy), median(bares.millis), median(bares.busy), display.words()),
                median(figures.millis) / median(bares.millis), "×", 2, true);
    }

    /** What one program's starts came to. */
    private static final class Figures {
        private final double[] millis = new double[TURNS];
        private final double[] busy = new double[TURNS];
        private double heap;

        void take(int turn, StartedProgram.Started started) {
            millis[turn] = started.millis();
            busy[turn] = started.busyMillis();
            heap = Math.max(heap, started.heap());
        }
    }

    private static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return sorted[sorted.length / 2];
    }
}
