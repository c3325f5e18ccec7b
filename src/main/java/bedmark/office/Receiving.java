package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import bedmark.pack.PackReader;
import bedmark.pack.ReadPack;
import bedmark.pack.Receipt;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.OfficeDeed;
import bedmark.survey.merge.Clash;
import bedmark.survey.merge.Merge;
import bedmark.survey.merge.ZoneId;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;

/** Takes packs in: copied beside the others, proved there, and only then told to the books; receipts of what is in. */
final class Receiving {
    private final OfficeStore store;
    private final PackShelf shelf;
    private final OfficeOptions options;

    Receiving(OfficeStore store, PackShelf shelf, OfficeOptions options) {
        this.store = store;
        this.shelf = shelf;
        this.options = options;
    }

    List<Received> receive(List<Path> files, String person, Progress progress) {
        List<Received> received = new ArrayList<>();
        try (Provers provers = new Provers(files, this::prove)) {
            while (received.size() < files.size()) {
                if (progress.cancelled()) {
                    provers.rest().forEach(proved -> proved.laid().ifPresent(laid -> shelf.drop(laid.part())));
                    return received;
                }
                progress.at(received.size(), files.size());
                received.add(take(provers.next(), person));
            }
        }
        progress.at(files.size(), files.size());
        return received;
    }

    Received receive(Path file, String person) {
        return take(prove(file), person);
    }

    /**
     * A pack that was looked at; nothing of it is taken in yet.
     *
     * @param laid   its copy in the store's folder
     * @param pack   what it holds, where it is sound
     * @param defect why it is refused, where it is not
     */
    record Proved(Path file, Optional<PackShelf.Laid> laid, Optional<ReadPack> pack, Optional<Intake> intake,
                  Optional<Defect> defect) {
    }

    /** Looks at a pack in the calling thread. */
    private Proved prove(Path file) {
        Optional<PackShelf.Laid> laid = Optional.empty();
        try {
            laid = Optional.of(shelf.lay(file));
            ReadPack pack = new PackReader(options.limits(), BundleReader::readUnjudged).open(laid.get().part(),
                    Progress.NONE);
            return new Proved(file, laid, Optional.of(pack), Optional.of(Intake.of(pack.bundle(),
                    laid.get().sha256())), Optional.empty());
        } catch (Refused e) {
            boolean copied = laid.filter(copy -> e.defect().where().equals(copy.part().toString())).isPresent();
            return new Proved(file, laid, Optional.empty(), Optional.empty(), Optional.of(copied
                    ? new Defect(e.defect().code(), file.toString(), e.defect().details()) : e.defect()));
        }
    }

    private Received take(Proved proved, String person) {
        Optional<String> fingerprint = proved.pack().map(pack -> pack.fingerprint().text());
        Optional<Defect> defect = proved.defect();
        if (defect.isEmpty()) {
            try {
                return take(proved.file(), proved.laid().orElseThrow(), proved.pack().orElseThrow(),
                        proved.intake().orElseThrow(), person);
            } catch (Refused e) {
                defect = Optional.of(e.defect());
            } catch (NotSaved e) {
                defect = Optional.of(e.defect());
            }
        }
        proved.laid().ifPresent(laid -> shelf.drop(laid.part()));
        return new Received.Turned(proved.file(), defect.get(), fingerprint);
    }

    private Received take(Path file, PackShelf.Laid laid, ReadPack pack, Intake intake, String person) {
        String fingerprint = pack.fingerprint().text();
        Branch document = pack.bundle().document();
        Branch sender = document.branch("device").orElse(Branch.EMPTY);
        String name = sender.text("name").orElse("");
        String shown = name.isBlank() ? fingerprint : name;
        if (!store.ask(tables -> store.minutes(tables).trusts(fingerprint))) {
            throw new Refused(Defect.in(shown, "device-untrusted", fingerprint));
        }
        OfficeDeed deed = new OfficeDeed.PackReceived(laid.sha256(), file.getFileName().toString(), laid.bytes(),
                fingerprint, document.uuid("id"), document.time("createdAt"), sender.uuid("id"), name);
        Set<String> before = store.ask(tables -> tables.known(digests(intake)));
        Optional<Entry> entry = store.keep(tables -> tables.hasPack(laid.sha256()), () -> shelf.keep(laid),
                new Books.Deed(person, deed, Optional.of(intake)));
        shelf.passed(laid.sha256());
        if (entry.isEmpty()) {
            shelf.drop(laid.part());
            return new Received.AlreadyHere(file, laid.sha256(), shown, fingerprint, receipt(document, intake,
                    received(laid.sha256())));
        }
        int known = (int) digests(intake).stream().filter(before::contains).count();
        return new Received.Taken(file, laid.sha256(), shown, fingerprint, digests(intake).size() - known, known,
                clashes(intake), ahead(document, entry.get().at()), receipt(document, intake, entry.get()));
    }

    /** The entry by which a pack was taken in. */
    private Entry received(String sha256) {
        return store.packs().stream().filter(entry -> entry.act() instanceof Act.OfficeActed acted
                && acted.deed() instanceof OfficeDeed.PackReceived pack && pack.sha256().equals(sha256))
                .findFirst().orElseThrow();
    }

    /** The same receipt however often the same pack comes. */
    private Optional<Receipt> receipt(Branch bundle, Intake intake, Entry entry) {
        String sha256 = intake.copies().isEmpty() ? "" : intake.copies().get(0).pack();
        return bundle.uuid("id").filter(id -> !sha256.isEmpty()).map(id -> Receipt.of(
                UUID.nameUUIDFromBytes((store.device().id() + sha256).getBytes(StandardCharsets.US_ASCII)), entry.at(),
                new Receipt.Office(store.device().id(), store.device().name()), id, sha256, intake.copies().stream().map(row ->
                        new Receipt.Item(row.copy().id(), row.copy().revision(), row.copy().digest())).toList()));
    }

    private static Set<String> digests(Intake intake) {
        Set<String> digests = new HashSet<>();
        intake.copies().forEach(row -> digests.add(row.copy().digest()));
        return digests;
    }

    private List<Clash> clashes(Intake intake) {
        Set<ZoneId> zones = new HashSet<>();
        intake.copies().forEach(row -> zones.add(row.copy().zone()));
        return store.ask(tables -> Merge.zones(tables.copies(tables.clashing(zones)), store.minutes(tables).setAside())
                .values().stream().flatMap(zone -> zone.clashes().stream()).toList());
    }

    private static long ahead(Branch bundle, OffsetDateTime now) {
        return bundle.time("createdAt").map(at -> Math.max(0, Duration.between(now, at).toSeconds())).orElse(0L);
    }
}
