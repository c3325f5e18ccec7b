package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.Desk;
import bedmark.index.Device;
import bedmark.index.DeviceFile;
import bedmark.index.office.OfficeBroken;
import bedmark.index.office.OfficeTables;
import bedmark.index.office.ZoneNames;
import bedmark.journal.Fault;
import bedmark.journal.Progress;
import bedmark.json.JsonReader;
import bedmark.office.FlatColumn.FlatRow;
import bedmark.office.trend.ZoneTrend;
import bedmark.pack.DeviceKey;
import bedmark.pack.Receipt;
import bedmark.pack.ReceiptWriter;
import bedmark.survey.Entry;
import bedmark.survey.OfficeDeed;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.survey.merge.Merge;
import bedmark.survey.merge.MergedZone;
import bedmark.survey.merge.ZoneId;
import java.io.Closeable;
import java.io.IOException;
import java.nio.file.Path;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Consumer;
import java.util.function.Function;

/**
 * The office's store: in one folder {@code journal/} and {@code packs/} are the truth and {@code index/} can be thrown
 * away. All methods may be called from any thread; they wait for the store's own.
 */
public final class OfficeStore implements AutoCloseable {
    /** The folder in a person's home that is the office's unless they say otherwise. */
    public static final String USUAL_FOLDER = ".bedmark-office";

    static final String PACKS = "packs";
    static final String PASSING = "passing";

    private final Path folder;
    private final OfficeOptions options;
    private final Desk desk;
    private final Closeable lock;
    private final PackShelf shelf;
    private volatile Device device;
    private final Books books;
    private final Results results;
    private final Listing listing;
    private final PackPhotos photos;
    private Minutes minutes = new Minutes();
    private final AtomicBoolean closed = new AtomicBoolean();

    OfficeStore(Path folder, Optional<String> url, OfficeOptions options, Desk desk, Closeable lock,
                String index, boolean afresh) throws IOException {
        this.folder = folder;
        this.options = options;
        this.desk = desk;
        this.lock = lock;
        this.shelf = new PackShelf(folder.resolve(url.isPresent() ? PASSING : PACKS), options.files(),
                url.isPresent());
        shelf.open();
        this.photos = new PackPhotos(shelf, options.limits());
        DeviceFile file = new DeviceFile(folder, options.files(), OfficeOpening.OFFICE);
        Optional<Device> known = file.read();
        this.device = known.isPresent() ? known.get() : file.write(Optional.empty(), options.name());
        Effects effects = new Effects(shelf, options.limits(), this::minutes);
        this.books = url.isPresent()
                ? new ServerBooks(url.get(), options, device.id(), effects, () -> minutes = new Minutes())
                : FolderBooks.open(folder, index, options, device.id(), effects, afresh);
        this.results = new Results(new Judge(this::version), this::minutes);
        this.listing = new Listing(this, results, options.clock(), url.isPresent());
    }

    /**
     * Opens an office store, and makes it where the folder is empty or missing.
     *
     * @throws Refused {@code store-locked} where another program has it open, {@code store-of-tablet} where it is the
     *                 store of a tablet, {@code office-folder-other} where it holds anything else, {@code store-…}
     *                 where it can't be used
     */
    public static OfficeStore open(Path folder, OfficeOptions options) {
        return OfficeOpening.of(folder, Optional.empty(), options, FolderBooks.INDEX, false);
    }

    /**
     * Opens the store that several desks share on a database server.
     *
     * @param url     {@code jdbc:postgresql:…}
     * @param own     this desk's own folder: its identity, its key, and packs that pass through
     * @throws Refused {@code office-database-failed} where the server can't be used, and those of
     *                 {@link #open(Path, OfficeOptions)} for the folder
     */
    public static OfficeStore open(String url, Path own, OfficeOptions options) {
        if (!OfficeTables.isServer(url)) {
            throw new IllegalArgumentException("no server");
        }
        return OfficeOpening.of(own, Optional.of(url), options, FolderBooks.INDEX, false);
    }

    /** As {@link #open(Path, OfficeOptions)}, with the tables made anew from the journal and the packs. */
    public static OfficeStore rebuild(Path folder, OfficeOptions options) {
        return OfficeOpening.of(folder, Optional.empty(), options, FolderBooks.INDEX, true);
    }

    /** Whether a folder holds an office store. */
    public static boolean isOffice(Path folder) {
        return OfficeOpening.isOffice(folder);
    }

    /** Whether a text names a database server rather than a folder. */
    public static boolean isServer(String text) {
        return OfficeTables.isServer(text);
    }

    /** An office with its tables made anew in a folder of another name, beside those in use. */
    static OfficeStore beside(Path folder, String index, OfficeOptions options) {
        return OfficeOpening.of(folder, Optional.empty(), options, index, true);
    }

