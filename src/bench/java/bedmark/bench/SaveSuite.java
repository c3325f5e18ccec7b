package bedmark.bench;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.journal.FileLayer;
import bedmark.journal.QuickLayer;
import bedmark.survey.Act;
import bedmark.survey.Survey;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Random;
import java.util.UUID;

/**
 * A save of the store against a raw write and force of as many bytes. Both append to growing files on the same disk,
 * turn by turn in random order, with a person's pause between them, in which the index hears of the entry.
 */
final class SaveSuite implements Suite {
    private static final int SAVES = Integer.getInteger("bench.saves", 3_000);
    private static final int WARM_UP = 200;
    private static final int QUICK_WARM_UP = 20_000;
    private static final int ANSWERS = 40;
    private static final long PAUSE_MILLIS = 3;

    @Override
    public String name() {
        return "save";
    }

    @Override
    public List<Row> run() throws IOException, InterruptedException {
        warmUp();
        try (BenchFolder folder = BenchFolder.make("save");
             Store store = Store.open(folder.path().resolve("store"), StoreOptions.of("bench"));
             FileLayer.Output raw = FileLayer.disk().create(folder.path().resolve("raw"))) {
            long[] saves = new long[SAVES];
            long[] writes = new long[SAVES];
            Typist typist = new Typist(store);
            Random turns = new Random(1);
            Path segment = folder.path().resolve("store/journal/00000001.journal");
            for (int i = -WARM_UP; i < SAVES; i++) {
                boolean first = turns.nextBoolean();
                long write = first ? write(raw, typist.bytes()) : 0;
                long before = segment.toFile().length();
                Act act = typist.next();
                Thread.sleep(PAUSE_MILLIS);
                long start = System.nanoTime();
                store.append("R. Okafor", act);
                long save = System.nanoTime() - start;
                typist.wrote((int) (segment.toFile().length() - before));
                Thread.sleep(PAUSE_MILLIS);
                write = first ? write : write(raw, typist.bytes());
                Thread.sleep(PAUSE_MILLIS);
                if (i >= 0) {
                    saves[i] = save;
                    writes[i] = write;
                }
            }
            return rows(saves, writes);
        }
    }

    /** The code is compiled by work that waits for no medium. */
    private static void warmUp() throws IOException {
        try (BenchFolder folder = BenchFolder.make("warm-up");
             Store store = Store.open(folder.path(), StoreOptions.of("bench").withFiles(new QuickLayer()))) {
            Typist typist = new Typist(store);
            for (int i = 0; i < QUICK_WARM_UP; i++) {
                store.append("R. Okafor", typist.next());
            }
        }
    }

    private static long write(FileLayer.Output raw, int bytes) throws IOException {
        ByteBuffer buffer = ByteBuffer.wrap(new byte[bytes]);
        long start = System.nanoTime();
        raw.write(buffer);
        raw.force();
        return System.nanoTime() - start;
    }

    private static List<Row> rows(long[] saves, long[] writes) {
        Arrays.sort(saves);
        Arrays.sort(writes);
        return List.of(row("p50", saves, writes, 0.50, 1.3), row("p99", saves, writes, 0.99, 2));
    }

    private static Row row(String what, long[] saves, long[] writes, double share, double budget) {
        int at = (int) (saves.length * share);
        return new Row(String.format(Locale.ROOT, "save, %s over that of raw write and force (%d over %d µs)", what,
                saves[at] / 1000, writes[at] / 1000), (double) saves[at] / writes[at], "", budget, true);
    }

    /** Somebody who opens a survey, answers its fields, and opens the next one. */
    private static final class Typist {
        private final Store store;
        private UUID survey = UUID.randomUUID();
        private int answers;
        private int bytes = 400;

        Typist(Store store) {
            this.store = store;
            store.append("R. Okafor", opened());
        }

        private Act opened() {
            return new Act.SurveyOpened(survey, Survey.begin(survey, "round-1", "t1", "loading-zone", 1, "R. Okafor",
                    OffsetDateTime.parse("2026-03-01T12:00:00Z")).document());
        }

        /** How many bytes the last entry took. */
        int bytes() {
            return bytes;
        }

        void wrote(int last) {
            bytes = last;
        }

        Act next() {
            answers++;
            if (answers % ANSWERS == 0) {
                store.append("R. Okafor", new Act.SurveyCompleted(survey, "R. Okafor"));
                survey = UUID.randomUUID();
                store.append("R. Okafor", opened());
            }
            return new Act.AnswerSet(survey, Pointer.of("readings").child("field" + answers % ANSWERS),
                    Optional.of(Branch.EMPTY.with("value", Node.number(answers)).with("unit", "mm")
                            .with("quality", "measured")));
        }
    }
}
