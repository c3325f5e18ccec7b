package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import bedmark.journal.Journal;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.QueueState;
import bedmark.survey.SurveyHistory;
import bedmark.vault.DataKey;
import bedmark.vault.Passphrase;
import java.io.ByteArrayInputStream;
import java.io.Closeable;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.time.temporal.ChronoUnit;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import java.util.concurrent.CopyOnWriteArrayList;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicReference;
import java.util.function.Consumer;
import java.util.function.Function;

/**
 * The store of one device, in one folder: {@code journal/} is the truth, {@code photos/} its files and
 * {@code incoming/} those that are being copied, {@code index/} a database that can be thrown away,
 * {@code device.json} the identity. One program at a time. All methods may be called from any thread, interrupted or
 * not; an act is saved on the caller's thread, all else waits for the store's own.
 */
public final class Store implements AutoCloseable {
    static final String LOCK = "store.lock";

    private final Path folder;
    private final StoreOptions options;
    private final Optional<DataKey> key;
    private final Closeable lock;
    private final Desk desk;
    private final Desk photoDesk = new Desk("bedmark-photos");
    private final PhotoShelf shelf;
    private final Ledger ledger;
    private final Pen pen;
    private volatile Device device;
    private final List<StoreObserver> observers = new CopyOnWriteArrayList<>();
    private final AtomicReference<Optional<OffsetDateTime>> savedAt;
    private final AtomicBoolean closed = new AtomicBoolean();

    private Store(Path folder, StoreOptions options, Closeable lock, Desk desk, boolean afresh) throws IOException {
        this.folder = folder;
        this.options = options;
        this.lock = lock;
        this.desk = desk;
        this.key = Keys.of(folder, options.files(), options.passphrase());
        this.shelf = new PhotoShelf(folder, options.files(), key);
        shelf.open();
        this.ledger = Ledger.open(folder, options, key, afresh);
        this.pen = new Pen(desk, ledger);
        try {
            Optional<Entry> newest = ledger.newest();
            this.savedAt = new AtomicReference<>(newest.map(Entry::at));
            DeviceFile file = new DeviceFile(folder, options.files());
            Optional<Device> known = file.read();
            this.device = known.isPresent() ? known.get()
                    : file.write(newest.map(Entry::device), options.deviceName());
        } catch (IOException | RuntimeException e) {
            ledger.close();
            throw e;
        }
    }

    /**
     * Opens a store, and makes it where the folder is empty or missing.
     *
     * @throws Refused {@code store-locked} where another program has it open; {@code store-sealed} where it takes a
     *                 passphrase and none is given, {@code passphrase-wrong}, {@code passphrase-…}; {@code store-…}
     *                 where the folder can't be used
     */
    public static Store open(Path folder, StoreOptions options) {
        return open(folder, options, false);
    }

    /**
     * Opens a store that is there.
     *
     * @throws Refused as {@link #open(Path, StoreOptions)}; {@code store-missing} where the folder holds no store
     */
    public static Store openExisting(Path folder, StoreOptions options) {
        return open(requireStore(folder, options.files()), options);
    }

    private static Store open(Path folder, StoreOptions options, boolean afresh) {
        Path home = folder.toAbsolutePath().normalize();
        Database.requireFit(home);
        Desk desk = new Desk("bedmark-store");
        try {
            return desk.call(() -> openLocked(home, options, desk, afresh));
        } catch (RuntimeException e) {
            desk.close();
            throw e;
        }
    }

    private static Store openLocked(Path folder, StoreOptions options, Desk desk, boolean afresh) {
        FileLayer files = options.files();
        try {
            files.createFolder(folder);
            Closeable lock = files.lock(folder.resolve(LOCK))
                    .orElseThrow(() -> new Refused(Defect.in(folder.toString(), "store-locked")));
            try {
                new Sealing(folder, files).settle();
                return new Store(folder, options, lock, desk, afresh);
            } catch (IOException | RuntimeException e) {
                lock.close();
                throw e;
            }
        } catch (IOException e) {
            throw new Refused(Fault.defect("store", e, files, folder), e);
        }
    }

