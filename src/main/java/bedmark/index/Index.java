package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.journal.Digest;
import bedmark.journal.Mark;
import bedmark.journal.Place;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.SurveyHistory;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;

/** Takes entries into the database, one by one or many at once, in the order of the journal. */
final class Index implements AutoCloseable {
    static final String FORMAT = "5";
    static final String UNREAD = "?";
    private static final int BATCH = 1000;
    private static final String ENTRY = "insert into entry values (?, ?, ?, ?, ?, ?, ?, ?, ?)";
    private static final String TOUCH = "insert into touch values (?, ?)";
    private static final String LANDMARK = "insert into landmark values (?, ?)";
    private static final String PLACES = "e.sequence_no, e.segment, e.start_at, e.byte_length, e.hash";

    private final Database database;
    private final LevelOf levels;
    private final EntrySource source;
    private final Histories histories = new Histories(this::load);
    private final Set<UUID> changed = new LinkedHashSet<>();
    private Optional<Branch> register = Optional.empty();
    private boolean registerRead;
    private Optional<Mark> newest;
    private UUID journal;
    private Tally tally;
    private int waiting;

    private Index(Database database, LevelOf levels, EntrySource source, UUID journal, Optional<Mark> newest,
                  Tally tally) {
        this.database = database;
        this.levels = levels;
        this.source = source;
        this.journal = journal;
        this.newest = newest;
        this.tally = tally;
    }

    /** An empty index for a journal, in an empty database. */
    static Index begin(Database database, LevelOf levels, EntrySource source, UUID journal) {
        database.layOut();
        database.run("insert into settings values ('format', ?)", FORMAT);
        database.run("insert into settings values ('journal', ?)", journal.toString());
        database.commit();
        return new Index(database, levels, source, journal, Optional.empty(), Tally.NOTHING);
    }

    /**
     * The index that a database holds.
     *
     * @throws IndexBroken where it holds none of this format, or not all that it says it holds
     */
    static Index goOn(Database database, LevelOf levels, EntrySource source) {
        if (!setting(database, "format").equals(FORMAT)) {
            throw new IndexBroken("the index is of another format");
        }
        UUID journal = uuid(setting(database, "journal"));
        List<Marked> marks = database.rows("select sequence_no, segment, start_at, byte_length, hash, entries, "
                + "landmarks, seal from mark e", row -> marked(row, journal));
        long counted = database.rows("select count(*) from entry", row -> row.getLong(1)).get(0);
        Tally tally = marks.isEmpty() ? Tally.NOTHING : marks.get(0).tally();
        if (counted != tally.entries()) {
            throw new IndexBroken("the index holds " + counted + " entries instead of " + tally.entries());
        }
        return new Index(database, levels, source, journal, marks.stream().map(Marked::mark).findFirst(), tally);
    }

    private record Marked(Mark mark, Tally tally) {
    }

    private static Marked marked(ResultSet row, UUID journal) throws SQLException {
        At at = at(row);
        Mark mark = new Mark(journal, at.sequence(), at.place());
        Tally tally = Tally.read(row.getLong("entries"), row.getString("landmarks"));
        if (!Arrays.equals(seal(mark, tally), row.getBytes("seal"))) {
            throw new IndexBroken("the mark is not as it was written");
        }
        return new Marked(mark, tally);
    }

    private static byte[] seal(Mark mark, Tally tally) {
        Place place = mark.place();
        return RowSeal.of(mark.journal(), mark.sequence(), place.segment(), place.offset(), place.length(),
                place.hash(), tally.entries(), tally.text());
    }

    private static String setting(Database database, String name) {
        return database.rows("select content from settings where name = ?", row -> row.getString(1), name).stream()
                .findFirst().orElseThrow(() -> new IndexBroken("the index names no " + name));
    }

    private static UUID uuid(String text) {
        try {
            return UUID.fromString(text);
        } catch (IllegalArgumentException e) {
            throw new IndexBroken(e);
        }
    }

    /** The last entry that was taken in. */
    Optional<Mark> mark() {
        return newest;
    }

    Database database() {
        return database;
    }

    /** Takes an entry in; {@link #flush()} makes it last. */
    void add(Entry entry, Place place) {
        List<UUID> touched = Fold.touched(entry.act());
        // Folded before the rows hold this entry, so that it does not count twice.
        touched.forEach(histories::of);
        boolean alone = entry.act().about().isPresent();
        row(entry.sequence(), place, entry.act().code(), entry.at().toString(), entry.person(),
                entry.act().about().orElse(null));
        if (!alone) {
            touched.forEach(survey -> database.batch(TOUCH, survey, entry.sequence()));
        }
        special(entry);
        for (UUID survey : touched) {
            histories.apply(survey, entry, place);
            changed.add(survey);
        }
        waiting++;
        if (waiting >= BATCH || histories.full()) {
            flush();
        }
    }

    /** Takes an entry in that this version can't read. */
    void addUnread(long sequence, Place place) {
        row(sequence, place, UNREAD, "", "", null);
        waiting++;
    }

    private void row(long sequence, Place place, String act, String at, String person, UUID survey) {
        database.batch(ENTRY, sequence, place.segment(), place.offset(), place.length(), place.hash().bytes(), act,
                at, person, survey);
        newest = Optional.of(new Mark(journal, sequence, place));
        tally = tally.withEntry();
    }

