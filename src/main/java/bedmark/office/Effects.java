package bedmark.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.office.OfficeTables;
import bedmark.index.office.PlantRow;
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
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.Collectors;

/** What deeds make of the tables: the same in whichever order packs come. */
final class Effects implements Books.Effect {
    /** Zones whose surveys are held in memory at once. */
    static final int TOGETHER = 1000;

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
    public Set<ZoneId> of(OfficeTables tables, List<Books.Done> deeds) {
        Set<ZoneId> touched = new HashSet<>();
        Arrivals arrivals = new Arrivals();
        for (Books.Done done : deeds) {
            if (done.entry().act() instanceof Act.OfficeActed acted) {
                if (acted.deed() instanceof OfficeDeed.PackReceived pack) {
                    arrive(tables, done.entry(), pack, done.intake().orElseGet(() -> read(pack.sha256())), arrivals);
                } else {
                    touched.addAll(arrivals.takeIn(tables));
                    touched.addAll(of(tables, done.entry(), acted.deed()));
                }
            }
        }
        touched.addAll(arrivals.takeIn(tables));
        return touched;
    }

    private Set<ZoneId> of(OfficeTables tables, Entry entry, OfficeDeed deed) {
        if (deed instanceof OfficeDeed.RegisterChanged changed) {
            PlantRow row = Intake.plant(changed.head(), Intake.millis(entry.at()), true);
            Register register = registers.of(row);
            tables.addRegister(row.register(), row.id(), Intake.registerText(register));
            put(tables, row, register);
        } else if (deed instanceof OfficeDeed.ClashSettled settled) {
            return Set.of(settled.zone());
        }
        return Set.of();
    }

    /** Reads a pack of the shelf once more. */
    private Intake read(String sha256) {
        ReadPack pack = new PackReader(limits, BundleReader::readUnjudged).open(shelf.file(sha256), Progress.NONE);
        return Intake.of(pack.bundle(), sha256);
    }

    /** What packs brought that followed one another, to be taken in at once. */
    private static final class Arrivals {
        private final List<String> packs = new ArrayList<>();
        private final List<CopyRow> copies = new ArrayList<>();
        private final Map<String, String> plantNames = new HashMap<>();

        Set<ZoneId> takeIn(OfficeTables tables) {
            if (packs.isEmpty()) {
                return Set.of();
            }
            tables.refusals().settle(packs);
            Set<ZoneId> touched = tables.add(copies).stream().map(Copy::zone).collect(Collectors.toSet());
            plantNames.forEach((plant, name) -> tables.addUnnamed(touched.stream()
                    .filter(zone -> zone.plant().equals(plant)).toList(), name));
            packs.clear();
            copies.clear();
            plantNames.clear();
            return touched;
        }
    }

    private void arrive(OfficeTables tables, Entry entry, OfficeDeed.PackReceived pack, Intake intake,
                        Arrivals arrivals) {
        tables.addPack(pack.sha256(), entry.sequence(), shelf.forTables(pack.sha256()));
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
        arrivals.packs.add(pack.sha256());
        arrivals.plantNames.put(holds.id(), registers.of(holds).name());
        intake.copies().forEach(row -> arrivals.copies.add(row.receivedAt(came)));
    }

    private static boolean later(PlantRow one, PlantRow other) {
        return one.made() != other.made() ? one.made() > other.made() : one.digest().compareTo(other.digest()) > 0;
    }

    private static void put(OfficeTables tables, PlantRow row, Register register) {
        tables.put(row);
        tables.name(row.id(), register.name(), Intake.names(register));
    }

    @Override
    public void stand(OfficeTables tables, Collection<ZoneId> zones) {
        stand(tables, zones, minutes.apply(tables));
    }

    static void stand(OfficeTables tables, Collection<ZoneId> zones, Minutes minutes) {
        Set<String> aside = minutes.setAside();
        List<ZoneId> all = List.copyOf(zones);
        for (int from = 0; from < all.size(); from += TOGETHER) {
            List<Copy> copies = tables.copies(all.subList(from, Math.min(from + TOGETHER, all.size())));
            tables.put(Merge.zones(copies, aside).values().stream().map(Standings::of).toList());
        }
    }

    static MergedZone merged(OfficeTables tables, ZoneId zone, Minutes minutes) {
        return Merge.zone(zone, tables.copies(Set.of(zone)), minutes.setAside());
    }
}