    /**
     * Proves a store that need not be open, without changing a byte.
     *
     * @param passphrase where the store is sealed
     * @throws Refused {@code store-missing} where the folder holds no store, {@code sealing-unfinished},
     *                 {@code store-sealed}, {@code passphrase-…}, {@code work-cancelled}
     */
    public static StoreCheck check(Path folder, FileLayer files, Optional<Passphrase> passphrase, Progress progress) {
        Path home = requireStore(folder, files);
        Database.requireFit(home);
        if (new Sealing(home, files).underWay()) {
            throw new Refused(Defect.in(folder.toString(), "sealing-unfinished"));
        }
        Desk desk = new Desk("bedmark-check");
        try (desk) {
            return desk.call(() -> StoreProof.ofClosed(home, files, Keys.look(home, files, passphrase), progress));
        }
    }

    /** As the other one, of a store that is not sealed. */
    public static StoreCheck check(Path folder, FileLayer files, Progress progress) {
        return check(folder, files, Optional.empty(), progress);
    }

    /**
     * Throws the index away and makes it anew from the journal.
     *
     * @return the number of entries taken in
     * @throws Refused as {@link #open(Path, StoreOptions)}; {@code store-missing} where the folder holds no store
     */
    public static long rebuild(Path folder, StoreOptions options) {
        Path home = requireStore(folder, options.files());
        try (Store store = open(home, options, true)) {
            return store.opening().replayed();
        }
    }

    static Path requireStore(Path folder, FileLayer files) {
        Path home = folder.toAbsolutePath().normalize();
        if (!files.exists(home.resolve(Ledger.JOURNAL))) {
            throw new Refused(Defect.in(folder.toString(), "store-missing"));
        }
        return home;
    }

    public Path folder() {
        return folder;
    }

    public Device device() {
        return device;
    }

    /**
     * Gives the device another name; its identity stays.
     *
     * @throws NotSaved where the name is not on the medium; the old one then holds
     */
    public void nameDevice(String name) {
        device = desk.call(() -> {
            try {
                return new DeviceFile(folder, options.files()).write(Optional.of(device.id()), name);
            } catch (IOException e) {
                throw new NotSaved(Fault.defect("not-saved", e, options.files(), folder,
                        Long.toString(ledger.last())), ledger.last(), e);
            }
        });
    }

    /** What opening found and did, and what has been found since. */
    public Opening opening() {
        return desk.call(ledger::opening);
    }

    /**
     * Saves an act: when this returns, it is on the medium.
     *
     * @param person who did it
     * @return the entry with its sequence number and time
     * @throws NotSaved where it is not on the medium
     * @throws Refused  {@code survey-unknown}, {@code survey-known}, {@code act-unfit}, {@code revision-unfit},
     *                  {@code act-without-survey}, {@code photo-missing}, {@code entry-too-large}, or what is wrong in
     *                  a document: the act is impossible as things stand, and nothing was written
     */
    public Entry append(String person, Act act) {
        if (act instanceof Act.PhotoAttached attached && !options.files().exists(photoFile(attached.photo()))) {
            throw new Refused(Defect.in(attached.photo().text("file").orElse(""), "photo-missing"));
        }
        try {
            Entry entry = pen.save(OffsetDateTime.now(options.clock()), person, device.id(), act);
            savedAt.set(Optional.of(OffsetDateTime.now(options.clock())));
            tell(observer -> observer.saved(entry));
            return entry;
        } catch (NotSaved e) {
            tell(observer -> observer.notSaved(e));
            throw e;
        }
    }

    /** An observer that fails can't make a saved entry look as if it were not. */
    private void tell(Consumer<StoreObserver> news) {
        for (StoreObserver observer : observers) {
            try {
                news.accept(observer);
            } catch (RuntimeException e) {
                Thread current = Thread.currentThread();
                current.getUncaughtExceptionHandler().uncaughtException(current, e);
            }
        }
    }

    /**
     * Copies a photo into the store, untouched, and saves that it is attached.
     *
     * @param source  a JPEG or PNG file; it stays where it is
     * @param caption may be empty
     * @throws NotSaved as {@link #append(String, Act)}
     * @throws Refused  {@code photo-unreadable}, {@code photo-unfit}, and those of {@link #append(String, Act)}
     */
    public Entry attachPhoto(Path source, UUID survey, String person, OffsetDateTime takenAt, String caption) {
        return attach(keepPhoto(source), survey, person, takenAt, caption);
    }