    /** A database that fails is told in words too. */
    static RuntimeException refused(RuntimeException failure) {
        return failure instanceof OfficeBroken
                ? new Refused(Defect.in("", "office-database-failed", String.valueOf(failure.getMessage())), failure)
                : failure;
    }

    /** What was done so far; called on the store's thread. */
    Minutes minutes(OfficeTables tables) {
        minutes.readOn(tables);
        return minutes;
    }

    private Register version(String digest) {
        return new Register(JsonReader.read(books.tables().register(digest).orElseThrow()).root());
    }

    /** Asks the tables on the store's own thread. */
    <T> T ask(Function<OfficeTables, T> question) {
        return on(() -> books.ask(() -> question.apply(books.tables())));
    }

    /** As {@link #ask}, for whoever needs no zone to stand as it does by what came last. */
    <T> T look(Function<OfficeTables, T> question) {
        return on(() -> books.look(() -> question.apply(books.tables())));
    }

    private <T> T on(Callable<T> work) {
        try {
            return desk.call(work);
        } catch (OfficeBroken e) {
            throw refused(e);
        }
    }

    /**
     * Takes packs in, one after the other; each whole or not at all. Some small ones are brought onto the medium and
     * into the tables together, while the next ones are proved. A person may stop it between two of them.
     *
     * @param person   who receives
     * @param progress told of the packs, and asked whether to stop
     * @return what came of each, in their order; fewer than there are files where it was stopped
     */
    public List<Received> receive(List<Path> files, String person, Progress progress) {
        return new Receiving(this, shelf, options).receive(files, person, progress);
    }

    /** Takes one pack in, whole or not at all. Receiving it again changes nothing. */
    public Received receive(Path file, String person) {
        return new Receiving(this, shelf, options).receive(file, person);
    }

    /**
     * Signs and writes a receipt under its usual name.
     *
     * @param into a folder that exists
     * @throws Refused {@code receipt-…}, {@code device-key-…}
     */
    public Path write(Receipt receipt, Path into) {
        return ReceiptWriter.write(receipt, key(), into.resolve(ReceiptWriter.fileName(receipt)));
    }

    /** The key by which this office signs receipts and round files, made on first use. */
    public DeviceKey key() {
        return DeviceKey.of(folder);
    }

    /**
     * Does something that the office decided.
     *
     * @return the entry with its number and time
     */
    public Entry act(String person, OfficeDeed deed) {
        return act(person, deed, Optional.empty());
    }

    /**
     * As {@link #act(String, OfficeDeed)}, but only where what it changes is still as the person saw it.
     *
     * @param base the digest of the register that a change of it starts from
     * @throws Refused {@code register-changed-since}
     */
    public Entry act(String person, OfficeDeed deed, Optional<String> base) {
        if (deed instanceof OfficeDeed.PackReceived) {
            throw new IllegalArgumentException("a pack is received");
        }
        return keep(List.of(new Books.Deed(person, deed, Optional.empty(), base))).get(0).orElseThrow();
    }

    /** As {@link Books#keep}. */
    List<Optional<Entry>> keep(List<Books.Deed> deeds) {
        try {
            return desk.call(() -> {
                try {
                    listing.changing();
                    return books.keep(deeds);
                } catch (RuntimeException e) {
                    // It may have read a deed that was taken back.
                    minutes = new Minutes();
                    throw e;
                }
            });
        } catch (OfficeBroken e) {
            throw refused(e);
        }
    }

    /**
     * Writes a note that is no deed and that nothing depends on.
     *
     * @return whether it is written; whoever can't write it goes on without
     */
    boolean note(Consumer<OfficeTables> note) {
        try {
            return desk.call(() -> books.tables().whole(() -> {
                note.accept(books.tables());
                return true;
            }));
        } catch (OfficeBroken | IllegalStateException e) {
            // They may be closed, too, where they could not be made anew.
            return false;
        }
    }

    /** Trusts a device from now on; nothing happens where it is trusted already. */
    public void trust(String fingerprint, String name, String person) {
        if (!ask(tables -> minutes(tables).trusts(fingerprint))) {
            act(person, new OfficeDeed.DeviceTrusted(fingerprint, name));
        }
    }

    public boolean trusts(String fingerprint) {
        return ask(tables -> minutes(tables).trusts(fingerprint));
    }

    /** Every zone of every plant, worst first. */
    public List<RankedZone> rank() {
        return rank(RankQuery.ALL, Progress.NONE);
    }

    /**
     * The zones that a query asks for, worst first. The list tells what was true when it was asked for, and puts a zone
     * together whenever that is looked at: whoever looks at all of them several times copies it first.
     *
     * @param progress told while zones are judged that were not judged since they changed
     */
    public List<RankedZone> rank(RankQuery query, Progress progress) {
        return listing.rank(query, progress);
    }