    private void special(Entry entry) {
        Act act = entry.act();
        if (act instanceof Act.RegisterTaken taken) {
            pushSurveys();
            register = Optional.of(taken.register());
            registerRead = true;
            landmark(entry);
        } else if (isLandmark(act)) {
            landmark(entry);
        } else if (act instanceof Act.WalkStarted started) {
            database.run("merge into walk key (round) values (?, ?, null)", started.round(), entry.sequence());
        } else if (act instanceof Act.WalkFinished finished) {
            database.run("update walk set finished = ? where round = ?", entry.sequence(), finished.round());
        }
    }

    private void landmark(Entry entry) {
        database.batch(LANDMARK, entry.act().code(), entry.sequence());
        tally = tally.withLandmark(entry);
    }

    /** Whether entries of that kind are looked for by what they are. */
    static boolean isLandmark(Act act) {
        return act instanceof Act.RegisterTaken || act instanceof Act.PackExported || act instanceof Act.ReceiptNoted
                || act instanceof Act.BackupMade || act instanceof Act.PointProposed;
    }

    /** Makes everything that was taken in last. */
    void flush() {
        if (waiting == 0) {
            return;
        }
        pushRows();
        pushSurveys();
        Mark mark = newest.orElseThrow();
        Place place = mark.place();
        database.run("merge into mark key (one) values (1, ?, ?, ?, ?, ?, ?, ?, ?)", mark.sequence(),
                place.segment(), place.offset(), place.length(), place.hash().bytes(), tally.entries(), tally.text(),
                seal(mark, tally));
        database.commit();
        waiting = 0;
        if (histories.full()) {
            histories.shrink();
        }
    }

    private void pushRows() {
        for (String table : List.of(ENTRY, TOUCH, LANDMARK)) {
            database.runBatch(table);
        }
    }

    private void pushSurveys() {
        for (UUID survey : changed) {
            Folded folded = histories.of(survey);
            folded.history().ifPresent(history ->
                    database.batch(SurveyRow.WRITE, SurveyRow.of(history, folded, level(history)).values()));
        }
        if (!changed.isEmpty()) {
            database.runBatch(SurveyRow.WRITE);
            changed.clear();
        }
    }

    private String level(SurveyHistory history) {
        Branch known = register().orElse(Branch.EMPTY);
        try {
            return levels.level(history.survey().document(), known);
        } catch (RuntimeException e) {
            // What can't be judged has no level; the entry is saved all the same.
            return "";
        }
    }

    /** Folds a survey that is not at hand; its row tells whether all its entries were found. */
    private Folded load(UUID survey) {
        Folded folded = Histories.fold(survey, entriesOf(survey), new ArrayList<>());
        List<Folded> rows = database.rows("select first_no, last_no, hash from survey where id = ?", row ->
                new Folded(folded.history(), row.getLong(1), row.getLong(2), Digest.ofBytes(row.getBytes(3))), survey);
        if (rows.size() != folded.history().stream().count() || !rows.isEmpty() && !rows.get(0).equals(folded)) {
            throw new IndexBroken("the index does not find every entry of survey " + survey);
        }
        return folded;
    }

    /** A survey as it stands. */
    Folded folded(UUID survey) {
        return histories.of(survey);
    }

    /** The latest register; read from the journal when it is first asked for. */
    Optional<Branch> register() {
        if (!registerRead) {
            pushRows();
            register = landmarks("register-taken", 1).stream().findFirst()
                    .map(entry -> ((Act.RegisterTaken) entry.act()).register());
            registerRead = true;
        }
        return register;
    }

    /** The newest entries of one kind, newest first; neither too few nor any other. */
    List<Entry> landmarks(String act, int atMost) {
        List<Entry> found = database.rows("select " + PLACES + " from landmark l join entry e "
                + "on e.sequence_no = l.sequence_no where l.act = ? order by l.sequence_no desc limit ?", Index::at, act,
                atMost).stream().map(this::read).map(Histories.Placed::entry).toList();
        Tally.Kind expected = tally.kind(act);
        boolean whole = found.size() == Math.min(atMost, expected.count())
                && found.stream().allMatch(entry -> entry.act().code().equals(act))
                && (found.isEmpty() || found.get(0).sequence() == expected.last());
        if (!whole) {
            throw new IndexBroken("the index does not find every " + act);
        }
        return found;
    }

    /** One entry, proved against the journal. */
    Entry entry(long sequence) {
        return database.rows("select " + PLACES + " from entry e where e.sequence_no = ?", Index::at, sequence)
                .stream().map(this::read).map(Histories.Placed::entry).findFirst()
                .orElseThrow(() -> new IndexBroken("entry " + sequence + " is not in the index"));
    }

    /** All entries of one survey, in order, proved against the journal. */
    List<Histories.Placed> entriesOf(UUID survey) {
        pushRows();
        return database.rows("select " + PLACES + " from entry e where e.survey = ? union all select " + PLACES
                + " from touch t join entry e on e.sequence_no = t.sequence_no where t.survey = ? order by 1",
                Index::at, survey, survey).stream().map(this::read).toList();
    }

    /** A sequence number and where its entry lies. */
    record At(long sequence, Place place) {
    }

    static At at(ResultSet row) throws SQLException {
        return new At(row.getLong("sequence_no"), new Place(row.getInt("segment"), row.getLong("start_at"),
                row.getInt("byte_length"), Digest.ofBytes(row.getBytes("hash"))));
    }

    private Histories.Placed read(At at) {
        try {
            return new Histories.Placed(source.read(at.sequence(), at.place()), at.place());
        } catch (Refused e) {
            if (e.defect().code().equals("journal-entry-damaged")) {
                // Either of the two is wrong; walking the journal once more tells which.
                throw new IndexBroken(e);
            }
            throw e;
        }
    }

    @Override
    public void close() {
        database.close();
    }
}