    /** As {@link #attachPhoto(Path, UUID, String, OffsetDateTime, String)}, from memory. */
    public Entry attachPhoto(byte[] photo, UUID survey, String person, OffsetDateTime takenAt, String caption) {
        return attach(keep(() -> shelf.keep(new ByteArrayInputStream(photo), "")), survey, person, takenAt, caption);
    }

    private Entry attach(Branch kept, UUID survey, String person, OffsetDateTime takenAt, String caption) {
        Branch photo = Branch.EMPTY.with("id", UUID.randomUUID().toString());
        for (Map.Entry<String, Node> member : kept.members().entrySet()) {
            photo = photo.with(member.getKey(), member.getValue());
        }
        photo = photo.with("takenAt", Node.time(takenAt));
        return append(person, new Act.PhotoAttached(survey, caption.isBlank() ? photo
                : photo.with("caption", caption)));
    }

    /**
     * Copies a photo into the store without telling of it: for a survey that is taken in whole afterwards.
     *
     * @return {@code file}, {@code sha256} and {@code bytes} as in a survey's document
     * @throws NotSaved where it is not on the medium
     * @throws Refused  {@code photo-unreadable}, {@code photo-unfit}
     */
    public Branch keepPhoto(Path source) {
        return keep(() -> shelf.keep(source));
    }

    /** A copy onto the shelf. */
    @FunctionalInterface
    private interface Copy {
        Branch make() throws IOException;
    }

    private Branch keep(Copy copy) {
        try {
            return photoDesk.call(() -> {
                try {
                    return copy.make();
                } catch (IOException e) {
                    long safe = desk.call(ledger::last);
                    throw new NotSaved(Fault.defect("not-saved", e, options.files(), shelf.folder(),
                            Long.toString(safe)), safe, e);
                }
            });
        } catch (NotSaved e) {
            tell(observer -> observer.notSaved(e));
            throw e;
        }
    }

    /** As {@link #keepPhoto(Path)}, from a stream. */
    Branch keepPhoto(InputStream content, String name) {
        return keep(() -> shelf.keep(content, name));
    }

    /**
     * Copies the whole store to a folder or stick, proves the copy, and notes that it was made. Others go on saving.
     *
     * @param chosen the backup gets a folder of its own in it; an earlier one there is brought up to date
     * @return the backup's folder
     * @throws Refused {@code backup-…}, {@code work-cancelled}: the store is as it was, and an earlier backup whole
     */
    public Path backup(Path chosen, String person, Progress progress) {
        Path target = Backup.folder(chosen.toAbsolutePath().normalize(), device);
        Journal.Reach now = desk.call(ledger::reach);
        BackupList list = new Backup(folder, target, options.files(), progress).make(device,
                OffsetDateTime.now(options.clock()).truncatedTo(ChronoUnit.SECONDS), now.extent(), now.last(),
                sealed());
        append(person, new Act.BackupMade(target.toString(), now.last(), list.sha256()));
        return target;
    }

    /**
     * Takes the surveys of another tablet's backup over; see {@link StoreFolder#restore}.
     *
     * @throws Refused {@code backup-…}, {@code restore-other-plant}, {@code store-sealed}, {@code passphrase-wrong},
     *                 {@code photo-missing}, {@code work-cancelled}
     */
    public Restored takeOver(Path backup, Optional<Passphrase> passphrase, String person, Progress progress) {
        FileLayer files = options.files();
        try {
            Path from = Backups.find(backup, files);
            BackupList list = Backups.prove(from, files, progress);
            return new HandOver(this, new BackupContent(from, list, files, passphrase), person).run();
        } catch (IOException e) {
            throw new Refused(Fault.defect("restore", e, files, backup), e);
        }
    }

    /**
     * Where the file of a photo of a survey lies; in a sealed store that file is sealed, and only
     * {@link #photo(Branch)} tells what it holds.
     *
     * @throws Refused {@code photo-missing} where the photo's document names no file of this store
     */
    public Path photoFile(Branch photo) {
        return shelf.file(photo).orElseThrow(() ->
                new Refused(Defect.in(photo.text("file").orElse(""), "photo-missing")));
    }

    /** A photo of a survey; nothing where its document names none that lies in this store. */
    public Optional<StoredPhoto> photo(Branch photo) {
        return shelf.file(photo).filter(options.files()::exists).map(file -> new StoredPhoto(shelf, file));
    }

    /** Whether what lies on disk is sealed. */
    public boolean sealed() {
        return key.isPresent();
    }

