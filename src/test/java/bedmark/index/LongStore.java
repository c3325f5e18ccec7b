package bedmark.index;

import bedmark.journal.Digest;
import bedmark.journal.Journal;
import bedmark.journal.Place;
import bedmark.journal.Progress;
import bedmark.journal.QuickLayer;
import bedmark.journal.Replay;
import bedmark.survey.Entry;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/** Makes, rebuilds and asks stores of a {@link Decade}, as a program of its own with a heap of its own. */
public final class LongStore {
    private LongStore() {
    }

    private static StoreOptions options() {
        return StoreOptions.of("tablet 7").withClock(Clock.fixed(Instant.parse("2026-03-01T12:00:00Z"), ZoneOffset.UTC))
                .withFiles(new QuickLayer());
    }

    /** @param arguments {@code append}, {@code rebuild} or {@code ask}, the store's folder, the number of entries */
    public static void main(String[] arguments) throws IOException {
        Path folder = Path.of(arguments[1]);
        long entries = Long.parseLong(arguments[2]);
        long start = System.nanoTime();
        switch (arguments[0]) {
            case "append" -> append(folder, entries);
            case "rebuild" -> rebuild(folder);
            default -> ask(folder);
        }
        System.out.println("took " + (System.nanoTime() - start) / 1_000_000 + " ms");
    }

    /** Every entry the way a person's act goes, so that the index grows as it does on a tablet. */
    private static void append(Path folder, long entries) {
        Decade decade = new Decade();
        try (Store store = Store.open(folder, options())) {
            for (long i = 0; i < entries; i++) {
                Entry entry = decade.next();
                store.append(entry.person(), entry.act());
            }
        }
    }

    private static void rebuild(Path folder) {
        List<Long> heard = new ArrayList<>();
        long taken = Store.rebuild(folder, options().withProgress((done, total) -> {
            long percent = done * 100 / total;
            if (heard.isEmpty() || heard.get(heard.size() - 1) != percent) {
                heard.add(percent);
            }
        }));
        System.out.println("rebuilt " + taken);
        System.out.println("progress " + heard);
    }

    /**
     * A line for each row of the index and for each question: a digest of the answer. Surveys are asked for one by one
     * too, or every so-and-so-manieth of them where there are very many.
     */
    private static void ask(Path folder) {
        try (Database database = Database.openToRead(folder.resolve(Ledger.INDEX))) {
            for (String table : Asked.TABLES) {
                say("table " + table, database.rows("select * from " + table + " order by 1", row ->
                        Digest.of(Asked.text(table, row).getBytes(StandardCharsets.UTF_8)).hashCode()));
            }
        }
        try (Store store = Store.open(folder, options())) {
            System.out.println("opening " + store.opening());
            List<SurveyLine> lines = store.surveys(SurveyQuery.ALL);
            say("lines", lines);
            say("current", store.surveys(SurveyQuery.ALL.current()));
            say("counts", store.counts());
            say("queue", store.queue());
            say("walks", store.walks());
            say("exports", store.exports());
            say("register", store.register());
            for (int i = 0; i < lines.size(); i += 1 + lines.size() / 3_000) {
                SurveyLine line = lines.get(i);
                say(line.id().toString(), store.survey(line.id()) + " " + store.history(line.id()) + " "
                        + store.latestFinished(line.transfer(), Optional.of(line.id())));
            }
            for (int i = 0; i < 80; i++) {
                say("latest T" + i, store.latestFinished("T" + i, Optional.empty()) + " "
                        + store.surveys(SurveyQuery.ALL.ofTransfer("T" + i).current()));
            }
            for (int i = 0; i < 5; i++) {
                say("round " + i, store.surveys(SurveyQuery.ALL.ofRound("round-" + i)) + " "
                        + store.open("round-" + i) + " " + store.walk("round-" + i));
            }
        }
    }

    private static void say(String question, Object answer) {
        System.out.println(question + " " + Digest.of(answer.toString().getBytes(StandardCharsets.UTF_8)).hex());
    }

    /** Writes the journal alone; opening the store makes its index. */
    public static void journal(Path folder, long entries) throws IOException {
        Decade decade = new Decade();
        try (Journal journal = Journal.open(folder.resolve(Ledger.JOURNAL), new QuickLayer(), 64L << 20,
                Optional.empty(), Progress.NONE, new Nothing())) {
            for (long i = 0; i < entries; i++) {
                Entry entry = decade.next();
                journal.append(entry.at(), entry.person(), entry.device(), entry.act());
            }
        }
    }

    /** A new journal has nothing to tell. */
    private static final class Nothing implements Replay {
        @Override
        public void begin(UUID identity, boolean resumed) {
            if (resumed) {
                throw new IllegalStateException("the journal is not new");
            }
        }

        @Override
        public void entry(long sequence, Place place, byte[] payload) {
            throw new IllegalStateException("the journal is not new");
        }
    }
}
