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
import bedmark.journal.Place;
import bedmark.journal.Progress;
import bedmark.json.EntryCodec;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.vault.DataKey;
import bedmark.vault.WrappedKey;
import java.io.IOException;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Proves a whole store: the journal byte by byte, the index row by row, the photos by their digests. */
final class StoreProof implements JournalVisitor {
    private final FileLayer files;
    private final Cover cover;
    private final PhotoShelf shelf;
    private final Progress progress;
    private final IndexProof index;
    private final boolean sealed;
    private final List<Defect> defects = new ArrayList<>();
    private final Set<Branch> photos = new LinkedHashSet<>();
    private Optional<OffsetDateTime> lastAt = Optional.empty();
    private Optional<StoreFacts.Made> backup = Optional.empty();

    private StoreProof(Path folder, FileLayer files, Optional<DataKey> key, Progress progress,
                       IndexProof.Asker asker) {
        this.files = files;
        this.cover = Cover.of(key);
        this.sealed = key.isPresent();
        this.shelf = new PhotoShelf(folder, files, key);
        this.progress = progress;
        this.index = new IndexProof(asker);
    }

    /** Proves a store while it is open; what is saved meanwhile is left out. */
    static StoreCheck ofOpen(Path folder, FileLayer files, Optional<DataKey> key, Progress progress, Desk desk,
                             Ledger ledger) {
        StoreProof proof = new StoreProof(folder, files, key, progress, new IndexProof.OfOpen(desk, ledger));
        // The index first: what is saved between the two is then in the journal's part and not in the index's.
        proof.index.begin(true);
        return proof.run(folder, Optional.of(desk.call(ledger::extent)), true);
    }

    /** Proves a store that this program has not open. */
    static StoreCheck ofClosed(Path folder, FileLayer files, Optional<DataKey> key, Progress progress) {
        Path indexFolder = folder.resolve(Ledger.INDEX);
        if (!files.exists(indexFolder.resolve(Database.NAME + ".mv.db"))) {
            return unindexed(folder, files, key, progress, "index-missing");
        }
        try (Database database = Database.openToRead(indexFolder, key.map(DataKey::indexPassword));
             EntryReader reader = new EntryReader(folder.resolve(Ledger.JOURNAL), files, Cover.of(key))) {
            Index index = Index.goOn(database, LevelOf.NONE, reader::read);
            StoreProof proof = new StoreProof(folder, files, key, progress, new IndexProof.OfClosed(index));
            proof.index.begin(true);
            return proof.run(folder, Optional.empty(), true);
        } catch (IndexBroken e) {
            return unindexed(folder, files, key, progress, "index-unusable");
        } catch (Refused e) {
            if (e.defect().code().equals("store-locked")) {
                return unindexed(folder, files, key, progress, "index-in-use");
            }
            throw e;
        }
    }

    private static StoreCheck unindexed(Path folder, FileLayer files, Optional<DataKey> key, Progress progress,
                                        String why) {
        StoreProof proof = new StoreProof(folder, files, key, progress, new IndexProof.OfNone());
        proof.defects.add(Defect.in(Ledger.INDEX, why));
        proof.index.begin(false);
        return proof.run(folder, Optional.empty(), false);
    }

    private StoreCheck run(Path folder, Optional<Journal.Extent> extent, boolean compare) {
        Path journalFolder = folder.resolve(Ledger.JOURNAL);
        try {
            proveKey(folder);
            JournalProof journal = JournalProof.of(journalFolder, files, cover, extent, this);
            journal.tail().ifPresent(defects::add);
            boolean equal = compare && index.end(journal.last());
            defects.addAll(index.defects());
            long named = provePhotos();
            return new StoreCheck(journal.segments(), journal.entries(), journal.last(), journal.intact(),
                    journal.torn(), named, equal, defects, new StoreFacts(journal.last(), lastAt, backup,
                            files.usableSpace(folder), sealed));
        } catch (IOException e) {
            throw new Refused(Fault.defect("journal", e, files, journalFolder), e);
        }
    }

    @Override
    public void entry(long sequence, Place place, byte[] payload) {
        Optional<Entry> entry = decode(sequence, place, payload);
        index.entry(sequence, place, entry);
        entry.ifPresent(read -> {
            lastAt = Optional.of(read.at());
            backup = StoreFacts.Made.of(read).or(() -> backup);
            if (read.act() instanceof Act.PhotoAttached attached) {
                photos.add(attached.photo());
            } else if (read.act() instanceof Act.SurveyTaken taken) {
                photos.addAll(taken.document().branches("photos"));
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
            // Named below.
        }
        defects.add(Defect.in(Ledger.JOURNAL, "journal-entry-unknown", Long.toString(place.offset()),
                Long.toString(sequence)));
        return Optional.empty();
    }

    @Override
    public void flaw(Defect flaw) {
        defects.add(flaw);
    }

    @Override
    public void walked(long done, long total) {
        progress.at(done, total);
        if (progress.cancelled()) {
            throw new Refused(Defect.in("", "work-cancelled"));
        }
    }

    /** The wrapped key lies there twice; one of the two being damaged is no loss yet. */
    private void proveKey(Path folder) throws IOException {
        PassphraseFile file = new PassphraseFile(folder, files);
        Optional<WrappedKey> wrapped = file.read();
        if (wrapped.isPresent()) {
            file.flawed(wrapped.get()).forEach(name -> defects.add(Defect.in(name, "passphrase-twin-damaged")));
        }
    }

    /** The number of photos that lie in this store. */
    private long provePhotos() throws IOException {
        long named = 0;
        for (Branch photo : photos) {
            Optional<Path> file = shelf.file(photo);
            if (file.isEmpty()) {
                continue;
            }
            named++;
            String name = photo.text("file").orElse("");
            String digest = photo.text("sha256").orElse("");
            if (!files.exists(file.get())) {
                defects.add(Defect.in(name, "photo-missing"));
            } else if (shelf.digestOf(file.get()).filter(found -> found.hex().equals(digest)).isEmpty()) {
                defects.add(Defect.in(name, "photo-differs", digest));
            }
            if (progress.cancelled()) {
                throw new Refused(Defect.in("", "work-cancelled"));
            }
        }
        return named;
    }
}