    /** The latest register: {@code plant}, {@code forms}, {@code rounds}. */
    public Optional<Branch> register() {
        return desk.call(ledger::register);
    }

    /** A survey as it stands, with every change, read from the journal. */
    public Optional<SurveyHistory> history(UUID survey) {
        return index(index -> index.folded(survey).history());
    }

    /** What was when, and what came back. */
    public Chronicle chronicle() {
        return new Chronicle(this::index);
    }

    /** How the store does. */
    public StoreFacts facts() {
        long last = desk.call(ledger::last);
        Optional<StoreFacts.Made> backup = index(index -> index.landmarks("backup-made", 1).stream().findFirst())
                .flatMap(StoreFacts.Made::of);
        return new StoreFacts(last, savedAt(), backup, free(), sealed());
    }

    /** Some systems don't know. */
    private long free() {
        try {
            return options.files().usableSpace(folder);
        } catch (IOException e) {
            return 0;
        }
    }

    /** The surveys that a query asks for, in the order in which they were opened. */
    public List<SurveyLine> surveys(SurveyQuery query) {
        return ask(queries -> queries.surveys(query));
    }

    /** As {@link #surveys(SurveyQuery)}, each query in turn: what many of them ask is asked at once. */
    public List<List<SurveyLine>> surveys(List<SurveyQuery> several) {
        return ask(queries -> several.stream().map(queries::surveys).toList());
    }

    public Optional<SurveyLine> survey(UUID id) {
        return ask(queries -> queries.row(id).map(SurveyRow::line));
    }

    /** The current surveys of a round that are not completed. */
    public List<SurveyLine> open(String round) {
        return surveys(SurveyQuery.ALL.ofRound(round).in(QueueState.OPEN).current());
    }

    /**
     * The last result of a transfer point: the inspected survey that was completed last and that no completed
     * revision replaces.
     *
     * @param before leaves out this survey, what it corrects, and what was completed after it
     */
    public Optional<Branch> latestFinished(String transfer, Optional<UUID> before) {
        return index(index -> new Queries(index).latestFinished(transfer, before)
                .flatMap(id -> index.folded(id).history()).map(history -> history.survey().document()));
    }

    /** How many surveys are in each state; every state has a number. */
    public Map<QueueState, Long> counts() {
        return ask(Queries::counts);
    }

    /** The surveys that wait for export, in the order in which they were opened. */
    public List<SurveyLine> queue() {
        return surveys(SurveyQuery.ALL.in(QueueState.QUEUED));
    }

    /** The newest walk of a round. */
    public Optional<Walk> walk(String round) {
        return ask(queries -> queries.walk(round));
    }

    /** The newest walk of each round, the one started last first. */
    public List<Walk> walks() {
        return ask(Queries::walks);
    }

    /** The packs that left, newest first. */
    public List<Export> exports() {
        return ask(Queries::exports);
    }

    /** The transfer points that were found in the field and proposed, in that order. */
    public List<Branch> proposals() {
        return proposals(Long.MAX_VALUE);
    }

    /** As {@link #proposals()}, as of an entry. */
    public List<Branch> proposals(long asOf) {
        return ask(queries -> queries.proposals(asOf));
    }

    private <T> T ask(Function<Queries, T> question) {
        return index(index -> question.apply(new Queries(index)));
    }

    private <T> T index(Function<Index, T> question) {
        return desk.call(() -> ledger.ask(question));
    }

    /** When an entry was last forced to the medium; after opening, the time of the last entry. */
    public Optional<OffsetDateTime> savedAt() {
        return savedAt.get();
    }

    /** Adds an observer until the returned handle is run. */
    public Runnable observe(StoreObserver observer) {
        observers.add(observer);
        return () -> observers.remove(observer);
    }

    /** Proves the whole store in the calling thread, while others go on saving. */
    public StoreCheck check(Progress progress) {
        return StoreProof.ofOpen(folder, options.files(), key, progress, desk, ledger);
    }

    /** Waits for what was begun, closes the index cleanly and gives the lock up. Closing again does nothing. */
    @Override
    public void close() {
        if (closed.getAndSet(true)) {
            return;
        }
        pen.close();
        photoDesk.call(() -> true);
        photoDesk.close();
        desk.call(() -> {
            ledger.close();
            lock.close();
            return true;
        });
        desk.close();
    }
}
