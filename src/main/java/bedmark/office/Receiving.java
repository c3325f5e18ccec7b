package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.office.CopyRow;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import bedmark.office.Proved.Sound;
import bedmark.pack.PackReader;
import bedmark.pack.PackSender;
import bedmark.pack.ReadPack;
import bedmark.pack.Receipt;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.OfficeDeed;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;
import java.util.stream.Collectors;

/** Takes packs in: copied beside the others, proved there, and only then told to the books; receipts of what is in. */
final class Receiving {
    /** Packs that are brought onto the medium and into the tables together. */
    private static final int TOGETHER = 25;
    private static final long TOGETHER_BYTES = 16 << 20;
    /** Towards the end fewer go together, so that there is little left to take in when the last one is proved. */
    private static final int LAST_TOGETHER = 4;
    private static final int SHARE_OF_REST = 2;

    private final OfficeStore store;
    private final PackShelf shelf;
    private final OfficeOptions options;
    private final Counting counting = new Counting();

    Receiving(OfficeStore store, PackShelf shelf, OfficeOptions options) {
        this.store = store;
        this.shelf = shelf;
        this.options = options;
    }

    List<Received> receive(List<Path> files, String person, Progress progress) {
        List<Received> received = new ArrayList<>();
        try (Provers provers = new Provers(files, this::prove)) {
            while (received.size() < files.size()) {
                received.addAll(take(together(provers, received.size(), files.size(), progress), person));
                if (received.size() < files.size() && progress.cancelled()) {
                    provers.rest().forEach(proved -> proved.laid().ifPresent(laid -> shelf.drop(laid.part())));
                    return counted(received);
                }
            }
        }
        progress.at(files.size(), files.size());
        return counted(received);
    }

    private List<Received> counted(List<Received> received) {
        return received.stream().noneMatch(Received.Taken.class::isInstance) ? received
                : store.ask(tables -> counting.counted(received, tables, store.minutes(tables).setAside()));
    }

    /** The next packs that go together: few, and small ones. */
    private static List<Proved> together(Provers provers, int done, int total, Progress progress) {
        List<Proved> packs = new ArrayList<>();
        long bytes = 0;
        int most = Math.min(Math.min(TOGETHER, Math.max(LAST_TOGETHER, (total - done) / SHARE_OF_REST)), total - done);
        while (packs.size() < most && bytes < TOGETHER_BYTES && !progress.cancelled()) {
            progress.at(done + packs.size(), total);
            Proved next = provers.next();
            packs.add(next);
            bytes += next.sound().map(sound -> sound.pack().intake().bytes()).orElse(0L);
        }
        return packs;
    }

    Received receive(Path file, String person) {
        return counted(take(List.of(prove(file)), person)).get(0);
    }

    /** Looks at a pack in the calling thread. */
    private Proved prove(Path file) {
        Optional<PackShelf.Laid> laid = Optional.empty();
        try {
            laid = Optional.of(shelf.lay(file));
            ReadPack pack = new PackReader(options.limits(), BundleReader::readUnjudged).open(laid.get().part(),
                    Progress.NONE);
            Branch document = pack.bundle().document();
            Branch head = Branch.EMPTY;
            for (String key : List.of("id", "createdAt", "device")) {
                head = document.has(key) ? head.with(key, document.get(key).get()) : head;
            }
            Ids.prove(pack.bundle().register(), pack.bundle().surveys());
            Intake intake = Intake.of(pack.bundle(), laid.get().sha256());
            return Proved.sound(new Sound(file, new Books.Pack(laid.get(), intake), new PackSender(pack.fingerprint(),
                    head.branch("device").flatMap(device -> device.text("name"))), head));
        } catch (Refused e) {
            boolean copied = laid.filter(copy -> e.defect().where().equals(copy.part().toString())).isPresent();
            return Proved.refused(file, laid, copied
                    ? new Defect(e.defect().code(), file.toString(), e.defect().details()) : e.defect(),
                    laid.flatMap(copy -> PackSender.of(copy.part(), options.limits())));
        }
    }

    /** What comes of packs, in their order. */
    private List<Received> take(List<Proved> packs, String person) {
        Set<String> trusted = store.look(tables -> packs.stream().flatMap(proved -> proved.signer().stream())
                .map(signer -> signer.fingerprint().text()).filter(store.minutes(tables)::trusts)
                .collect(Collectors.toSet()));
        List<Received> received = new ArrayList<>();
        Map<String, Sound> waiting = new LinkedHashMap<>();
        for (Proved proved : packs) {
            Optional<Sound> sound = proved.sound().filter(one -> trusted.contains(one.fingerprint()));
            if (sound.isEmpty() || waiting.containsKey(sound.get().sha256())) {
                received.addAll(keep(List.copyOf(waiting.values()), person));
                waiting.clear();
            }
            if (sound.isPresent()) {
                waiting.put(sound.get().sha256(), sound.get());
            } else {
                received.add(turned(proved, trusted));
            }
        }
        received.addAll(keep(List.copyOf(waiting.values()), person));
        return new Refusals(store, options.clock()).noted(received);
    }

