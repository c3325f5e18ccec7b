package bedmark.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.office.OfficeTables;
import bedmark.index.office.PlantRow;
import bedmark.index.office.Standing;
import bedmark.json.BundleReader;
import bedmark.journal.Progress;
import bedmark.pack.PackLimits;
import bedmark.pack.PackReader;
import bedmark.pack.ReadPack;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.OfficeDeed;
import bedmark.survey.Register;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.Merge;
import bedmark.survey.merge.MergedZone;
import bedmark.survey.merge.ZoneId;
import bedmark.index.office.CopyRow;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;

/** What deeds make of the tables: the same in whichever order packs come. */
final class Effects implements Books.Effect {
    private final PackShelf shelf;
    private final PackLimits limits;
    private final Function<OfficeTables, Minutes> minutes;
    private final Registers registers = new Registers();

    /** @param minutes what was done so far, the deed under way included */
    Effects(PackShelf shelf, PackLimits limits, Function<OfficeTables, Minutes> minutes) {
        this.shelf = shelf;
        this.limits = limits;
        this.minutes = minutes;
    }

    @Override
    public boolean needless(OfficeTables tables, Books.Deed deed) {
        return deed.deed() instanceof OfficeDeed.PackReceived pack && tables.hasPack(pack.sha256());
    }

    @Override
    public void prove(OfficeTables tables, Books.Deed deed) {
        if (deed.base().isPresent() && deed.deed() instanceof OfficeDeed.RegisterChanged changed) {
            Optional<String> holds = tables.plant(changed.plant()).map(PlantRow::digest);
            if (holds.isPresent() && !holds.equals(deed.base())) {
                throw new Refused(Defect.in("", "register-changed-since"));
            }
        }
    }

    @Override
    public void prepare(List<Books.Deed> deeds) {
        List<PackShelf.Laid> laid = deeds.stream().flatMap(deed -> deed.pack().stream()).map(Books.Pack::laid).toList();
        if (!laid.isEmpty()) {
            shelf.keep(laid);
        }
    }

    @Override
    public void of(OfficeTables tables, List<Books.Done> deeds) {
        List<Copy> added = new ArrayList<>();
        for (Books.Done done : deeds) {
            if (done.entry().act() instanceof Act.OfficeActed acted) {
                added.addAll(of(tables, done.entry(), acted.deed(), done.intake()));
            }
        }
        if (!added.isEmpty()) {
            stand(tables, Set.copyOf(added.stream().map(Copy::zone).distinct().toList()), minutes.apply(tables));
            tables.staleDrives(added);
        }
    }

    /** What came in by it; what its zones come to is told when all of them are in. */
    private List<Copy> of(OfficeTables tables, Entry entry, OfficeDeed deed, Optional<Intake> intake) {
        if (deed instanceof OfficeDeed.PackReceived pack) {
            return take(tables, entry, pack, intake.orElseGet(() -> read(pack.sha256())));
        } else if (deed instanceof OfficeDeed.RegisterChanged changed) {
            PlantRow row = Intake.plant(changed.head(), Intake.millis(entry.at()), true);
            Register register = registers.of(row);
            tables.addRegister(row.register(), row.id(), Intake.registerText(register));
            put(tables, row, register);
        } else if (deed instanceof OfficeDeed.ClashSettled settled) {
            stand(tables, Set.of(settled.zone()), minutes.apply(tables));
        }
        return List.of();
    }

    /** Reads a pack of the shelf once more. */
    private Intake read(String sha256) {
        ReadPack pack = new PackReader(limits, BundleReader::readUnjudged).open(shelf.file(sha256), Progress.NONE);
        return Intake.of(pack.bundle(), sha256);
    }

    private List<Copy> take(OfficeTables tables, Entry entry, OfficeDeed.PackReceived pack, Intake intake) {
        tables.addPack(pack.sha256(), entry.sequence(), shelf.forTables(pack.sha256()));
        tables.refusals().settle(List.of(pack.sha256()));
        tables.addRegister(intake.plant().register(), intake.plant().id(), intake.register());
        Optional<PlantRow> known = tables.plant(intake.plant().id());
        boolean newer = known.isEmpty() || !known.get().own() && later(intake.plant(), known.get());
        PlantRow holds = newer ? intake.plant() : known.get();
        if (newer && known.filter(one -> one.digest().equals(holds.digest())).isPresent()) {
            tables.madeAgain(holds);
        } else if (newer && known.filter(one -> one.register().equals(holds.register())).isPresent()) {
            tables.put(holds);
        } else if (newer) {
            put(tables, holds, registers.of(holds));
        }
        long came = Intake.millis(entry.at());
        List<CopyRow> copies = intake.copies().stream().map(row -> row.receivedAt(came)).toList();
        Set<String> touched = tables.add(copies);
        List<Copy> added = copies.stream().map(CopyRow::copy).filter(copy -> touched.contains(copy.digest()))
                .toList();
        if (!added.isEmpty()) {
            tables.addUnnamed(Set.copyOf(added.stream().map(Copy::zone).distinct().toList()),
                    registers.of(holds).name());
        }
        return added;
    }

    private static boolean later(PlantRow one, PlantRow other) {
        return one.made() != other.made() ? one.made() > other.made() : one.digest().compareTo(other.digest()) > 0;
    }

    private static void put(OfficeTables tables, PlantRow row, Register register) {
        tables.put(row);
        tables.name(row.id(), register.name(), Intake.names(register));
    }

    /** Says what counts of zones by what the tables hold of them. */
    static void stand(OfficeTables tables, Collection<ZoneId> zones, Minutes minutes) {
        if (zones.isEmpty()) {
            return;
        }
        List<Copy> copies = tables.copies(zones);
        Set<String> aside = minutes.setAside();
        List<Standing> standings = Merge.zones(copies, aside).values().stream().map(Standings::of).toList();
        tables.put(standings);
    }

    static MergedZone merged(OfficeTables tables, ZoneId zone, Minutes minutes) {
        return Merge.zone(zone, tables.copies(Set.of(zone)), minutes.setAside());
    }
}
