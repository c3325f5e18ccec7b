package bedmark.index;

import bedmark.document.Defect;
import bedmark.journal.Mark;
import bedmark.journal.Place;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;
import java.util.function.Function;

/**
 * Compares an index with the journal that is walked: every entry's row, every survey's row with the fold of its
 * entries, every walk, and that nothing is there beyond. What an index has yet to take in is left out.
 */
final class IndexProof {
    private static final int PAGE = 500;
    private static final String ROW = "select e.*, (select count(*) from touch t where t.sequence_no = e.sequence_no) "
            + "touched, (select count(*) from landmark l where l.sequence_no = e.sequence_no) marked from entry e ";

    /** Asks the index, each time anew. */
    @FunctionalInterface
    interface Asker {
        <T> T ask(Function<Index, T> question);

        /** Whether entries are saved while it is asked: one that knew of none when it was first asked is not amiss. */
        default boolean isInUse() {
            return false;
        }
    }

    /** The index of an open store, asked between other work. */
    record OfOpen(Desk desk, Ledger ledger) implements Asker {
        @Override
        public <T> T ask(Function<Index, T> question) {
            return desk.call(() -> ledger.peek(question));
        }

        @Override
        public boolean isInUse() {
            return true;
        }
    }

    /** An index that nobody else uses. */
    record OfClosed(Index index) implements Asker {
        @Override
        public <T> T ask(Function<Index, T> question) {
            return question.apply(index);
        }
    }

    /** No index at all. */
    record OfNone() implements Asker {
        @Override
        public <T> T ask(Function<Index, T> question) {
            throw new IndexBroken("there is no index");
        }
    }

    /** What the row of an entry says. */
    private record Row(Index.At at, String act, String madeAt, String person, Optional<UUID> survey, long touched,
                       long marked) {
        static Row read(ResultSet row) throws SQLException {
            return new Row(Index.at(row), row.getString("act"), row.getString("made_at"), row.getString("person"),
                    Optional.ofNullable(row.getObject("survey", UUID.class)), row.getLong("touched"),
                    row.getLong("marked"));
        }

        static Row of(long sequence, Place place, Optional<Entry> entry) {
            Index.At at = new Index.At(sequence, place);
            return entry.map(read -> {
                Act act = read.act();
                long touched = act.about().isPresent() ? 0 : Fold.touched(act).size();
                boolean marked = Index.isLandmark(act);
                return new Row(at, act.code(), read.at().toString(), read.person(), act.about(), touched,
                        marked ? 1 : 0);
            }).orElse(new Row(at, Index.UNREAD, "", "", Optional.empty(), 0, 0));
        }
    }

    private final Asker asker;
    private final Deque<Row> ahead = new ArrayDeque<>();
    private final Set<UUID> opened = new HashSet<>();
    private final Map<String, List<Long>> walks = new HashMap<>();
    private final Map<String, List<Long>> landmarks = new HashMap<>();
    private final List<Defect> defects = new ArrayList<>();
    private boolean comparing;
    private long known;
    private long fetched;

    IndexProof(Asker asker) {
        this.asker = asker;
    }

    /** @param compare whether there is an index to compare with */
    void begin(boolean compare) {
        comparing = compare;
        guarded(() -> known = asker.ask(Index::mark).map(Mark::sequence).orElse(0L));
    }

    /** Takes an entry of the journal, in order. */
    void entry(long sequence, Place place, Optional<Entry> entry) {
        if (sequence > known) {
            return;
        }
        entry.ifPresent(this::remember);
        guarded(() -> {
            if (ahead.isEmpty()) {
                ahead.addAll(asker.ask(index -> index.database().rows(ROW + "where e.sequence_no > ? "
                        + "order by e.sequence_no limit " + PAGE, Row::read, fetched)));
                fetched = ahead.isEmpty() ? fetched : ahead.peekLast().at().sequence();
            }
            while (!ahead.isEmpty() && ahead.peek().at().sequence() < sequence) {
                differs("entry", Long.toString(ahead.poll().at().sequence()));
            }
            if (!Row.of(sequence, place, entry).equals(ahead.poll())) {
                differs("entry", Long.toString(sequence));
            }
        });
    }