    /** One that is not sound, or whose device is not trusted. */
    private Received turned(Proved proved, Set<String> trusted) {
        proved.laid().ifPresent(laid -> shelf.drop(laid.part()));
        return new Received.Turned(proved.file(), proved.defect().orElseGet(() -> proved.sound().map(sound ->
                Defect.in(sound.shown(), "device-untrusted", sound.fingerprint())).orElseThrow()),
                proved.laid().map(Receiving::content), proved.laid().map(laid -> proved.signer().map(signer ->
                Sender.of(signer, trusted)).orElse(Sender.UNPROVED)));
    }

    private static Received.Content content(PackShelf.Laid laid) {
        return new Received.Content(laid.sha256(), laid.bytes());
    }

    /** Keeps packs that differ; where they can't all be kept together, each says for itself why. */
    private List<Received> keep(List<Sound> packs, String person) {
        List<Received> received = new ArrayList<>();
        int most = packs.size();
        while (received.size() < packs.size()) {
            int from = received.size();
            List<Sound> some = packs.subList(from, Math.min(from + most, packs.size()));
            try {
                received.addAll(kept(some, person));
            } catch (Refused e) {
                most = alone(some, e.defect(), received);
            } catch (NotSaved e) {
                most = alone(some, e.defect(), received);
            }
        }
        return received;
    }

    private int alone(List<Sound> failed, Defect defect, List<Received> received) {
        if (failed.size() == 1) {
            Sound pack = failed.get(0);
            shelf.drop(pack.pack().laid().part());
            received.add(new Received.Turned(pack.file(), defect, Optional.of(content(pack.pack().laid())),
                    Optional.of(Sender.of(pack.signer(), Set.of(pack.fingerprint())))));
        }
        return 1;
    }

    /** What came of the first of some packs, and of those that were kept with it. */
    private List<Received> kept(List<Sound> packs, String person) {
        List<Optional<Entry>> entries = store.keep(packs.stream().map(pack -> deed(pack, person)).toList());
        List<Received> received = new ArrayList<>();
        for (int i = 0; i < entries.size(); i++) {
            Sound pack = packs.get(i);
            shelf.passed(pack.sha256());
            if (entries.get(i).isEmpty()) {
                shelf.drop(pack.pack().laid().part());
                received.add(new Received.AlreadyHere(pack.file(), pack.sha256(), pack.shown(), pack.fingerprint(),
                        receipt(pack, received(pack.sha256()))));
            } else {
                Entry entry = entries.get(i).get();
                counting.add(pack.sha256(), pack.pack().intake().zones());
                received.add(new Received.Taken(pack.file(), pack.sha256(), pack.shown(), pack.fingerprint(), 0,
                        pack.pack().intake().digests().size(), List.of(), ahead(pack.head(), entry.at()),
                        receipt(pack, entry)));
            }
        }
        return received;
    }

    private static Books.Deed deed(Sound pack, String person) {
        PackShelf.Laid laid = pack.pack().laid();
        return new Books.Deed(person, new OfficeDeed.PackReceived(laid.sha256(), pack.file().getFileName().toString(),
                laid.bytes(), pack.fingerprint(), pack.head().uuid("id"), pack.head().time("createdAt"),
                pack.device().uuid("id"), pack.device().text("name").orElse("")), Optional.of(pack.pack()));
    }

    /** The entry by which a pack was taken in. */
    private Entry received(String sha256) {
        return store.packs().stream().filter(entry -> entry.act() instanceof Act.OfficeActed acted
                && acted.deed() instanceof OfficeDeed.PackReceived pack && pack.sha256().equals(sha256))
                .findFirst().orElseThrow();
    }

    /** Under the same id however often the same pack comes; a tablet takes it once, however the office is called. */
    private Optional<Receipt> receipt(Sound pack, Entry entry) {
        List<CopyRow> copies = pack.pack().intake().copies();
        return pack.head().uuid("id").filter(id -> !copies.isEmpty()).map(id -> Receipt.of(
                UUID.nameUUIDFromBytes((store.device().id() + pack.sha256()).getBytes(StandardCharsets.US_ASCII)),
                entry.at(), new Receipt.Office(store.device().id(), store.device().name()), id, pack.sha256(),
                copies.stream().map(row -> new Receipt.Item(row.copy().id(), row.copy().revision(),
                        row.copy().digest())).toList()));
    }

    private static long ahead(Branch bundle, OffsetDateTime now) {
        return bundle.time("createdAt").map(at -> Math.max(0, Duration.between(now, at).toSeconds())).orElse(0L);
    }
}
