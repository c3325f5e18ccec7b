package bedmark.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.office.DeedRow;
import bedmark.index.office.OfficeBroken;
import bedmark.index.office.OfficeTables;
import bedmark.index.office.RefusalRow;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import bedmark.journal.Journal;
import bedmark.journal.JournalProof;
import bedmark.journal.JournalVisitor;
import bedmark.journal.Mark;
import bedmark.journal.NotSaved;
import bedmark.journal.Place;
import bedmark.journal.Replay;
import bedmark.json.EntryCodec;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.merge.ZoneId;
import java.io.IOException;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;
import java.util.function.Supplier;
import java.util.stream.IntStream;

/** An office of its own in a folder: the journal is the truth, the tables are made anew from it where they fail. */
final class FolderBooks implements Books {
    static final String JOURNAL = "journal";
    static final String INDEX = "index";
    private static final long SEGMENT_BYTES = 64L << 20;
    private static final String MARK = "mark";
    /** Whether the tables hold surveys that zones do not yet stand by. */
    private static final String UNTOLD = "untold";
    private static final String YES = "yes";

    private final Path folder;
    private final Path index;
    private final OfficeOptions options;
    private final FileLayer files;
    private final UUID device;
    private final Effect effect;
    private final List<Defect> found = new ArrayList<>();
    private Optional<OfficeTables> tables = Optional.empty();
    private Optional<Journal> journal = Optional.empty();
    private final boolean beside;
    private boolean rebuilt;
    /** Zones that are stood anew once for all that came, before anybody asks for them. */
    private final Set<ZoneId> untold = new HashSet<>();

    private FolderBooks(Path folder, String index, OfficeOptions options, UUID device, Effect effect) {
        this.folder = folder;
        this.index = folder.resolve(index);
        this.beside = !index.equals(INDEX);
        this.options = options;
        this.files = options.files();
        this.device = device;
        this.effect = effect;
    }

    /** @param index the name of the folder of the tables */
    static FolderBooks open(Path folder, String index, OfficeOptions options, UUID device, Effect effect,
                            boolean afresh) throws IOException {
        FolderBooks books = new FolderBooks(folder, index, options, device, effect);
        try {
            books.open(afresh);
            return books;
        } catch (IOException | RuntimeException e) {
            books.close();
            throw e;
        }
    }

    private void open(boolean afresh) throws IOException {
        files.createFolder(index);
        List<RefusalRow> refusals = afresh ? refusals() : List.of();
        if (afresh) {
            drop();
        }
        Optional<Mark> mark = Optional.empty();
        try {
            tables = Optional.of(OfficeTables.of(index));
            mark = tables().setting(MARK).map(MarkText::read);
            if (tables().setting(UNTOLD).filter(YES::equals).isPresent()) {
                // It was cut off before; nobody knows any more which they were.
                untold.addAll(tables().zoneIds());
            }
        } catch (OfficeBroken | IllegalArgumentException e) {
            rebuilt = true;
            drop();
            tables = Optional.of(OfficeTables.of(index));
        }
        if (beside) {
            readAll();
            return;
        }
        Journal opened = Journal.open(folder.resolve(JOURNAL), files, SEGMENT_BYTES, mark, options.progress(),
                new CatchUp());
        journal = Optional.of(opened);
        putBack(refusals);
        found.addAll(opened.found());
        if (rebuilt) {
            found.add(Defect.in(index.toString(), "office-tables-broken"));
        }
    }

    /** No journal holds them: they go over into tables that are made anew, as far as they can still be read. */
    private List<RefusalRow> refusals() throws IOException {
        if (beside || tables.isEmpty() && files.list(index).isEmpty()) {
            return List.of();
        }
        try {
            tables = Optional.of(tables.isPresent() ? tables() : OfficeTables.of(index));
            return tables().whole(() -> tables().refusals().all());
        } catch (OfficeBroken e) {
            return List.of();
        }
    }

    private void putBack(List<RefusalRow> refusals) {
        tables().whole(() -> {
            refusals.stream().filter(row -> row.sha256().filter(tables()::hasPack).isEmpty())
                    .forEach(tables().refusals()::note);
            return true;
        });
    }

    /** Takes in the whole journal without a byte of it changed, to be compared; nothing can be kept then. */
    private void readAll() throws IOException {
        CatchUp all = new CatchUp();
        JournalProof proof = JournalProof.of(folder.resolve(JOURNAL), files, Optional.empty(), new JournalVisitor() {
            @Override
            public void entry(long sequence, Place place, byte[] payload) {
                all.entry(sequence, place, payload);
            }

            @Override
            public void flaw(Defect flaw) {
                found.add(flaw);
            }

            @Override
            public void walked(long done, long total) {
                options.progress().at(done, total);
            }
        });
        proof.tail().ifPresent(found::add);
    }

    /** Brings the tables up to the journal while that is opened. */
    private final class CatchUp implements Replay {
        private UUID identity = new UUID(0, 0);

        @Override
        public void begin(UUID journalIdentity, boolean resumed) {
            identity = journalIdentity;
            if (!resumed && tables().lastDeed() > 0) {
                rebuilt = true;
                try {
                    drop();
                } catch (IOException e) {
                    throw new Refused(Fault.defect("store", e, files, folder), e);
                }
                tables = Optional.of(OfficeTables.of(index));
            }
        }

