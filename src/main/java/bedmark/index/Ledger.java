package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Cover;
import bedmark.journal.EntryReader;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import bedmark.journal.Journal;
import bedmark.journal.JournalProof;
import bedmark.journal.JournalVisitor;
import bedmark.journal.Mark;
import bedmark.journal.Place;
import bedmark.journal.Replay;
import bedmark.json.EntryCodec;
import bedmark.survey.Entry;
import bedmark.vault.DataKey;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import java.util.concurrent.BlockingQueue;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.function.Consumer;
import java.util.function.Function;

/** Journal and index, kept in step: what the index does not know or knows wrongly comes from the journal. */
final class Ledger implements AutoCloseable {
    static final String JOURNAL = "journal";
    static final String INDEX = "index";

    private final StoreOptions options;
    private final FileLayer files;
    private final Optional<DataKey> key;
    private final Path journalFolder;
    private final Path indexFolder;
    private final EntryReader reader;
    private final List<Defect> found = new ArrayList<>();
    private Optional<Index> index = Optional.empty();
    private Optional<Journal> journal = Optional.empty();
    private final BlockingQueue<Journal.Saved> untold = new LinkedBlockingQueue<>();
    private boolean begunAnew;
    private boolean rebuilt;
    private long replayed;

    private Ledger(Path folder, StoreOptions options, Optional<DataKey> key) {
        this.options = options;
        this.key = key;
        this.files = options.files();
        this.journalFolder = folder.resolve(JOURNAL);
        this.indexFolder = folder.resolve(INDEX);
        this.reader = new EntryReader(journalFolder, files, Cover.of(key));
    }

    /**
     * Opens both.
     *
     * @param key    what both are sealed with
     * @param afresh makes the index anew in any case
     */
    static Ledger open(Path folder, StoreOptions options, Optional<DataKey> key, boolean afresh) throws IOException {
        Ledger ledger = new Ledger(folder, options, key);
        try {
            ledger.open(afresh);
            return ledger;
        } catch (IOException | RuntimeException e) {
            ledger.close();
            throw e;
        }
    }

    private void open(boolean afresh) throws IOException {
        files.createFolder(indexFolder);
        if (files.exists(indexFolder.resolve(Database.NAME + ".mv.db"))) {
            openIndex();
        }
        Optional<Mark> mark = index.flatMap(Index::mark);
        Journal opened = Journal.open(journalFolder, files, options.segmentBytes(), Cover.of(key), mark,
                options.progress(), new CatchUp());
        journal = Optional.of(opened);
        found.addAll(opened.found());
        rebuilt |= begunAnew && replayed > 0;
        if (afresh && !rebuilt) {
            rebuild(this::afresh);
        }
        ask(Index::mark);
    }

    private Optional<String> password() {
        return key.map(DataKey::indexPassword);
    }

    private void openIndex() {
        Optional<Database> database = Optional.empty();
        try {
            database = Optional.of(Database.open(indexFolder, password()));
            index = Optional.of(Index.goOn(database.get(), options.levels(), reader::read));
        } catch (IndexBroken | Refused e) {
            // Nobody else has this store: a database that says it is in use was left so by a damaged file.
            database.ifPresent(Ledger::closeQuietly);
        }
    }

    /** Brings the index up to the journal while that is opened. */
    private final class CatchUp implements Replay {
        @Override
        public void begin(UUID identity, boolean resumed) {
            begunAnew = !resumed;
            if (begunAnew) {
                afresh(identity);
            }
        }

        @Override
        public void entry(long sequence, Place place, byte[] payload) {
            take(sequence, place, payload);
        }
    }

    /** An index without entries, on disk or, where the disk takes none, in memory. */
    private void afresh(UUID identity) {
        dropIndex();
        Optional<Database> database = Optional.empty();
        try {
            for (Path file : files.list(indexFolder)) {
                files.delete(file);
            }
            database = Optional.of(Database.open(indexFolder, password()));
            index = Optional.of(Index.begin(database.get(), options.levels(), reader::read, identity));
        } catch (IOException | IndexBroken | Refused e) {
            database.ifPresent(Ledger::closeQuietly);
            inMemory(identity);
        }
    }

    private void inMemory(UUID identity) {
        dropIndex();
        note(Defect.in(indexFolder.toString(), "index-in-memory"));
        index = Optional.of(Index.begin(Database.inMemory(), options.levels(), reader::read, identity));
    }

