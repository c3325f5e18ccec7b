package bedmark.office;

import bedmark.index.office.OfficeTables;
import bedmark.index.office.PlantRow;
import bedmark.index.office.Standing;
import bedmark.json.BundleReader;
import bedmark.json.JsonReader;
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

    /** @param minutes what was done so far, the deed under way included */
    Effects(PackShelf shelf, PackLimits limits, Function<OfficeTables, Minutes> minutes) {
        this.shelf = shelf;
        this.limits = limits;
        this.minutes = minutes;
    }

    @Override
    public void of(OfficeTables tables, Entry entry, Optional<Intake> intake) {
        if (!(entry.act() instanceof Act.OfficeActed acted)) {
            return;
        }
        OfficeDeed deed = acted.deed();
        if (deed instanceof OfficeDeed.PackReceived pack) {
            take(tables, entry.sequence(), pack, intake.orElseGet(() -> read(pack.sha256())));
        } else if (deed instanceof OfficeDeed.RegisterChanged changed) {
            PlantRow row = Intake.plant(changed.head(), Intake.millis(entry.at()), true);
            Register register = register(row);
            tables.addRegister(row.register(), row.id(), Intake.registerText(register));
            put(tables, row, register);
        } else if (deed instanceof OfficeDeed.ClashSettled settled) {
            stand(tables, Set.of(settled.zone()), minutes.apply(tables));
        }
    }

    /** Reads a pack of the shelf once more. */
    private Intake read(String sha256) {
        ReadPack pack = new PackReader(limits, BundleReader::readUnjudged).open(shelf.file(sha256), Progress.NONE);
        return Intake.of(pack.bundle(), sha256);
    }

    private void take(OfficeTables tables, long sequence, OfficeDeed.PackReceived pack, Intake intake) {
        tables.addPack(pack.sha256(), sequence, shelf.forTables(pack.sha256()));
        tables.addRegister(intake.plant().register(), intake.plant().id(), intake.register());
        Optional<PlantRow> known = tables.plant(intake.plant().id());
        if (known.isEmpty() || !known.get().own() && later(intake.plant(), known.get())) {
            Register register = register(intake.plant());
            if (known.filter(one -> one.register().equals(intake.plant().register())).isPresent()) {
                tables.put(intake.plant());
            } else {
                put(tables, intake.plant(), register);
            }
        }
        Set<String> touched = tables.add(intake.copies());
        List<Copy> added = intake.copies().stream().map(CopyRow::copy).filter(copy -> touched.contains(copy.digest()))
                .toList();
        if (!added.isEmpty()) {
            Set<ZoneId> zones = Set.copyOf(added.stream().map(Copy::zone).distinct().toList());
            tables.addUnnamed(zones, plantName(tables, intake.plant().id()));
            stand(tables, zones, minutes.apply(tables));
            tables.staleDrives(added);
        }
    }

    private static boolean later(PlantRow one, PlantRow other) {
        return one.made() != other.made() ? one.made() > other.made() : one.digest().compareTo(other.digest()) > 0;
    }

    private static void put(OfficeTables tables, PlantRow row, Register register) {
        tables.put(row);
        tables.name(row.id(), register.name(), Intake.names(register));
    }

    static Register register(PlantRow row) {
        return new Register(JsonReader.read(row.content()).root().branch("plant").orElseThrow());
    }

    private static String plantName(OfficeTables tables, String plant) {
        return tables.plant(plant).map(row -> register(row).name()).orElse("");
    }

    private static void stand(OfficeTables tables, Collection<ZoneId> zones, Minutes minutes) {
        List<Copy> copies = tables.copies(zones);
        Set<String> aside = minutes.setAside();
        List<Standing> standings = Merge.zones(copies, aside).values().stream().map(Standings::of).toList();
        tables.put(standings);
    }

    static MergedZone merged(OfficeTables tables, ZoneId zone, Minutes minutes) {
        return Merge.zone(zone, tables.copies(Set.of(zone)), minutes.setAside());
    }
}