        @Override
        public void entry(long sequence, Place place, byte[] payload) {
            Entry entry;
            try {
                entry = EntryCodec.read(payload);
            } catch (Refused e) {
                found.add(Defect.in(JOURNAL, "journal-entry-unknown", Long.toString(place.offset()),
                        Long.toString(sequence)));
                return;
            }
            try {
                take(List.of(new Done(entry, Optional.empty())), new Mark(identity, sequence, place));
            } catch (Refused e) {
                // A pack that can no longer be read: what it brought is missing, and everything else is not.
                found.add(e.defect());
                note(entry, new Mark(identity, sequence, place));
            }
        }
    }

    /** @param mark of the last of them */
    private void take(List<Done> deeds, Mark mark) {
        untold.addAll(tables().whole(() -> {
            deeds.forEach(done -> tables().add(row(done.entry())));
            Set<ZoneId> touched = effect.of(tables(), deeds);
            if (untold.isEmpty() && !touched.isEmpty()) {
                tables().set(UNTOLD, YES);
            }
            tables().set(MARK, MarkText.write(mark));
            return touched;
        }));
    }

    private void note(Entry entry, Mark mark) {
        tables().whole(() -> {
            tables().add(row(entry));
            tables().set(MARK, MarkText.write(mark));
            return true;
        });
    }

    static DeedRow row(Entry entry) {
        return new DeedRow(entry.sequence(), entry.at().toString(), entry.person(), entry.device(),
                entry.act().code(), EntryCodec.write(entry));
    }

    private void drop() throws IOException {
        tables.ifPresent(FolderBooks::closeQuietly);
        tables = Optional.empty();
        untold.clear();
        for (Path file : files.list(index)) {
            files.delete(file);
        }
    }

    private static void closeQuietly(OfficeTables broken) {
        try {
            broken.close();
        } catch (OfficeBroken e) {
            // It is thrown away.
            return;
        }
    }

    @Override
    public List<Optional<Entry>> keep(List<Deed> deeds) {
        List<Boolean> needless = look(() -> {
            deeds.forEach(deed -> effect.prove(tables(), deed));
            return deeds.stream().map(deed -> effect.needless(tables(), deed)).toList();
        });
        effect.prepare(IntStream.range(0, deeds.size()).filter(i -> !needless.get(i)).mapToObj(deeds::get).toList());
        List<Optional<Entry>> kept = new ArrayList<>();
        List<Done> done = new ArrayList<>();
        Optional<Place> last = Optional.empty();
        try {
            for (int i = 0; i < deeds.size(); i++) {
                if (needless.get(i)) {
                    kept.add(Optional.empty());
                    continue;
                }
                Journal.Saved saved = append(deeds.get(i));
                kept.add(Optional.of(saved.entry()));
                done.add(new Done(saved.entry(), deeds.get(i).pack().map(Pack::intake)));
                last = Optional.of(saved.place());
            }
        } catch (NotSaved e) {
            // Those before it are in the journal, and so is nothing of those after it.
            if (kept.isEmpty()) {
                throw e;
            }
        }
        last.ifPresent(place -> tell(done, place));
        return kept;
    }

    private Journal.Saved append(Deed deed) {
        return journal.orElseThrow().append(OffsetDateTime.now(options.clock()), deed.person(), device,
                new Act.OfficeActed(deed.deed()));
    }

    /** Tells the tables what the journal holds already. */
    private void tell(List<Done> done, Place last) {
        try {
            take(done, new Mark(journal.orElseThrow().identity(), done.get(done.size() - 1).entry().sequence(), last));
        } catch (OfficeBroken e) {
            rebuild();
        }
    }

    @Override
    public <T> T ask(Supplier<T> question) {
        return surely(() -> {
            stand();
            return tables().whole(question);
        });
    }

    @Override
    public <T> T look(Supplier<T> question) {
        return surely(() -> tables().whole(question));
    }

    private <T> T surely(Supplier<T> work) {
        try {
            return work.get();
        } catch (OfficeBroken e) {
            rebuild();
        }
        return work.get();
    }

    /** Stands the zones anew that wait for it. */
    private void stand() {
        if (!untold.isEmpty()) {
            tables().whole(() -> {
                effect.stand(tables(), untold);
                tables().set(UNTOLD, "");
                return true;
            });
            untold.clear();
        }
    }

    private void rebuild() {
        try {
            journal.ifPresent(Journal::close);
            journal = Optional.empty();
            rebuilt = true;
            open(true);
        } catch (IOException e) {
            throw new Refused(Fault.defect("store", e, files, folder), e);
        }
    }

    /** What was not as it was written. */
    List<Defect> found() {
        return List.copyOf(found);
    }

    @Override
    public OfficeTables tables() {
        return tables.orElseThrow(() -> new IllegalStateException("the office's tables are closed"));
    }

    @Override
    public void close() {
        tables.ifPresent(FolderBooks::closeQuietly);
        tables = Optional.empty();
        journal.ifPresent(Journal::close);
        journal = Optional.empty();
    }
}