    private void take(long sequence, Place place, byte[] payload) {
        replayed++;
        Optional<Entry> entry = decode(sequence, place, payload);
        indexing(taker -> {
            if (entry.isPresent()) {
                taker.add(entry.get(), place);
            } else {
                taker.addUnread(sequence, place);
            }
        });
    }

    private Optional<Entry> decode(long sequence, Place place, byte[] payload) {
        try {
            Entry entry = EntryCodec.read(payload);
            if (entry.sequence() == sequence) {
                return Optional.of(entry);
            }
        } catch (Refused e) {
            // Named below: it is sound as bytes, but of a later program or none.
        }
        note(Defect.in(JOURNAL, "journal-entry-unknown", Long.toString(place.offset()), Long.toString(sequence)));
        return Optional.empty();
    }

    /** Changes the index; where it fails, it is made anew when it is next asked. */
    private void indexing(Consumer<Index> change) {
        try {
            index.ifPresent(change);
        } catch (RuntimeException e) {
            dropIndex();
        }
    }

    private void dropIndex() {
        Optional<Index> broken = index;
        index = Optional.empty();
        broken.ifPresent(Ledger::closeQuietly);
    }

    private static void closeQuietly(AutoCloseable broken) {
        try {
            broken.close();
        } catch (Exception e) {
            // It is thrown away or proved when it is opened.
            return;
        }
    }

    /** Asks the index, and makes it anew where it turns out to be broken. */
    <T> T ask(Function<Index, T> question) {
        try {
            return peek(question);
        } catch (IndexBroken e) {
            rebuild(this::afresh);
        }
        try {
            return peek(question);
        } catch (IndexBroken e) {
            rebuild(this::inMemory);
        }
        return peek(question);
    }

    /** Asks the index as it is. */
    <T> T peek(Function<Index, T> question) {
        catchUp();
        return question.apply(index.orElseThrow(() -> new IndexBroken("there is no index")));
    }

    private void rebuild(Consumer<UUID> beginning) {
        rebuilt = true;
        replayed = 0;
        beginning.accept(journal().identity());
        try {
            JournalProof.of(journalFolder, files, Cover.of(key), Optional.of(journal().extent()), new JournalVisitor() {
                @Override
                public void entry(long sequence, Place place, byte[] payload) {
                    take(sequence, place, payload);
                }

                @Override
                public void flaw(Defect flaw) {
                    note(flaw);
                }

                @Override
                public void walked(long done, long total) {
                    options.progress().at(done, total);
                }
            });
        } catch (IOException e) {
            throw new Refused(Fault.defect("journal", e, files, journalFolder), e);
        }
    }

    private void note(Defect defect) {
        if (!found.contains(defect)) {
            found.add(defect);
        }
    }

    /** Saves an entry that was found possible; the only thing here that is not done on the index's thread. */
    Journal.Saved save(Entry possible) {
        return journal().append(possible.at(), possible.person(), possible.device(), possible.act());
    }

    /**
     * Leaves an entry that was saved for the index, which hears of it before it is next asked; from any thread.
     *
     * @return how many it has yet to hear of
     */
    int tell(Journal.Saved saved) {
        untold.add(saved);
        return untold.size();
    }

    /** Makes the index hear of what was saved. */
    void catchUp() {
        indexing(asked -> {
            hear(asked);
            asked.flush();
        });
    }

    /** What the index knows already it knows from walking the journal meanwhile. */
    private void hear(Index asked) {
        for (Journal.Saved saved = untold.poll(); saved != null; saved = untold.poll()) {
            long sequence = saved.entry().sequence();
            if (asked.mark().filter(mark -> mark.sequence() >= sequence).isEmpty()) {
                asked.add(saved.entry(), saved.place());
            }
        }
    }

    /** The last entry that this version can read. */
    Optional<Entry> newest() {
        return ask(asked -> asked.mark().flatMap(mark -> {
            try {
                return Optional.of(reader.read(mark.sequence(), mark.place()));
            } catch (Refused e) {
                return Optional.empty();
            }
        }));
    }

    private Journal journal() {
        return journal.orElseThrow();
    }

    long last() {
        return journal().last();
    }

    Journal.Reach reach() {
        return journal().reach();
    }

    Journal.Extent extent() {
        return journal().extent();
    }

    Optional<Branch> register() {
        return ask(Index::register);
    }

    Opening opening() {
        return new Opening(rebuilt, replayed, found);
    }

    @Override
    public void close() {
        catchUp();
        dropIndex();
        reader.close();
        journal.ifPresent(Journal::close);
    }
}