    private void remember(Entry entry) {
        if (Index.isLandmark(entry.act())) {
            landmarks.computeIfAbsent(entry.act().code(), unknown -> new ArrayList<>()).add(entry.sequence());
        }
        if (Fold.opens(entry.act())) {
            opened.addAll(Fold.touched(entry.act()));
        } else {
            Fold.touched(entry.act()).stream().filter(survey -> !opened.contains(survey))
                    .forEach(survey -> unfit(entry.sequence(), survey));
        }
        if (entry.act() instanceof Act.WalkStarted started) {
            walks.put(started.round(), List.of(entry.sequence()));
        } else if (entry.act() instanceof Act.WalkFinished finished && walks.containsKey(finished.round())) {
            walks.put(finished.round(), List.of(walks.get(finished.round()).get(0), entry.sequence()));
        }
    }

    /**
     * Ends the comparison.
     *
     * @param last the journal's last entry
     * @return whether the index says what the journal says
     */
    boolean end(long last) {
        guarded(() -> {
            if (known > last) {
                differs("entry", (last + 1) + "-" + known);
            } else if (known == 0 && last > 0 && !asker.isInUse()) {
                defects.add(Defect.in(Ledger.INDEX, "index-missing"));
            }
            surveys();
            walks();
            landmarks();
        });
        return comparing && defects.stream().noneMatch(defect -> defect.code().startsWith("index-"));
    }

    private void surveys() {
        Set<UUID> expected = new HashSet<>(opened);
        IndexPaths paths = new IndexPaths();
        for (List<Opened> page = page(0); !page.isEmpty(); page = page(page.get(page.size() - 1).first())) {
            for (Opened row : page) {
                asker.ask(index -> survey(index, row.survey()));
                asker.ask(index -> new Queries(index).row(row.survey())).ifPresent(found -> paths.add(found.line()));
                expected.remove(row.survey());
            }
        }
        expected.forEach(survey -> differs("survey", survey.toString()));
        paths.wrong(asker).forEach(path -> differs("survey", path));
    }

    /** Looks for the entries that people look for by their kind the way that they are looked for. */
    private void landmarks() {
        landmarks.forEach((act, sequences) -> asker.ask(index -> {
            List<Long> found = index.landmarks(act, Integer.MAX_VALUE).stream().map(Entry::sequence)
                    .filter(sequence -> sequence <= known).sorted().toList();
            return found.equals(sequences) || differs("landmark", act);
        }));
    }

    private record Opened(UUID survey, long first) {
    }

    private List<Opened> page(long after) {
        return asker.ask(index -> index.database().rows("select id, first_no from survey where first_no > ? "
                + "order by first_no limit " + PAGE,
                row -> new Opened(row.getObject(1, UUID.class), row.getLong(2)), after));
    }

    private boolean survey(Index index, UUID survey) {
        List<Long> unfit = new ArrayList<>();
        Folded folded = Histories.fold(survey, index.entriesOf(survey), unfit);
        unfit.forEach(sequence -> unfit(sequence, survey));
        Optional<SurveyRow> row = new Queries(index).row(survey);
        boolean same = row.isPresent() && folded.history().map(history ->
                SurveyRow.of(history, folded, row.get().line().level()).sameAs(row.get())).orElse(false);
        if (!same) {
            differs("survey", survey.toString());
        }
        return same;
    }

    private void walks() {
        Map<String, List<Long>> rows = new HashMap<>();
        asker.ask(index -> index.database().rows("select round, started, finished from walk where started <= " + known,
                row -> {
                    Long finished = row.getObject(3, Long.class);
                    return rows.put(row.getString(1), finished == null || finished > known ? List.of(row.getLong(2))
                            : List.of(row.getLong(2), finished));
                }));
        if (!rows.equals(walks)) {
            differs("walk", "");
        }
    }

    private void unfit(long sequence, UUID survey) {
        defects.add(Defect.in(Ledger.JOURNAL, "entry-unfit", Long.toString(sequence), survey.toString()));
    }

    private boolean differs(String table, String key) {
        return defects.add(Defect.in(Ledger.INDEX, "index-differs", table, key));
    }

    private void guarded(Runnable step) {
        if (!comparing) {
            return;
        }
        try {
            step.run();
        } catch (IndexBroken e) {
            comparing = false;
            defects.add(Defect.in(Ledger.INDEX, "index-unusable"));
        }
    }

    List<Defect> defects() {
        return defects;
    }
}