    /**
     * The worst of the zones that a query asks for: the head of {@link #rank(RankQuery, Progress)}, without reading all
     * of them where enough are overloaded.
     *
     * @param atMost how many; at least 1
     */
    public List<RankedZone> worst(RankQuery query, int atMost, Progress progress) {
        return listing.worst(query, atMost, progress);
    }

    /** A zone as it stands in the list. */
    public Optional<RankedZone> ranked(ZoneId zone) {
        return listing.ranked(zone);
    }

    /** Judges what was not judged since it changed. */
    void judgeWaiting(Progress progress) {
        listing.judgeWaiting(progress);
    }

    /**
     * A zone's latest result by the register that it was made with; the worst, where contents clash.
     *
     * @return nothing where it was never inspected, or can't be judged
     */
    public Optional<JudgedZone> judged(ZoneId zone) {
        return ask(tables -> results.latest(tables, List.of(zone)).get(zone).stream().min(Judge.WORST_FIRST));
    }

    /** The same result by the register that holds today. */
    public Optional<JudgedZone> judgedToday(ZoneId zone) {
        return ask(tables -> tables.plant(zone.plant()).flatMap(today -> results.judged(tables,
                Merge.zone(zone, tables.copies(List.of(zone)), minutes(tables).setAside()).latest(),
                copy -> today.register()).stream().min(Judge.WORST_FIRST)));
    }

    /** The bytes of a photo of a survey; nothing where no pack holds it. */
    public Optional<byte[]> photo(JudgedZone zone, String sha256) {
        return desk.call(() -> books.ask(() -> books.tables().packOf(zone.copy().digest())).flatMap(pack ->
                photos.bytes(books, pack, sha256)));
    }

    /** A zone over time. */
    public ZoneTrend trend(ZoneId zone) {
        return ask(tables -> results.trend(tables, zone));
    }

    /** Contents with what the flat table tells of them, in the order of the digests. */
    List<FlatRow> rows(List<String> digests) {
        return ask(tables -> results.rows(tables, digests));
    }

    /** What counts of a zone's surveys. */
    public MergedZone merged(ZoneId zone) {
        return ask(tables -> Effects.merged(tables, zone, minutes(tables)));
    }

    /** A zone's surveys by their digests, with all sides of every clash. */
    public Map<String, Survey> surveys(Collection<String> digests) {
        return ask(tables -> Results.documents(tables, digests));
    }

    /** The zones with that id, of several plants maybe; those with that tag where none has. */
    public List<ZoneNames> zonesNamed(String named) {
        List<ZoneNames> zones = ask(OfficeTables::zones).stream().map(zone -> zone.row().names()).toList();
        List<ZoneNames> exact = zones.stream().filter(one -> one.zone().key().equals(named)
                || one.zone().transfer().equals(named)).toList();
        return exact.isEmpty() ? zones.stream().filter(one -> one.tag().equals(named)).toList() : exact;
    }

    /** The register that holds today, by plant. */
    public Map<String, Register> registers() {
        return ask(tables -> {
            Map<String, Register> registers = new LinkedHashMap<>();
            tables.plants().forEach(row -> registers.put(row.id(), Registers.read(row)));
            return registers;
        });
    }

    /** {@code plant}, {@code forms} and {@code rounds} that hold today. */
    public Optional<Branch> head(String plant) {
        return ask(tables -> tables.plant(plant).map(row -> JsonReader.read(row.content()).root()));
    }

    /** The packs that were taken in, in their order; each entry's deed is a {@link OfficeDeed.PackReceived}. */
    public List<Entry> packs() {
        return ask(tables -> minutes(tables).packs());
    }

    public List<OfficeDeed.ActionSet> actions() {
        return ask(tables -> minutes(tables).actions());
    }

    /** This office's, or this desk's own folder. */
    public Path folder() {
        return folder;
    }

    public Device device() {
        return device;
    }

    /**
     * Gives the office, or this desk, the name that its receipts and round files carry from now on.
     *
     * @throws Refused {@code store-…} where it can't be written, and those of {@link OfficeName#proved}
     */
    public void rename(String typed) {
        String name = OfficeName.proved(typed);
        desk.call(() -> {
            try {
                device = new DeviceFile(folder, options.files(), OfficeOpening.OFFICE)
                        .write(Optional.of(device.id()), name);
                return true;
            } catch (IOException e) {
                throw new Refused(Fault.defect("store", e, options.files(), folder), e);
            }
        });
    }

    /** What was not as it was written when the store was opened. */
    public List<Defect> found() {
        return desk.call(() -> books instanceof FolderBooks folder ? folder.found() : List.of());
    }

    @Override
    public void close() {
        if (closed.getAndSet(true)) {
            return;
        }
        desk.call(() -> {
            books.close();
            lock.close();
            return true;
        });
        desk.close();
    }
}
